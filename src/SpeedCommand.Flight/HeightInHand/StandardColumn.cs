using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>Dry air as warm as the standard atmosphere at every pressure altitude, plus an offset.</summary>
/// <param name="temperatureOffsetK">Offset, K, positive when warmer.</param>
public sealed class StandardColumn(double temperatureOffsetK) : IAirColumn
{
    /// <inheritdoc/>
    public bool TryAt(double pressureAltitudeM, out Air air)
    {
        air = default;
        return StandardAtmosphere.TryAt(pressureAltitudeM, out var state)
            && Air.TryStandard(state.PressurePa, temperatureOffsetK, out air, out _);
    }
}
