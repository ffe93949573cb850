using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Polars;

/// <summary>A sink curve for a person: its conditions, a row every round step of airspeed, the three targets.</summary>
internal sealed class PolarTable(SinkCurve curve, DisplayUnits units)
{
    private const int MostRows = 24;

    private readonly StringBuilder _text = new();
    private readonly FlightConditions _conditions = curve.Conditions;
    private readonly bool _isGroundShown = curve.Conditions.HeadwindMps != 0 || curve.Conditions.AirMps != 0;

    public string Write()
    {
        _text.Append(CultureInfo.InvariantCulture, $"{_conditions.Glider.Name}, {ConditionLines.Load(_conditions)}\n");
        _text.Append(ConditionLines.Air(_conditions, units)).Append('\n');
        _text.Append(ConditionLines.Motion(_conditions, units)).Append("\n\n");
        AppendHeads();
        var step = NiceSteps.For(units.Speed.Convert(curve.FastestMps - curve.SlowestMps), MostRows);
        foreach (var point in curve.Every(units.Speed.DifferenceToSi(step)))
        {
            AppendPoint("", point, Zone(point.IndicatedMps));
        }

        _text.Append('\n');
        AppendTargets();
        _text.Append(CultureInfo.InvariantCulture, $"\n{LimitsLine()}\n");
        _text.Append(ResidualTable.Write(_conditions.Glider, units));
        _text.Append(CultureInfo.InvariantCulture, $"\n{ConditionLines.Caution}\n");
        return _text.ToString();
    }

    private void AppendHeads()
    {
        var (speed, vertical) = (units.Speed.Symbol, units.Vertical.Symbol);
        var (ground, unit) = _isGroundShown ? ("ground", "ratio") : ("", "");
        _text.Append($"{"",-13}{"indicated",10}{"equivalent",11}{"true",7}{"sink",8}{"glide",8}{ground,8}".TrimEnd()).Append('\n');
        _text.Append($"{"",-13}{speed,10}{speed,11}{speed,7}{vertical,8}{"ratio",8}{unit,8}".TrimEnd()).Append('\n');
    }

    private void AppendPoint(string name, in SinkCurvePoint point, string note)
    {
        var speed = units.Speed;
        _text.Append(name.PadRight(13))
            .Append(ConditionLines.Number(curve.Limits.Rounded(point.IndicatedMps, speed), 0).PadLeft(10))
            .Append(ConditionLines.Number(speed.Convert(point.EquivalentMps), 0).PadLeft(11))
            .Append(ConditionLines.Number(speed.Convert(point.TrueMps), 0).PadLeft(7))
            .Append(ConditionLines.Number(units.Vertical.Convert(point.SinkMps), 2).PadLeft(8))
            .Append(ConditionLines.Number(point.GlideRatio, 1).PadLeft(8));
        if (_isGroundShown)
        {
            var ratio = point.RatioOverGround(_conditions.HeadwindMps, _conditions.AirMps);
            _text.Append((double.IsInfinity(ratio) ? "climbs" : ConditionLines.Number(ratio, 1)).PadLeft(8));
        }

        var flaps = curve.FlapSettingAt(point) is { } setting ? "flaps " + setting : "";
        var notes = string.Join(", ", new[] { flaps, note }.Where(part => part.Length > 0));
        _text.Append(notes.Length > 0 ? "   " + notes : "").Append('\n');
    }

    private void AppendTargets()
    {
        var answer = curve.Answer;
        AppendTarget("minimum sink", answer.MinSink, answer.Circle.Speed.IsKnown ? CircleNote(answer.Circle) : "");
        AppendTarget("best glide", answer.BestGlide.Speed, "");
        var missing = LimitNames.WhyNoSpeedToFly(_conditions.Glider, curve.Limits);
        if (missing.Length > 0)
        {
            _text.Append("speed to fly  not shown: ").Append(missing).Append('\n');
            return;
        }

        var average = answer.SpeedToFly.AverageSpeedMps;
        AppendTarget("speed to fly", answer.SpeedToFly.Speed, average > 0 ? $"average {ConditionLines.Show(average, units.Speed, 0)}" : "");
    }

    private string CircleNote(in ThermallingTarget circle) =>
        $"circle of radius {ConditionLines.Show(circle.RadiusM, units.Height, 0)}, {ConditionLines.Number(circle.CircleTimeS, 0)} s";

    private void AppendTarget(string name, in TargetSpeed target, string note)
    {
        if (!target.IsKnown)
        {
            _text.Append(CultureInfo.InvariantCulture, $"{name,-13}{"--",10}\n");
            return;
        }

        var point = new SinkCurvePoint(target.IndicatedAirspeedMps, target.EquivalentAirspeedMps, target.TrueAirspeedMps, target.SinkMps);
        var held = LimitNames.HeldAt(target.LimitedBy);
        AppendPoint(name, point, string.Join(", ", new[] { note, held }.Where(part => part.Length > 0)));
    }

    private string Zone(double indicatedMps) =>
        indicatedMps < curve.Limits.StallMarginMps ? "below the stall margin"
        : indicatedMps > curve.Limits.RoughAirMps ? "above rough air"
        : "";

    private string LimitsLine()
    {
        if (_conditions.Glider.Limits is null)
        {
            return "no limits in the glider file";
        }

        var limits = curve.Limits;
        return $"limits, indicated: stall margin {ConditionLines.Show(limits.StallMarginMps, units.Speed, 0)}, "
            + $"rough air {ConditionLines.Show(limits.RoughAirMps, units.Speed, 0)}, "
            + $"never exceed {ConditionLines.Show(limits.NeverExceedMps, units.Speed, 0)}";
    }
}
