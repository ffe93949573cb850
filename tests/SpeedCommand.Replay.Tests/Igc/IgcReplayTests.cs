using System.Text;
using CsCheck;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Igc;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Tests.Igc;

/// <summary>IGC files through the pipeline: what is there is computed, what is not stays blank, nothing is made up.</summary>
public sealed class IgcReplayTests
{
    private static readonly Glider Glider = GliderFile.Read("""
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } }
        """u8, "test.json").Glider!;

    private sealed class Pictures : IPictureSink
    {
        public List<CockpitPicture> All { get; } = [];

        public void OnPicture(in CockpitPicture picture) => All.Add(picture);
    }

    private static List<CockpitPicture> Replay(string text, out IgcRecording recording)
    {
        var pictures = new Pictures();
        recording = IgcRecording.Open(() => new MemoryStream(Encoding.UTF8.GetBytes(text)));
        var replay = recording.Start(new FlightSettings(Glider), pictures, _ => StreamSettings.Sentences(ChecksumRule.Required));
        while (replay.Step())
        {
        }

        return pictures.All;
    }

    /// <summary>A straight glide northwards, one line every so many seconds.</summary>
    private static string File(string extensions, int count, int intervalS, Func<int, string> fields, Func<int, int>? heightM = null)
    {
        var text = new StringBuilder("AXXX123\nHFDTE140626\n" + extensions);
        for (var i = 0; i < count; i++)
        {
            var t = i * intervalS;
            var height = heightM?.Invoke(t) ?? 1000;
            text.Append(System.Globalization.CultureInfo.InvariantCulture,
                $"B10{t / 60:00}{t % 60:00}50{10_000 + 16 * t:00000}N00830000EA{height:00000}{(height == 0 ? 1500 : height):00000}{fields(t)}\n");
        }

        return text.ToString();
    }

    /// <summary>ISO 2533 at 1000 m: 8.5 °C; 108 km/h indicated are 30.00 m/s, true by √(ρ0/ρ) = 1.0498 and a little compressibility 31.5 m/s.</summary>
    [Fact]
    public void AirspeedAndPressure_GiveTheWholePicture()
    {
        var pictures = Replay(File("I023638IAS3941OAT\n", 60, 1, _ => "108009"), out var recording);
        Assert.Equal(["a fix every 1.0 s: a value stays for 1.5 s instead of 0.9 s"], recording.Remarks);
        var last = pictures[^1];
        Assert.Equal(1000, last.PressureAltitudeM.Value, 0.1);
        Assert.Equal(30, last.IndicatedAirspeedMps.Value, 0.01);
        Assert.Equal(31.5, last.TrueAirspeedMps.Value, 0.1);
        Assert.Equal(282.15, last.TemperatureK.Value, 0.01);
        Assert.Equal(0, last.ClimbMps.Value, 0.05);
        Assert.All(pictures[20..], picture => Assert.True(picture.ClimbMps.IsKnown && picture.MinSinkIndicatedMps.IsKnown));
        Assert.Equal(59.1, last.TimeS, 1e-9);
    }

    /// <summary>True airspeed alone: the same flight as with the indicated one that belongs to it.</summary>
    [Fact]
    public void TrueAirspeedAlone_IsTurnedIntoIndicated()
    {
        var pictures = Replay(File("I023640TAS4143OAT\n", 10, 1, _ => "11340009"), out var recording);
        Assert.Contains("no indicated airspeed: worked out from the true airspeed", recording.Remarks);
        Assert.Equal(31.5, pictures[^1].TrueAirspeedMps.Value, 0.001);
        Assert.Equal(30, pictures[^1].IndicatedAirspeedMps.Value, 0.05);
    }

    /// <summary>Rising at 2 m/s by the pressure alone is no total-energy climb: it is not shown as one.</summary>
    [Fact]
    public void WithoutAirspeed_HeightsRemain_AndNoClimbIsShown()
    {
        var pictures = Replay(File("", 60, 1, _ => "", t => 1000 + 2 * t), out var recording);
        Assert.Contains(recording.Remarks, remark => remark.StartsWith("no airspeed", StringComparison.Ordinal));
        Assert.All(pictures, picture => Assert.False(picture.ClimbMps.IsKnown || picture.AverageClimbMps.IsKnown || picture.TrueAirspeedMps.IsKnown));
        Assert.Equal(1118, pictures[^1].PressureAltitudeM.Value, 0.1);
        Assert.True(pictures[^1].DensityAltitudeM.IsKnown);
        Assert.Equal(2.0, recording.Climbs!.BestMps, 1e-9);
        Assert.Empty(recording.Climbs.Climbs);
    }

