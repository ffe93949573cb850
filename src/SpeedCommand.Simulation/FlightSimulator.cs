using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Simulation.Gliding;
using SpeedCommand.Simulation.Randomness;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation;

/// <summary>
/// Flies a scenario: truth in steps of 10 ms by the midpoint rule, sensors sampled within the steps. The same scenario,
/// glider and seed give the same flight, to the byte.
/// </summary>
public sealed class FlightSimulator
{
    private const double StepS = ScenarioFile.StepUs / 1e6;

    /// <summary>A leg whose end never comes is a mistake in the scenario: no flight lasts longer, s.</summary>
    private const double LongestS = 12 * 3600;

    private readonly Scenario _scenario;
    private readonly SpeedTargets _targets;
    private readonly GliderMotion _motion;
    private readonly AirData _airData;
    private readonly GaussMarkov _verticalTurbulence;
    private readonly GaussMarkov _gust;
    private readonly GaussMarkov _wander;
    private readonly SensorChannel[] _channels;
    private readonly GnssReceiver? _gnss;
    private readonly LinesInOrder _lines = new();
    private ISpeedGuide _guide;
    private GliderState _state;
    private GliderFlow _flow;
    private SensedAir _sensed;
    private double _gustMps;
    private long _timeUs;

    /// <summary>Makes ready to fly.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="glider">Its glider.</param>
    /// <param name="seed">The seed of every random number in the run.</param>
    public FlightSimulator(Scenario scenario, Glider glider, long seed)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        ArgumentNullException.ThrowIfNull(glider);
        _scenario = scenario;
        _targets = new SpeedTargets(glider);
        _motion = new GliderMotion(_targets, scenario.MassKg, scenario.Pilot, scenario.Air, scenario.Vertical);
        _airData = new AirData(glider.AirspeedCorrection);
        var turbulence = scenario.Turbulence;
        _verticalTurbulence = new GaussMarkov(new SeededNoise(seed, "turbulence"), turbulence.VerticalMps, turbulence.VerticalTimeS);
        _gust = new GaussMarkov(new SeededNoise(seed, "gust"), turbulence.HorizontalMps, turbulence.HorizontalTimeS);
        _wander = new GaussMarkov(new SeededNoise(seed, "wander"), scenario.Pilot.WanderMps, scenario.Pilot.WanderTimeS);
        _channels = [.. scenario.Sensors.Select(sensor => new SensorChannel(sensor, seed))];
        _gnss = scenario.Gnss is { } gnss ? new GnssReceiver(gnss, scenario.StartUtc, seed) : null;
        _guide = new PerfectGuide(_targets, scenario.MassKg);
    }

    /// <summary>Time flown so far, microseconds.</summary>
    public long TimeUs => _timeUs;

    /// <summary>Where the glider is.</summary>
    public GliderState State => _state;

    /// <summary>Lets legs flown at the speed to fly follow someone else's advice.</summary>
    /// <param name="guide">Who advises.</param>
    public void FollowGuide(ISpeedGuide guide) => _guide = guide;

    /// <summary>Flies the plan from the start to its end.</summary>
    /// <param name="sink">Who takes lines and truth.</param>
    /// <exception cref="InvalidOperationException">The plan leads outside the polar or the air profile, or never ends.</exception>
    public void Fly(ISimulatedFlightSink sink)
    {
        ArgumentNullException.ThrowIfNull(sink);
        Start();
        sink.OnTruth(Truth());
        for (var lap = 0; lap < _scenario.Laps; lap++)
        {
            foreach (var leg in _scenario.Plan)
            {
                FlyLeg(leg, sink);
            }
        }

        _lines.ReleaseUntil(long.MaxValue, sink);
    }

    private void Start()
    {
        var air = _scenario.Air.At(_scenario.StartHeightM);
        var first = _scenario.Plan[0];
        _flow = new GliderFlow(air, 1, 0, 0, 0);
        _state = new GliderState(_scenario.StartHeightM, _airData.TrueOf(WantedIndicatedMps(first), air), 0, 0, 0, 0, 0, 0);
        _motion.RateAt(_state, Orders(first), 0, out _flow);
        _gustMps = _gust.Value;
        _sensed = Sense();
    }

    private void FlyLeg(FlightLeg leg, ISimulatedFlightSink sink)
    {
        var startUs = _timeUs;
        var start = _state;
        while (!IsOver(leg, startUs, start))
        {
            if (_timeUs / 1e6 > LongestS)
            {
                throw new InvalidOperationException($"a leg of the plan has not ended after {LongestS / 3600} h of flight");
            }

            Step(leg, sink);
        }
    }

    private bool IsOver(FlightLeg leg, long startUs, in GliderState start) =>
        (_timeUs - startUs) / 1e6 >= leg.ForS
        || _state.AlongM - start.AlongM >= leg.ForM
        || (start.HeightM < leg.ToHeightM ? _state.HeightM >= leg.ToHeightM : _state.HeightM <= leg.ToHeightM)
        || Math.Abs(_state.HeadingRad - start.HeadingRad) >= leg.TurnRad;

    private void Step(FlightLeg leg, ISimulatedFlightSink sink)
    {
        var timeS = _timeUs / 1e6;
        var orders = Orders(leg);
        var rate = _motion.RateAt(_state, orders, timeS, out _);
        var middle = _state.After(rate, StepS / 2);
        _verticalTurbulence.Step(StepS);
        _wander.Step(StepS);
        _gust.Step(StepS);
        var turbulenceMps = (orders.TurbulenceMps + _verticalTurbulence.Value) / 2;
        _state = _state.After(_motion.RateAt(middle, orders with { TurbulenceMps = turbulenceMps }, timeS + StepS / 2, out _), StepS);
        _timeUs += ScenarioFile.StepUs;
        _motion.RateAt(_state, orders with { TurbulenceMps = _verticalTurbulence.Value }, timeS + StepS, out _flow);
        _gustMps = _gust.Value;
        var before = _sensed;
        _sensed = Sense();
        for (var i = 0; i < _channels.Length; i++)
        {
            var sensor = _scenario.Sensors[i];
            _channels[i].Advance(timeS, timeS + StepS, before.Of(sensor), _sensed.Of(sensor), _lines);
        }

        _gnss?.Advance(_timeUs, StepS, _state, _scenario.Wind.At(_state.HeightM), _lines);
        _lines.ReleaseUntil(_timeUs, sink);
        if (_timeUs % _scenario.TruthEveryUs == 0)
        {
            sink.OnTruth(Truth());
        }
    }

    private PilotOrders Orders(FlightLeg leg) => new(
        _airData.TrueOf(WantedIndicatedMps(leg), _flow.Air) + _wander.Value, leg.BankRad, leg.LaunchMps, _verticalTurbulence.Value);

    private double WantedIndicatedMps(FlightLeg leg) => double.IsFinite(leg.IndicatedMps)
        ? leg.IndicatedMps
        : _guide.IndicatedMps(_timeUs, _flow, leg.ExpectedClimbMps);

    private SensedAir Sense() => _airData.Sense(_state, _flow, _gustMps, _scenario.RelativeHumidity);

    private TruthSample Truth() => new(
        _timeUs, _state.HeightM, _flow.Air.PressureAltitudeM, _state.AirspeedMps, _airData.IndicatedOf(_state.AirspeedMps, _flow.Air),
        _flow.ClimbMps, _flow.AirMps, _flow.Air.TemperatureK, _flow.LoadFactor, _state.BankRad);
}
