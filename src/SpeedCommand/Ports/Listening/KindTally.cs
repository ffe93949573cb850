namespace SpeedCommand.Ports.Listening;

/// <summary>How often one kind of line came, and how evenly.</summary>
internal sealed class KindTally
{
    private double _firstS, _lastS, _meanGapS, _squares;

    public long Count { get; private set; }

    /// <summary>Lines a second between the first and the last; 0 for fewer than two.</summary>
    public double RateHz => Count > 1 && _lastS > _firstS ? (Count - 1) / (_lastS - _firstS) : 0;

    /// <summary>Mean time between two lines.</summary>
    public double MeanGapS => _meanGapS;

    /// <summary>Root mean square deviation of the gaps from their mean; of what the board, the line and this computer do together.</summary>
    public double JitterS => Count > 2 ? Math.Sqrt(_squares / (Count - 1)) : 0;

    public double LongestGapS { get; private set; }

    /// <summary>Counts a line that arrived at this time; the running mean and variance are Welford's.</summary>
    public void Add(double arrivalS)
    {
        Count++;
        if (Count == 1)
        {
            _firstS = _lastS = arrivalS;
            return;
        }

        var gapS = arrivalS - _lastS;
        _lastS = arrivalS;
        var before = gapS - _meanGapS;
        _meanGapS += before / (Count - 1);
        _squares += before * (gapS - _meanGapS);
        LongestGapS = Math.Max(LongestGapS, gapS);
    }
}
