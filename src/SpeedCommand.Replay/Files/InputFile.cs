namespace SpeedCommand.Replay.Files;

/// <summary>A file a command reads, which it must therefore never write.</summary>
/// <param name="Name">What it is to the user, as "the log".</param>
/// <param name="Path">Its path; null or empty when there is none.</param>
public readonly record struct InputFile(string Name, string? Path)
{
    /// <summary>What stands at a path where a file was expected and none was found, for the end of a message.</summary>
    /// <param name="path">The path.</param>
    /// <returns>"the folder 'x'" or "no 'x'".</returns>
    public static string Found(string path) => Directory.Exists(path) ? $"the folder '{path}'" : $"no '{path}'";
}
