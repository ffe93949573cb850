namespace SpeedCommand.Flight.LocatedJson;

/// <summary>One thing wrong, or doubtful, in a text file a person wrote: where it is, and what was expected and found.</summary>
/// <param name="File">The file's name as the user gave it.</param>
/// <param name="Line">Line number from 1; 0 when the fault has no line (a setting from the environment, say).</param>
/// <param name="Key">Path of the key, for example "limits.stall"; empty for the file as a whole.</param>
/// <param name="Message">What was expected and what was found.</param>
/// <param name="IsWarning">Whether the file still works.</param>
public readonly record struct JsonProblem(string File, int Line, string Key, string Message, bool IsWarning = false)
{
    /// <summary>One line for a person: file, line, key, message.</summary>
    /// <returns>For example "glider.json:12: limits.stall: expected a number with a unit (m/s, …), found '66'".</returns>
    public override string ToString()
    {
        var place = Line > 0 ? $"{File}:{Line}" : File;
        var what = Key.Length > 0 ? $"{Key}: {Message}" : Message;
        return IsWarning ? $"{place}: warning: {what}" : $"{place}: {what}";
    }
}
