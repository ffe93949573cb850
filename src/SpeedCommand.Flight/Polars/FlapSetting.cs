namespace SpeedCommand.Flight.Polars;

/// <summary>One flap setting and the polar flown with it.</summary>
/// <param name="Name">What stands beside the lever.</param>
/// <param name="Polar">The polar, at the same reference mass and wing area as the others.</param>
public sealed record FlapSetting(string Name, IPolar Polar);
