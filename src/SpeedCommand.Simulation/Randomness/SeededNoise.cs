using System.Numerics;

namespace SpeedCommand.Simulation.Randomness;

/// <summary>
/// A stream of random numbers that is the same on every machine: xoshiro256++ (Blackman and Vigna 2019) seeded by SplitMix64
/// from a seed and a name, so that adding one source of noise leaves all others as they were.
/// </summary>
public sealed class SeededNoise
{
    private ulong _s0;
    private ulong _s1;
    private ulong _s2;
    private ulong _s3;

    /// <summary>Starts the stream.</summary>
    /// <param name="seed">The seed of the whole run.</param>
    /// <param name="name">Name of the source of noise within the run.</param>
    public SeededNoise(long seed, string name)
    {
        ArgumentNullException.ThrowIfNull(name);
        // FNV-1a, 64 bit: enough to keep a few dozen names apart.
        var state = 14695981039346656037UL;
        foreach (var letter in name)
        {
            state = unchecked((state ^ letter) * 1099511628211UL);
        }

        state ^= SplitMix(unchecked((ulong)seed));
        _s0 = SplitMix(state);
        _s1 = SplitMix(_s0);
        _s2 = SplitMix(_s1);
        _s3 = SplitMix(_s2);
    }

    /// <summary>The next 64 random bits.</summary>
    /// <returns>Any value.</returns>
    public ulong NextBits()
    {
        unchecked
        {
            var result = BitOperations.RotateLeft(_s0 + _s3, 23) + _s0;
            var shifted = _s1 << 17;
            _s2 ^= _s0;
            _s3 ^= _s1;
            _s1 ^= _s2;
            _s0 ^= _s3;
            _s2 ^= shifted;
            _s3 = BitOperations.RotateLeft(_s3, 45);
            return result;
        }
    }

    /// <summary>The next number, evenly spread.</summary>
    /// <returns>From 0 to just under 1.</returns>
    public double NextUniform() => (NextBits() >> 11) * (1.0 / (1UL << 53));

    /// <summary>
    /// The next number of a normal distribution: ratio of uniforms after Leva (ACM TOMS 18, 1992). The value itself comes
    /// from one division; the logarithm, which may differ in its last bit between machines, only decides rare rejections.
    /// </summary>
    /// <returns>Mean 0, standard deviation 1.</returns>
    public double NextNormal()
    {
        while (true)
        {
            var u = 1 - NextUniform();
            var v = 1.7156 * (NextUniform() - 0.5);
            var x = u - 0.449871;
            var y = Math.Abs(v) + 0.386595;
            var q = x * x + y * (0.19600 * y - 0.25472 * x);
            if (q < 0.27597 || (q <= 0.27846 && v * v <= -4 * Math.Log(u) * u * u))
            {
                return v / u;
            }
        }
    }

    private static ulong SplitMix(ulong state)
    {
        unchecked
        {
            var z = state + 0x9E3779B97F4A7C15UL;
            z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9UL;
            z = (z ^ (z >> 27)) * 0x94D049BB133111EBUL;
            return z ^ (z >> 31);
        }
    }
}
