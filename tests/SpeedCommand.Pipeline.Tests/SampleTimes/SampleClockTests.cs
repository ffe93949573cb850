using SpeedCommand.Estimation.Energy;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Pipeline.SampleTimes;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.Tests.SampleTimes;

/// <summary>What a sample clock promises besides alignment: nothing where nothing is to be done, and starting over in time.</summary>
public sealed class SampleClockTests
{
    private static readonly JitteryLine Bunched = new(20_000, 200e-6, 16_000, 500);

    [Theory]
    [InlineData(10_000)]
    [InlineData(20_000)]
    [InlineData(50_000)]
    [InlineData(31_250)]
    public void RegularLines_KeepTheirArrival(long periodUs)
    {
        var clock = new SampleClock(SampleMark.None);
        for (var arrivalUs = 7L; arrivalUs < 60_000_000; arrivalUs += periodUs)
        {
            Assert.Equal(arrivalUs, clock.StampOf(arrivalUs, 0, double.NaN, 0));
        }

        Assert.True(clock.IsSettled);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(2_000.0)]
    public void IrregularOrSlowLines_LoseTheTransmissionOnly(double leastUs)
    {
        // Exponential gaps of 50 ms on average, or 2 s and more.
        var random = new Random(11);
        var clock = new SampleClock(SampleMark.None);
        var arrivalUs = 0L;
        int lines = 0, untouched = 0;
        for (; lines < 4_000; lines++)
        {
            arrivalUs += (long)(leastUs * 1000 - 50_000 * Math.Log(1 - random.NextDouble()));
            untouched += clock.StampOf(arrivalUs, 2_604, double.NaN, 0) == arrivalUs - 2_604 ? 1 : 0;
        }

        Assert.True(untouched >= (leastUs > 0 ? lines : lines * 0.98), $"{untouched} of {lines}");
    }

    /// <summary>Ten seconds after any of these the stamps are as good as ever; before, they are never worse than the arrivals.</summary>
    [Theory]
    [InlineData(50_000, 0, 0)]
    [InlineData(10_000, 0, 0)]
    [InlineData(20_000, 3_000_000, 0)]
    [InlineData(20_000, 400_000, 0)]
    [InlineData(20_000, 0, 9_000)]
    public void RateChangesDropOutsAndSteps_AreSurvived(double nextPeriodUs, long silenceUs, long stepUs)
    {
        var clock = new SampleClock(SampleMark.None);
        var lastUs = 0L;
        foreach (var (_, arrivalUs, _) in Bunched.Lines(3, 30))
        {
            lastUs = clock.StampOf(arrivalUs, 0, double.NaN, 0);
        }

        Assert.True(clock.IsSettled);
        var fromUs = 30_000_000 + silenceUs + stepUs;
        List<double> late = [];
        foreach (var (sampleUs, arrivalUs, _) in (Bunched with { PeriodUs = nextPeriodUs }).Lines(4, 40))
        {
            var stampUs = clock.StampOf(fromUs + arrivalUs, 0, double.NaN, 0);
            Assert.InRange(stampUs, lastUs, fromUs + arrivalUs);
            lastUs = stampUs;
            if (sampleUs > 10e6)
            {
                late.Add(stampUs - fromUs - sampleUs);
            }
        }

        Assert.True(clock.IsSettled);
        Assert.InRange(Math.Sqrt(late.Average(one => one * one)), 0, 3_000);
    }

    [Fact]
    public void CounterThatTurnsOver_CountsOn()
    {
        var plain = new SampleClock(new SampleMark(SampleMarkKind.Counter, double.NaN));
        var turning = new SampleClock(new SampleMark(SampleMarkKind.Counter, 256));
        foreach (var (_, arrivalUs, number) in (Bunched with { LostShare = 0.1 }).Lines(5, 60))
        {
            Assert.Equal(plain.StampOf(arrivalUs, 0, number, 0), turning.StampOf(arrivalUs, 0, number % 256, 0));
        }

        Assert.True(turning.IsSettled);
    }

    [Fact]
    public void CounterThatStartsAgain_StartsTheClockOver()
    {
        var clock = new SampleClock(new SampleMark(SampleMarkKind.Counter, double.NaN));
        foreach (var (_, arrivalUs, number) in Bunched.Lines(5, 20))
        {
            clock.StampOf(arrivalUs, 0, number, 0);
        }

        Assert.True(clock.IsSettled);
        clock.StampOf(20_100_000, 0, 0, 0);
        Assert.False(clock.IsSettled);
    }

    [Fact]
    public void ClockThatStandsStill_NeverTakesOutMoreThanAQuarterOfASecond()
    {
        var clock = new SampleClock(new SampleMark(SampleMarkKind.Time, double.NaN));
        for (var arrivalUs = 0L; arrivalUs < 40_000_000; arrivalUs += 20_000)
        {
            var stampUs = clock.StampOf(arrivalUs, 0, Math.Min(arrivalUs, 20_000_000), 0);
            Assert.InRange(arrivalUs - stampUs, 0, 250_000);
        }
    }

    [Fact]
    public void Estimator_GetsSampleTimes_AndAgesCountFromTheArrival()
    {
        var estimator = new StampCollector();
        var pictures = new LastPicture();
        var pipeline = new FlightPipeline(new FlightSettings(TestGliders.WithLimits), pictures, estimator);
        var stream = pipeline.AddStream("both", new StreamSettings(new SentenceFormat(ChecksumRule.Required), 9_600));
        var line = Cockpit.Sentence("P,90000.0,P,STATIC,P,600.0,P,IMPACT");
        pipeline.Accept(950_000, stream, line);
        pipeline.AdvanceTo(1_000_000);
        // Sent as start bit, eight bits and stop bit, with CR and LF.
        var expectedUs = 950_000 - (line.Length + 2) * 10_000_000L / 9_600;
        Assert.Equal([expectedUs, expectedUs], estimator.StampsUs);
        Assert.Equal(0.05, pictures.Last.PressureAltitudeM.AgeS, 6);
    }

    private sealed class LastPicture : IPictureSink
    {
        public CockpitPicture Last { get; private set; }

        public void OnPicture(in CockpitPicture picture) => Last = picture;
    }

    private sealed class StampCollector : IEnergyEstimator
    {
        public List<long> StampsUs { get; } = [];

        public void Reset() => StampsUs.Clear();

        public void AddHeight(long timeUs, double heightM) => StampsUs.Add(timeUs);

        public void AddKineticHeight(long timeUs, double kineticHeightM) => StampsUs.Add(timeUs);

        public EnergyEstimate EstimateAt(long timeUs) => EnergyEstimate.Unknown;
    }
}
