using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation;
using SpeedCommand.Simulation.AirMass;
using SpeedCommand.Simulation.Gliding;
using SpeedCommand.Simulation.Randomness;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Desk.Fitting;

/// <summary>
/// Flies ten-minute glides of a glider that is worse than its handbook, through thermals and sink that nobody sees, and fits its
/// polar: whether the truth lies in the intervals is then known.
/// </summary>
/// <param name="handbook">The glider as its file has it, with a drag polar.</param>
/// <param name="isQuiet">Whether the air is that of an early morning instead of a thermal day.</param>
internal sealed class FitTrial(Glider handbook, bool isQuiet)
{
    public const int FlightCount = 10;

    private const double LegS = 110;

    /// <summary>A morning's air moves a fifth as much.</summary>
    private readonly double _liveliness = isQuiet ? 0.2 : 1;
    private static readonly double[] SpeedsKmh = [85, 100, 120, 140, 160];
    private static readonly ReadingKind[] Kinds =
        [ReadingKind.StaticPressurePa, ReadingKind.ImpactPressurePa, ReadingKind.OutsideAirTemperatureK, ReadingKind.LoadFactor];

    private readonly DragPolar _handbookPolar = (DragPolar)handbook.Polar;

    /// <summary>The glider as its file has it.</summary>
    public Glider Handbook => handbook;

    /// <summary>The glider as it really is: more drag when flown fast and when flown slowly, 8 % more sink at best glide.</summary>
    public DragPolar Truth { get; } = TruthOf((DragPolar)handbook.Polar);

    /// <summary>Flies and fits one trial.</summary>
    /// <param name="seed">Its seed; each has other air and other sensor errors.</param>
    /// <returns>The fit, which does not know the truth.</returns>
    public FitResult Run(long seed)
    {
        var segments = new List<GlideSegment>();
        for (var flight = 0; flight < FlightCount; flight++)
        {
            segments.AddRange(Fly(flight, seed * FlightCount + flight));
        }

        return FitResult.Of(_handbookPolar, isBugsOnly: false, [.. Enumerable.Range(1, FlightCount).Select(i => new FitFlight($"flight {i}", true))], segments);
    }

    private static DragPolar TruthOf(DragPolar polar) => new(
        polar.WingAreaM2, polar.ReferenceMassKg, polar.Cd0 * 1.11, polar.K1 - 0.0012, polar.K2 * 1.12, polar.ClMax);

    private IReadOnlyList<GlideSegment> Fly(int flight, long seed)
    {
        var settings = new FlightSettings(handbook);
        var cutter = new GlideSegments(flight, settings, _handbookPolar);
        var pipeline = new FlightPipeline(settings, cutter);
        var sink = new PipelineFeed(pipeline);
        var real = new Glider { Name = handbook.Name, Polar = Truth, Limits = handbook.Limits, AirspeedCorrection = handbook.AirspeedCorrection };
        var simulator = new FlightSimulator(ScenarioOf(seed), real, seed);
        simulator.Fly(sink);
        pipeline.AdvanceTo(simulator.TimeUs);
        cutter.End();
        return cutter.Segments;
    }

    private Scenario ScenarioOf(long seed) => new()
    {
        Name = "fit",
        StartUtc = new DateTimeOffset(2026, 6, 14, 10, 0, 0, TimeSpan.Zero),
        GliderFile = "",
        MassKg = handbook.ReferenceMassKg,
        Air = new AirProfile(TemperatureProfile.Standard(5), 0, StandardAtmosphere.SeaLevelPressurePa),
        RelativeHumidity = double.NaN,
        Wind = new Wind([], [], []),
        Vertical = Thermals(new SeededNoise(seed, "thermals")),
        Turbulence = new Turbulence(0.4 * _liveliness, 4, 0.4 * _liveliness, 2),
        StartHeightM = 2000,
        Pilot = new PilotModel { WanderMps = 0.4 },
        Plan = Plan(seed),
        Laps = 1,
        TruthEveryUs = 1_000_000,
        Grade = SensorGrade.Common,
        Sensors = [.. Kinds.Select(kind => SensorGrades.Of(SensorGrade.Common, kind, kind == ReadingKind.StaticPressurePa ? "static" : "pitot"))],
    };

    /// <summary>Each flight flies all speeds, in another order, with a turn between.</summary>
    private static List<FlightLeg> Plan(long seed)
    {
        var legs = new List<FlightLeg>();
        for (var i = 0; i < SpeedsKmh.Length; i++)
        {
            var speedMps = SpeedsKmh[(i + (int)(seed % SpeedsKmh.Length)) % SpeedsKmh.Length] / 3.6;
            legs.Add(new FlightLeg(LegS, double.NaN, double.NaN, double.NaN, speedMps, double.NaN, 0, 0));
            if (i == 2)
            {
                legs.Add(new FlightLeg(double.NaN, double.NaN, double.NaN, 2 * Math.PI, speedMps, double.NaN, Math.PI / 6, 0));
            }
        }

        return legs;
    }

    /// <summary>Thermals anywhere in a corridor: what goes up within one comes down around it, so that the air's mean is zero.</summary>
    private List<IVerticalMotion> Thermals(SeededNoise noise) =>
    [
        .. Enumerable.Range(0, 30).Select(_ => new Thermal(
            -1000 + 24_000 * noise.NextUniform(), -1500 + 3000 * noise.NextUniform(), 150 + 250 * noise.NextUniform(),
            _liveliness * (1 + 2 * noise.NextUniform()))),
    ];

    /// <summary>Hands the simulated lines straight to the pipeline.</summary>
    private sealed class PipelineFeed(FlightPipeline pipeline) : ISimulatedFlightSink
    {
        private readonly Dictionary<int, int> _streams = [];

        public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
        {
            // Two streams of different names; their first letters tell them apart without making text.
            if (!_streams.TryGetValue(stream[0], out var number))
            {
                _streams[stream[0]] = number = pipeline.AddStream(System.Text.Encoding.ASCII.GetString(stream), ChecksumRule.Required);
            }

            pipeline.Accept(timeUs, number, line);
        }

        public void OnTruth(in TruthSample truth)
        {
        }
    }
}
