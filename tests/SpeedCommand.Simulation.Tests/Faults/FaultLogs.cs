using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Faults;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Tests.Faults;

/// <summary>The logs of replay-logs/faults: how they are made, and what a pilot sees on them.</summary>
internal static class FaultLogs
{
    public const string ScenarioName = "fault-glide";
    public const long Seed = 1;

    private static readonly Glider Marram = TestFlights.Bundled("marram-15.json");

    public static string PathOf(string plan) => Path.Combine(AppContext.BaseDirectory, "replay-logs", "faults", plan + ".log");

    /// <summary>The good flight, as the simulate command writes it.</summary>
    public static byte[] Good { get; } = Simulate();

    public static byte[] Spoil(string planName)
    {
        var plan = FaultPlanFile.Read(BundledFaultPlans.Find(planName)!, planName).Plan!;
        using var log = FlightLogReader.Open(new MemoryStream(Good));
        var bytes = new MemoryStream();
        using (var output = new FlightLogWriter(bytes, SpoiltLog.HeaderOf(log.Header, plan, Seed)))
        {
            SpoiltLog.Write(log, plan, Seed, output);
        }

        return bytes.ToArray();
    }

    public static List<CockpitPicture> Watch(Stream log)
    {
        var pilot = new Pilot();
        using var records = FlightLogReader.Open(log);
        new FlightReplay(records, new FlightPipeline(new FlightSettings(Marram), pilot), _ => StreamSettings.Sentences(ChecksumRule.Required)).RunToEnd();
        Assert.Empty(records.Problems);
        return pilot.Pictures;
    }

    private static byte[] Simulate()
    {
        var scenario = ScenarioFile.Read(BundledScenarios.Find(ScenarioName)!, ScenarioName).Scenario!;
        var bytes = new MemoryStream();
        using (var log = new FlightLogWriter(bytes, FlightRecording.HeaderOf(scenario, Seed)))
        {
            var simulator = new FlightSimulator(scenario, Marram, Seed);
            simulator.Fly(new FlightRecording(log));
            log.WriteEnd(simulator.TimeUs);
        }

        return bytes.ToArray();
    }

    private sealed class Pilot : IPictureSink
    {
        public List<CockpitPicture> Pictures { get; } = [];

        public void OnPicture(in CockpitPicture picture) => Pictures.Add(picture);
    }
}
