using System.Globalization;
using CsCheck;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests.Controls;

/// <summary>Controls as text: what is understood, what is told about the rest, and that what was written reads back to the same bits.</summary>
public sealed class ControlTextTests
{
    [Theory]
    [InlineData("expected-climb 1.5 m/s", "expected-climb 1.5 m/s", 1.5)]
    [InlineData("expected-climb 3kt", "expected-climb 1.5433 m/s", 1.5433)] // 3 x 1852 m / 3600 s, to four decimals
    [InlineData("expected-climb 300 ft/min", "expected-climb 1.524 m/s", 1.524)] // 300 x 0.3048 m / 60 s
    [InlineData("expected-climb auto 2 m/s", "expected-climb auto 2 m/s", 2)]
    [InlineData("ballast 80 kg", "ballast 80 kg", 80)]
    [InlineData("ballast 80 l", "ballast 80 kg", 80)]
    [InlineData("ballast 100 lb", "ballast 45.4 kg", 45.4)] // 100 x 0.45359237 kg, to one decimal
    [InlineData("ballast 80 kg dump 90 l/min", "ballast 80 kg dump 1.5 kg/s", 80)]
    [InlineData("bugs 12.5 %", "bugs 12.5 %", 0.125)]
    [InlineData("phase auto", "phase auto", 0)]
    [InlineData("phase climbing", "phase climbing", (double)FlightPhase.Climbing)]
    [InlineData("phase gliding", "phase gliding", (double)FlightPhase.Gliding)]
    [InlineData("qnh 1021 hPa", "qnh 1021 hPa", 102_100)]
    [InlineData("qnh 29.92 inHg", "qnh 1013.21 hPa", 101_321)] // 29.92 x 3386.389 Pa (ISO 80000-4), to two decimals
    [InlineData("  brightness   70 %  ", "brightness 70 %", 0.7)]
    [InlineData("volume 0 %", "volume 0 %", 0)]
    [InlineData("mute on", "mute on", 1)]
    public void GoodText_IsUnderstood(string text, string written, double si)
    {
        Assert.True(ControlText.TryReadChange(text, out var change, out var problem), problem);
        Assert.Equal(written, ControlText.Write(change));
        Assert.Equal(si, change.Value, 1e-12 * Math.Max(1, si));
    }

    [Theory]
    [InlineData("expected-climb", "expected-climb: expected a number with a unit (m/s, km/h, kt, mph, ft/min), auto, + or -, found ''")]
    [InlineData("expected-climb 15.1 m/s", "expected-climb: expected 0 to 15 m/s, found '15.1 m/s'")]
    [InlineData("expected-climb -1 m/s", "expected-climb: expected 0 to 15 m/s, found '-1 m/s'")]
    [InlineData("expected-climb 1,5 m/s", "expected-climb: expected a number with a unit (m/s, km/h, kt, mph, ft/min), auto, + or -, found '1,5 m/s'")]
    [InlineData("expected-climb automatic", "expected-climb: expected a number with a unit (m/s, km/h, kt, mph, ft/min), auto, + or -, found 'automatic'")]
    [InlineData("ballast 601 l", "ballast: expected 0 to 600 kg, found '601 l'")]
    [InlineData("ballast dump 20 kg/s", "ballast: expected a number with a unit (kg, l, lb), dump, dump RATE, stop, + or -, found 'dump 20 kg/s'")]
    [InlineData("bugs 101 %", "bugs: expected 0 to 100 %, found '101 %'")]
    [InlineData("phase landing", "phase: expected auto, climbing, gliding, + or -, found 'landing'")]
    [InlineData("qnh 1021", "qnh: expected a number with a unit (Pa, hPa, kPa, mbar, bar, inHg, mmHg), + or -, found '1021'")]
    [InlineData("qnh 860 hPa", "qnh: expected 870 to 1090 hPa, found '860 hPa'")]
    [InlineData("brightness 200 %", "brightness: expected 0 to 100 %, found '200 %'")]
    [InlineData("volume loud", "volume: expected a number with a unit (%), + or -, found 'loud'")]
    [InlineData("mute", "mute: expected off, on, + or -, found ''")]
    [InlineData("flaps 2", "expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found 'flaps'")]
    [InlineData("\u0001\n", "expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found '??'")]
    public void BadText_IsToldInOneLine(string text, string expected)
    {
        Assert.False(ControlText.TryRead(text, out _, out var problem));
        Assert.Equal(expected, problem);
    }

    [Theory] // complete in itself is what a log may hold: a step would come to something else in another recording
    [InlineData("expected-climb +")]
    [InlineData("expected-climb auto")]
    [InlineData("ballast stop")]
    [InlineData("ballast dump")]
    public void Request_IsNoChange(string text)
    {
        Assert.True(ControlText.TryRead(text, out _, out _));
        Assert.False(ControlText.TryReadChange(text, out _, out var problem));
        Assert.Equal($"expected a value that stands by itself, found '{text}'", problem);
    }

    [Fact]
    public void WrittenChange_ReadsBackToTheSameBits() => AnyChange.Sample(change =>
    {
        var rounded = ControlText.Round(change);
        Assert.True(ControlText.TryReadChange(ControlText.Write(rounded), out var read, out var problem), problem);
        Assert.Equal(rounded, read);
        Assert.Equal(BitConverter.DoubleToInt64Bits(rounded.Value), BitConverter.DoubleToInt64Bits(read.Value));
    }, iter: 5_000);

    [Fact]
    public void AnyText_IsReadOrTold_NeverThrown() => Gen.OneOf(Gen.String, Gen.Select(AnyChange, Gen.Int[0, 30], Gen.Char, (change, at, junk) =>
    {
        var text = ControlText.Write(change).ToCharArray();
        text[at % text.Length] = junk;
        return new string(text);
    })).Sample(text => Assert.Equal(ControlText.TryRead(text, out _, out var problem), problem is null), iter: 5_000);

    [Fact]
    public void CommaDecimalCulture_SameText()
    {
        var before = CultureInfo.CurrentCulture;
        try
        {
            var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
            culture.NumberFormat.NumberDecimalSeparator = ",";
            culture.NumberFormat.NegativeSign = "−";
            CultureInfo.CurrentCulture = culture;
            Assert.True(ControlText.TryReadChange("expected-climb 1.5 m/s", out var change, out _));
            Assert.Equal("expected-climb 1.5 m/s", ControlText.Write(change));
            Assert.Equal("0.5 m/s, 1 kt, 100 ft/min", ControlCatalogue.Of(ControlId.ExpectedClimb).StepText);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Registry_IsInTheOrderOfItsNumbers() =>
        Assert.Equal(Enum.GetValues<ControlId>(), ControlCatalogue.All.Select(spec => spec.Id));

    internal static Gen<ControlChange> AnyChange { get; } = Gen.Select(Gen.Enum<ControlId>(), Gen.Double[0, 1], Gen.Bool, Gen.Double[0.01, 10])
        .Select((control, share, flag, rate) =>
        {
            var spec = ControlCatalogue.Of(control);
            return control switch
            {
                ControlId.Phase => new ControlChange(control, flag ? 0 : Math.Round(share), flag),
                ControlId.Mute => new ControlChange(control, Math.Round(share)),
                ControlId.ExpectedClimb => new ControlChange(control, share * spec.Max, flag),
                ControlId.Ballast => new ControlChange(control, share * spec.Max, DumpKgPerS: flag ? rate : 0),
                _ => new ControlChange(control, spec.Min + share * (spec.Max - spec.Min)),
            };
        });
}
