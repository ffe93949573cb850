using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.SampleTimes;

/// <summary>
/// When the samples of one series were taken, worked out from when their lines arrived. A line is never early, so the earliest
/// arrivals show the board's clock, and a later one was held up on the way: by the time of transmission, a buffer, a busy
/// machine. Whatever does not fit a steady clock makes it start over, and meanwhile only the time of transmission is taken
/// out. Stamps never run backwards and never lie after the arrival.
/// </summary>
internal sealed class SampleClock(SampleMark mark)
{
    /// <summary>A longer silence than this may have changed anything, microseconds.</summary>
    private const long MaxGapUs = 1_000_000;

    /// <summary>First the rate is learnt by counting, microseconds: a buffer of 16 ms is 2 % of it.</summary>
    private const double LearningUs = 1_000_000;

    /// <summary>A series slower than four samples in that time has nothing to gain.</summary>
    private const int LeastLines = 4;

    /// <summary>So long after the start the line is good to a millisecond or so, microseconds.</summary>
    private const double SettlingUs = 5_000_000;

    /// <summary>The phase of a buffer of 16 ms against a board's clock hides up to 4 ms of either sign; more is a step, microseconds.</summary>
    private const double MaxErrorUs = 6_000;

    /// <summary>More is not taken out: half of what the estimator takes from the past, and longer stalls are rare, microseconds.</summary>
    private const double MostDelayUs = 250_000;

    /// <summary>Before it is settled the line may be wrong by more, microseconds.</summary>
    private const double MaxUnsettledErrorUs = 40_000;

    /// <summary>Delays usually beyond this, microseconds, and this share of a period, are no delays: the series is not regular.</summary>
    private const double MaxSpreadUs = 40_000, MaxSpreadShare = 0.75;

    /// <summary>A second step within ten seconds, and the board's clock is not steady.</summary>
    private const double MostSteps = 1, StepsForgottenPerUs = 1e-7;

    private readonly ArrivalEnvelope _envelope = new();
    private readonly SampleNumbers _numbers = new();
    private bool _isStarted;
    private bool _isLearnt;
    private int _lines;
    private long _originUs;
    private long _sentUs;
    private long _stampUs = long.MinValue;
    private double _mark;
    private double _markedX;
    private double _steps;
    private long _badLines;

    /// <summary>Whether delays are being taken out now.</summary>
    public bool IsSettled => _isLearnt && _sentUs - _originUs >= SettlingUs;

    /// <summary>The sample's stamp.</summary>
    /// <param name="arrivalUs">When the line arrived, microseconds, never running back.</param>
    /// <param name="transmissionUs">How long its transmission took, microseconds; 0 when not known.</param>
    /// <param name="newMark">The board's own count or clock in this line; NaN when there is none.</param>
    /// <param name="badLines">Bad lines of the stream so far.</param>
    /// <returns>Microseconds, at most the arrival, at least the stamp before.</returns>
    public long StampOf(long arrivalUs, long transmissionUs, double newMark, long badLines)
    {
        var sentUs = arrivalUs - transmissionUs;
        var delayUs = (long)Math.Round(DelayUs(sentUs, newMark, badLines - _badLines));
        _badLines = badLines;
        _stampUs = Math.Max(_stampUs, sentUs - delayUs);
        return _stampUs;
    }

    private double DelayUs(long sentUs, double newMark, long newBadLines)
    {
        var sinceUs = sentUs - _sentUs;
        _sentUs = Math.Max(_sentUs, sentUs);
        var y = (double)(sentUs - _originUs);
        if (!_isStarted || sinceUs > MaxGapUs || !TryPlace(y, newMark, newBadLines, out var x))
        {
            return Start(newMark);
        }

        _lines++;
        if (!_isLearnt)
        {
            return Learn(x, y, newMark);
        }

        _steps = Math.Max(0, _steps - sinceUs * StepsForgottenPerUs);
        var delayUs = y - _envelope.At(x);
        if (!Follows(x, y, delayUs))
        {
            return Start(newMark);
        }

        if (!_numbers.IsProvisional)
        {
            _envelope.Add(x, y);
        }

        var mostUs = !IsSettled ? 0 : _numbers.IsLossLikely ? Math.Min(MostDelayUs, _envelope.UsualSpreadUs) : MostDelayUs;
        return Math.Clamp(delayUs, 0, mostUs);
    }

    /// <summary>Sees to it that the line is not above this arrival, nor far below all recent ones.</summary>
    private bool Follows(double x, double y, double delayUs)
    {
        var isTime = mark.Kind == SampleMarkKind.Time;
        if (!IsSettled)
        {
            if (delayUs < 0 && !_numbers.IsProvisional)
            {
                _envelope.LowerTo(x, y);
            }

            return delayUs >= -Math.Max(MaxUnsettledErrorUs, isTime ? 0 : 2 * _envelope.SlopeUs);
        }

        if ((delayUs < -MaxErrorUs && !_numbers.IsProvisional) || _envelope.LeastRecentUs > MaxErrorUs)
        {
            // The arrival at hand may be late by itself: a step up is as high as the earliest of the recent ones.
            _envelope.StepTo(x, Math.Min(y, _envelope.At(x) + Math.Max(0, _envelope.LeastRecentUs)));
            _steps++;
        }

        var isRegular = _envelope.UsualSpreadUs <= Math.Max(MaxSpreadUs, isTime ? 0 : MaxSpreadShare * _envelope.SlopeUs);
        return isRegular && _steps <= MostSteps && (isTime || delayUs >= -_envelope.SlopeUs / 2);
    }

    private double Start(double newMark)
    {
        _isStarted = mark.Kind == SampleMarkKind.None || double.IsFinite(newMark);
        _isLearnt = false;
        _lines = 0;
        _originUs = _sentUs;
        _mark = newMark;
        _markedX = _steps = 0;
        _numbers.Start();
        return 0;
    }

    private double Learn(double x, double y, double newMark)
    {
        if (y < LearningUs)
        {
            return 0;
        }

        if (_lines < LeastLines || x <= 0)
        {
            return Start(newMark);
        }

        _isLearnt = true;
        _envelope.Start(x, y, y / x);
        return 0;
    }

    /// <summary>The sample's place in the series: its number, or the board's own time.</summary>
    private bool TryPlace(double y, double newMark, long newBadLines, out double x)
    {
        if (mark.Kind == SampleMarkKind.None)
        {
            var isPlaced = true;
            if (_isLearnt)
            {
                isPlaced = _numbers.TryCount(y, newBadLines, _envelope, IsSettled);
            }
            else
            {
                _numbers.Count();
            }

            x = _numbers.Number;
            return isPlaced;
        }

        var step = newMark - _mark;
        // A mark that never turns over makes this not a number, and with it the answer no.
        step = step < 0 ? step + mark.TurnsOverAt : step;
        _mark = newMark;
        _markedX += step;
        x = _markedX;
        return step >= 0;
    }
}
