using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Tests;

internal static class TestFlights
{
    /// <summary>The reference glider of the sink checks: 340 kg, 11.2 m², CD = 0.0115 - 0.002 CL + 0.0215 CL².</summary>
    public static Glider ReferenceGlider { get; } = new()
    {
        Name = "Reference",
        Polar = new DragPolar(11.2, 340, 0.0115, -0.002, 0.0215),
        Limits = new GliderLimits(18, double.NaN, [new NeverExceedStep(9000, 70)]),
    };

    public static Scenario Read(string members)
    {
        var json = $$"""{ "name": "test", "glider": "none.json", "mass": "340 kg", {{members}} }""";
        var result = ScenarioFile.Read(Encoding.UTF8.GetBytes(json), "test.json");
        return result.Scenario ?? throw new InvalidOperationException(string.Join("\n", result.Problems));
    }

    public static RecordedFlight Fly(Scenario scenario, Glider glider, long seed = 1)
    {
        var flight = new RecordedFlight();
        new FlightSimulator(scenario, glider, seed).Fly(flight);
        return flight;
    }

    public static Glider Bundled(string file) =>
        GliderFile.Read(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "gliders", file)), file).Glider!;
}

internal sealed class RecordedFlight : ISimulatedFlightSink
{
    public List<(long TimeUs, string Stream, string Line)> Lines { get; } = [];

    public List<TruthSample> Truth { get; } = [];

    public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line) =>
        Lines.Add((timeUs, Encoding.ASCII.GetString(stream), Encoding.Latin1.GetString(line)));

    public void OnTruth(in TruthSample truth) => Truth.Add(truth);
}
