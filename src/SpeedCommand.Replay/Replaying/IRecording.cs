using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Replaying;

/// <summary>A recorded flight of any kind, opened.</summary>
public interface IRecording : IDisposable
{
    /// <summary>File name of the glider the recording names; empty when it names none.</summary>
    string GliderFile { get; }

    /// <summary>Time of day at its start; null when it does not tell.</summary>
    DateTimeOffset? StartUtc { get; }

    /// <summary>The settings and the glider the recording was flown with, as far as it tells them.</summary>
    FlownSettings Flown { get; }

    /// <summary>The first lines that could not be used.</summary>
    IReadOnlyList<LogProblem> Problems { get; }

    /// <summary>How many lines could not be used.</summary>
    long ProblemCount { get; }

    /// <summary>Whether the recording ends in the middle of a line, as after a power cut. Known once everything was read.</summary>
    bool IsCut { get; }

    /// <summary>What a user should know of this recording before its numbers: what is missing and what stands in.</summary>
    IReadOnlyList<string> Remarks { get; }

    /// <summary>Puts the recording in front of a new pipeline. May be done once.</summary>
    /// <param name="settings">The glider and the pilot's choices.</param>
    /// <param name="sink">Takes the pictures.</param>
    /// <param name="streams">What is to be known of each stream, by name.</param>
    /// <returns>The replay, before its first record.</returns>
    IReplay Start(FlightSettings settings, IPictureSink sink, Func<string, StreamSettings> streams);
}
