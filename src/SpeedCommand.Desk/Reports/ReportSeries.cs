namespace SpeedCommand.Desk.Reports;

/// <summary>A number over the flight, thinned by means so that a long flight draws no more points than a page can show.</summary>
internal static class ReportSeries
{
    public const int MaxPoints = 600;

    /// <summary>The unbroken stretches of a number, thinned; time in minutes.</summary>
    public static IReadOnlyList<IReadOnlyList<(double Minutes, double Value)>> Of(IReadOnlyList<ReportMoment> moments, Func<ReportMoment, double> number)
    {
        var bin = Math.Max(1, (moments.Count + MaxPoints - 1) / MaxPoints);
        var stretches = new List<IReadOnlyList<(double, double)>>();
        var stretch = new List<(double, double)>();
        for (var start = 0; start < moments.Count; start += bin)
        {
            var count = Math.Min(bin, moments.Count - start);
            var values = Enumerable.Range(start, count).Select(i => number(moments[i])).Where(double.IsFinite).ToList();
            if (values.Count > 0)
            {
                stretch.Add((moments[start + count / 2].TimeS / 60, values.Average()));
            }
            else if (stretch.Count > 0)
            {
                stretches.Add(stretch);
                stretch = [];
            }
        }

        if (stretch.Count > 0)
        {
            stretches.Add(stretch);
        }

        return stretches;
    }
}
