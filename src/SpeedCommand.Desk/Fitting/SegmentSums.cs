namespace SpeedCommand.Desk.Fitting;

/// <summary>Adds up the moments of a steady stretch.</summary>
internal sealed class SegmentSums
{
    private DragTerms _terms;
    private double _indicatedMps, _climbMps, _handbookSinkMps, _referenceMps, _referenceSinkMps, _lengthM;

    public int Count { get; private set; }

    public double StartS { get; private set; }

    public double EndS { get; private set; }

    public double StartM { get; private set; }

    public double MeanIndicatedMps => _indicatedMps / Count;

    /// <summary>Adds one moment.</summary>
    public void Add(in GlideMoment moment, double periodS, double alongM)
    {
        if (Count++ == 0)
        {
            (StartS, StartM) = (moment.TimeS, alongM);
        }

        EndS = moment.TimeS;
        _lengthM += moment.TrueMps * periodS;
        _terms += moment.Terms;
        _indicatedMps += moment.IndicatedMps;
        _climbMps += moment.ClimbMps;
        _handbookSinkMps += moment.HandbookSinkMps;
        _referenceMps += moment.ReferenceMps;
        _referenceSinkMps -= moment.ClimbMps * moment.ReferenceMps / moment.TrueMps;
    }

    public GlideSegment Segment(int flight, SegmentVerdict verdict) => new(flight, StartS, EndS, verdict)
    {
        StartM = StartM,
        LengthM = _lengthM,
        IndicatedMps = MeanIndicatedMps,
        ClimbMps = _climbMps / Count,
        NettoMps = (_climbMps + _handbookSinkMps) / Count,
        Terms = _terms / Count,
        ReferenceMps = _referenceMps / Count,
        ReferenceSinkMps = _referenceSinkMps / Count,
    };
}
