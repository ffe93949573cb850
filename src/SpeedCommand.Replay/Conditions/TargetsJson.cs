using System.Text.Json;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Conditions;

/// <summary>The three targets as JSON: SI numbers.</summary>
public static class TargetsJson
{
    /// <summary>Writes the members "air", "minSink", "bestGlide" and "speedToFly" into an open object.</summary>
    /// <param name="json">Where to.</param>
    /// <param name="answer">The targets.</param>
    public static void WriteMembers(Utf8JsonWriter json, TargetsAnswer answer)
    {
        ArgumentNullException.ThrowIfNull(json);
        ArgumentNullException.ThrowIfNull(answer);
        WriteAir(json, answer.Conditions.Air);
        WriteSpeed(json, "minSink", answer.MinSink, static (_, _) => { }, answer);
        WriteSpeed(json, "bestGlide", answer.BestGlide.Speed,
            static (json, answer) => JsonNumbers.Write(json, "glideRatio", answer.BestGlide.GlideRatio), answer);
        WriteSpeed(json, "speedToFly", answer.SpeedToFly.Speed, static (json, answer) =>
        {
            JsonNumbers.Write(json, "averageSpeedMps", answer.SpeedToFly.AverageSpeedMps);
            json.WriteString("limitedBy", LimitWords.Of(answer.SpeedToFly.LimitedBy));
        }, answer);
    }

    private static void WriteAir(Utf8JsonWriter json, in Air air)
    {
        json.WriteStartObject("air");
        JsonNumbers.Write(json, "pressureAltitudeM", air.PressureAltitudeM);
        JsonNumbers.Write(json, "pressurePa", air.PressurePa);
        JsonNumbers.Write(json, "temperatureC", air.TemperatureK - 273.15);
        json.WriteString("temperatureSource", air.TemperatureSource == TemperatureSource.Measured ? "measured" : "standard");
        JsonNumbers.Write(json, "densityKgPerM3", air.DensityKgPerM3);
        JsonNumbers.Write(json, "densityAltitudeM", air.DensityAltitudeM);
        json.WriteEndObject();
    }

    private static void WriteSpeed(Utf8JsonWriter json, string name, in TargetSpeed speed, Action<Utf8JsonWriter, TargetsAnswer> rest, TargetsAnswer answer)
    {
        if (!speed.IsKnown)
        {
            json.WriteNull(name);
            return;
        }

        json.WriteStartObject(name);
        JsonNumbers.Write(json, "liftCoefficient", speed.LiftCoefficient);
        JsonNumbers.Write(json, "trueAirspeedMps", speed.TrueAirspeedMps);
        JsonNumbers.Write(json, "equivalentAirspeedMps", speed.EquivalentAirspeedMps);
        JsonNumbers.Write(json, "indicatedAirspeedMps", speed.IndicatedAirspeedMps);
        JsonNumbers.Write(json, "sinkMps", speed.SinkMps);
        rest(json, answer);
        json.WriteEndObject();
    }
}
