using System.Text;
using SpeedCommand.Flight.Gliders;

namespace SpeedCommand.Pipeline.Tests;

internal static class TestGliders
{
    private const string Limits = """
        , "limits": { "stall": "66 km/h", "roughAir": "180 km/h", "neverExceed": [ { "upTo": "6000 m", "airspeed": "250 km/h" } ] }
        """;

    public static Glider WithLimits { get; } = Read(Limits);

    public static Glider WithoutLimits { get; } = Read("");

    private static Glider Read(string limits)
    {
        var json = $$"""
            { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "emptyMass": "235 kg", "maxMass": "450 kg",
              "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } {{limits}} }
            """;
        return GliderFile.Read(Encoding.UTF8.GetBytes(json), "test.json").Glider!;
    }
}
