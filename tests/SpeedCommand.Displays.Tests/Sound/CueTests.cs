using SpeedCommand.Displays.Sound;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>The signals, measured: docs/sound.md says how they go.</summary>
public class CueTests
{
    private static double[] Of(double holdMps, double flownMps) => Samples.Of(SoundStyle.Standard, Flown.Speed(holdMps, flownMps).For(3));

    private static (double BeginHz, double EndHz) Glide(double[] samples, (int Begin, int End) chirp)
    {
        const int Window = Samples.RateHz / 40;
        return (Samples.StrongestHz(samples.AsSpan(chirp.Begin, Window)), Samples.StrongestHz(samples.AsSpan(chirp.End - Window, Window)));
    }

    [Fact]
    public void SpeedUp_IsThreeQuickChirps_ThatRise()
    {
        var samples = Of(30, 20);
        var chirps = Samples.Bursts(samples);
        Assert.Equal(3, chirps.Count);
        Assert.All(chirps, chirp => Assert.InRange((double)(chirp.End - chirp.Begin) / Samples.RateHz, 0.08, 0.11));
        Assert.All(chirps, chirp => Assert.True(Glide(samples, chirp) is { BeginHz: < 1000, EndHz: > 1300 }));
    }

    [Fact]
    public void SlowDown_IsTwoLongChirps_ThatFall()
    {
        var samples = Of(20, 30);
        var chirps = Samples.Bursts(samples);
        Assert.Equal(2, chirps.Count);
        Assert.All(chirps, chirp => Assert.InRange((double)(chirp.End - chirp.Begin) / Samples.RateHz, 0.2, 0.23));
        Assert.All(chirps, chirp => Assert.True(Glide(samples, chirp) is { BeginHz: > 850, EndHz: < 600 }));
    }

    [Fact]
    public void ClimbTone_IsSilent_WhileASignalSounds()
    {
        var picture = Flown.Climb(4) with
        {
            HoldIndicatedMps = Flown.Speed(20, 30).HoldIndicatedMps,
            SmoothIndicatedAirspeedMps = Flown.Speed(20, 30).SmoothIndicatedAirspeedMps,
        };
        var bursts = Samples.Bursts(Samples.Of(SoundStyle.Standard, picture.For(2.5)));
        // Two long chirps among shorter pulses, and nothing in between them.
        var longOnes = bursts.Select((burst, i) => (Length: burst.End - burst.Begin, i)).Where(one => one.Length > 0.18 * Samples.RateHz).ToList();
        Assert.Equal(2, longOnes.Count);
        Assert.Equal(longOnes[0].i + 1, longOnes[1].i);
    }
}
