namespace SpeedCommand.Pipeline.Health;

/// <summary>The last few points of a value, for its range; points are added at equal intervals. Nothing is allocated after construction.</summary>
/// <param name="length">Points kept.</param>
internal sealed class SlowWindow(int length)
{
    private readonly double[] _values = new double[length];
    private int _next;
    private int _count;

    public bool IsFull => _count == _values.Length;

    public void Clear() => _count = 0;

    public void Add(double value)
    {
        _values[_next] = value;
        _next = (_next + 1) % _values.Length;
        _count = Math.Min(_count + 1, _values.Length);
    }

    /// <summary>Largest less smallest of the newest points, as many as there are up to a number.</summary>
    public double Range(int newest = int.MaxValue)
    {
        var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
        for (var i = 1; i <= Math.Min(newest, _count); i++)
        {
            var value = _values[(_next - i + _values.Length) % _values.Length];
            low = Math.Min(low, value);
            high = Math.Max(high, value);
        }

        return Math.Max(0, high - low);
    }

    /// <summary>Newest less oldest.</summary>
    public double Change() => _values[(_next - 1 + _values.Length) % _values.Length] - _values[(_next - _count + _values.Length) % _values.Length];
}
