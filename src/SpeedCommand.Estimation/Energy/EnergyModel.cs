using Lanes = System.Runtime.Intrinsics.Vector256<double>;

namespace SpeedCommand.Estimation.Energy;

/// <summary>The states of <see cref="EnergyStateFilters"/> and how they move; docs/estimators.md derives it.</summary>
internal static class EnergyModel
{
    public const int EnergyHeight = 0;
    public const int Staying = 1;
    public const int Passing = 2;
    public const int Kinetic = 3;
    public const int KineticRate = 4;
    public const int Gust = 5;
    public const int TubeHeight = 6;
    public const int TubeKinetic = 7;
    public const int KineticAcceleration = 8;

    /// <summary>States without a probe; the three of the probe come after them.</summary>
    public const int StatesWithoutProbe = 9;

    public const int TubeProbe = 9;
    public const int ProbeError = 10;
    public const int ProbeSlope = 11;
    public const int States = 12;

    /// <summary>One column of states of all filters, taken over a step. The tubes come first: they need the others as they were.</summary>
    /// <param name="x">The column, or a row of the covariance.</param>
    /// <param name="at">Where it begins.</param>
    /// <param name="stride">From one state to the next.</param>
    /// <param name="probe">What the probe's slope counts; null without a probe.</param>
    /// <param name="step">The step.</param>
    public static void Move(Lanes[] x, int at, int stride, ProbeFactor? probe, in EnergyStep step)
    {
        ref var energy = ref x[at];
        ref var staying = ref x[at + Staying * stride];
        ref var passing = ref x[at + Passing * stride];
        ref var kinetic = ref x[at + Kinetic * stride];
        ref var rate = ref x[at + KineticRate * stride];
        ref var gust = ref x[at + Gust * stride];
        ref var acceleration = ref x[at + KineticAcceleration * stride];
        ref var tubeHeight = ref x[at + TubeHeight * stride];
        ref var tubeKinetic = ref x[at + TubeKinetic * stride];
        var climb = staying + passing;
        tubeHeight = step.HeightTube.Kept * tubeHeight + (1 - step.HeightTube.Kept) * (energy - kinetic)
            + step.HeightTube.Integral * (climb - rate);
        tubeKinetic = step.KineticTube.Kept * tubeKinetic + (1 - step.KineticTube.Kept) * (kinetic + gust)
            + step.KineticTube.Integral * rate;
        if (probe is { } factor)
        {
            ref var tubeProbe = ref x[at + TubeProbe * stride];
            var slope = x[at + ProbeSlope * stride];
            tubeProbe = step.ProbeTube.Kept * tubeProbe
                + (1 - step.ProbeTube.Kept) * (energy + gust + x[at + ProbeError * stride] + factor.KineticM * slope)
                + step.ProbeTube.Integral * (climb + factor.KineticRateMps * slope);
        }

        energy += step.Dt * staying + step.Passing.Integral * passing;
        passing *= step.Passing.Kept;
        kinetic += step.Dt * rate + step.Dt * step.Dt / 2 * acceleration;
        (rate, acceleration) = (step.RateKept * rate + step.RateGained * acceleration,
            step.AccelerationKept * acceleration - step.AccelerationLost * rate);
        gust *= step.Gust.Kept;
    }
}
