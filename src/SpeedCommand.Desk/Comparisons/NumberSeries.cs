namespace SpeedCommand.Desk.Comparisons;

/// <summary>One column of two outputs over time, for a picture.</summary>
internal sealed class NumberSeries(string column)
{
    private readonly List<(double TimeS, double Expected, double Found)> _points = [];

    public string Column => column;

    public IReadOnlyList<(double TimeS, double Expected, double Found)> Points => _points;

    public void Add(double timeS, double expected, double found) => _points.Add((timeS, expected, found));

    /// <summary>The unbroken stretches of one of the two: a blank is a gap, not a line.</summary>
    public IEnumerable<List<(double TimeS, double Value)>> Stretches(bool isFound)
    {
        var stretch = new List<(double, double)>();
        foreach (var (timeS, expected, found) in _points)
        {
            var value = isFound ? found : expected;
            if (double.IsNaN(value))
            {
                if (stretch.Count > 0)
                {
                    yield return stretch;
                    stretch = [];
                }

                continue;
            }

            stretch.Add((timeS, value));
        }

        if (stretch.Count > 0)
        {
            yield return stretch;
        }
    }
}
