namespace SpeedCommand.Replay.Files;

/// <summary>Why a command must not, or cannot, write where it was told to.</summary>
/// <param name="IsUsage">True when another name must be given, false when the disk stands in the way.</param>
/// <param name="Message">One line with the option, what was expected and what was found.</param>
public sealed record OutputFault(bool IsUsage, string Message);
