namespace SpeedCommand.Sentences.GnssSentences;

/// <summary>
/// GGA, position and height: <c>time,latitude,N,longitude,E,quality,satellites,horizontal dilution,altitude,M,geoid
/// separation,M,age of corrections,station</c>.
/// </summary>
public readonly record struct GgaSentence
{
    /// <summary>
    /// Whether position and heights are measured: quality 1 to 5. Estimated (6), manual (7) and simulated (8) ones are not,
    /// and without a fix they are NaN, even if the receiver repeats old ones.
    /// </summary>
    public bool HasFix { get; private init; }

    /// <summary>
    /// UTC time of day, seconds, 0 to below 86401 (a leap second counts on); NaN when empty. Midnight is the caller's.
    /// </summary>
    public double TimeOfDayS { get; private init; }

    /// <summary>Latitude, radians, positive north; NaN when not known.</summary>
    public double LatitudeRad { get; private init; }

    /// <summary>Longitude, radians, positive east; NaN when not known.</summary>
    public double LongitudeRad { get; private init; }

    /// <summary>Height above mean sea level as the receiver's geoid has it, geometric metres; NaN when not known.</summary>
    public double AltitudeM { get; private init; }

    /// <summary>Height of that mean sea level above the ellipsoid, metres; NaN when not known.</summary>
    public double GeoidSeparationM { get; private init; }

    /// <summary>Satellites used; null when empty. Old receivers stop counting at 12.</summary>
    public int? SatelliteCount { get; private init; }

    /// <summary>Horizontal dilution of precision, 1; NaN when empty.</summary>
    public double HorizontalDilution { get; private init; }

    /// <summary>Reads a GGA sentence of any talker.</summary>
    /// <param name="sentence">A sentence of any type.</param>
    /// <param name="gga">What it says; meaningless when the result is false.</param>
    /// <returns>False for another type, a missing field, or one that is neither empty nor well-formed.</returns>
    public static bool TryRead(in Sentence sentence, out GgaSentence gga)
    {
        gga = default;
        if (!sentence.IsOfType("GGA"u8))
        {
            return false;
        }

        var fields = new GnssFieldReader(sentence.Fields);
        var timeOfDayS = fields.TimeOfDayS();
        var latitudeRad = fields.LatitudeRad();
        var longitudeRad = fields.LongitudeRad();
        var hasFix = fields.Count() is >= 1 and <= 5;
        var satelliteCount = fields.Count();
        var horizontalDilution = fields.Number();
        var altitudeM = fields.Number((byte)'M');
        var geoidSeparationM = fields.Number((byte)'M');
        fields.Skip();
        fields.Skip();
        gga = new GgaSentence
        {
            HasFix = hasFix,
            TimeOfDayS = timeOfDayS,
            LatitudeRad = hasFix ? latitudeRad : double.NaN,
            LongitudeRad = hasFix ? longitudeRad : double.NaN,
            AltitudeM = hasFix ? altitudeM : double.NaN,
            GeoidSeparationM = hasFix ? geoidSeparationM : double.NaN,
            SatelliteCount = satelliteCount,
            HorizontalDilution = horizontalDilution,
        };
        return fields.IsSound;
    }
}
