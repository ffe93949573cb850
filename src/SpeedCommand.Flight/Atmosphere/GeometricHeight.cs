namespace SpeedCommand.Flight.Atmosphere;

/// <summary>Geometric and geopotential height: the same energy in gravity that weakens, and in gravity that does not (ISO 2533, 2.3).</summary>
public static class GeometricHeight
{
    /// <summary>Nominal radius of the earth, m (ISO 2533, table 1).</summary>
    public const double EarthRadiusM = 6_356_766;

    /// <summary>Geopotential height H = r Z/(r + Z).</summary>
    /// <param name="geometricM">Geometric height above sea level, m, far below the earth's radius in size.</param>
    /// <returns>Geopotential height, m.</returns>
    public static double ToGeopotentialM(double geometricM) => EarthRadiusM * geometricM / (EarthRadiusM + geometricM);

    /// <summary>Geometric height Z = r H/(r - H).</summary>
    /// <param name="geopotentialM">Geopotential height, m, far below the earth's radius in size.</param>
    /// <returns>Geometric height above sea level, m.</returns>
    public static double FromGeopotentialM(double geopotentialM) => EarthRadiusM * geopotentialM / (EarthRadiusM - geopotentialM);
}
