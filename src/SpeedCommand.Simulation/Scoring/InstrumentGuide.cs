using SpeedCommand.Estimation.Command;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Simulation.Gliding;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Advises as the instrument does: the speed to fly for the instrument's own netto, smoothed.</summary>
/// <param name="targets">The glider's targets.</param>
/// <param name="massKg">Its mass, kg.</param>
/// <param name="nettoMps">What the instrument shows as netto, m/s; NaN when blank, which leaves the advice as it was.</param>
public sealed class InstrumentGuide(SpeedTargets targets, double massKg, Func<double> nettoMps) : ISpeedGuide
{
    private readonly SmoothNetto _smooth = new();

    /// <inheritdoc/>
    public double IndicatedMps(long timeUs, in GliderFlow flow, double expectedClimbMps)
    {
        var netto = _smooth.Add(timeUs, nettoMps());
        var target = targets.SpeedToFly(flow.Air, new Loading(massKg, 1, 0), expectedClimbMps, double.IsFinite(netto) ? netto : 0);
        return target.Speed.IndicatedAirspeedMps;
    }
}
