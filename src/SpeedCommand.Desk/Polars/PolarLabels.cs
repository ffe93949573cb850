using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Polars;

/// <summary>The markers of a polar picture and their labels, laid out so that none covers a line or another label.</summary>
internal sealed class PolarLabels(SinkCurve curve, DisplayUnits units, PlotArea area)
{
    private const float TextSize = 13.5f;
    private const float MarkerRadius = 6.5f;

    /// <summary>The share of the MacCready tangent at which it is named: before the curve begins, as a rule.</summary>
    private const double NamedPart = 0.22;

    /// <summary>The same for the glide tangent, further on, where the MacCready tangent's labels are not.</summary>
    private const double GlideNamedPart = 0.4;

    private readonly LabelPlacer _placer = new(area.Pixels);
    private readonly List<(SKPoint At, Marker Shape, SKColor Color, string[] Lines, float AngleRad)> _labels = [];
    private readonly List<SKRect?> _places = [];
    private readonly List<(float X, string Text, bool IsRight, bool IsLow)> _limits = [];
    private readonly List<SKRect> _limitPlaces = [];

    public enum Marker
    {
        Round,
        Square,
        Diamond,
        Ring,
        None,
    }

    public void AvoidLine(IReadOnlyList<(double X, double Y)> points) => _placer.Avoid([.. points.Select(point => area.At(point.X, point.Y))]);

    public void AddLimit(double indicatedMps, string name, bool isRight, bool isLow) => _limits.Add(
        (area.At(units.Speed.Convert(indicatedMps), 0).X, $"{name} {ConditionLines.Show(indicatedMps, units.Speed, 0)}", isRight, isLow));

    public void NameClimbTangent(MacCreadyTangent tangent)
    {
        var conditions = curve.Conditions;
        var air = conditions.AirMps == 0 ? "" : $", air {ConditionLines.Show(conditions.AirMps, units.Vertical, 1)}";
        Add(0, tangent.OriginSinkMps, Marker.Ring, PictureColors.Vermilion, 0);
        var part = NamedPart * tangent.TouchTrueMps;
        Add(curve.IndicatedAtTrue(part), tangent.SinkAt(part), Marker.None, PictureColors.Vermilion, -0.8f,
            "MacCready tangent", $"from climb {ConditionLines.Show(conditions.ClimbMps, units.Vertical, 1)}{air}");
        var average = curve.Answer.SpeedToFly.AverageSpeedMps;
        // In still air the tangent cuts the line of no sink at the average speed.
        if (conditions.AirMps == 0 && conditions.ClimbMps > 0 && curve.IndicatedAtTrue(average) is var indicated && double.IsFinite(indicated))
        {
            Add(indicated, 0, Marker.Ring, PictureColors.Vermilion, -1.2f, $"average {ConditionLines.Show(average, units.Speed, 0)}", "climbs included, true");
        }
    }

    public void NameGlideTangent(MacCreadyTangent tangent)
    {
        var wind = tangent.OriginTrueMps;
        var origin = wind == 0 ? "from no wind" : $"from {ConditionLines.Wind(wind, units)}";
        if (wind >= 0)
        {
            Add(curve.IndicatedAtTrue(wind), tangent.OriginSinkMps, Marker.Ring, PictureColors.Green, 0);
        }

        var start = Math.Max(0, wind);
        var part = start + GlideNamedPart * (tangent.TouchTrueMps - start);
        Add(curve.IndicatedAtTrue(part), tangent.SinkAt(part), Marker.None, PictureColors.Green, 1.7f, "glide tangent", origin);
    }

    /// <summary>Where each label stands, once laid out, those of the limits included; null where none could be found.</summary>
    public IReadOnlyList<SKRect?> Places => [.. _limitPlaces.Select(place => (SKRect?)place), .. _places.Where((_, i) => _labels[i].Lines.Length > 0)];

    /// <summary>Finds room for every label.</summary>
    public void LayOut()
    {
        using var text = new PictureText(TextSize);
        AddTargets();
        foreach (var (x, words, isRight, isLow) in _limits)
        {
            _limitPlaces.Add(_placer.PlaceUpright(isRight ? x + 4 : x - TextSize - 6, new SKSize(TextSize + 2, text.Width(words)), isLow));
            _placer.Avoid([new SKPoint(x, area.Pixels.Top), new SKPoint(x, area.Pixels.Bottom)]);
        }

        foreach (var label in _labels.Where(label => label.Shape != Marker.None))
        {
            _placer.Avoid(SKRect.Create(label.At.X - MarkerRadius, label.At.Y - MarkerRadius, 2 * MarkerRadius, 2 * MarkerRadius));
        }

        _places.AddRange(_labels.Select(label => label.Lines.Length > 0 ? _placer.Place(label.At, text.Measure(label.Lines), label.AngleRad) : null));
    }

