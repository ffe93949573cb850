using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

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

    /// <summary>Nothing that is read is to be written over, by its own replay or by another's; null when all is well.</summary>
    public static OutputFault? Fault(ReplayRequest request)
    {
        var option = OptionOf(request);
        if (request.Folder is not null && File.Exists(request.Folder))
        {
            return new OutputFault(true, $"{option}: expected a folder, found the file '{request.Folder}'");
        }

        var outputs = request.Recordings.Select(recording => Of(recording, request)).OfType<string>()
            .Where(output => output != ReplayRequest.StandardOutput).ToArray();
        if (outputs.GroupBy(output => output, StringComparer.Ordinal).FirstOrDefault(group => group.Count() > 1) is { } twice)
        {
            return new OutputFault(true, $"{option}: expected logs of different names, found two that both give '{twice.Key}'");
        }

        if (request.Folder is not null && OutputFile.MakeFolder(option, request.Folder) is { } noFolder)
        {
            return noFolder;
        }

        var inputs = OutputFile.Known(InputsOf(request));
        return outputs.Select(output => OutputFile.FaultOf(option, output, inputs)).FirstOrDefault(fault => fault is not null)
            ?? (request.Sound is null ? null : OutputFile.FaultOf("--sound", request.Sound,
                OutputFile.Known([.. InputsOf(request), .. outputs.Select(output => new InputFile($"that of {option}", output))])));
    }

    /// <summary>The option that says where pictures go.</summary>
    public static string OptionOf(ReplayRequest request) => request.HasFolder ? "--out-dir" : "--out";

    private static IEnumerable<InputFile> InputsOf(ReplayRequest request)
    {
        var settings = request.Settings?.ToString() ?? StateFolder.DefaultSettings;
        return
        [
            .. request.Recordings.Select(recording => new InputFile("the log", recording)),
            new("the settings", settings),
            new("the glider file", GliderFiles.PathOf(request.Glider, settings ?? "")),
            new("the glider file", GliderFiles.PathOf(SettingsFile.GliderOf(settings), settings ?? "")),
        ];
    }
}
