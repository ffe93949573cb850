using System.Text;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

internal static class TestSettings
{
    private const string Json = """
        { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg",
          "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 },
          "limits": { "stall": "66 km/h", "roughAir": "180 km/h", "neverExceed": [ { "upTo": "6000 m", "airspeed": "250 km/h" } ] } }
        """;

    public static FlightSettings Flight { get; } = new(GliderFile.Read(Encoding.UTF8.GetBytes(Json), "test.json").Glider!);

    public static CockpitSettings For(string? recordIn, SerialTextSettings? serialText = null, params PortSettings[] ports) => new(
        Flight, "test-15.json", ports, DisplayUnits.Metric, IsTerminalOn: false, serialText,
        recordIn is null ? null : new RecorderOptions(recordIn), Path.Combine(recordIn ?? Path.GetTempPath(), "service.log"));
}
