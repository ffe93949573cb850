using SpeedCommand.Estimation.Command;

namespace SpeedCommand.Desk.Reports;

/// <summary>One stretch of circling, from the picture that called it climbing to the last.</summary>
/// <param name="StartS">Its begin, s since the start.</param>
/// <param name="EndS">Its end, s.</param>
/// <param name="StartHeightM">Pressure altitude at its begin, m; NaN when not known.</param>
/// <param name="GainM">Energy height gained, m: height, with speed counted as the height it is worth.</param>
/// <param name="AverageMps">Average total-energy climb while it was known, m/s; NaN when it never was.</param>
/// <param name="TurningShare">Share of its time with a load that only a turn brings, 0 to 1; NaN when not known.</param>
internal sealed record ClimbLeg(double StartS, double EndS, double StartHeightM, double GainM, double AverageMps, double TurningShare)
{
    public double DurationS => EndS - StartS;

    /// <summary>Whether it counts as a climb, by the rule for the climb expected next; a search in sink says nothing about the day's climbs.</summary>
    public bool IsClimb => DurationS >= LastClimbs.LeastS && GainM >= LastClimbs.LeastGainM;
}
