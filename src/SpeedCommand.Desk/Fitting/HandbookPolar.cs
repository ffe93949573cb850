using SpeedCommand.Desk.Commands;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Fitting;

/// <summary>The polar of a glider file as a drag polar, the form that is fitted.</summary>
internal static class HandbookPolar
{
    private const int PointCount = 15;

    /// <summary>The drag polar of the file, or the closest one to its table or parabola.</summary>
    /// <exception cref="DeskFailure">There is none: flaps, no wing area, or points that are no drag polar.</exception>
    public static DragPolar Of(Glider glider, string file)
    {
        if (glider.Polar is DragPolar polar)
        {
            return polar;
        }

        if (glider.Polar is FlappedPolar)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{file}: flaps: expected one polar for all speeds, found several settings: a log does not tell which was set");
        }

        if (double.IsNaN(glider.WingAreaM2))
        {
            throw new DeskFailure(ExitStatus.BadData, $"{file}: wingArea: expected the wing area, which lift coefficients need, found none");
        }

        var (slowest, fastest) = (glider.Polar.MinAirspeedMps, glider.Polar.MaxAirspeedMps);
        var points = Enumerable.Range(0, PointCount).Select(i => slowest + (fastest - slowest) * i / (PointCount - 1))
            .Select(speed => new SinkPoint(speed, glider.Polar.SinkMps(speed), 0)).Where(point => double.IsFinite(point.SinkMps)).ToList();
        return DragPolarFit.Of(points, glider.ReferenceMassKg, glider.WingAreaM2)?.Polar
            ?? throw new DeskFailure(ExitStatus.BadData, $"{file}: expected a polar that a drag polar comes close to, found one that none fits");
    }
}
