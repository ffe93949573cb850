using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>What the pipeline promises to the service: no garbage, no exception, the same pictures for the same calls.</summary>
public sealed class SteadyStateTests
{
    private sealed class Counter : IPictureSink
    {
        public long Count { get; private set; }

        public long KnownCount { get; private set; }

        public void OnPicture(in CockpitPicture picture)
        {
            Count++;
            KnownCount += picture.HoldIndicatedMps.IsKnown ? 1 : 0;
        }
    }

    [Fact]
    public void ThousandsOfReadings_AllocateNothing()
    {
        var sink = new Counter();
        var pipeline = new FlightPipeline(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 2 }, sink);
        var stream = pipeline.AddStream("both", ChecksumRule.Required);
        // Values that differ as a sensor's do: those that stand still are taken for stuck, and half the pipeline would rest.
        var random = new Random(4);
        var lines = Enumerable.Range(0, 1000).Select(i => (i % 4) switch
        {
            0 => Cockpit.Sentence(FormattableString.Invariant($"P,{90_000 + 4 * random.NextDouble():F1},P,STATIC,C,{12 + 0.1 * random.NextDouble():F2},C,OAT")),
            1 => Cockpit.Sentence(FormattableString.Invariant($"P,{600 + 4 * random.NextDouble():F1},P,IMPACT,G,{1 + 0.02 * random.NextDouble():F3},,LOAD")),
            2 => Cockpit.Sentence("P,600.0,P,IMPACT")[..20],
            _ => [1, 2, 3],
        }).ToArray();
        var accepted = 0;
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 5_000; i++, accepted++)
            {
                pipeline.Accept(accepted * 10_000L, stream, lines[accepted % lines.Length]);
            }
        }));
        Assert.Equal(2499, sink.Count);
        Assert.InRange(sink.KnownCount, 2_000, sink.Count);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void SpoiltSentences_NeverThrow_AndTheSameOnesGiveTheSamePictures(int seed)
    {
        Assert.Equal(FlySpoilt(seed), FlySpoilt(seed));
    }

    /// <summary>Real sentences with random bytes changed and random values in them, at random times.</summary>
    private static List<CockpitPicture> FlySpoilt(int seed)
    {
        var random = new Random(seed);
        var cockpit = new Cockpit();
        string[] ids = ["P,{0},P,STATIC", "P,{0},P,IMPACT", "C,{0},C,OAT", "G,{0},,LOAD", "A,{0},D,BANK", "H,{0},P,RH", "G,{0},,IAS", "P,{0},B,TEPROBE"];
        var timeUs = 0L;
        for (var i = 0; i < 20_000; i++)
        {
            timeUs += random.Next(-5_000, 60_000);
            var value = Math.Round(Math.Exp(random.NextDouble() * 30 - 10) * (random.Next(4) == 0 ? -1 : 1), 3);
            var text = value.ToString("F3", System.Globalization.CultureInfo.InvariantCulture);
            var line = Cockpit.Sentence(ids[random.Next(ids.Length)].Replace("{0}", text, StringComparison.Ordinal));
            if (random.Next(3) == 0)
            {
                line[random.Next(line.Length)] = (byte)random.Next(256);
            }

            cockpit.Pipeline.Accept(timeUs, random.Next(2), line);
        }

        return cockpit.Pictures;
    }
}
