using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;

namespace SpeedCommand.Flight.Targets;

/// <summary>The speeds a target may take now, in the polar's own scale, and what stands at either end.</summary>
internal readonly record struct SpeedBounds(double LowMps, double HighMps, LimitedBy LowReason, LimitedBy HighReason)
{
    /// <summary>False when no speed is allowed: the stall has come up to the limits, or a limit cannot be converted.</summary>
    public static bool TryMake(Glider glider, double stallMargin, in Air air, in PolarScale scale, out SpeedBounds bounds)
    {
        var polar = glider.Polar;
        var (low, high) = (polar.MinAirspeedMps, polar.MaxAirspeedMps);
        var (lowReason, highReason) = (LimitedBy.PolarRange, LimitedBy.PolarRange);
        bounds = default;
        if (glider.Limits is { } limits)
        {
            // The stall is a fixed lift coefficient, so its indication goes with the root of load and mass like any other.
            var slowest = limits.StallMps * (1 + stallMargin) * scale.Equivalent;
            if (!TryReduce(glider, air, scale, slowest, out var stall))
            {
                return false;
            }

            if (stall >= low)
            {
                (low, lowReason) = (stall, LimitedBy.Stall);
            }

            var (fastest, reason) = limits.FastestAt(air.PressureAltitudeM);
            if (!double.IsNaN(fastest))
            {
                if (!TryReduce(glider, air, scale, fastest, out var cap))
                {
                    return false;
                }

                if (cap <= high)
                {
                    (high, highReason) = (cap, reason);
                }
            }
        }

        bounds = new(low, high, lowReason, highReason);
        return low < high;
    }

    public LimitedBy ReasonAt(double x) => x <= LowMps ? LowReason : x >= HighMps ? HighReason : LimitedBy.None;

    private static bool TryReduce(Glider glider, in Air air, in PolarScale scale, double indicatedMps, out double x)
    {
        var calibrated = glider.AirspeedCorrection.ToCalibrated(new IndicatedAirspeed(indicatedMps));
        var isKnown = AirspeedConversion.TryEquivalent(calibrated, air, out var equivalent);
        x = equivalent.Mps / scale.Equivalent;
        return isKnown;
    }
}
