using System.Text;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Tests;

public class FlightSimulatorTests
{
    public static TheoryData<string> Bundled => new(BundledScenarios.Names);

    [Theory]
    [MemberData(nameof(Bundled))]
    public void Fly_BundledScenario_EndsAndSendsEverySensor(string name)
    {
        var result = ScenarioFile.Read(BundledScenarios.Find(name), name);
        Assert.Empty(result.Problems);
        var scenario = result.Scenario!;
        var flight = TestFlights.Fly(scenario, TestFlights.Bundled(scenario.GliderFile));
        Assert.Equal(scenario.Name, name);
        Assert.All(flight.Truth, truth => Assert.True(double.IsFinite(truth.EnergyHeightM + truth.ClimbMps + truth.AirMps)));
        Assert.Equal(scenario.Sensors.Select(sensor => sensor.Stream).Distinct().Order(), flight.Lines.Select(line => line.Stream).Distinct().Order());
        Assert.Equal(flight.Lines.Select(line => line.TimeUs).Order(), flight.Lines.Select(line => line.TimeUs));
    }

    [Fact]
    public void Fly_SameSeed_GivesTheSameBytesAndAnotherSeedDoesNot()
    {
        Assert.Equal(LogOf("demo", 3), LogOf("demo", 3));
        Assert.NotEqual(LogOf("demo", 3), LogOf("demo", 4));
    }

    [Fact]
    public void Fly_DemoSeed_GivesTheDemoLogInTheRepository()
    {
        var committed = File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "replay-logs", "demo.log"));
        Assert.Equal(Encoding.UTF8.GetString(committed).Split('\n'), Encoding.UTF8.GetString(LogOf("demo", 7)).Split('\n'));
    }

    [Fact]
    public void Fly_OneSensorLess_LeavesTheOthersAsTheyWere()
    {
        var scenario = ScenarioFile.Read(BundledScenarios.Find("demo"), "demo").Scenario!;
        var glider = TestFlights.Bundled(scenario.GliderFile);
        var all = TestFlights.Fly(scenario, glider).Lines.Where(line => line.Stream == "pitot");
        var less = TestFlights.Fly(scenario with { Sensors = [.. scenario.Sensors.Where(sensor => sensor.Stream == "pitot")] }, glider).Lines;
        Assert.Equal(all, less);
    }

    [Fact]
    public void Fly_OtherGrade_LeavesTheFlightItselfAsItWas()
    {
        var fine = ScenarioFile.Read(BundledScenarios.Find("demo"), "demo", SensorGrade.Fine).Scenario!;
        var poor = ScenarioFile.Read(BundledScenarios.Find("demo"), "demo", SensorGrade.Poor).Scenario!;
        var glider = TestFlights.Bundled(fine.GliderFile);
        Assert.Equal(TestFlights.Fly(fine, glider).Truth, TestFlights.Fly(poor, glider).Truth);
    }

    [Fact]
    public void TruthRecord_WrittenAndRead_IsTheSampleToItsDecimals()
    {
        var sample = new TruthSample(5, 1234.5678, 1200.123, 30.12345, 28.4567, -1.23456, 0.98765, 281.456, 1.2345, -0.7);
        Assert.True(TruthRecord.TryRead(5, TruthRecord.Write(sample), out var read));
        Assert.Equal(1234.568, read.HeightM, 1e-9);
        Assert.Equal(-1.2346, read.ClimbMps, 1e-9);
        Assert.Equal(281.46, read.TemperatureK, 1e-9);
        Assert.Equal(-0.7, read.BankRad, 1e-4);
        Assert.False(TruthRecord.TryRead(5, "{\"heightM\":12"u8, out _));
    }

    private static byte[] LogOf(string name, long seed)
    {
        var scenario = ScenarioFile.Read(BundledScenarios.Find(name), name).Scenario!;
        var simulator = new FlightSimulator(scenario, TestFlights.Bundled(scenario.GliderFile), seed);
        using var bytes = new MemoryStream();
        using var log = new FlightLogWriter(bytes, FlightRecording.HeaderOf(scenario, seed));
        simulator.Fly(new FlightRecording(log));
        log.WriteEnd(simulator.TimeUs);
        return bytes.ToArray();
    }
}
