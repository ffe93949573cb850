namespace SpeedCommand.Desk.Reports;

/// <summary>One glide between climbs.</summary>
/// <param name="StartS">Its begin, s since the start.</param>
/// <param name="EndS">Its end, s.</param>
/// <param name="DistanceM">Distance through the air, m.</param>
/// <param name="LossM">Energy height lost, m; negative when gained.</param>
/// <param name="MeanIndicatedMps">Mean indicated airspeed, m/s.</param>
/// <param name="MeanToFlyMps">Mean speed to hold at the same moments, m/s; NaN when there was none.</param>
/// <param name="OffSpeedM">Height lost to flying off the speed to hold, m; NaN when there was none.</param>
internal sealed record GlideLeg(
    double StartS, double EndS, double DistanceM, double LossM, double MeanIndicatedMps, double MeanToFlyMps, double OffSpeedM)
{
    public double DurationS => EndS - StartS;

    /// <summary>Ratio achieved through the air, moving air and all; NaN when no height was lost.</summary>
    public double Ratio => LossM > 0 ? DistanceM / LossM : double.NaN;
}
