namespace SpeedCommand.Replay.Igc;

/// <summary>One B record. What the recorder does not tell is NaN.</summary>
public readonly record struct IgcFix
{
    /// <summary>Microseconds since the first fix; goes on over midnight.</summary>
    public long TimeUs { get; init; }

    /// <summary>UTC time of day, s.</summary>
    public double TimeOfDayS { get; init; }

    /// <summary>Latitude, radians, positive north.</summary>
    public double LatitudeRad { get; init; }

    /// <summary>Longitude, radians, positive east.</summary>
    public double LongitudeRad { get; init; }

    /// <summary>Whether the receiver had a three-dimensional fix; without one position and GNSS altitude may be old.</summary>
    public bool IsThreeDimensional { get; init; }

    /// <summary>Pressure altitude by the standard atmosphere, m above 1013.25 hPa; 0 in every fix of a recorder without a sensor.</summary>
    public double PressureAltitudeM { get; init; }

    /// <summary>GNSS altitude as the recorder counts it, m; NaN without a three-dimensional fix.</summary>
    public double GnssAltitudeM { get; init; }

    /// <summary>Indicated airspeed, m/s (IAS).</summary>
    public double IndicatedMps { get; init; }

    /// <summary>True airspeed, m/s (TAS).</summary>
    public double TrueMps { get; init; }

    /// <summary>Outside air temperature, K (OAT).</summary>
    public double OutsideTemperatureK { get; init; }

    /// <summary>The recorder's own compensated vertical speed, m/s, positive up (VAT).</summary>
    public double CompensatedVerticalMps { get; init; }

    /// <summary>Engine noise as a fraction of its scale (ENL).</summary>
    public double EngineNoise { get; init; }
}
