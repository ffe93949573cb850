namespace SpeedCommand.Replay.Igc;

/// <summary>A stretch of circling that gained height. By height alone: this is not total energy.</summary>
/// <param name="StartTimeOfDayS">UTC time of day at its start, s; beyond midnight it goes on counting.</param>
/// <param name="DurationS">How long it lasted, s.</param>
/// <param name="StartHeightM">Height at its start, m.</param>
/// <param name="GainM">Height gained, m.</param>
/// <param name="Turns">Turns made, positive to the right.</param>
/// <param name="RecorderMeanMps">Mean of the recorder's own compensated vertical speed, m/s; NaN without.</param>
/// <param name="MaxEngineNoise">The loudest engine noise, a fraction of its scale; NaN without.</param>
public readonly record struct IgcClimb(
    double StartTimeOfDayS, double DurationS, double StartHeightM, double GainM, double Turns, double RecorderMeanMps, double MaxEngineNoise)
{
    /// <summary>Mean rate of climb, m/s.</summary>
    public double MeanMps => GainM / DurationS;
}
