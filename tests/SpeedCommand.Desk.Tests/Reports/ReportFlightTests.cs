using SpeedCommand.Desk.Commands;
using SpeedCommand.Desk.Reports;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Desk.Tests.Reports;

/// <summary>Climbs and glides of a simulated flight against what was really flown.</summary>
[Collection("console")]
public sealed class ReportFlightTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly ReportFlight _flight;
    private readonly List<TruthSample> _truth = [];

    public ReportFlightTests()
    {
        var log = Path.Combine(_folder, "day.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "thermal-day", "--seed", "5", "--out", log).Status);
        _flight = ReportCommand.Replay(new FlightInput(log, null, null));
        using var reader = FlightLogFile.Open(log);
        while (reader.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Truth && TruthRecord.TryRead(record.TimeUs, record.Content, out var sample))
            {
                _truth.Add(sample);
            }
        }
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private TruthSample TruthAt(double timeS) => _truth.MinBy(one => Math.Abs(one.TimeUs * 1e-6 - timeS));

    private IEnumerable<TruthSample> Between(double startS, double endS) => _truth.Where(one => one.TimeUs * 1e-6 >= startS && one.TimeUs * 1e-6 <= endS);

    /// <summary>The gain is the energy height the simulator gained, within the lag of the estimate at both ends (some 2 s at up to 2 m/s).</summary>
    [Fact]
    public void Climbs_GainWhatWasGained()
    {
        Assert.Equal(2, _flight.Climbs.Count);
        Assert.All(_flight.Climbs, climb =>
        {
            var gained = TruthAt(climb.EndS).EnergyHeightM - TruthAt(climb.StartS).EnergyHeightM;
            Assert.Equal(gained, climb.GainM, 8.0);
            Assert.Equal(gained / climb.DurationS, climb.AverageMps, 0.06);
            Assert.Equal(Between(climb.StartS, climb.EndS).Average(one => one.LoadFactor > 1.064 ? 1 : 0), climb.TurningShare, 0.05);
        });
    }

    /// <summary>Distance within the airspeed's error of a common sensor; the airspeed flown is what the legs of the scenario ask for.</summary>
    [Fact]
    public void Glides_GoAsFarAsWasFlown()
    {
        Assert.Equal(3, _flight.Glides.Count);
        Assert.All(_flight.Glides, glide =>
        {
            var flown = Between(glide.StartS, glide.EndS).ToList();
            Close.Relative(flown.Average(one => one.TrueAirspeedMps) * glide.DurationS, glide.DistanceM, 0.01);
            Assert.Equal(flown.Average(one => one.IndicatedAirspeedMps), glide.MeanIndicatedMps, 0.3);
            var lost = TruthAt(glide.StartS).EnergyHeightM - TruthAt(glide.EndS).EnergyHeightM;
            Assert.Equal(lost, glide.LossM, 8.0);
            Close.Relative(flown.Average(one => one.TrueAirspeedMps) * glide.DurationS / lost, glide.Ratio, 0.08);
            Assert.InRange(glide.OffSpeedM, 0, 0.5 * lost);
        });
    }

    [Fact]
    public void Faults_AreThoseOfTheReplay()
    {
        var fault = Assert.Single(_flight.Faults);
        Assert.Equal(Pipeline.Picture.Faults.TemperatureSilent, fault.Fault);
        Assert.InRange(fault.EndS, 0.1, 2);
    }
}
