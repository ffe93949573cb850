using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>Rounds one gauge with hysteresis, so that a value near the middle between two steps does not flicker.</summary>
internal struct SteadyGauge
{
    // Half a step would be plain rounding; the rest is the hysteresis.
    private const double StepsToMove = 0.8;

    private double _shown;
    private double _sigma;
    private bool _holds;

    /// <summary>Takes the newest gauge and returns the one to show; a blank one is blank at once and forgets the past.</summary>
    public Gauge Next(Gauge gauge, DisplayUnit unit)
    {
        if (!gauge.IsKnown)
        {
            _holds = false;
            return gauge;
        }

        // The rounding step follows the uncertainty; keep that still as well, or the step itself would flicker.
        if (!_holds || !(gauge.Sigma > _sigma * 0.7 && gauge.Sigma < _sigma * 1.4))
        {
            _sigma = gauge.Sigma;
        }

        var step = Readout.StepFor(unit.ConvertDifference(_sigma), unit.Step);
        var value = unit.Convert(gauge.Value);
        if (!_holds || Math.Abs(value - _shown) > StepsToMove * step || Math.IEEERemainder(_shown, step) != 0)
        {
            _shown = Math.Round(value / step, MidpointRounding.AwayFromZero) * step;
        }

        _holds = true;
        return gauge with { Value = unit.DifferenceToSi(_shown), Sigma = _sigma };
    }
}
