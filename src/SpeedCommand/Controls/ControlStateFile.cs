using System.Text;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Controls;

/// <summary>
/// The file that keeps the controls over a restart: a first line, a line a control, a last line. It is written aside, carried to the
/// disk and renamed, so that a power cut leaves the old one or the new one; one that is damaged all the same is not used at all.
/// </summary>
internal static class ControlStateFile
{
    private const string First = "speedcommand-controls 1", Last = "end";

    /// <summary>More than any such file has; what is longer is something else.</summary>
    private const int MaxBytes = 4096;

    /// <summary>The file's text.</summary>
    public static string Write(IEnumerable<ControlChange> changes) =>
        string.Concat(changes.Select(change => ControlText.Write(change)).Prepend(First).Append(Last).Select(line => line + "\n"));

    /// <summary>Reads the file's text.</summary>
    /// <param name="text">The text.</param>
    /// <param name="changes">The controls; none when it is damaged.</param>
    /// <returns>Null, or what is wrong with it.</returns>
    public static string? Read(string text, out IReadOnlyList<ControlChange> changes)
    {
        changes = [];
        var lines = text.Split('\n');
        if (lines[0] != First)
        {
            return $"line 1: expected '{First}', found something else";
        }

        if (lines.Length < 3 || lines[^2] != Last || lines[^1].Length > 0)
        {
            return $"line {lines.Length}: expected '{Last}' as the last line, found none";
        }

        var read = new List<ControlChange>();
        for (var i = 1; i < lines.Length - 2; i++)
        {
            if (!ControlText.TryReadChange(lines[i], out var change, out var problem))
            {
                return $"line {i + 1}: {problem}";
            }

            read.Add(change);
        }

        changes = read;
        return null;
    }

    /// <summary>Loads the file.</summary>
    /// <param name="path">Where it is.</param>
    /// <param name="changes">The controls; none when there is no file, or it is damaged.</param>
    /// <returns>Null, or what is wrong with it.</returns>
    public static string? Load(string path, out IReadOnlyList<ControlChange> changes)
    {
        changes = [];
        try
        {
            var file = new FileInfo(path);
            return !file.Exists ? null
                : file.Length > MaxBytes ? $"expected at most {MaxBytes} bytes, found {file.Length}"
                : Read(File.ReadAllText(path, Encoding.ASCII), out changes);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return fault.Message;
        }
    }

    /// <summary>Saves the file.</summary>
    /// <returns>Null, or why it could not be saved.</returns>
    public static string? Save(string path, string text)
    {
        try
        {
            Directory.CreateDirectory(Path.GetDirectoryName(Path.GetFullPath(path))!);
            var aside = path + ".new";
            using (var file = new FileStream(aside, FileMode.Create, FileAccess.Write))
            {
                file.Write(Encoding.ASCII.GetBytes(text));
                file.Flush(flushToDisk: true);
            }

            File.Move(aside, path, overwrite: true);
            return null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return fault.Message;
        }
    }
}
