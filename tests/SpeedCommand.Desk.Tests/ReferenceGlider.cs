using System.Text.Json;

namespace SpeedCommand.Desk.Tests;

/// <summary>
/// An invented glider (340 kg, 11.2 m², CD0 0.0115, K1 -0.002, K2 0.0215, limits too wide to matter) for which the expected values
/// beside the checks were worked out independently, with scipy, from the textbook formulas.
/// </summary>
public sealed class ReferenceGlider : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;

    public ReferenceGlider() => File.WriteAllText(GliderFile, """
        { "name": "Reference", "wingArea": "11.2 m2", "referenceMass": "340 kg", "maxMass": "450 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215 },
          "limits": { "stall": "36 km/h", "neverExceed": [ { "upTo": "15000 m", "airspeed": "300 km/h" } ] } }
        """);

    public string GliderFile => PathOf("reference.json");

    public string PathOf(string name) => Path.Combine(_folder, name);

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    public string Text(string command, params string[] options)
    {
        var (status, output, errors) = DeskConsole.RunToText([command, "--glider", GliderFile, .. options]);
        Assert.Equal((0, ""), (status, errors));
        return output;
    }

    public JsonElement Json(string command, params string[] options) =>
        JsonDocument.Parse(Text(command, [.. options, "--json"])).RootElement;
}
