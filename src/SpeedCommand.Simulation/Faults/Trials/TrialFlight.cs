using System.Text;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>A short simulated flight, kept in memory to be flown again and again with faults.</summary>
public sealed class TrialFlight : ISimulatedFlightSink
{
    private readonly List<(long TimeUs, byte[] Stream, byte[] Line)> _lines = [];
    private readonly HashSet<string> _sent = new(StringComparer.Ordinal);
    private readonly FlightSettings _settings;

    /// <summary>Flies a scenario once.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="settings">The glider, and the pilot's choices.</param>
    /// <param name="seed">The seed.</param>
    public TrialFlight(Scenario scenario, FlightSettings settings, long seed)
    {
        ArgumentNullException.ThrowIfNull(settings);
        _settings = settings;
        var simulator = new FlightSimulator(scenario, settings.Glider, seed);
        simulator.Fly(this);
        EndUs = simulator.TimeUs;
        Pictures = Fly(new FaultPlan("none", []), seed, out _);
        UnsmoothedMps = [.. Pictures.Select(UnsmoothedSpeedToFly)];
    }

    /// <summary>When the flight ends, microseconds.</summary>
    public long EndUs { get; }

    /// <summary>What the pilot sees without a fault, ten pictures a second.</summary>
    public IReadOnlyList<CockpitPicture> Pictures { get; }

    /// <summary>For each picture the speed to fly in the air of that very moment, m/s indicated; NaN where it is not known.</summary>
    public IReadOnlyList<double> UnsmoothedMps { get; }

    /// <summary>The settings used by all trials: those of a glider, with a climb expected so that the speed to fly says something.</summary>
    /// <param name="glider">The glider.</param>
    /// <returns>The settings.</returns>
    public static FlightSettings SettingsOf(Glider glider) => new(glider) { ExpectedClimbMps = 1.5 };

    /// <inheritdoc/>
    public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
    {
        _lines.Add((timeUs, stream.ToArray(), line.ToArray()));
        _sent.Add(Encoding.Latin1.GetString(line));
    }

    /// <inheritdoc/>
    public void OnTruth(in TruthSample truth)
    {
    }

    /// <summary>Flies it with faults.</summary>
    /// <param name="plan">The faults.</param>
    /// <param name="seed">Their seed.</param>
    /// <param name="isForged">Whether a sentence came that no board had sent and whose checksum fits all the same.</param>
    /// <returns>What the pilot sees.</returns>
    public IReadOnlyList<CockpitPicture> Fly(FaultPlan plan, long seed, out bool isForged)
    {
        var forged = false;
        var pictures = new KeptPictures();
        var pipeline = new FlightPipeline(_settings, pictures);
        var names = new List<byte[]>();
        var spoiler = new FlightSpoiler(plan, seed, new PortLines((timeUs, stream, line) =>
        {
            forged |= IsForged(line);
            pipeline.Accept(timeUs, StreamOf(stream), line);
        }));
        foreach (var (timeUs, stream, line) in _lines)
        {
            spoiler.OnLine(timeUs, stream, line);
        }

        spoiler.Finish(EndUs);
        pipeline.AdvanceTo(spoiler.StampOf(EndUs));
        isForged = forged;
        return pictures.List;

        int StreamOf(ReadOnlySpan<byte> name)
        {
            for (var i = 0; i < names.Count; i++)
            {
                if (name.SequenceEqual(names[i]))
                {
                    return i;
                }
            }

            names.Add(name.ToArray());
            return pipeline.AddStream(Encoding.ASCII.GetString(name), ChecksumRule.Required);
        }
    }

    private bool IsForged(ReadOnlySpan<byte> line) => SentenceReader.TryRead(line, ChecksumRule.Required, out _) == SentenceFault.None
        && !_sent.Contains(Encoding.Latin1.GetString(line[line.LastIndexOf((byte)'$')..]));

    private double UnsmoothedSpeedToFly(CockpitPicture picture)
    {
        if (!picture.NettoMps.IsKnown || !StandardAtmosphere.TryAt(picture.PressureAltitudeM.Value, out var state)
            || !Air.TryMeasured(state.PressurePa, picture.TemperatureK.Value, double.NaN, out var air, out _))
        {
            return double.NaN;
        }

        var speed = new SpeedTargets(_settings.Glider, _settings.StallMargin).SpeedToFly(
            air, new Loading(_settings.MassKg, 1, _settings.BugsFraction), _settings.ExpectedClimbMps, picture.NettoMps.Value).Speed;
        return Math.Max(speed.IndicatedAirspeedMps, picture.MinSinkIndicatedMps.Value);
    }

    private sealed class KeptPictures : IPictureSink
    {
        public List<CockpitPicture> List { get; } = [];

        public void OnPicture(in CockpitPicture picture) => List.Add(picture);
    }
}
