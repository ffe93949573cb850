using System.Buffers.Binary;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>Samples of sound, and what can be measured of them. Nothing here knows how the sound is made.</summary>
internal static class Samples
{
    public const int RateHz = 24_000;

    /// <summary>The sound of pictures, read back from the WAV file.</summary>
    public static double[] Of(SoundStyle style, IEnumerable<CockpitPicture> pictures)
    {
        var file = new MemoryStream();
        using (var track = new SoundTrack(style, 1, file))
        {
            foreach (var picture in pictures)
            {
                track.OnPicture(picture);
            }
        }

        return Read(file.ToArray());
    }

    /// <summary>Samples as fractions of full scale; the header is checked field by field (RIFF WAVE, from memory).</summary>
    public static double[] Read(byte[] file)
    {
        Assert.Equal("RIFF"u8, file.AsSpan(0, 4));
        Assert.Equal("WAVEfmt "u8, file.AsSpan(8, 8));
        Assert.Equal("data"u8, file.AsSpan(36, 4));
        int[] numbers = [4, 16, 24, 28, 40];
        Assert.Equal([file.Length - 8, 16, RateHz, 2 * RateHz, file.Length - 44],
            numbers.Select(place => BinaryPrimitives.ReadInt32LittleEndian(file.AsSpan(place))));
        int[] shorts = [20, 22, 32, 34];
        Assert.Equal([1, 1, 2, 16], shorts.Select(place => (int)BinaryPrimitives.ReadInt16LittleEndian(file.AsSpan(place))));
        return [.. Enumerable.Range(0, (file.Length - 44) / 2).Select(i => BinaryPrimitives.ReadInt16LittleEndian(file.AsSpan(44 + 2 * i)) / 32768.0)];
    }

    /// <summary>The strongest frequency of a stretch between 200 and 2200 Hz, to 0.2 % either way: Goertzel's algorithm under a Hann window.</summary>
    public static double StrongestHz(ReadOnlySpan<double> stretch)
    {
        var windowed = new double[stretch.Length];
        for (var i = 0; i < windowed.Length; i++)
        {
            windowed[i] = stretch[i] * (1 - Math.Cos(2 * Math.PI * i / windowed.Length));
        }

        var (best, bestPower) = (0.0, 0.0);
        for (var hz = 200.0; hz < 2200; hz *= 1.004)
        {
            var power = Power(windowed, hz);
            (best, bestPower) = power > bestPower ? (hz, power) : (best, bestPower);
        }

        return best;
    }

    private static double Power(double[] samples, double hz)
    {
        var twice = 2 * Math.Cos(2 * Math.PI * hz / RateHz);
        var (last, before) = (0.0, 0.0);
        foreach (var sample in samples)
        {
            (last, before) = (sample + twice * last - before, last);
        }

        return last * last + before * before - twice * last * before;
    }

    /// <summary>Where sounds begin and end: 4 ms louder than -20 dB after silence, and the other way round.</summary>
    public static List<(int Begin, int End)> Bursts(double[] samples)
    {
        const int Step = RateHz / 250;
        var bursts = new List<(int, int)>();
        var begin = -1;
        for (var i = 0; i <= samples.Length; i += Step)
        {
            var isLoud = i < samples.Length && samples.Skip(i).Take(Step).Max(Math.Abs) > 0.1;
            if (isLoud && begin < 0)
            {
                begin = i;
            }
            else if (!isLoud && begin >= 0)
            {
                bursts.Add((begin, i));
                begin = -1;
            }
        }

        return bursts;
    }

    /// <summary>
    /// The loudest sample above 6 kHz, as a fraction of full scale. The highest partial that is meant is 4.8 kHz, so this is what clicks
    /// leave. A windowed sinc of 129 taps: 70 dB down from 5.5 kHz (Blackman's window, textbook).
    /// </summary>
    public static double Click(ReadOnlySpan<double> samples)
    {
        const int Half = 64;
        const double CutHz = 6000;
        Span<double> taps = stackalloc double[2 * Half + 1];
        for (var i = -Half; i <= Half; i++)
        {
            var low = i == 0 ? 2 * CutHz / RateHz : Math.Sin(2 * Math.PI * CutHz * i / RateHz) / (Math.PI * i);
            var window = 0.42 + 0.5 * Math.Cos(Math.PI * i / Half) + 0.08 * Math.Cos(2 * Math.PI * i / Half);
            taps[i + Half] = ((i == 0 ? 1 : 0) - low) * window;
        }

        var loudest = 0.0;
        for (var at = 0; at + taps.Length <= samples.Length; at++)
        {
            var sum = 0.0;
            for (var i = 0; i < taps.Length; i++)
            {
                sum += taps[i] * samples[at + i];
            }

            loudest = Math.Max(loudest, Math.Abs(sum));
        }

        return loudest;
    }
}
