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

    /// <summary>Its indicator reads 100 km/h where the calibrated airspeed is 103 km/h.</summary>
    public static Glider WithPositionError { get; } = Read(Limits + """
        , "airspeedCorrection": [ { "indicated": "60 km/h", "calibrated": "61.8 km/h" }, { "indicated": "200 km/h", "calibrated": "206 km/h" } ]
        """);

    private static Glider Read(string limits)
    {
        var json = $$"""
            { "name": "Test 15", "wingArea": "11.2 m²", "referenceMass": "340 kg", "emptyMass": "235 kg", "maxMass": "450 kg",
              "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215, "clMax": 1.45 } {{limits}} }
            """;
        return GliderFile.Read(Encoding.UTF8.GetBytes(json), "test.json").Glider!;
    }
}
