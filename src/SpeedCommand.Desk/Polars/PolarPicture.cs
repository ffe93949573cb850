using System.Globalization;
using ScottPlot;
using SkiaSharp;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Polars;

/// <summary>Draws a sink curve over indicated airspeed, sink downwards, with the tangents, the three targets and the limits.</summary>
internal sealed class PolarPicture
{
    public const int WidthPx = 1080;
    public const int HeightPx = 700;

    private const int CurveParts = 240;

    /// <summary>Room for labels above everything else, as a share of the greatest sink shown.</summary>
    private const double TopShare = 0.16;

    private static readonly SKRect DataArea = new(72, 104, WidthPx - 36, HeightPx - 84);

    private readonly SinkCurve _curve;
    private readonly DisplayUnits _units;
    private readonly PlotArea _area;
    private readonly List<(double X, double Y)> _points;

    public PolarPicture(SinkCurve curve, DisplayUnits units)
    {
        (_curve, _units) = (curve, units);
        _points = [.. Enumerable.Range(0, CurveParts + 1)
            .Select(i => curve.At(curve.SlowestMps + (curve.FastestMps - curve.SlowestMps) * i / CurveParts))
            .Where(point => point is not null)
            .Select(point => At(point!.Value.IndicatedMps, point.Value.SinkMps))];
        var tangents = new[] { MacCreadyTangent.OfSpeedToFly(curve), MacCreadyTangent.OfBestGlide(curve) }.Where(tangent => tangent is not null);
        var bottom = _points.Max(point => point.Y) * 1.1;
        var top = tangents.Select(tangent => units.Vertical.Convert(tangent!.OriginSinkMps)).Append(0).Min() - TopShare * bottom;
        var right = units.Speed.Convert(Math.Max(curve.FastestMps, double.IsNaN(curve.Limits.NeverExceedMps) ? 0 : curve.Limits.NeverExceedMps));
        _area = new PlotArea(DataArea, (0, right * 1.05), (top, bottom));
        Labels = new PolarLabels(curve, units, _area);
        AddAxes();
        AddLimits();
        AddCurve();
        AddTangents();
        Labels.LayOut();
    }

    public PolarLabels Labels { get; }

    private bool IsClimbShown => _area.At(0, 0).Y > DataArea.Top + 0.25f * DataArea.Height;

    public void Draw(SKCanvas canvas)
    {
        _area.Draw(canvas, WidthPx, HeightPx);
        Labels.Draw(canvas);
        DrawWords(canvas);
    }

    private (double X, double Y) At(double indicatedMps, double sinkMps) => (_units.Speed.Convert(indicatedMps), _units.Vertical.Convert(sinkMps));

    private void AddAxes()
    {
        var limits = _area.Plot.Axes.GetLimits();
        var (top, bottom) = (Math.Min(limits.Top, limits.Bottom), Math.Max(limits.Top, limits.Bottom));
        var across = NiceSteps.Between(0, limits.Right, NiceSteps.For(limits.Right, 14));
        var step = NiceSteps.For(bottom - top, 10);
        var decimals = step < 1 ? 1 : 0;
        _area.SetTicks(
            across.Select(value => (value, ConditionLines.Number(value, 0))),
            NiceSteps.Between(IsClimbShown ? top : 0, bottom, step).Select(value => (value, ConditionLines.Number(Math.Abs(value), decimals))));
        (double X, double Y)[] level = [(0, 0), (limits.Right, 0)];
        _area.AddLine(level, PictureColors.Quiet, 1.2f, LinePattern.Solid);
        Labels.AvoidLine(level);
    }

