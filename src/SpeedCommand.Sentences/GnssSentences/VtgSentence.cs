namespace SpeedCommand.Sentences.GnssSentences;

/// <summary>VTG, course and speed over the ground: <c>true track,T,magnetic track,M,speed,N,speed,K[,mode]</c>.</summary>
public readonly record struct VtgSentence
{
    private const double MetresPerSecondPerKnot = 1852.0 / 3600.0;
    private const double MetresPerSecondPerKmh = 1 / 3.6;

    /// <summary>
    /// Whether speed and track are measured, by the mode; receivers older than version 2.3 have none and are believed. Without
    /// a fix both are NaN.
    /// </summary>
    public bool HasFix { get; private init; }

    /// <summary>
    /// Speed over the ground, metres per second; NaN when not known. From the field in km/h, which is finer than the one in
    /// knots at the same decimals, and from that one when it is empty.
    /// </summary>
    public double GroundSpeedMps { get; private init; }

    /// <summary>Track over the ground, radians clockwise from true north; NaN when not known, as at rest.</summary>
    public double TrackRad { get; private init; }

    /// <summary>Reads a VTG sentence of any talker.</summary>
    /// <param name="sentence">A sentence of any type.</param>
    /// <param name="vtg">What it says; meaningless when the result is false.</param>
    /// <returns>False for another type, a missing field, or one that is neither empty nor well-formed.</returns>
    public static bool TryRead(in Sentence sentence, out VtgSentence vtg)
    {
        vtg = default;
        if (!sentence.IsOfType("VTG"u8))
        {
            return false;
        }

        var fields = new GnssFieldReader(sentence.Fields);
        var trackDeg = fields.Number((byte)'T');
        _ = fields.Number((byte)'M');
        var byKnotsMps = fields.Number((byte)'N') * MetresPerSecondPerKnot;
        var byKmhMps = fields.Number((byte)'K') * MetresPerSecondPerKmh;
        var hasFix = fields.IsMeasuredByOptionalMode();
        vtg = new VtgSentence
        {
            HasFix = hasFix,
            GroundSpeedMps = !hasFix ? double.NaN : double.IsNaN(byKmhMps) ? byKnotsMps : byKmhMps,
            TrackRad = hasFix ? double.DegreesToRadians(trackDeg) : double.NaN,
        };
        return fields.IsSound;
    }
}
