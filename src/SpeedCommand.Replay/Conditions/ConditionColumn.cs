using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.HeightInHand;

namespace SpeedCommand.Replay.Conditions;

/// <summary>The air above and below that the options describe: as much warmer than standard as where they were given, equally humid.</summary>
public sealed class ConditionColumn(FlightConditions conditions) : IAirColumn
{
    private readonly StandardColumn _dry = new(conditions.TemperatureOffsetK);

    /// <inheritdoc/>
    public bool TryAt(double pressureAltitudeM, out Air air)
    {
        if (double.IsNaN(conditions.Air.RelativeHumidity))
        {
            return _dry.TryAt(pressureAltitudeM, out air);
        }

        air = default;
        return StandardAtmosphere.TryAt(pressureAltitudeM, out var standard)
            && Air.TryMeasured(standard.PressurePa, standard.TemperatureK + conditions.TemperatureOffsetK,
                conditions.Air.RelativeHumidity, out air, out _);
    }
}
