using SpeedCommand.Pipeline.SampleTimes;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.Tests.SampleTimes;

/// <summary>How a line delays what a board sends. Times in microseconds.</summary>
/// <param name="PeriodUs">Time between two samples by the board's clock.</param>
/// <param name="ClockError">How much that clock runs slow: 200e-6 is 200 parts per million.</param>
/// <param name="LatencyTimerUs">What has arrived is handed over on multiples of this, as a USB serial converter does; 0 for at once.</param>
/// <param name="SchedulingUs">Mean of the exponential delay by a busy machine.</param>
/// <param name="StallEvery">One line in so many is held up by another 30 ms; 0 for none.</param>
/// <param name="LostShare">Share of lines that get lost.</param>
/// <param name="Baud">Speed of the line; 0 for one that takes no time.</param>
internal sealed record JitteryLine(
    double PeriodUs, double ClockError = 0, double LatencyTimerUs = 0, double SchedulingUs = 0, int StallEvery = 0, double LostShare = 0, int Baud = 0)
{
    private const int LineBytes = 30;

    public long TransmissionUs => Baud == 0 ? 0 : LineBytes * 10_000_000L / Baud;

    /// <summary>Sample moments with the arrivals that follow from them; arrivals never run back.</summary>
    public IEnumerable<(double SampleUs, long ArrivalUs, long Number)> Lines(int seed, double seconds)
    {
        var random = new Random(seed);
        var phaseUs = random.NextDouble() * PeriodUs;
        var timerPhaseUs = random.NextDouble() * LatencyTimerUs;
        var newestUs = 0L;
        for (var number = 0L; ; number++)
        {
            var sampleUs = phaseUs + number * PeriodUs * (1 + ClockError);
            if (sampleUs > seconds * 1e6)
            {
                yield break;
            }

            var arrivalUs = sampleUs + TransmissionUs;
            if (LatencyTimerUs > 0)
            {
                arrivalUs = timerPhaseUs + Math.Ceiling((arrivalUs - timerPhaseUs) / LatencyTimerUs) * LatencyTimerUs;
            }

            arrivalUs += -SchedulingUs * Math.Log(1 - random.NextDouble());
            arrivalUs += StallEvery > 0 && random.Next(StallEvery) == 0 ? 30_000 : 0;
            var isLost = random.NextDouble() < LostShare;
            newestUs = Math.Max(newestUs, (long)Math.Ceiling(arrivalUs));
            if (!isLost)
            {
                yield return (sampleUs, newestUs, number);
            }
        }
    }

    /// <summary>
    /// Stamp minus sample moment of each line from some second on, before the correction and after it; and the share of lines for
    /// which the clock was settled. Lost lines come as bad ones when they are garbled.
    /// </summary>
    public (List<double> BeforeUs, List<double> AfterUs, double SettledShare) Errors(
        int seed, double fromS, double seconds, SampleMarkKind mark = SampleMarkKind.None, bool isGarbling = false)
    {
        var clock = new SampleClock(new SampleMark(mark, double.NaN));
        List<double> before = [], after = [];
        var settled = 0;
        var last = long.MinValue;
        var received = 0L;
        foreach (var (sampleUs, arrivalUs, number) in Lines(seed, seconds))
        {
            received++;
            var own = mark switch
            {
                SampleMarkKind.Counter => number,
                SampleMarkKind.Time => Math.Round(number * PeriodUs),
                _ => double.NaN,
            };
            var stampUs = clock.StampOf(arrivalUs, TransmissionUs, own, isGarbling ? number + 1 - received : 0);
            Assert.InRange(stampUs, last, arrivalUs);
            last = stampUs;
            if (sampleUs >= fromS * 1e6)
            {
                before.Add(arrivalUs - sampleUs);
                after.Add(stampUs - sampleUs);
                settled += clock.IsSettled ? 1 : 0;
            }
        }

        return (before, after, (double)settled / after.Count);
    }
}
