namespace SpeedCommand.Replay.Files;

/// <summary>Guards what a command is told to write: before any work, and before anything on the disk is touched.</summary>
public static class OutputFile
{
    /// <summary>Whether a file may be written: it is none of those that are read, by whatever name, and the disk takes it.</summary>
    /// <param name="option">The option that names the file.</param>
    /// <param name="path">The file to write.</param>
    /// <param name="inputs">What the command reads; those without a path are passed over.</param>
    /// <returns>The fault, or null when all is well.</returns>
    public static OutputFault? FaultOf(string option, string path, params IEnumerable<InputFile> inputs) => FaultOf(option, path, Known(inputs));

    /// <summary>Looks at what a command reads once, for a command that writes many files.</summary>
    /// <param name="inputs">What the command reads; those without a path are passed over.</param>
    /// <returns>The inputs, known again by whatever name.</returns>
    public static KnownInputs Known(IEnumerable<InputFile> inputs) => new(inputs);

    /// <summary>Whether a file may be written, as above.</summary>
    /// <param name="option">The option that names the file.</param>
    /// <param name="path">The file to write.</param>
    /// <param name="inputs">What the command reads.</param>
    /// <returns>The fault, or null when all is well.</returns>
    public static OutputFault? FaultOf(string option, string path, KnownInputs inputs)
    {
        ArgumentNullException.ThrowIfNull(path);
        ArgumentNullException.ThrowIfNull(inputs);
        if (path.Length == 0 || Directory.Exists(path))
        {
            return new OutputFault(true, $"{option}: expected a file, found {(path.Length == 0 ? "''" : $"the folder '{path}'")}");
        }

        var identity = FileIdentity.Of(path);
        if (inputs.NameOf(identity) is { } name)
        {
            return new OutputFault(true, $"{option}: expected another file than {name}, found '{path}'");
        }

        return ReasonNotToWrite(path, identity) is { } reason ? Unwritable(option, path, reason) : null;
    }

    /// <summary>Makes a folder to write into.</summary>
    /// <param name="option">The option that names the folder.</param>
    /// <param name="path">The folder; made when it is not there.</param>
    /// <returns>The fault, or null when the folder is there.</returns>
    public static OutputFault? MakeFolder(string option, string path)
    {
        ArgumentNullException.ThrowIfNull(path);
        if (path.Length == 0 || File.Exists(path))
        {
            return new OutputFault(true, $"{option}: expected a folder, found {(path.Length == 0 ? "''" : $"the file '{path}'")}");
        }

        try
        {
            Directory.CreateDirectory(path);
            return null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return new OutputFault(false, $"{option}: expected a folder that can be made, found '{path}': {fault.Message}");
        }
    }

    /// <summary>The fault of a file that the disk did not take.</summary>
    /// <param name="option">The option that names the file.</param>
    /// <param name="path">The file.</param>
    /// <param name="reason">The disk's reason.</param>
    /// <returns>The fault.</returns>
    public static OutputFault Unwritable(string option, string path, string reason) =>
        new(false, $"{option}: expected a file that can be written, found '{path}': {reason}");

    /// <summary>Replaces a file at once: whoever stops half-way leaves the old one.</summary>
    /// <param name="path">The file; a link stays a link, and what it points to is replaced.</param>
    /// <param name="content">The new content.</param>
    /// <exception cref="IOException">The file cannot be written.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be written.</exception>
    public static void Replace(string path, ReadOnlySpan<byte> content)
    {
        if (FileIdentity.Of(path).IsSpecial)
        {
            File.WriteAllBytes(path, content);
            return;
        }

        var target = File.Exists(path) ? File.ResolveLinkTarget(path, returnFinalTarget: true)?.FullName ?? path : path;
        var aside = target + ".new";
        File.WriteAllBytes(aside, content);
        File.Move(aside, target, overwrite: true);
    }

    /// <summary>Tried without touching what is there: a file is opened and closed, a new name is taken and given back.</summary>
    private static string? ReasonNotToWrite(string path, FileIdentity identity)
    {
        if (Path.GetDirectoryName(Path.GetFullPath(path)) is { } folder && !Directory.Exists(folder))
        {
            return $"there is no folder '{folder}'";
        }

        if (identity.IsSpecial)
        {
            return null;
        }

        try
        {
            using var probe = File.Exists(path)
                ? new FileStream(path, FileMode.Open, FileAccess.Write, FileShare.ReadWrite, 1)
                : new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.ReadWrite, 1, FileOptions.DeleteOnClose);
            return null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return fault.Message;
        }
    }
}
