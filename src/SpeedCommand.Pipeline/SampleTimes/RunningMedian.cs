namespace SpeedCommand.Pipeline.SampleTimes;

/// <summary>The median of the newest values, kept in order so that none is ever sorted.</summary>
internal sealed class RunningMedian(int capacity)
{
    private readonly double[] _newest = new double[capacity];
    private readonly double[] _ordered = new double[capacity];
    private int _next;

    /// <summary>How many values there are, at most the capacity.</summary>
    public int Count { get; private set; }

    /// <summary>The middle one, of an even number the upper one; 0 when there is none.</summary>
    public double Median => Count > 0 ? _ordered[Count / 2] : 0;

    /// <summary>Forgets all.</summary>
    public void Clear() => Count = _next = 0;

    /// <summary>Takes a value; the oldest makes room when there is none.</summary>
    public void Add(double value)
    {
        if (Count == _newest.Length)
        {
            var at = _ordered.AsSpan(0, Count).BinarySearch(_newest[_next]);
            Array.Copy(_ordered, at + 1, _ordered, at, Count - at - 1);
            Count--;
        }

        _newest[_next] = value;
        _next = (_next + 1) % _newest.Length;
        var place = _ordered.AsSpan(0, Count).BinarySearch(value);
        place = place < 0 ? ~place : place;
        Array.Copy(_ordered, place, _ordered, place + 1, Count - place);
        _ordered[place] = value;
        Count++;
    }
}
