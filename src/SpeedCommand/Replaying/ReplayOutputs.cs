using SpeedCommand.Replay.Replaying;

namespace SpeedCommand.Replaying;

/// <summary>Where the pictures of each recording go.</summary>
internal static class ReplayOutputs
{
    /// <summary>Without a panel and a sound, pictures go to standard output; with one, only where they were asked to go.</summary>
    public static string? Of(string recording, ReplayRequest request)
    {
        if (request.Folder is not null)
        {
            return Path.Combine(request.Folder, RecordingFile.StemOf(recording) + request.Ending);
        }

        return request.Out ?? (request.IsShown || request.Sound is not null ? null : ReplayRequest.StandardOutput);
    }

    /// <summary>A recording is not to be written over, by its own replay or by another's; null when all is well.</summary>
    public static string? Fault(ReplayRequest request)
    {
        var option = request.HasFolder ? "--out-dir" : "--out";
        if (request.Folder is not null && File.Exists(request.Folder))
        {
            return $"{option}: expected a folder, found the file '{request.Folder}'";
        }

        var outputs = request.Recordings.Select(recording => Of(recording, request)).OfType<string>()
            .Where(output => output != ReplayRequest.StandardOutput).ToArray();
        var inputs = request.Recordings.Select(Path.GetFullPath).ToHashSet(StringComparer.Ordinal);
        if (request.Sound is not null && (inputs.Contains(Path.GetFullPath(request.Sound)) || outputs.Contains(request.Sound)))
        {
            return $"--sound: expected a file of its own, found '{request.Sound}'";
        }

        if (outputs.FirstOrDefault(output => inputs.Contains(Path.GetFullPath(output))) is { } overwritten)
        {
            return $"{option}: expected another file than the log, found '{overwritten}'";
        }

        var twice = outputs.GroupBy(output => output, StringComparer.Ordinal).FirstOrDefault(group => group.Count() > 1);
        return twice is null ? null : $"{option}: expected logs of different names, found two that both give '{twice.Key}'";
    }
}
