namespace SpeedCommand.Simulation.AirMass;

/// <summary>One cause of rising or sinking air. Places are metres in the frame that drifts with the wind.</summary>
public interface IVerticalMotion
{
    /// <summary>Vertical motion of the air.</summary>
    /// <param name="alongM">Distance along the initial track, m.</param>
    /// <param name="acrossM">Distance to the right of it, m.</param>
    /// <param name="heightM">Geopotential height, m.</param>
    /// <param name="timeS">Time since the start, s.</param>
    /// <returns>m/s, positive up.</returns>
    double AirMps(double alongM, double acrossM, double heightM, double timeS);
}
