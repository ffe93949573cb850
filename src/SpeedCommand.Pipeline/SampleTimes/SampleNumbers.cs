namespace SpeedCommand.Pipeline.SampleTimes;

/// <summary>
/// Numbers the samples of a regular series that carries no count of its own: one line, one sample, until the times say that
/// some were lost, or that a line taken for one after a loss was only late.
/// </summary>
internal sealed class SampleNumbers
{
    /// <summary>A line is never early but for what the envelope is wrong by, microseconds; of a short period a quarter.</summary>
    private const double EnvelopeErrorUs = 4_000;

    /// <summary>Where delays are usually less than this share of a period, a line late by a period tells of a loss.</summary>
    private const double CalmShare = 0.4;

    /// <summary>Elsewhere it takes this long of nothing but late lines, microseconds, and so many of them.</summary>
    private const double DoubtUs = 120_000;
    private const int LeastDoubtfulLines = 5;

    /// <summary>What a stall held up comes all at once; late lines for longer than this are no stall, microseconds.</summary>
    private const double StallUs = 50_000;

    /// <summary>For so long a supposed loss may turn out to have been a delay, microseconds.</summary>
    private const double RegretUs = 500_000;

    /// <summary>More losses than one line in eight, and the rate is not the one supposed.</summary>
    private const double LossesForgotten = 0.125, MostLosses = 3;

    private int _doubtful;
    private double _doubtfulSinceY;
    private double _leastDoubtfulUs;
    private double _skipped;
    private double _skippedY;
    private double _losses;
    private double _y;

    /// <summary>The newest sample's number.</summary>
    public double Number { get; private set; }

    /// <summary>Whether lines were late for so long that a loss is the likelier reason.</summary>
    public bool IsLossLikely => _doubtful > 0 && _y - _doubtfulSinceY > StallUs;

    /// <summary>Whether a loss was supposed so lately that the number may yet turn out to be wrong.</summary>
    public bool IsProvisional => _skipped > 0;

    /// <summary>Starts anew at 0.</summary>
    public void Start()
    {
        Number = _doubtful = 0;
        _skipped = _losses = 0;
    }

    /// <summary>Numbers the next line while nothing is known yet.</summary>
    public void Count() => Number++;

    /// <summary>Numbers the next line.</summary>
    /// <param name="y">When it was sent, microseconds.</param>
    /// <param name="badLines">Bad lines since the line before, each of which may have been one of this series.</param>
    /// <param name="envelope">The line below the arrivals so far.</param>
    /// <param name="isSettled">Whether that line can be relied on.</param>
    /// <returns>False when no number makes sense, since the rate has changed.</returns>
    public bool TryCount(double y, long badLines, ArrivalEnvelope envelope, bool isSettled)
    {
        _y = y;
        Number++;
        var periodUs = envelope.SlopeUs;
        var lateUs = y - envelope.At(Number);
        var mostLost = Math.Floor((lateUs + Math.Min(EnvelopeErrorUs, periodUs / 4)) / periodUs);
        _losses = Math.Max(0, _losses - LossesForgotten);
        _skipped = y - _skippedY > RegretUs ? 0 : _skipped;
        if (lateUs < -periodUs / 2 && _skipped > 0)
        {
            var back = Math.Min(_skipped, Math.Round(-lateUs / periodUs));
            Number -= back;
            _skipped -= back;
        }
        else if (mostLost < 1)
        {
            _doubtful = 0;
        }
        else if (badLines > 0 || (isSettled && envelope.UsualSpreadUs < CalmShare * periodUs))
        {
            Skip(badLines > 0 ? Math.Min(badLines, mostLost) : mostLost);
        }
        else
        {
            Doubt(lateUs, mostLost, periodUs);
        }

        return _losses <= MostLosses;
    }

    private void Doubt(double lateUs, double mostLost, double periodUs)
    {
        if (_doubtful == 0)
        {
            _doubtfulSinceY = _y;
            _leastDoubtfulUs = double.PositiveInfinity;
        }

        _doubtful++;
        _leastDoubtfulUs = Math.Min(_leastDoubtfulUs, lateUs);
        if (_doubtful >= LeastDoubtfulLines && _y - _doubtfulSinceY >= DoubtUs)
        {
            Skip(Math.Clamp(Math.Round(_leastDoubtfulUs / periodUs), 1, mostLost));
        }
    }

    private void Skip(double lost)
    {
        Number += lost;
        _skipped += lost;
        _skippedY = _y;
        _losses++;
        _doubtful = 0;
    }
}
