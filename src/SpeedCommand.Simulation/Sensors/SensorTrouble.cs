namespace SpeedCommand.Simulation.Sensors;

/// <summary>What can go wrong with a sensor board.</summary>
public enum SensorTroubleKind
{
    /// <summary>It sends nothing.</summary>
    Silent,

    /// <summary>It goes on sending its last value.</summary>
    Stuck,

    /// <summary>One byte of every sentence is wrong, as on a bad line.</summary>
    Garbled,
}

/// <summary>A time during which a sensor misbehaves.</summary>
/// <param name="Kind">How.</param>
/// <param name="FromS">From, s since the start.</param>
/// <param name="ForS">For how long, s.</param>
public sealed record SensorTrouble(SensorTroubleKind Kind, double FromS, double ForS);