    [Fact]
    public void WithoutPressureSensor_HeightsAreBlank_AndGnssHeightServesTheClimbs()
    {
        var pictures = Replay(File("", 40, 1, _ => "", _ => 0), out var recording);
        Assert.All(pictures, picture => Assert.False(picture.PressureAltitudeM.IsKnown));
        Assert.Contains(recording.Remarks, remark => remark.StartsWith("no pressure altitude", StringComparison.Ordinal));
        Assert.Equal(1500, recording.Climbs!.MaxHeightM);
    }

    [Theory]
    [InlineData(1, 1.5, true)]
    [InlineData(2, 3.0, true)]
    [InlineData(4, 6.0, false)]
    public void Freshness_IsOneAndAHalfIntervals_AndEndsThere(int intervalS, double freshS, bool hasClimb)
    {
        var pictures = Replay(File("I013638IAS\n", 30, intervalS, _ => "108") + "B1100005050000N00830000EA0100001000108\n", out var recording);
        Assert.Equal(freshS, recording.FreshnessUs * 1e-6, 1e-9);
        var lastFixS = 29.0 * intervalS;
        Assert.All(pictures.Where(picture => picture.TimeS < 3590), picture => Assert.Equal(
            picture.TimeS > 0 && picture.TimeS - lastFixS <= freshS, picture.IndicatedAirspeedMps.IsKnown));
        Assert.Equal(hasClimb, pictures.Exists(picture => picture.ClimbMps.IsKnown && picture.TimeS > 10));
        Assert.Equal(!hasClimb, recording.Remarks.Contains("climb and netto need fixes at most 2 s apart: they are blank"));
    }

    /// <summary>flight.igc is made to glide for a minute at 1 m/s down, then to circle to the right every 24 s, rising 2.1 m/s.</summary>
    [Fact]
    public void ReferenceFlight_HasItsOneClimb()
    {
        var path = Path.Combine(AppContext.BaseDirectory, "Igc/reference/flight.igc");
        Replay(System.IO.File.ReadAllText(path), out var recording);
        var climb = Assert.Single(recording.Climbs!.Climbs);
        Assert.Equal(2.1, climb.MeanMps, 0.15);
        Assert.Equal(climb.DurationS / 24, climb.Turns, 0.5);
        Assert.InRange(climb.DurationS, 170, 195);
        Assert.Equal(2.1, climb.RecorderMeanMps, 0.1);
        Assert.Equal(2.1, recording.Climbs.BestMps, 0.05);
    }

    [Fact]
    public void FileWithoutAUsableFix_IsRefused() => Assert.StartsWith("line 2: expected a B record",
        Assert.Throws<FormatException>(() => Replay("AXXX123\nBxx\n", out _)).Message, StringComparison.Ordinal);

    /// <summary>Whatever stands in the file: never an exception but the one that refuses it.</summary>
    [Fact]
    public void Junk_NeverThrows() => Gen.Select(Gen.Int[0, 60], Gen.Int[0, 45], Gen.Byte).List[1, 20].Sample(spoilt =>
    {
        var bytes = Encoding.UTF8.GetBytes(File("I023638IAS3941OAT\n", 60, 1, _ => "108009"));
        foreach (var (line, column, value) in spoilt)
        {
            bytes[(40 + line * 42 + column) % bytes.Length] = value;
        }

        try
        {
            using var recording = IgcRecording.Open(() => new MemoryStream(bytes));
            var replay = recording.Start(new FlightSettings(Glider), new Pictures(), _ => StreamSettings.Sentences(ChecksumRule.Required));
            while (replay.Step())
            {
            }
        }
        catch (FormatException)
        {
            // Refused as a whole: also an answer.
        }
    }, iter: 300);
}
