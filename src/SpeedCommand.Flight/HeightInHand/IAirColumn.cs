using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>The air over a place, from below to above.</summary>
public interface IAirColumn
{
    /// <summary>The air at a pressure altitude.</summary>
    /// <param name="pressureAltitudeM">Pressure altitude, m.</param>
    /// <param name="air">The air; <c>default</c> when not known.</param>
    /// <returns>Whether the column speaks of this altitude.</returns>
    bool TryAt(double pressureAltitudeM, out Air air);
}
