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
/// <param name="AgeS">Age of the older of static pressure and airspeed, s.</param>
internal readonly record struct TargetInputs(Air Air, double SteadyLoad, Gauge Netto, bool IsOutsidePolar, double AgeS);

/// <summary>The speeds to fly and how they came about.</summary>
internal readonly record struct Targets(Gauge MinSink, Gauge BestGlide, Gauge SpeedToFly, LimitedBy LimitedBy);

/// <summary>Air, load and netto in, speeds to fly out.</summary>
internal sealed class TargetStage(FlightSettings settings, SpeedTargets targets)
{
    /// <summary>A speed command that follows every gust is chased in vain; the air a glider flies through lasts seconds.</summary>
    private const double NettoSmoothingS = 2;

    private double _smoothNettoMps = double.NaN;

    public Loading LoadingAt(double loadFactor) => new(settings.MassKg, loadFactor, settings.BugsFraction);

    public bool TrySink(TrueAirspeed airspeed, in Air air, double loadFactor, out double sinkMps) =>
        targets.TrySink(airspeed, air, LoadingAt(loadFactor), out sinkMps);

    /// <summary>Forgets the air flown through, as after a silence.</summary>
    public void Reset() => _smoothNettoMps = double.NaN;

    /// <summary>Computes once a picture.</summary>
    public Targets At(in TargetInputs inputs)
    {
        var straight = LoadingAt(1);
        var minSink = targets.MinSink(inputs.Air, LoadingAt(inputs.SteadyLoad));
        var bestGlide = targets.BestGlide(inputs.Air, straight, headwindMps: 0, airMps: 0);
        var netto = inputs.IsOutsidePolar ? 0 : SmoothNetto(inputs.Netto);
        var speedToFly = double.IsNaN(netto)
            ? default
            : targets.SpeedToFly(inputs.Air, straight, settings.ExpectedClimbMps, netto);
        var sigma = inputs.IsOutsidePolar ? double.NaN : Math.Abs(speedToFly.AirSensitivity) * inputs.Netto.Sigma;
        if (speedToFly.Speed.IsKnown && minSink.IsKnown && speedToFly.Speed.IndicatedAirspeedMps < minSink.IndicatedAirspeedMps)
        {
            // In a turn or a pull-up the stall comes up; so does the slowest speed that may be asked for.
            speedToFly = speedToFly with { Speed = minSink };
        }

        return new Targets(
            Show(minSink, 0, inputs.AgeS),
            Show(bestGlide.Speed, 0, inputs.AgeS),
            Show(speedToFly.Speed, sigma, inputs.AgeS),
            speedToFly.LimitedBy);
    }

    private static Gauge Show(in TargetSpeed speed, double sigma, double ageS) =>
        speed.IsKnown ? new Gauge(speed.IndicatedAirspeedMps, sigma, ageS) : Gauge.Blank;

    private double SmoothNetto(in Gauge netto)
    {
        const double Step = PipelineBounds.PicturePeriodUs * 1e-6 / NettoSmoothingS;
        if (netto.IsKnown)
        {
            _smoothNettoMps = double.IsNaN(_smoothNettoMps) ? netto.Value : _smoothNettoMps + (netto.Value - _smoothNettoMps) * Step;
        }

        return netto.IsKnown ? _smoothNettoMps : double.NaN;
    }
}