    private void AddLimits()
    {
        var limits = _curve.Limits;
        var right = _area.Plot.Axes.GetLimits().Right;
        var margin = _units.Speed.Convert(limits.StallMarginMps);
        var never = _units.Speed.Convert(limits.NeverExceedMps);
        var rough = _units.Speed.Convert(limits.RoughAirMps);
        if (margin > 0)
        {
            _area.AddBand(0, margin, PictureColors.Quiet, 26);
            Labels.AddLimit(limits.StallMarginMps, "stall margin", isRight: false, isLow: true);
        }

        // Above the altitude where never exceed comes below it, rough air no longer decides.
        if (rough > 0 && !(rough >= never))
        {
            _area.AddBand(rough, never > 0 ? never : right, PictureColors.Orange, 40);
            Labels.AddLimit(limits.RoughAirMps, "rough air", isRight: false, isLow: false);
        }

        if (never > 0)
        {
            _area.AddBand(never, right, PictureColors.Vermilion, 64);
            Labels.AddLimit(limits.NeverExceedMps, "never exceed", isRight: true, isLow: false);
        }
    }

    private void AddCurve()
    {
        var margin = _units.Speed.Convert(_curve.Limits.StallMarginMps);
        var rough = _units.Speed.Convert(_curve.Limits.RoughAirMps);
        // One point is shared where the line changes, so that no gap shows.
        var slow = _points.FindLastIndex(point => point.X <= margin);
        var fast = _points.FindIndex(point => point.X >= rough);
        var (first, last) = (Math.Max(slow, 0), fast < 0 ? _points.Count - 1 : fast);
        if (first > 0)
        {
            _area.AddLine(_points[..(first + 1)], PictureColors.Blue, 2, LinePattern.Dotted);
        }

        if (last > first)
        {
            _area.AddLine(_points[first..(last + 1)], PictureColors.Blue, 3, LinePattern.Solid);
        }

        if (last < _points.Count - 1)
        {
            _area.AddLine(_points[Math.Max(first, last)..], PictureColors.Blue, 2, LinePattern.Dashed);
        }

        Labels.AvoidLine(_points);
    }

    private void AddTangents()
    {
        if (MacCreadyTangent.OfSpeedToFly(_curve) is { } climb)
        {
            AddTangent(climb, PictureColors.Vermilion, LinePattern.Solid);
            Labels.NameClimbTangent(climb);
        }

        if ((_curve.Conditions.HeadwindMps != 0 || !_curve.Answer.SpeedToFly.Speed.IsKnown) && MacCreadyTangent.OfBestGlide(_curve) is { } glide)
        {
            AddTangent(glide, PictureColors.Green, LinePattern.Dashed);
            Labels.NameGlideTangent(glide);
        }
    }

    private void AddTangent(MacCreadyTangent tangent, SKColor color, LinePattern pattern)
    {
        var points = tangent.Points(_curve).Select(point => At(point.IndicatedMps, point.SinkMps)).ToList();
        _area.AddLine(points, color, 1.8f, pattern);
        Labels.AvoidLine(points);
    }

    private void DrawWords(SKCanvas canvas)
    {
        using var title = new PictureText(22);
        using var text = new PictureText(13);
        using var small = new PictureText(11.5f);
        var conditions = _curve.Conditions;
        title.Line(canvas, conditions.Glider.Name, DataArea.Left, 36, PictureColors.Ink, isBold: true, SKTextAlign.Left);
        text.Line(canvas, $"{ConditionLines.Load(conditions)}; {ConditionLines.Air(conditions, _units)}", DataArea.Left, 61, PictureColors.Ink, false, SKTextAlign.Left);
        text.Line(canvas, ConditionLines.Motion(conditions, _units), DataArea.Left, 81, PictureColors.Ink, false, SKTextAlign.Left);
        text.Line(canvas, $"indicated airspeed, {_units.Speed.Symbol}", DataArea.MidX, DataArea.Bottom + 42, PictureColors.Ink, false, SKTextAlign.Center);
        var vertical = IsClimbShown ? $"\u2190 sink      {_units.Vertical.Symbol}      climb \u2192" : $"\u2190 sink, {_units.Vertical.Symbol}";
        text.Upright(canvas, vertical, 24, IsClimbShown ? _area.At(0, 0).Y : DataArea.MidY, PictureColors.Ink, SKTextAlign.Center);
        small.Line(canvas, string.Create(CultureInfo.InvariantCulture,
            $"Tangents are straight in true airspeed; this axis is what the pilot reads. {ConditionLines.Caution}"),
            DataArea.Left, HeightPx - 16, PictureColors.Quiet, false, SKTextAlign.Left);
    }
}
