using CsCheck;
using SpeedCommand.Displays.Sound;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>No order, in any order, makes a click or an allocation.</summary>
public class SynthesizerTests
{
    private static readonly Gen<(SoundOrder Order, double Gain, int Length)> AnyStep =
        from climb in Gen.Double[-15, 15]
        from isSilent in Gen.Frequency((2, Gen.Const(false)), (1, Gen.Const(true)))
        from isHoarse in Gen.Bool
        from cue in Gen.Frequency((6, Gen.Const(SoundCue.None)), (1, Gen.Enum<SoundCue>()))
        from gain in Gen.OneOf(Gen.Const(1.0), Gen.Const(0.0), Gen.Const(0.5))
        from length in Gen.Int[1, 4000]
        select ((isSilent ? SoundOrder.Silence : new SoundOrder(ClimbTone.FrequencyHz(climb), ClimbTone.CadenceHz(climb), isHoarse, cue)) with { Cue = cue }, gain, length);

    private static double[] Render(IEnumerable<(SoundOrder Order, double Gain, int Length)> steps)
    {
        var synthesizer = new Synthesizer();
        return [.. steps.SelectMany(step =>
        {
            var samples = new short[step.Length];
            synthesizer.Render(step.Order, step.Gain, samples);
            return samples;
        }).Select(sample => sample / 32768.0)];
    }

    /// <summary>-40 dB of full scale.</summary>
    [Fact]
    public void Changes_DoNotClick() => AnyStep.Array[12].Sample(steps => Samples.Click(Render(steps)) < 0.01, iter: 30, threads: 1);

    [Fact]
    public void ClickAndHardBegin_AreNoticed()
    {
        var tone = Render([(new SoundOrder(ClimbTone.FrequencyHz(3), 0, false, SoundCue.None), 1, 6000)]);
        Assert.InRange(Samples.Click(tone), 0, 0.001);
        Assert.InRange(Samples.Click([.. new double[500], .. tone.AsSpan(3003)]), 0.02, 1);
        Assert.InRange(Samples.Click([.. tone.AsSpan(0, 3000), .. tone.AsSpan(3012)]), 0.02, 1);
    }

    [Fact]
    public void Loudness_FollowsTheGain()
    {
        var order = new SoundOrder(700, 0, false, SoundCue.None);
        var samples = Render([(order, 1, 12_000), (order, 0.25, 12_000), (order, 0, 12_000)]);
        var loudest = samples.Chunk(6000).Select(chunk => chunk.Max(Math.Abs)).ToList();
        Assert.InRange(loudest[1], 0.85, 1);
        Assert.InRange(loudest[3] / loudest[1], 0.24, 0.26);
        Assert.Equal(0, samples[^1]);
    }

    [Fact]
    public void PictureToSamples_AllocatesNothing()
    {
        var (guide, synthesizer, samples) = (new SoundGuide(SoundStyle.Standard), new Synthesizer(), new short[2400]);
        var timeUs = 0L;
        // What the runtime itself allocates while it compiles the loop anew is over by the last round.
        Assert.Equal(0, Enumerable.Range(0, 5).Select(_ => Spend()).Min());

        long Spend()
        {
            var before = GC.GetAllocatedBytesForCurrentThread();
            for (var i = 0; i < 100; i++)
            {
                timeUs += 100_000;
                var picture = Pictures.GlidingTooSlow with { TimeUs = timeUs, NettoMps = new(i % 20 - 10, 0.3, 0) };
                synthesizer.Render(guide.Next(picture), 0.5, samples);
            }

            return GC.GetAllocatedBytesForCurrentThread() - before;
        }
    }
}
