using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Airspeeds;

/// <summary>
/// Conversions between impact pressure (total minus static) and calibrated, equivalent and true airspeed: isentropic, subsonic,
/// exact inverses of each other. Input below 0, above Mach 1 or not a number gives false and 0, never a clamped answer.
/// Formulas: Gracey, Measurement of Aircraft Speed and Altitude, NASA RP-1046 (1980).
/// </summary>
public static class AirspeedConversion
{
    /// <summary>Calibrated airspeed from impact pressure: Vc = a0 M(qc/p0).</summary>
    /// <param name="impactPressurePa">Impact pressure, Pa.</param>
    /// <param name="airspeed">Calibrated airspeed.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryCalibrated(double impactPressurePa, out CalibratedAirspeed airspeed)
    {
        var ratio = impactPressurePa / StandardAtmosphere.SeaLevelPressurePa;
        airspeed = default;
        if (!IsSubsonicRatio(ratio))
        {
            return false;
        }

        airspeed = new(StandardAtmosphere.SeaLevelSpeedOfSoundMps * CompressibleFlow.Mach(ratio));
        return true;
    }

    /// <summary>Impact pressure from calibrated airspeed.</summary>
    /// <param name="airspeed">Calibrated airspeed.</param>
    /// <param name="impactPressurePa">Impact pressure, Pa.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryImpactPressure(CalibratedAirspeed airspeed, out double impactPressurePa) =>
        TryImpactPressure(
            airspeed.Mps / StandardAtmosphere.SeaLevelSpeedOfSoundMps, StandardAtmosphere.SeaLevelPressurePa, out impactPressurePa);

    /// <summary>True airspeed and Mach number from impact pressure: V = a M(qc/p).</summary>
    /// <param name="impactPressurePa">Impact pressure, Pa.</param>
    /// <param name="air">The air.</param>
    /// <param name="airspeed">True airspeed.</param>
    /// <param name="mach">Mach number, 0 to 1.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryTrue(double impactPressurePa, in Air air, out TrueAirspeed airspeed, out double mach)
    {
        var ratio = impactPressurePa / air.PressurePa;
        airspeed = default;
        mach = 0;
        if (!IsSubsonicRatio(ratio))
        {
            return false;
        }

        mach = CompressibleFlow.Mach(ratio);
        airspeed = new(air.SpeedOfSoundMps * mach);
        return true;
    }

    /// <summary>Impact pressure from true airspeed.</summary>
    /// <param name="airspeed">True airspeed.</param>
    /// <param name="air">The air.</param>
    /// <param name="impactPressurePa">Impact pressure, Pa.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryImpactPressure(TrueAirspeed airspeed, in Air air, out double impactPressurePa) =>
        TryImpactPressure(Mach(airspeed, air), air.PressurePa, out impactPressurePa);

    /// <summary>Mach number.</summary>
    /// <param name="airspeed">True airspeed.</param>
    /// <param name="air">The air.</param>
    /// <returns>True airspeed over the speed of sound.</returns>
    public static double Mach(TrueAirspeed airspeed, in Air air) => airspeed.Mps / air.SpeedOfSoundMps;

    /// <summary>Equivalent from true airspeed: Ve = V √(ρ/ρ0).</summary>
    /// <param name="airspeed">True airspeed.</param>
    /// <param name="air">The air.</param>
    /// <returns>Equivalent airspeed.</returns>
    public static EquivalentAirspeed ToEquivalent(TrueAirspeed airspeed, in Air air) =>
        new(airspeed.Mps * Math.Sqrt(air.DensityKgPerM3 / StandardAtmosphere.SeaLevelDensityKgPerM3));

    /// <summary>True from equivalent airspeed.</summary>
    /// <param name="airspeed">Equivalent airspeed.</param>
    /// <param name="air">The air.</param>
    /// <returns>True airspeed.</returns>
    public static TrueAirspeed ToTrue(EquivalentAirspeed airspeed, in Air air) =>
        new(airspeed.Mps / Math.Sqrt(air.DensityKgPerM3 / StandardAtmosphere.SeaLevelDensityKgPerM3));

    /// <summary>Calibrated from equivalent airspeed; the two differ by compressibility only, so density plays no part.</summary>
    /// <param name="airspeed">Equivalent airspeed.</param>
    /// <param name="air">The air; its pressure counts.</param>
    /// <param name="calibrated">Calibrated airspeed.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryCalibrated(EquivalentAirspeed airspeed, in Air air, out CalibratedAirspeed calibrated)
    {
        calibrated = default;
        return TryImpactPressure(airspeed, air, out var impactPressurePa) && TryCalibrated(impactPressurePa, out calibrated);
    }

    /// <summary>Equivalent from calibrated airspeed.</summary>
    /// <param name="airspeed">Calibrated airspeed.</param>
    /// <param name="air">The air; its pressure counts.</param>
    /// <param name="equivalent">Equivalent airspeed.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryEquivalent(CalibratedAirspeed airspeed, in Air air, out EquivalentAirspeed equivalent)
    {
        equivalent = default;
        if (!TryImpactPressure(airspeed, out var impactPressurePa) || !TryTrue(impactPressurePa, air, out var trueAirspeed, out _))
        {
            return false;
        }

        equivalent = ToEquivalent(trueAirspeed, air);
        return true;
    }

    /// <summary>Impact pressure from equivalent airspeed.</summary>
    /// <param name="airspeed">Equivalent airspeed.</param>
    /// <param name="air">The air; its pressure counts.</param>
    /// <param name="impactPressurePa">Impact pressure, Pa.</param>
    /// <returns>Whether the input is in range.</returns>
    public static bool TryImpactPressure(EquivalentAirspeed airspeed, in Air air, out double impactPressurePa) =>
        TryImpactPressure(ToTrue(airspeed, air), air, out impactPressurePa);

    private static bool TryImpactPressure(double mach, double pressurePa, out double impactPressurePa)
    {
        impactPressurePa = 0;
        if (!(mach >= 0 && mach <= 1))
        {
            return false;
        }

        impactPressurePa = pressurePa * CompressibleFlow.PressureRatio(mach);
        return true;
    }

    private static bool IsSubsonicRatio(double ratio) => ratio >= 0 && ratio <= CompressibleFlow.SonicPressureRatio;
}
