namespace SpeedCommand.Estimation.Energy;

/// <summary>What a sample is a sample of.</summary>
public enum EnergyChannel
{
    /// <summary>Height, from the static pressure.</summary>
    Height,

    /// <summary>Kinetic height, from the impact pressure.</summary>
    Kinetic,

    /// <summary>Energy height, from a total-energy probe.</summary>
    Probe,
}
