namespace SpeedCommand.Flight.Airspeeds;

/// <summary>
/// What the airspeed correction says about the static port: the pitot tube counts as right, so the whole error of the
/// indication is an error of static pressure (Gracey, NASA RP-1046, 1980), and it spoils the altitude too.
/// </summary>
public static class PositionError
{
    /// <summary>The static port's error at an indication.</summary>
    /// <param name="correction">The glider's airspeed correction.</param>
    /// <param name="indicated">Indicated airspeed.</param>
    /// <param name="errorPa">Sensed minus true static pressure, Pa; positive where the indicator reads low.</param>
    /// <returns>Whether the airspeeds are in range.</returns>
    public static bool TryStaticError(AirspeedCorrection correction, IndicatedAirspeed indicated, out double errorPa)
    {
        errorPa = 0;
        if (!AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(indicated.Mps), out var sensedPa)
            || !AirspeedConversion.TryImpactPressure(correction.ToCalibrated(indicated), out var truePa))
        {
            return false;
        }

        errorPa = truePa - sensedPa;
        return true;
    }

    /// <summary>Takes the static port's error out of both pressures.</summary>
    /// <param name="correction">The glider's airspeed correction.</param>
    /// <param name="sensedStaticPa">Static pressure as sensed, Pa.</param>
    /// <param name="sensedImpactPa">Impact pressure as sensed, Pa.</param>
    /// <param name="staticPa">True static pressure, Pa; 0 when not known.</param>
    /// <param name="impactPa">True impact pressure, Pa; 0 when not known.</param>
    /// <returns>Whether the airspeeds are in range.</returns>
    public static bool TryCorrect(
        AirspeedCorrection correction, double sensedStaticPa, double sensedImpactPa, out double staticPa, out double impactPa)
    {
        (staticPa, impactPa) = (0, 0);
        if (!AirspeedConversion.TryCalibrated(sensedImpactPa, out var sensed)
            || !TryStaticError(correction, new IndicatedAirspeed(sensed.Mps), out var errorPa))
        {
            return false;
        }

        (staticPa, impactPa) = (sensedStaticPa - errorPa, sensedImpactPa + errorPa);
        return true;
    }
}
