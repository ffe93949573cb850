using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>
/// One sensor with its faults. Noise, bias, drift and quantum are in the unit of the reading: pascal, metres per second,
/// kelvin, fraction, g, radians.
/// </summary>
/// <param name="Kind">What it measures.</param>
/// <param name="Stream">Name of the stream its sentences come in on.</param>
/// <param name="EveryS">Time between samples by its own clock, s.</param>
/// <param name="Noise">Standard deviation of the white noise of a sample.</param>
/// <param name="Bias">Constant error.</param>
/// <param name="Drift">Standard deviation of a slow error with <see cref="DriftTimeS"/> correlation time.</param>
/// <param name="Quantum">Smallest step of what it sends; 0 for none.</param>
/// <param name="LagS">Time constant of its first-order lag, pneumatic or thermal, s; 0 for none.</param>
/// <param name="JitterS">Standard deviation of the delay from sample to stamp about its mean, s.</param>
/// <param name="ClockError">How much its clock runs slow, as a fraction: 50e-6 is 50 parts per million.</param>
/// <param name="Coefficient">Recovery factor of a thermometer (0 to 1), pressure coefficient of a total-energy probe (near -1).</param>
/// <param name="Troubles">When it is silent, stuck or garbled.</param>
public sealed record SensorSpec(
    ReadingKind Kind, string Stream, double EveryS, double Noise, double Bias = 0, double Drift = 0, double Quantum = 0,
    double LagS = 0, double JitterS = 0, double ClockError = 0, double Coefficient = 0, IReadOnlyList<SensorTrouble>? Troubles = null)
{
    /// <summary>Correlation time of the drift, s: the ten minutes over which a board warms and cools in a cockpit.</summary>
    public const double DriftTimeS = 600;

    /// <summary>The trouble at a moment, if any.</summary>
    /// <param name="timeS">Time since the start, s.</param>
    /// <returns>The trouble, or null.</returns>
    public SensorTrouble? TroubleAt(double timeS)
    {
        foreach (var trouble in Troubles ?? [])
        {
            if (timeS >= trouble.FromS && timeS < trouble.FromS + trouble.ForS)
            {
                return trouble;
            }
        }

        return null;
    }
}
