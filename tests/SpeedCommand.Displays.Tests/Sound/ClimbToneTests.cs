using System.Globalization;
using SpeedCommand.Displays.Sound;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>What is heard is what docs/sound.md says, measured from the WAV file.</summary>
public class ClimbToneTests
{
    /// <summary>The rows of the document's table but that of still air, which is silent: climb, pitch, pulses a second (0 for none).</summary>
    public static TheoryData<double, double, double> Documented
    {
        get
        {
            var rows = new TheoryData<double, double, double>();
            var table = File.ReadLines(Path.Combine(AppContext.BaseDirectory, "sound.md"))
                .SkipWhile(line => !line.StartsWith("| v, m/s |", StringComparison.Ordinal)).Skip(2)
                .TakeWhile(line => line.StartsWith('|'));
            foreach (var cells in table.Select(line => line.Split('|', StringSplitOptions.TrimEntries)).Where(cells => cells[1] != "0"))
            {
                rows.Add(Number(cells[1]), Number(cells[2]), cells[3] == "none" ? 0 : Number(cells[3]));
            }

            return rows;

            static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
        }
    }

    [Fact]
    public void Document_NamesTenClimbs() => Assert.Equal(10, Documented.Count);

    [Theory]
    [MemberData(nameof(Documented))]
    public void PitchAndCadence_AreTheDocumentsOwn(double climbMps, double pitchHz, double cadenceHz)
    {
        var samples = Samples.Of(SoundStyle.Standard, Flown.Climb(climbMps).For(5));
        Assert.InRange(Samples.StrongestHz(samples.AsSpan(Samples.RateHz / 2, Samples.RateHz)) / pitchHz, 0.99, 1.01);
        var bursts = Samples.Bursts(samples);
        if (cadenceHz == 0)
        {
            Assert.Single(bursts);
            return;
        }

        var lastS = (double)(bursts[^1].Begin - bursts[0].Begin) / Samples.RateHz;
        Assert.InRange((bursts.Count - 1) / lastS / cadenceHz, 0.99, 1.01);
        // Half of each period, longer by the ramps of 10 ms.
        Assert.InRange((bursts[1].End - bursts[1].Begin) * cadenceHz / Samples.RateHz, 0.45, 0.58);
    }

    [Fact]
    public void Hoarse_IsHeardAsFlutter_AndClearIsNot()
    {
        Assert.True(Depth(0.6) > 2 * Depth(0.4), "a doubtful climb sounds like a sure one");

        // How far the loudness swings within a tone without a break, from 10 ms to 10 ms.
        static double Depth(double sigmaMps)
        {
            var samples = Samples.Of(SoundStyle.Standard, Flown.Climb(-3, sigmaMps).For(2));
            var peaks = samples.Skip(Samples.RateHz).Chunk(Samples.RateHz / 100).Select(chunk => chunk.Max(Math.Abs)).ToList();
            return (peaks.Max() - peaks.Min()) / peaks.Max();
        }
    }
}
