using SkiaSharp;

namespace SpeedCommand.Desk.Plots;

/// <summary>Finds room for labels beside what they name: inside an area, on no line and on no other label.</summary>
internal sealed class LabelPlacer(SKRect area)
{
    private const float Clearance = 4;
    private const int Directions = 16;

    /// <summary>Near what it names, which lies on a line as a rule, a leader may touch lines.</summary>
    private const float LeaderFreedom = 14;

    private static readonly float[] Distances = [12, 22, 36, 54, 76, 104, 140, 184, 236, 300, 380, 470];

    private readonly List<SKRect> _rectangles = [];
    private readonly List<SKPoint> _points = [];

    /// <summary>Keeps a rectangle free of labels.</summary>
    public void Avoid(SKRect rectangle) => _rectangles.Add(rectangle);

    /// <summary>Keeps a line free of labels.</summary>
    public void Avoid(IReadOnlyList<SKPoint> line)
    {
        for (var i = 1; i < line.Count; i++)
        {
            var step = line[i] - line[i - 1];
            var parts = Math.Max(1, (int)MathF.Ceiling(step.Length / Clearance));
            for (var part = 0; part <= parts; part++)
            {
                var share = (float)part / parts;
                _points.Add(new SKPoint(line[i - 1].X + step.X * share, line[i - 1].Y + step.Y * share));
            }
        }
    }

    /// <summary>
    /// The nearest free place for a label, tried first in a direction of its own; null when the area is full. The line that leads
    /// to it crosses other lines, and as the last resort other labels, only where it cannot be helped.
    /// </summary>
    /// <param name="anchor">What the label names.</param>
    /// <param name="size">Size of the label.</param>
    /// <param name="angleRad">The first direction, 0 to the right, a quarter turn downwards.</param>
    public SKRect? Place(SKPoint anchor, SKSize size, float angleRad) =>
        Place(anchor, size, angleRad, mayCrossLines: false, mayCrossLabels: false)
            ?? Place(anchor, size, angleRad, mayCrossLines: true, mayCrossLabels: false)
            ?? Place(anchor, size, angleRad, mayCrossLines: true, mayCrossLabels: true);

    /// <summary>The first free place for a tall label that must stand at one x, sliding down from the top or up from the bottom.</summary>
    public SKRect PlaceUpright(float left, SKSize size, bool isLow)
    {
        var room = area.Height - size.Height;
        var places = Enumerable.Range(0, Math.Max(1, (int)(room / Clearance) - 3)).Select(i => SKRect.Create(
            left, isLow ? area.Bottom - size.Height - (i + 2) * Clearance : area.Top + (i + 2) * Clearance, size.Width, size.Height)).ToList();
        var place = places.Cast<SKRect?>().FirstOrDefault(place => IsFree(place!.Value, 1)) ?? places[0];
        _rectangles.Add(place);
        return place;
    }

    private SKRect? Place(SKPoint anchor, SKSize size, float angleRad, bool mayCrossLines, bool mayCrossLabels)
    {
        foreach (var distance in Distances)
        {
            for (var turn = 0; turn < Directions; turn++)
            {
                // 0, +1, -1, +2, -2 ...: the preferred side first.
                var steps = (turn + 1) / 2 * (turn % 2 == 0 ? -1 : 1);
                var angle = angleRad + steps * 2 * MathF.PI / Directions;
                var candidate = At(anchor, size, distance, angle);
                if (IsFree(candidate, Clearance) && (mayCrossLabels || IsLeaderFree(anchor, candidate, mayCrossLines)))
                {
                    _rectangles.Add(candidate);
                    return candidate;
                }
            }
        }

        return null;
    }

    /// <summary>Where a line from the thing named ends at its label.</summary>
    public static SKPoint LeaderEnd(SKPoint anchor, SKRect label) =>
        new(Math.Clamp(anchor.X, label.Left, label.Right), Math.Clamp(anchor.Y, label.Top, label.Bottom));

    private static SKRect At(SKPoint anchor, SKSize size, float distance, float angle)
    {
        var (x, y) = (MathF.Cos(angle), MathF.Sin(angle));
        var center = new SKPoint(anchor.X + x * (distance + size.Width / 2), anchor.Y + y * (distance + size.Height / 2));
        return SKRect.Create(center.X - size.Width / 2, center.Y - size.Height / 2, size.Width, size.Height);
    }

    private bool IsFree(SKRect candidate, float clearance)
    {
        var roomy = SKRect.Inflate(candidate, clearance, clearance);
        return area.Contains(roomy) && !_rectangles.Exists(roomy.IntersectsWith) && !_points.Exists(roomy.Contains);
    }

    private bool IsLeaderFree(SKPoint anchor, SKRect candidate, bool mayCrossLines)
    {
        var leader = LeaderEnd(anchor, candidate) - anchor;
        for (var at = 0f; at < leader.Length; at += Clearance / 2)
        {
            var point = new SKPoint(anchor.X + leader.X * at / leader.Length, anchor.Y + leader.Y * at / leader.Length);
            if (_rectangles.Exists(rectangle => rectangle.Contains(point) && !rectangle.Contains(anchor))
                || (!mayCrossLines && at > LeaderFreedom && _points.Exists(near => SKPoint.DistanceSquared(near, point) < Clearance * Clearance)))
            {
                return false;
            }
        }

        return true;
    }
}
