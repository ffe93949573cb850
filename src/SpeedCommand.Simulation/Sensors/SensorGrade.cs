using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>How good a set of sensor boards is. Noise figures are per sample, root mean square; docs/simulator.md lists their sources.</summary>
public enum SensorGrade
{
    /// <summary>Static like a BMP390 at x32 oversampling (0.03 Pa), impact like an SDP3x (0.1 Pa).</summary>
    Fine,

    /// <summary>Static like an MS5611 at OSR 4096 (1.2 Pa, sent in whole pascals), impact like an MS4525DO of 1 psi (1.05 Pa a count).</summary>
    Common,

    /// <summary>Static like a BMP085 (4.5 Pa as measured), impact through a 10-bit converter (4 Pa a count).</summary>
    Poor,
}

/// <summary>The sensors of each grade.</summary>
public static class SensorGrades
{
    private const double Degree = Math.PI / 180;

    /// <summary>The sensor of a grade.</summary>
    /// <param name="grade">The grade.</param>
    /// <param name="kind">What it measures.</param>
    /// <param name="stream">Name of its stream.</param>
    /// <returns>The sensor, without troubles.</returns>
    public static SensorSpec Of(SensorGrade grade, ReadingKind kind, string stream)
    {
        var i = (int)grade;
        SensorSpec Pick(double every, double[] noise, double[] bias, double[] drift, double[] quantum, double[] lag, double coefficient = 0) =>
            new(kind, stream, every, noise[i], bias[i], drift[i], quantum[i], lag[i], Jitter[i], ClockError[i], coefficient);
        return kind switch
        {
            ReadingKind.StaticPressurePa => Pick(0.05, [0.03, 1.2, 4.5], [5, 50, 150], [0.5, 3, 10], [0.01, 1, 1], Pneumatic),
            ReadingKind.TotalEnergyProbePa => Pick(0.05, [0.03, 1.2, 4.5], [5, 50, 150], [0.5, 3, 10], [0.01, 1, 1], Pneumatic, -1),
            ReadingKind.ImpactPressurePa => Pick(0.05, [0.1, 1.0, 4.0], [0.1, 2, 5], [0.02, 0.5, 2], [0.05, 1.05, 4], Pneumatic),
            ReadingKind.IndicatedAirspeedMps => Pick(0.05, [0.02, 0.1, 0.3], [0, 0.1, 0.3], [0, 0.05, 0.1], [0.01, 0.1, 0.1], Pneumatic),
            ReadingKind.OutsideAirTemperatureK => Pick(1, [0.02, 0.1, 0.3], [0.1, 0.5, 1], [0.02, 0.1, 0.3], [0.01, 0.1, 0.5], [2, 8, 20]),
            ReadingKind.RelativeHumidity => Pick(1, [0.002, 0.005, 0.02], [0.01, 0.02, 0.05], [0, 0, 0], [0.001, 0.001, 0.01], [4, 8, 20]),
            ReadingKind.LoadFactor => Pick(0.2, [0.005, 0.02, 0.05], [0.002, 0.01, 0.03], [0, 0, 0], [0.001, 0.01, 0.01], NoLag),
            ReadingKind.BankRad => Pick(0.2, [0.2 * Degree, Degree, 2 * Degree], [0.2 * Degree, Degree, 2 * Degree], [0, 0, 0],
                [0.1 * Degree, 0.1 * Degree, Degree], NoLag),
            _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "no such sensor"),
        };
    }

    // A metre or two of thin tube and a small volume. The tube is the glider's, whatever board hangs on it.
    private static readonly double[] Pneumatic = [0.05, 0.05, 0.05];
    private static readonly double[] NoLag = [0, 0, 0];
    private static readonly double[] Jitter = [0.0002, 0.001, 0.003];
    private static readonly double[] ClockError = [10e-6, 50e-6, 200e-6];
}
