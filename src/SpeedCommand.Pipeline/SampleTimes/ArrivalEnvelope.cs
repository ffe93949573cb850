namespace SpeedCommand.Pipeline.SampleTimes;

/// <summary>
/// The straight line below all arrivals of the last half minute: arrival over sample number, as early as samples ever came.
/// Of the lines that stay below all points it is the one nearest to them in sum (the linear program of Moon, Skelly and
/// Towsley 1999, solved on the lower convex hull; from memory). Delays only ever add, so this line is the board's clock.
/// </summary>
internal sealed class ArrivalEnvelope
{
    /// <summary>One point stands for each half second, the earliest: half a minute of them averages over the beat of two clocks.</summary>
    private const int Buckets = 64;
    private const double BucketUs = 500_000;

    /// <summary>Buckets that count as recent: two seconds.</summary>
    private const int RecentBuckets = 4;

    /// <summary>After a step the rate known before is better than one from fewer buckets: five seconds.</summary>
    private const int RateBuckets = 10;

    private readonly double[] _x = new double[Buckets];
    private readonly double[] _y = new double[Buckets];
    private readonly RunningMedian _spreads = new(Buckets);
    private readonly int[] _hull = new int[Buckets];
    private int _count;
    private bool _isRateHeld;
    private double _anchorX;
    private double _anchorY;
    private double _bucketX;
    private double _bucketY;
    private double _bucketLeast;
    private double _bucketMost;
    private double _bucketEndY;

    /// <summary>Time between two samples, microseconds.</summary>
    public double SlopeUs { get; private set; }

    /// <summary>The greatest delay of an ordinary half second, microseconds: the median, which losses and stalls do not move.</summary>
    public double UsualSpreadUs => _spreads.Median;

    /// <summary>The least delay of the last two seconds, microseconds: far above 0 when the board's clock is no longer this line.</summary>
    public double LeastRecentUs { get; private set; }

    /// <summary>Starts anew from one point.</summary>
    public void Start(double x, double y, double slopeUs)
    {
        (_anchorX, _anchorY, SlopeUs) = (x, y, slopeUs);
        _count = 0;
        _isRateHeld = false;
        LeastRecentUs = 0;
        _spreads.Clear();
        OpenBucket(y);
    }

    /// <summary>Moves the line down to a point below it, before much is known.</summary>
    public void LowerTo(double x, double y) => (_anchorX, _anchorY) = (x, y);

    /// <summary>Forgets the level but not the rate: from here on the line goes through this point.</summary>
    public void StepTo(double x, double y)
    {
        (_anchorX, _anchorY) = (x, y);
        _count = 0;
        _isRateHeld = true;
        LeastRecentUs = 0;
        OpenBucket(y);
    }

    /// <summary>When the sample was taken, were it as early as ever, microseconds.</summary>
    public double At(double x) => _anchorY + (x - _anchorX) * SlopeUs;

    /// <summary>Takes one arrival.</summary>
    public void Add(double x, double y)
    {
        if (y >= _bucketEndY)
        {
            CloseBucket();
            OpenBucket(y);
        }

        var delayUs = y - At(x);
        _bucketMost = Math.Max(_bucketMost, delayUs);
        if (delayUs < _bucketLeast)
        {
            (_bucketLeast, _bucketX, _bucketY) = (delayUs, x, y);
        }
    }

    private void OpenBucket(double y)
    {
        _bucketEndY = y + BucketUs;
        _bucketLeast = double.PositiveInfinity;
        _bucketMost = 0;
    }

    private void CloseBucket()
    {
        // A number taken back may not come before its neighbour: the hull needs them in order.
        if (double.IsPositiveInfinity(_bucketLeast) || (_count > 0 && _bucketX <= _x[_count - 1]))
        {
            return;
        }

        if (_count == Buckets)
        {
            Array.Copy(_x, 1, _x, 0, Buckets - 1);
            Array.Copy(_y, 1, _y, 0, Buckets - 1);
            _count--;
        }

        (_x[_count], _y[_count]) = (_bucketX, _bucketY);
        _count++;
        _spreads.Add(_bucketMost);
        Fit();
        LookBack();
    }

    private void Fit()
    {
        _isRateHeld &= _count < RateBuckets;
        if (_isRateHeld || _count < 2)
        {
            FitLevel();
        }
        else
        {
            FitRate(FindHull());
        }
    }

    /// <summary>The earliest of all arrivals at the rate known.</summary>
    private void FitLevel()
    {
        var earliest = 0;
        for (var i = 1; i < _count; i++)
        {
            earliest = _y[i] - _x[i] * SlopeUs < _y[earliest] - _x[earliest] * SlopeUs ? i : earliest;
        }

        (_anchorX, _anchorY) = (_x[earliest], _y[earliest]);
    }

    /// <summary>The lower hull's corners from left to right.</summary>
    private int FindHull()
    {
        var corners = 0;
        for (var i = 0; i < _count; i++)
        {
            while (corners >= 2 && Slope(_hull[corners - 2], _hull[corners - 1]) >= Slope(_hull[corners - 1], i))
            {
                corners--;
            }

            _hull[corners++] = i;
        }

        return corners;
    }

    /// <summary>The edge of the hull above which the mean number lies is the line wanted.</summary>
    private void FitRate(int corners)
    {
        var meanX = 0.0;
        for (var i = 0; i < _count; i++)
        {
            meanX += _x[i] / _count;
        }

        var right = 1;
        while (right < corners - 1 && _x[_hull[right]] < meanX)
        {
            right++;
        }

        (_anchorX, _anchorY) = (_x[_hull[right - 1]], _y[_hull[right - 1]]);
        SlopeUs = Slope(_hull[right - 1], _hull[right]);
    }

    private double Slope(int from, int to) => (_y[to] - _y[from]) / (_x[to] - _x[from]);

    private void LookBack()
    {
        LeastRecentUs = double.PositiveInfinity;
        for (var i = Math.Max(0, _count - RecentBuckets); i < _count; i++)
        {
            LeastRecentUs = Math.Min(LeastRecentUs, _y[i] - At(_x[i]));
        }
    }
}
