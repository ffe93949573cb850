using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;
using Fault = SpeedCommand.Pipeline.Picture.Faults;

namespace SpeedCommand.Simulation.Tests;

/// <summary>Sound sensors of any grade, in any air, name no fault of health: a false alarm blanks a number the pilot needs.</summary>
public class FalseAlarmTests
{
    private const Fault Health = Fault.StaticBlocked | Fault.PitotBlocked | Fault.StaticStuck | Fault.AirspeedStuck
        | Fault.StaticJumps | Fault.AirspeedJumps | Fault.TemperatureJumps | Fault.LoadJumps | Fault.ProbeDoubtful
        | Fault.StaticDisagrees | Fault.AirspeedDisagrees | Fault.ThermometerDoubtful;

    public static TheoryData<string, SensorGrade> Flights
    {
        get
        {
            var flights = new TheoryData<string, SensorGrade>();
            foreach (var name in BundledScenarios.Names.Except(["sensor-faults"]))
            {
                flights.Add(name, SensorGrade.Fine);
                flights.Add(name, SensorGrade.Common);
                flights.Add(name, SensorGrade.Poor);
            }

            return flights;
        }
    }

    [Theory]
    [MemberData(nameof(Flights))]
    public void SoundSensors_NameNoFault(string name, SensorGrade grade)
    {
        var scenario = ScenarioFile.Read(BundledScenarios.Find(name), name, grade).Scenario!;
        var glider = TestFlights.Bundled(scenario.GliderFile);
        var pictures = new FaultSpans();
        var feed = new PipelineFeed(new FlightPipeline(new FlightSettings(glider) { MassKg = scenario.MassKg }, pictures));
        new FlightSimulator(scenario, glider, seed: 1 + (int)grade).Fly(feed);
        Assert.True(pictures.Seen.Count == 0, string.Join("; ", pictures.Seen));
        Assert.True(pictures.Count > 100);
    }

    private sealed class FaultSpans : IPictureSink
    {
        private Fault _before;

        public List<string> Seen { get; } = [];

        public int Count { get; private set; }

        public void OnPicture(in CockpitPicture picture)
        {
            Count++;
            var begun = picture.Faults & Health & ~_before;
            _before = picture.Faults & Health;
            if (begun != Fault.None)
            {
                Seen.Add($"{begun} at {picture.TimeS:F1} s");
            }
        }
    }

    private sealed class PipelineFeed(FlightPipeline pipeline) : ISimulatedFlightSink
    {
        private readonly List<string> _streams = [];

        public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
        {
            var name = Encoding.ASCII.GetString(stream);
            if (!_streams.Contains(name))
            {
                _streams.Add(name);
                pipeline.AddStream(name, ChecksumRule.Required);
            }

            pipeline.Accept(timeUs, _streams.IndexOf(name), line);
        }

        public void OnTruth(in Truth.TruthSample truth)
        {
        }
    }
}
