using System.Globalization;
using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Tests;

public class SensorChannelTests
{
    private static readonly SensorSpec Quiet = new(ReadingKind.StaticPressurePa, "static", 0.05, 0);

    [Fact]
    public void Advance_NoiseBiasQuantum_AreThere()
    {
        var spec = Quiet with { Noise = 2, Bias = 40, Quantum = 1 };
        var values = Values(spec, 2000, _ => 90_000);
        var mean = values.Average();
        var variance = values.Average(value => (value - mean) * (value - mean));
        Assert.All(values, value => Assert.Equal(0, value % 1));
        // A quantum adds q²/12 of variance (Bennett); five standard errors over 40,000 samples.
        Assert.Equal(90_040, mean, 5 * 2 / Math.Sqrt(values.Count));
        Assert.Equal(4 + 1.0 / 12, variance, 4.1 * 5 * Math.Sqrt(2.0 / values.Count));
    }

    [Fact]
    public void Advance_Lag_StepReaches63PercentAtItsTimeConstantAndRampStaysBehind()
    {
        // First order: 63.212 % after one time constant, and a ramp followed at slope times lag behind.
        var step = Values(Quiet with { LagS = 0.4, EveryS = 0.01, Quantum = 0.001 }, 2, t => t > 0 ? 1000 : 0);
        var start = step.FindIndex(value => value > 0);
        Assert.Equal(632.12, step[start + 40], 5.0);
        var ramp = Values(Quiet with { LagS = 0.4, EveryS = 1, Quantum = 0.001 }, 30, t => 100 * t);
        Assert.Equal(100, ramp[^1] - ramp[^2], 0.01);
        var onTime = Values(Quiet with { EveryS = 1, Quantum = 0.001 }, 30, t => 100 * t);
        Assert.Equal(40, onTime[^1] - ramp[^1], 0.01);
    }

    [Fact]
    public void Advance_SlowClock_SendsFewerSamples()
    {
        Assert.Equal(20_000, Values(Quiet, 1000, _ => 1).Count, 1.0);
        Assert.Equal(19_802, Values(Quiet with { ClockError = 0.01 }, 1000, _ => 1).Count, 1.0);
    }

    [Fact]
    public void Advance_Troubles_AreSilentStuckOrGarbledInTheirTime()
    {
        var spec = Quiet with
        {
            Quantum = 0.1,
            Troubles = [new(SensorTroubleKind.Silent, 10, 4), new(SensorTroubleKind.Stuck, 20, 4), new(SensorTroubleKind.Garbled, 30, 4)],
        };
        var lines = Lines(spec, 40, t => 90_000 + t);
        Assert.DoesNotContain(lines, line => line.TimeUs is > 10_000_000 and < 14_000_000);
        Assert.Single(lines.Where(line => line.TimeUs is > 20_000_000 and < 24_000_000).Select(line => line.Line).Distinct());
        var garbled = lines.Where(line => line.TimeUs is > 30_000_000 and < 34_000_000).ToList();
        Assert.InRange(garbled.Count, 78, 82);
        Assert.All(garbled, line => Assert.NotEqual(SentenceFault.None,
            SentenceReader.TryRead(Encoding.Latin1.GetBytes(line.Line), ChecksumRule.Required, out _)));
        Assert.Equal(720, lines.Count, 1.0);
    }

    [Fact]
    public void Advance_Jitter_StampsNeverRunBackwardsNorAheadOfTheSample()
    {
        var stamps = Lines(Quiet with { JitterS = 0.03 }, 200, _ => 1).ConvertAll(line => line.TimeUs);
        Assert.Equal(stamps.Order(), stamps);
        var onTime = Lines(Quiet, 200, _ => 1).ConvertAll(line => line.TimeUs);
        var late = stamps.Zip(onTime, (a, b) => (a - b) / 1e6).ToList();
        Assert.All(late, delay => Assert.True(delay >= 0));
        // Mean of a folded normal: sigma sqrt(2/pi); holding the order adds a little.
        Assert.InRange(late.Average(), 0.03 * Math.Sqrt(2 / Math.PI) - 0.001, 0.03 * Math.Sqrt(2 / Math.PI) + 0.004);
    }

    private static List<double> Values(SensorSpec spec, double forS, Func<double, double> quantity) =>
        Lines(spec, forS, quantity).ConvertAll(line => double.Parse(line.Line.Split(',')[2], CultureInfo.InvariantCulture));

    private static List<(long TimeUs, string Stream, string Line)> Lines(SensorSpec spec, double forS, Func<double, double> quantity)
    {
        var channel = new SensorChannel(spec, 5);
        var queue = new LinesInOrder();
        var flight = new RecordedFlight();
        for (var i = 0; i < forS * 100; i++)
        {
            channel.Advance(i / 100.0, (i + 1) / 100.0, quantity(i / 100.0), quantity((i + 1) / 100.0), queue);
        }

        queue.ReleaseUntil(long.MaxValue, flight);
        return flight.Lines;
    }
}
