using BenchmarkDotNet.Attributes;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Benchmarks;

/// <summary>One frame of each display.</summary>
public class DisplayBenchmarks
{
    private readonly byte[] _frame = new byte[CharacterFrame.Of20x4.Length];
    private readonly CharacterText20x4 _characters = new(DisplayUnits.Metric);
    private readonly PanelStyle _style = new(80, 24, PanelLook.Colour, DisplayUnits.Metric);
    private CockpitPicture _picture;

    [GlobalSetup]
    public void Fly()
    {
        var newest = new NewestPicture();
        var pipeline = new FlightPipeline(BenchFlightData.Settings("marram-15.json"), newest);
        var stream = pipeline.AddStream("board", ChecksumRule.Required);
        for (var timeUs = 0; timeUs < 5_000_000; timeUs += 50_000)
        {
            pipeline.Accept(timeUs, stream, BenchFlightData.Static[timeUs / 50_000]);
            pipeline.Accept(timeUs, stream, BenchFlightData.Impact[timeUs / 50_000]);
        }

        _picture = newest.Picture;
    }

    [Benchmark(Description = "terminal panel, 80 x 24")]
    public string Terminal() => TerminalPanel.Render(_picture, _style);

    [Benchmark(Description = "four lines of 20 characters")]
    public int Characters() => _characters.Render(_picture, _frame);
}
