using System.Globalization;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>Reads scenario files; docs/simulator.md describes every key.</summary>
public static class ScenarioFile
{
    /// <summary>The simulator's step, microseconds; the spacing of truth records is a multiple of it.</summary>
    public const long StepUs = 10_000;

    /// <summary>Reads a scenario.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <param name="fileName">Its name, for messages.</param>
    /// <param name="grade">Sensor grade that replaces the file's own; null to leave it.</param>
    /// <returns>The scenario or every fault with key and line.</returns>
    public static ScenarioFileResult Read(ReadOnlySpan<byte> utf8, string fileName, SensorGrade? grade = null)
    {
        var problems = new List<JsonProblem>();
        if (!JsonPlaces.TryParse(utf8, fileName, out var top, out var problem))
        {
            return new ScenarioFileResult(null, [problem]);
        }

        if (top.Kind != JsonPlaceKind.Object)
        {
            return new ScenarioFileResult(null, [new JsonProblem(fileName, top.Line, "", $"expected an object, found '{top.Text}'")]);
        }

        var scenario = Read(new JsonFields(top, fileName, problems), grade, problems);
        return new ScenarioFileResult(scenario, problems);
    }

    private static Scenario? Read(JsonFields fields, SensorGrade? grade, List<JsonProblem> problems)
    {
        var usedGrade = fields.Word("grade", SensorGrade.Common, ScenarioSensors.Grades);
        usedGrade = grade ?? usedGrade;
        var name = fields.Text("name");
        var start = ReadStart(fields);
        var glider = fields.Text("glider");
        var mass = fields.Quantity("mass", QuantityKind.Mass, least: 1);
        var height = fields.Quantity("height", QuantityKind.Length);
        var truthEvery = fields.Quantity("truthEvery", QuantityKind.Duration, 0.1, 0.01);
        var laps = fields.Number("laps", 1);
        var humidity = double.NaN;
        var air = ScenarioAir.ReadAtmosphere(fields.Object("atmosphere"), problems, ref humidity);
        var wind = ScenarioAir.ReadWind(fields.Objects("wind"));
        var (vertical, turbulence) = ScenarioAir.ReadMotion(fields.Object("air"));
        var pilot = ScenarioPlan.ReadPilot(fields.Object("pilot"));
        var plan = ScenarioPlan.ReadLegs(fields);
        var sensors = ScenarioSensors.Read(fields, usedGrade);
        var gnss = ScenarioGnss.Read(fields);
        fields.RejectUnknown();
        return problems.Count > 0 || air is null ? null : new Scenario
        {
            Name = name,
            StartUtc = start,
            GliderFile = glider,
            MassKg = mass,
            Air = air,
            RelativeHumidity = humidity,
            Wind = wind,
            Vertical = vertical,
            Turbulence = turbulence,
            StartHeightM = height,
            Pilot = pilot,
            Plan = plan,
            Laps = Math.Max(1, (int)laps),
            TruthEveryUs = Math.Max(1, (long)Math.Round(truthEvery * 1e6 / StepUs)) * StepUs,
            Grade = usedGrade,
            Sensors = sensors,
            Gnss = gnss,
        };
    }

    private static DateTimeOffset ReadStart(JsonFields fields)
    {
        const string Format = "yyyy-MM-dd'T'HH:mm:ss'Z'";
        var text = fields.Text("start", "2026-06-14T10:00:00Z");
        if (DateTimeOffset.TryParseExact(text, Format, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out var start))
        {
            return start;
        }

        fields.Problem($"start: expected a time like 2026-06-14T10:00:00Z, found '{text}'");
        return default;
    }
}
