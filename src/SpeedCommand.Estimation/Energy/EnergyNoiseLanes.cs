using System.Runtime.InteropServices;
using Lanes = System.Runtime.Intrinsics.Vector256<double>;

namespace SpeedCommand.Estimation.Energy;

/// <summary>The noise of four filters side by side, each in its lane. Units as in <see cref="EnergyNoise"/>.</summary>
public sealed class EnergyNoiseLanes
{
    private readonly Lanes[] _values = new Lanes[EnergyNoise.Parameters];

    /// <summary>Makes it with noise in every lane: a filter that nobody sets runs along, and without noise it would run into slow tiny numbers.</summary>
    public EnergyNoiseLanes() => Array.Fill(_values, Lanes.One);

    internal Lanes ClimbDensity => _values[0];

    internal Lanes StayingDensity => _values[1];

    internal Lanes KineticDensity => _values[2];

    internal Lanes GustVarianceM2 => _values[3];

    internal Lanes HeightVarianceM2 => _values[4];

    internal Lanes KineticVarianceM2 => _values[5];

    internal Lanes ProbeVarianceM2 => _values[6];

    /// <summary>Sets one filter's noise.</summary>
    /// <param name="lane">The filter, 0 to 3.</param>
    /// <param name="noise">The noise.</param>
    public void Set(int lane, in EnergyNoise noise)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual((uint)lane, (uint)Lanes.Count, nameof(lane));
        var values = MemoryMarshal.Cast<Lanes, double>(_values.AsSpan())[lane..];
        values[0] = noise.ClimbDensity;
        values[Lanes.Count] = noise.StayingDensity;
        values[2 * Lanes.Count] = noise.KineticDensity;
        values[3 * Lanes.Count] = noise.GustVarianceM2;
        values[4 * Lanes.Count] = noise.HeightVarianceM2;
        values[5 * Lanes.Count] = noise.KineticVarianceM2;
        values[6 * Lanes.Count] = noise.ProbeVarianceM2;
    }

    /// <summary>Spectral density of one filter's climb, both parts, (m/s²)²/Hz.</summary>
    /// <param name="lane">The filter, 0 to 3.</param>
    internal double DensityOf(int lane) => ClimbDensity[lane] + StayingDensity[lane];
}
