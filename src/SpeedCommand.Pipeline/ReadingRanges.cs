using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline;

/// <summary>Which values a reading may have at all, and the fault to name when it lies outside.</summary>
public static class ReadingRanges
{
    /// <summary>Judges one reading.</summary>
    /// <param name="reading">The reading, SI units.</param>
    /// <param name="fault">The fault to name when it is impossible.</param>
    /// <returns>Whether the value is possible.</returns>
    public static bool IsPossible(in Reading reading, out Faults fault)
    {
        (fault, var possible) = reading.Kind switch
        {
            ReadingKind.StaticPressurePa => (Faults.StaticRange,
                reading.Value is >= PipelineBounds.MinStaticPa and <= PipelineBounds.MaxStaticPa),
            ReadingKind.TotalEnergyProbePa => (Faults.StaticRange,
                reading.Value is >= PipelineBounds.MinStaticPa and <= PipelineBounds.MaxStaticPa),
            ReadingKind.ImpactPressurePa => (Faults.AirspeedRange,
                reading.Value is >= PipelineBounds.MinImpactPa and <= PipelineBounds.MaxImpactPa),
            ReadingKind.IndicatedAirspeedMps => (Faults.AirspeedRange,
                reading.Value is >= 0 and <= PipelineBounds.MaxIndicatedMps),
            ReadingKind.OutsideAirTemperatureK => (Faults.TemperatureRange,
                reading.Value is >= PipelineBounds.MinTemperatureK and <= PipelineBounds.MaxTemperatureK),
            ReadingKind.RelativeHumidity => (Faults.TemperatureRange, reading.Value is >= 0 and <= 1),
            ReadingKind.LoadFactor => (Faults.LoadRange, Math.Abs(reading.Value) <= PipelineBounds.MaxLoadFactor),
            ReadingKind.BankRad => (Faults.LoadRange, Math.Abs(reading.Value) <= PipelineBounds.MaxBankRad),
            _ => (Faults.None, false),
        };
        return possible;
    }
}
