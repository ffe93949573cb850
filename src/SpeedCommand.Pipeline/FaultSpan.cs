namespace SpeedCommand.Pipeline;

/// <summary>One fault over a flight.</summary>
/// <param name="Name">Its name.</param>
/// <param name="FirstUs">Time of the first picture that had it, microseconds since the start.</param>
/// <param name="LastUs">Time of the last picture that had it, microseconds since the start.</param>
/// <param name="Count">How often it came.</param>
/// <param name="LastedUs">How long it was there in all, microseconds.</param>
public readonly record struct FaultSpan(string Name, long FirstUs, long LastUs, int Count, long LastedUs);
