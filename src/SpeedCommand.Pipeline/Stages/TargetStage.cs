using SpeedCommand.Estimation.Command;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>What the targets rest on. Every value is fresh; without netto there is no speed to fly, but for where the polar ends.</summary>
/// <param name="Air">The air at the glider.</param>
/// <param name="SteadyLoad">Load factor smoothed over a second.</param>
/// <param name="Netto">Vertical motion of the air, m/s.</param>
/// <param name="IsOutsidePolar">Whether netto is blank because the polar does not know the present airspeed.</param>
/// <param name="TimeUs">The moment, microseconds.</param>
/// <param name="AgeS">Age of the older of static pressure and airspeed, s.</param>
internal readonly record struct TargetInputs(Air Air, double SteadyLoad, Gauge Netto, bool IsOutsidePolar, long TimeUs, double AgeS);

/// <summary>The speeds to fly and how they came about.</summary>
/// <param name="MinSink">Speed of least sink.</param>
/// <param name="BestGlide">Speed of best glide in still air.</param>
/// <param name="SpeedToFly">MacCready speed.</param>
/// <param name="LimitedBy">What limited it.</param>
/// <param name="CirclingSinkMps">Least sink in a circle of the usual bank, m/s; NaN when not known.</param>
internal readonly record struct Targets(Gauge MinSink, Gauge BestGlide, Gauge SpeedToFly, LimitedBy LimitedBy, double CirclingSinkMps);

/// <summary>Air, load and netto in, speeds to fly out.</summary>
internal sealed class TargetStage(PilotStage pilot, SpeedTargets targets)
{
    private readonly SmoothNetto _smoothNetto = new();

    /// <summary>The doubt of the smoothed netto: that of its parts, smoothed alike, since they are wrong together.</summary>
    private readonly SmoothNetto _smoothSigma = new();

    private long _settledUs = long.MaxValue;

    public bool TrySink(TrueAirspeed airspeed, in Air air, double loadFactor, out double sinkMps) =>
        targets.TrySink(airspeed, air, pilot.LoadingAt(loadFactor), out sinkMps);

    /// <summary>Forgets the air flown through, as after a silence.</summary>
    public void Reset()
    {
        _smoothNetto.Reset();
        _smoothSigma.Reset();
        _settledUs = long.MaxValue;
    }

    /// <summary>Whether the climb has been there long enough for a speed to fly.</summary>
    public bool IsSettled(long timeUs) => timeUs >= _settledUs;

    /// <summary>Computes once a picture.</summary>
    public Targets At(in TargetInputs inputs)
    {
        var straight = pilot.LoadingAt(1);
        var minSink = targets.MinSink(inputs.Air, pilot.LoadingAt(inputs.SteadyLoad));
        var bestGlide = targets.BestGlide(inputs.Air, straight, headwindMps: 0, airMps: 0);
        _settledUs = Math.Min(_settledUs, inputs.TimeUs + PipelineBounds.SettlingUs);
        var netto = inputs.IsOutsidePolar ? 0 : Smooth(inputs.TimeUs, inputs.Netto);
        var speedToFly = double.IsNaN(netto) || !(inputs.Netto.IsKnown || inputs.IsOutsidePolar)
            ? default
            : targets.SpeedToFly(inputs.Air, straight, pilot.ExpectedClimbMps, netto);
        var sigma = inputs.IsOutsidePolar ? double.NaN : DoubtOf(speedToFly, inputs.Air, netto);
        if (speedToFly.Speed.IsKnown && minSink.IsKnown && speedToFly.Speed.IndicatedAirspeedMps < minSink.IndicatedAirspeedMps)
        {
            // In a turn or a pull-up the stall comes up; so does the slowest speed that may be asked for.
            speedToFly = speedToFly with { Speed = minSink };
        }

        var circle = targets.MinSink(inputs.Air, pilot.LoadingAt(LoadStage.ThermallingLoad));
        return new Targets(
            Show(minSink, 0, inputs.AgeS),
            Show(bestGlide.Speed, 0, inputs.AgeS),
            Show(speedToFly.Speed, sigma, inputs.AgeS),
            speedToFly.LimitedBy,
            circle.IsKnown ? circle.SinkMps : double.NaN);
    }

    private double Smooth(long timeUs, in Gauge netto)
    {
        if (!IsSettled(timeUs))
        {
            return double.NaN;
        }

        _smoothSigma.Add(timeUs, netto.Sigma);
        return _smoothNetto.Add(timeUs, netto.Value);
    }

    /// <summary>
    /// How far the speed to fly moves with netto's doubt. One that a limit holds does not move with a little of it, which says nothing
    /// about how well it is known: there netto is tried with all of its doubt, both ways.
    /// </summary>
    private double DoubtOf(in SpeedToFlyTarget speedToFly, in Air air, double netto)
    {
        var doubt = _smoothSigma.NettoMps;
        return speedToFly.AirSensitivity != 0
            ? Math.Abs(speedToFly.AirSensitivity) * doubt
            : Math.Max(Apart(speedToFly, air, netto - doubt), Apart(speedToFly, air, netto + doubt));
    }

    private double Apart(in SpeedToFlyTarget speedToFly, in Air air, double netto) => Math.Abs(
        targets.SpeedToFly(air, pilot.LoadingAt(1), pilot.ExpectedClimbMps, netto).Speed.IndicatedAirspeedMps - speedToFly.Speed.IndicatedAirspeedMps);

    private static Gauge Show(in TargetSpeed speed, double sigma, double ageS) =>
        speed.IsKnown ? new Gauge(speed.IndicatedAirspeedMps, sigma, ageS) : Gauge.Blank;
}
