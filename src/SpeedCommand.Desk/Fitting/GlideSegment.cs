namespace SpeedCommand.Desk.Fitting;

/// <summary>A stretch of flight, and what its mean climb says about the polar.</summary>
/// <param name="Flight">Number of the flight, from 0: stretches of one flight share its air.</param>
/// <param name="StartS">Its begin, s since the start of the flight.</param>
/// <param name="EndS">Its end, s.</param>
/// <param name="Verdict">Whether it is used.</param>
internal sealed record GlideSegment(int Flight, double StartS, double EndS, SegmentVerdict Verdict)
{
    /// <summary>Distance flown through the air before it, m.</summary>
    public double StartM { get; init; } = double.NaN;

    /// <summary>Its length through the air, m.</summary>
    public double LengthM { get; init; } = double.NaN;

    /// <summary>Mean indicated airspeed, m/s.</summary>
    public double IndicatedMps { get; init; } = double.NaN;

    /// <summary>Mean total-energy climb, m/s.</summary>
    public double ClimbMps { get; init; } = double.NaN;

    /// <summary>Mean climb and the sink of the polar known before, m/s: what that polar takes for moving air.</summary>
    public double NettoMps { get; init; } = double.NaN;

    /// <summary>Mean of what CD0, K1 and K2 are multiplied by to give the sink, m/s.</summary>
    public DragTerms Terms { get; init; }

    /// <summary>Mean equivalent airspeed, brought to the polar's reference mass, m/s.</summary>
    public double ReferenceMps { get; init; } = double.NaN;

    /// <summary>Mean sink brought to sea-level density and reference mass, m/s, positive down, moving air and all.</summary>
    public double ReferenceSinkMps { get; init; } = double.NaN;
}
