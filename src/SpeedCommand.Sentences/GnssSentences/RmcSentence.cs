namespace SpeedCommand.Sentences.GnssSentences;

/// <summary>
/// RMC, the recommended minimum of a receiver: <c>time,status,latitude,N,longitude,E,speed in knots,track,date,magnetic
/// variation,E[,mode[,navigational status]]</c>. The navigational status of version 4.1 is not looked at: receivers without
/// integrity information send V, not valid, with a perfect fix.
/// </summary>
public readonly record struct RmcSentence
{
    private const double MetresPerSecondPerKnot = 1852.0 / 3600.0;

    /// <summary>
    /// Whether position, speed and track are measured: status A, and a mode that is absent, autonomous, differential, real-time
    /// kinematic or precise. Without a fix they are NaN, even if the receiver repeats old ones.
    /// </summary>
    public bool HasFix { get; private init; }

    /// <summary>
    /// UTC time of day, seconds, 0 to below 86401 (a leap second counts on); NaN when empty. Midnight is the caller's.
    /// </summary>
    public double TimeOfDayS { get; private init; }

    /// <summary>UTC date, 1980 to 2079; null when empty.</summary>
    public DateOnly? Date { get; private init; }

    /// <summary>Latitude, radians, positive north; NaN when not known.</summary>
    public double LatitudeRad { get; private init; }

    /// <summary>Longitude, radians, positive east; NaN when not known.</summary>
    public double LongitudeRad { get; private init; }

    /// <summary>Speed over the ground, metres per second; NaN when not known.</summary>
    public double GroundSpeedMps { get; private init; }

    /// <summary>Track over the ground, radians clockwise from true north; NaN when not known, as at rest.</summary>
    public double TrackRad { get; private init; }

    /// <summary>Reads an RMC sentence of any talker.</summary>
    /// <param name="sentence">A sentence of any type.</param>
    /// <param name="rmc">What it says; meaningless when the result is false.</param>
    /// <returns>False for another type, a missing field, or one that is neither empty nor well-formed.</returns>
    public static bool TryRead(in Sentence sentence, out RmcSentence rmc)
    {
        rmc = default;
        if (!sentence.IsOfType("RMC"u8))
        {
            return false;
        }

        var fields = new GnssFieldReader(sentence.Fields);
        var timeOfDayS = fields.TimeOfDayS();
        var status = fields.Letter("AV"u8);
        var latitudeRad = fields.LatitudeRad();
        var longitudeRad = fields.LongitudeRad();
        var speedKnots = fields.Number();
        var trackDeg = fields.Number();
        var date = fields.Date();
        fields.Skip();
        fields.Skip();
        var hasFix = fields.IsMeasuredByOptionalMode() && status == 'A';
        rmc = new RmcSentence
        {
            HasFix = hasFix,
            TimeOfDayS = timeOfDayS,
            Date = date,
            LatitudeRad = hasFix ? latitudeRad : double.NaN,
            LongitudeRad = hasFix ? longitudeRad : double.NaN,
            GroundSpeedMps = hasFix ? speedKnots * MetresPerSecondPerKnot : double.NaN,
            TrackRad = hasFix ? double.DegreesToRadians(trackDeg) : double.NaN,
        };
        return fields.IsSound;
    }
}
