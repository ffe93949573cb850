using System.Text;
using System.Text.Json;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Desk.Commands;

/// <summary>The score as JSON: a list of objects, numbers unrounded, what is not known null.</summary>
internal static class ScoreJson
{
    public static string Of(IEnumerable<ScoreRow> rows)
    {
        using var bytes = new MemoryStream();
        using (var json = new Utf8JsonWriter(bytes, new JsonWriterOptions { Indented = true }))
        {
            json.WriteStartArray();
            foreach (var row in rows)
            {
                Write(json, row);
            }

            json.WriteEndArray();
        }

        return Encoding.UTF8.GetString(bytes.ToArray()) + "\n";
    }

    private static void Write(Utf8JsonWriter json, ScoreRow row)
    {
        json.WriteStartObject();
        json.WriteString("flight", row.Flight);
        json.WriteString("grade", row.Grade);
        json.WriteString("estimator", row.Estimator);
        Number(json, "rmsMps", row.Climb.RmsMps);
        Number(json, "boundMps", row.BoundMps);
        Number(json, "biasMps", row.Climb.BiasMps);
        Number(json, "lagS", row.Climb.LagS);
        Number(json, "within1Sigma", row.Climb.Within1);
        Number(json, "within2Sigma", row.Climb.Within2);
        Number(json, "errorOverSigmaSquared", row.Climb.ErrorOverSigma2);
        Number(json, "innovationSquared", row.Climb.InnovationSquared);
        Number(json, "blankShare", row.Climb.BlankShare);
        Number(json, "falseClimbMps", row.Response.FalseClimbMps);
        Number(json, "riseS", row.Response.RiseS);
        Number(json, "overshootShare", row.Response.OvershootShare);
        Number(json, "nettoBiasMps", row.NettoBiasMps);
        json.WriteEndObject();
    }

    private static void Number(Utf8JsonWriter json, string name, double value)
    {
        if (double.IsFinite(value))
        {
            json.WriteNumber(name, value);
        }
        else
        {
            json.WriteNull(name);
        }
    }
}
