using System.Text.Json;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Polars;

/// <summary>A sink curve as JSON: the members of a targets answer, the limits, the curve every 1 m/s, the residuals of sink tables.</summary>
internal static class PolarJson
{
    public static void WriteMembers(Utf8JsonWriter json, SinkCurve curve)
    {
        TargetsJson.WriteMembers(json, curve.Answer);
        json.WriteStartObject("limits");
        JsonNumbers.Write(json, "stallMarginIndicatedMps", curve.Limits.StallMarginMps);
        JsonNumbers.Write(json, "roughAirIndicatedMps", curve.Limits.RoughAirMps);
        JsonNumbers.Write(json, "neverExceedIndicatedMps", curve.Limits.NeverExceedMps);
        json.WriteEndObject();
        WriteCurve(json, curve);
        json.WriteStartArray("sinkTables");
        foreach (var (name, table) in ResidualTable.TablesOf(curve.Conditions.Glider.Polar))
        {
            json.WriteStartObject();
            json.WriteString("flapSetting", name.Length > 0 ? name : null);
            json.WriteBoolean("isConvex", table.IsConvex);
            WriteArray(json, "residualsMps", table.ResidualsMps);
            WriteArray(json, "dragPolarResidualsMps", ResidualTable.FitOf(table)?.ResidualsMps ?? []);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteCurve(Utf8JsonWriter json, SinkCurve curve)
    {
        var conditions = curve.Conditions;
        json.WriteStartArray("curve");
        foreach (var point in curve.Every(1))
        {
            json.WriteStartObject();
            JsonNumbers.Write(json, "indicatedAirspeedMps", point.IndicatedMps);
            JsonNumbers.Write(json, "equivalentAirspeedMps", point.EquivalentMps);
            JsonNumbers.Write(json, "trueAirspeedMps", point.TrueMps);
            JsonNumbers.Write(json, "sinkMps", point.SinkMps);
            JsonNumbers.Write(json, "glideRatio", point.GlideRatio);
            JsonNumbers.Write(json, "glideRatioOverGround", point.RatioOverGround(conditions.HeadwindMps, conditions.AirMps));
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteArray(Utf8JsonWriter json, string name, IReadOnlyList<double> values)
    {
        json.WriteStartArray(name);
        foreach (var value in values)
        {
            json.WriteNumberValue(value);
        }

        json.WriteEndArray();
    }
}
