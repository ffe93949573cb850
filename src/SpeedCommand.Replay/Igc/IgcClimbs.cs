namespace SpeedCommand.Replay.Igc;

/// <summary>
/// Finds the climbs of a flight from its track and its heights, for flights without an airspeed. Bounded: the oldest climbs stay,
/// later ones than <see cref="MaxClimbs"/> are only counted.
/// </summary>
public sealed class IgcClimbs
{
    /// <summary>More than any flight has.</summary>
    public const int MaxClimbs = 500;

    private const double EarthRadiusM = 6_371_000;

    /// <summary>A slow circle takes 30 s; over two thirds of it the turn shows, whatever the wind does to the track.</summary>
    private const double WindowS = 20;

    /// <summary>Half a turn within the window is circling; less than a quarter is not any more.</summary>
    private const double CirclingRad = Math.PI, StraightRad = Math.PI / 2;

    /// <summary>Shorter circling is a try, and a smaller gain is noise (common practice).</summary>
    private const double MinDurationS = 45, MinGainM = 30;

    /// <summary>Over this span the best climb by height is sought, as averagers do.</summary>
    private const double BestSpanS = 30;

    /// <summary>Slower than this over the ground the direction of the track means nothing, m/s.</summary>
    private const double SlowestTrackMps = 3;

    /// <summary>Enough for the longer span at ten fixes a second; beyond that the spans get shorter.</summary>
    private const int RingSize = 512;

    private readonly Point[] _ring = new Point[RingSize];
    private readonly List<IgcClimb> _climbs = [];
    private readonly bool _useGnss;
    private long _count;
    private double _bearingRad = double.NaN;
    private Circling? _circling;

    /// <summary>Starts before the first fix.</summary>
    /// <param name="useGnss">Whether heights are the receiver's, for recorders without a pressure sensor.</param>
    public IgcClimbs(bool useGnss) => _useGnss = useGnss;

    /// <summary>The climbs found so far.</summary>
    public IReadOnlyList<IgcClimb> Climbs => _climbs;

    /// <summary>How many climbs there were, listed or not.</summary>
    public int Count { get; private set; }

    /// <summary>The best mean rate of climb by height over 30 s, m/s; NaN before there were 30 s.</summary>
    public double BestMps { get; private set; } = double.NaN;

    /// <summary>The greatest height, m; NaN before any.</summary>
    public double MaxHeightM { get; private set; } = double.NaN;

    /// <summary>Takes the next fix.</summary>
    /// <param name="fix">The fix.</param>
    public void Add(in IgcFix fix)
    {
        var heightM = _useGnss ? fix.GnssAltitudeM : fix.PressureAltitudeM;
        if (!double.IsFinite(heightM) || !fix.IsThreeDimensional)
        {
            return;
        }

        var turnRad = TurnTo(fix);
        _ring[_count++ % RingSize] = new Point(fix, heightM, turnRad);
        MaxHeightM = double.IsNaN(MaxHeightM) ? heightM : Math.Max(MaxHeightM, heightM);
        if (TryBack(BestSpanS, out var before, out _) && (Newest.TimeS - before.TimeS) is var spanS && spanS >= BestSpanS)
        {
            var climbMps = (heightM - before.HeightM) / spanS;
            BestMps = double.IsNaN(BestMps) ? climbMps : Math.Max(BestMps, climbMps);
        }

        Judge();
    }

    /// <summary>Ends a climb that the end of the flight cut short.</summary>
    public void End()
    {
        if (_circling is not null)
        {
            Close(Newest);
        }
    }

    private Point Newest => _ring[(_count - 1) % RingSize];

    /// <summary>Change of the track's direction at this fix, radians, positive to the right.</summary>
    private double TurnTo(in IgcFix fix)
    {
        if (_count == 0)
        {
            return 0;
        }

        var last = Newest.Fix;
        var northM = (fix.LatitudeRad - last.LatitudeRad) * EarthRadiusM;
        var eastM = Math.IEEERemainder(fix.LongitudeRad - last.LongitudeRad, 2 * Math.PI) * Math.Cos(fix.LatitudeRad) * EarthRadiusM;
        var elapsedS = (fix.TimeUs - last.TimeUs) * 1e-6;
        if (Math.Sqrt(northM * northM + eastM * eastM) < SlowestTrackMps * elapsedS || elapsedS == 0)
        {
            return 0;
        }

        var before = _bearingRad;
        _bearingRad = Math.Atan2(eastM, northM);
        return double.IsNaN(before) ? 0 : Math.IEEERemainder(_bearingRad - before, 2 * Math.PI);
    }

    private void Judge()
    {
        if (!TryBack(WindowS, out var start, out var turnRad))
        {
            return;
        }

        if (_circling is null)
        {
            if (Math.Abs(turnRad) >= CirclingRad)
            {
                _circling = new Circling(start, turnRad);
            }

            return;
        }

        _circling.Add(Newest);
        if (Math.Abs(turnRad) < StraightRad)
        {
            // The window's middle is about where the circle was left.
            TryBack(WindowS / 2, out var end, out _);
            Close(end);
        }
    }

    private void Close(in Point end)
    {
        var climb = _circling!.ClimbUntil(end);
        _circling = null;
        if (climb.DurationS < MinDurationS || climb.GainM < MinGainM)
        {
            return;
        }

        Count++;
        if (_climbs.Count < MaxClimbs)
        {
            _climbs.Add(climb);
        }
    }

    /// <summary>The newest point at least so long ago, and the turn since.</summary>
    private bool TryBack(double spanS, out Point point, out double turnRad)
    {
        turnRad = 0;
        point = Newest;
        var nowS = point.TimeS;
        for (var i = _count - 1; i >= 0 && i > _count - 1 - RingSize; i--)
        {
            point = _ring[i % RingSize];
            if (nowS - point.TimeS >= spanS)
            {
                return true;
            }

            turnRad += point.TurnRad;
        }

        return false;
    }

    private readonly record struct Point(IgcFix Fix, double HeightM, double TurnRad)
    {
        public double TimeS => Fix.TimeUs * 1e-6;
    }

    private sealed class Circling(Point start, double turnRad)
    {
        private double _turnRad = turnRad;
        private double _verticalSum;
        private int _verticalCount;
        private double _noise = double.NaN;

        public void Add(in Point point)
        {
            _turnRad += point.TurnRad;
            if (double.IsFinite(point.Fix.CompensatedVerticalMps))
            {
                _verticalSum += point.Fix.CompensatedVerticalMps;
                _verticalCount++;
            }

            _noise = double.IsNaN(_noise) ? point.Fix.EngineNoise : Math.Max(_noise, point.Fix.EngineNoise);
        }

        public IgcClimb ClimbUntil(in Point end) => new(start.Fix.TimeOfDayS, end.TimeS - start.TimeS, start.HeightM,
            end.HeightM - start.HeightM, _turnRad / (2 * Math.PI), _verticalCount == 0 ? double.NaN : _verticalSum / _verticalCount, _noise);
    }
}
