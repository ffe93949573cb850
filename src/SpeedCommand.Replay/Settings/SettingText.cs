namespace SpeedCommand.Replay.Settings;

/// <summary>A setting as it was written, and where.</summary>
/// <param name="Text">The value.</param>
/// <param name="Origin">The file, "command line", or the environment variable.</param>
/// <param name="Line">Line in the file from 1; 0 elsewhere.</param>
/// <param name="Path">The setting's path.</param>
public sealed record SettingText(string Text, string Origin, int Line, string Path);
