namespace SpeedCommand.Estimation.Energy;

/// <summary>What may be going on, for <see cref="ModeMixture"/>.</summary>
internal enum FlightMode
{
    /// <summary>Noise as learnt.</summary>
    Usual,

    /// <summary>The pilot pulls or pushes.</summary>
    Stick,

    /// <summary>The glider flies into or out of rising air.</summary>
    Edge,
}
