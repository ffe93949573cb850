namespace SpeedCommand.Replay.Files;

/// <summary>What a command reads, known again by whatever name: a folder of a thousand logs is looked at once, not once a log.</summary>
public sealed class KnownInputs
{
    private readonly Dictionary<FileIdentity, string> _names = [];

    internal KnownInputs(IEnumerable<InputFile> inputs)
    {
        ArgumentNullException.ThrowIfNull(inputs);
        foreach (var input in inputs.Where(input => !string.IsNullOrEmpty(input.Path)))
        {
            _names.TryAdd(FileIdentity.Of(input.Path!), input.Name);
        }
    }

    /// <summary>What a file is to the user; null when it is no input.</summary>
    internal string? NameOf(FileIdentity identity) => _names.GetValueOrDefault(identity);
}
