using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Desk.Commands;

/// <summary>A recorded flight and the settings to replay it with, as the user names them.</summary>
/// <param name="Path">The recording.</param>
/// <param name="SettingsFile">The settings file; null for standard settings.</param>
/// <param name="Glider">A glider file that beats settings and recording; null for none.</param>
internal sealed record FlightInput(string Path, string? SettingsFile, string? Glider)
{
    private static readonly Dictionary<string, string> Nothing = [];

    /// <summary>Every file that is read for it, as far as it is known before the recording is opened.</summary>
    public IEnumerable<InputFile> Files =>
    [
        new("the log", Path),
        new("the settings", SettingsFile),
        new("the glider file", GliderFiles.PathOf(Glider, SettingsFile ?? "")),
        new("the glider file", GliderFiles.PathOf(Replay.Settings.SettingsFile.GliderOf(SettingsFile), SettingsFile ?? "")),
    ];

    /// <summary>Opens the recording.</summary>
    /// <exception cref="DeskFailure">There is none, or it is not readable as one.</exception>
    public IRecording Open()
    {
        if (!File.Exists(Path))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"LOG: expected a recorded flight, found {InputFile.Found(Path)}");
        }

        try
        {
            return RecordingFile.Open(Path);
        }
        catch (FormatException fault)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{Path}: {fault.Message}");
        }
    }

    /// <summary>Reads the settings; what the boards on the ports speak comes with them.</summary>
    /// <param name="gliderFallback">The glider the recording names.</param>
    /// <param name="flown">What the recording was flown with.</param>
    /// <param name="streams">What is to be known of each stream, by name.</param>
    /// <exception cref="DeskFailure">Something in them is wrong.</exception>
    public FlightSettings ReadSettings(string gliderFallback, FlownSettings flown, out Func<string, StreamSettings> streams)
    {
        if (SettingsFile is not null && !File.Exists(SettingsFile))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"--settings: expected a settings file, found {InputFile.Found(SettingsFile)}");
        }

        if (!Replay.Settings.SettingsFile.TryOpen(SettingsFile, Nothing, Nothing, out var source, out var problem))
        {
            throw new DeskFailure(ExitStatus.BadSettings, problem.ToString());
        }

        source.Recorded = flown;
        var flight = FlightSettingsReader.Read(source, Glider, gliderFallback);
        var ports = source.NamedElements("ports").ToDictionary(name => name, name => StreamSettingsReader.Read(source, $"ports.{name}"), StringComparer.Ordinal);
        var flownStreams = FlownStreams.Read(source);
        streams = name => ports.GetValueOrDefault(name) ?? flownStreams.GetValueOrDefault(name) ?? StreamSettings.Sentences(ChecksumRule.Required);
        return flight is null || source.HasErrors
            ? throw new DeskFailure(ExitStatus.BadSettings, [.. source.Problems.Where(one => !one.IsWarning).Select(one => one.ToString())])
            : flight;
    }
}
