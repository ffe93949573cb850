using System.Text.Json;
using SpeedCommand.Flight.UncertainClimbs;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.ClimbPlans;

/// <summary>A plan for uncertain climbs as JSON: SI numbers, every step from the ground up.</summary>
internal static class PlanJson
{
    public static void WriteMembers(Utf8JsonWriter json, ClimbPlan plan)
    {
        JsonNumbers.Write(json, "averageSpeedMps", plan.AverageSpeedMps);
        json.WriteStartArray("steps");
        foreach (var step in plan.Steps)
        {
            json.WriteStartObject();
            JsonNumbers.Write(json, "heightM", step.HeightM);
            JsonNumbers.Write(json, "speedToFlyIndicatedMps", step.Speed.IsKnown ? step.Speed.IndicatedAirspeedMps : double.NaN);
            JsonNumbers.Write(json, "settingMps", step.SettingMps);
            JsonNumbers.Write(json, "weakestClimbMps", step.WeakestClimbMps);
            JsonNumbers.Write(json, "landingProbability", step.LandingProbability);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }
}
