using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Gliders;

/// <summary>The placarded limits, all indicated airspeeds.</summary>
public sealed class GliderLimits
{
    private readonly NeverExceedStep[] _neverExceed;

    /// <summary>Makes the limits.</summary>
    /// <param name="stallMps">Stall, m/s, at reference mass in straight flight.</param>
    /// <param name="roughAirMps">Rough-air speed, m/s; NaN when there is none.</param>
    /// <param name="neverExceed">Never-exceed speeds in order of altitude, at least one.</param>
    /// <exception cref="ArgumentException">A speed is not above the stall, or the altitudes do not rise.</exception>
    public GliderLimits(double stallMps, double roughAirMps, IReadOnlyList<NeverExceedStep> neverExceed)
    {
        (StallMps, RoughAirMps) = (stallMps, roughAirMps);
        _neverExceed = [.. neverExceed];
        var before = double.NegativeInfinity;
        foreach (var step in _neverExceed)
        {
            if (!(step.UpToM > before && step.AirspeedMps > stallMps))
            {
                throw new ArgumentException("altitudes must rise and speeds be above the stall", nameof(neverExceed));
            }

            before = step.UpToM;
        }

        if (_neverExceed.Length == 0 || !(stallMps > 0) || roughAirMps <= stallMps)
        {
            throw new ArgumentException("one never-exceed speed is needed, and stall below rough air", nameof(neverExceed));
        }
    }

    /// <summary>Stall, m/s, at reference mass in straight flight.</summary>
    public double StallMps { get; }

    /// <summary>Rough-air speed, m/s; NaN when there is none.</summary>
    public double RoughAirMps { get; }

    /// <summary>Never-exceed speeds in order of altitude.</summary>
    public IReadOnlyList<NeverExceedStep> NeverExceed => _neverExceed;

    /// <summary>The never-exceed speed at an altitude.</summary>
    /// <param name="pressureAltitudeM">Pressure altitude, m.</param>
    /// <returns>Indicated airspeed, m/s; NaN above the last step, where the limit is not known.</returns>
    public double NeverExceedAt(double pressureAltitudeM)
    {
        foreach (var step in _neverExceed)
        {
            if (pressureAltitudeM <= step.UpToM)
            {
                return step.AirspeedMps;
            }
        }

        return double.NaN;
    }

    /// <summary>The lower of rough-air and never-exceed speed; the rough-air speed alone above the last step; NaN with neither.</summary>
    internal (double AirspeedMps, LimitedBy Reason) FastestAt(double pressureAltitudeM)
    {
        var neverExceed = NeverExceedAt(pressureAltitudeM);
        return double.IsNaN(RoughAirMps) || neverExceed <= RoughAirMps
            ? (neverExceed, LimitedBy.NeverExceed)
            : (RoughAirMps, LimitedBy.RoughAir);
    }
}