    public void Draw(SKCanvas canvas)
    {
        using var text = new PictureText(TextSize);
        DrawLimits(canvas, text);
        for (var i = 0; i < _labels.Count; i++)
        {
            if (_places[i] is { } place)
            {
                DrawLeader(canvas, _labels[i].At, LabelPlacer.LeaderEnd(_labels[i].At, place), _labels[i].Color);
                text.Draw(canvas, place.Location, _labels[i].Lines, _labels[i].Color);
            }
        }

        // Markers last: they cover the lines' ends.
        foreach (var (at, shape, color, _, _) in _labels.Where(label => label.Shape != Marker.None))
        {
            DrawMarker(canvas, at, shape, color);
        }
    }

    private void AddTargets()
    {
        var answer = curve.Answer;
        AddTarget("speed to fly", answer.SpeedToFly.Speed, Marker.Diamond, PictureColors.Vermilion, -0.6f,
            $"sinks {ConditionLines.Show(answer.SpeedToFly.Speed.SinkMps, units.Vertical, 2)}");
        var ratio = $"{ConditionLines.Number(answer.BestGlide.GlideRatio, 1)} : 1";
        var ground = curve.Conditions.HeadwindMps != 0 || curve.Conditions.AirMps != 0 ? " over the ground" : "";
        AddTarget("best glide", answer.BestGlide.Speed, Marker.Square, PictureColors.Green, 1.9f,
            double.IsInfinity(answer.BestGlide.GlideRatio) ? "the air carries the glider" : ratio + ground);
        AddTarget("minimum sink", answer.MinSink, Marker.Round, PictureColors.Blue, 2.4f, ConditionLines.Show(answer.MinSink.SinkMps, units.Vertical, 2));
    }

    private void AddTarget(string name, in TargetSpeed target, Marker shape, SKColor color, float angleRad, string note)
    {
        if (!target.IsKnown)
        {
            return;
        }

        var speed = $"{ConditionLines.Number(curve.Limits.Rounded(target.IndicatedAirspeedMps, units.Speed), 0)} {units.Speed.Symbol}";
        var held = LimitNames.HeldAt(target.LimitedBy);
        Add(target.IndicatedAirspeedMps, target.SinkMps, shape, color, angleRad, [$"{name} {speed}", note, .. held.Length > 0 ? new[] { held } : []]);
    }

    private void Add(double indicatedMps, double sinkMps, Marker shape, SKColor color, float angleRad, params string[] lines) =>
        _labels.Add((area.At(units.Speed.Convert(indicatedMps), units.Vertical.Convert(sinkMps)), shape, color, lines, angleRad));

    private void DrawLimits(SKCanvas canvas, PictureText text)
    {
        using var paint = new SKPaint { Color = PictureColors.Quiet, StrokeWidth = 1.2f, IsAntialias = true };
        for (var i = 0; i < _limits.Count; i++)
        {
            var x = _limits[i].X;
            canvas.DrawLine(x, area.Pixels.Top, x, area.Pixels.Bottom, paint);
            text.Upright(canvas, _limits[i].Text, _limitPlaces[i].Left + TextSize - 1, _limitPlaces[i].Bottom, PictureColors.Ink, SKTextAlign.Left);
        }
    }

    private static void DrawLeader(SKCanvas canvas, SKPoint from, SKPoint to, SKColor color)
    {
        using var paint = new SKPaint { Color = color, StrokeWidth = 1, IsAntialias = true };
        canvas.DrawLine(from, to, paint);
    }

    private static void DrawMarker(SKCanvas canvas, SKPoint at, Marker shape, SKColor color)
    {
        using var fill = new SKPaint { Color = shape == Marker.Ring ? SKColors.White : color, IsAntialias = true };
        using var edge = new SKPaint { Color = shape == Marker.Ring ? color : SKColors.White, IsAntialias = true, IsStroke = true, StrokeWidth = 1.6f };
        using var path = new SKPath();
        switch (shape)
        {
            case Marker.Square:
                path.AddRect(SKRect.Create(at.X - MarkerRadius + 1, at.Y - MarkerRadius + 1, 2 * MarkerRadius - 2, 2 * MarkerRadius - 2));
                break;
            case Marker.Diamond:
                const float Reach = MarkerRadius + 1.5f;
                path.AddPoly([new(at.X, at.Y - Reach), new(at.X + Reach, at.Y), new(at.X, at.Y + Reach), new(at.X - Reach, at.Y)]);
                break;
            default:
                path.AddCircle(at.X, at.Y, shape == Marker.Ring ? MarkerRadius - 2 : MarkerRadius);
                break;
        }

        canvas.DrawPath(path, fill);
        canvas.DrawPath(path, edge);
    }
}
