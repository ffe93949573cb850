using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Replaying;

/// <summary>A flight log of our own.</summary>
internal sealed class LogRecording(FlightLogReader log) : IRecording
{
    public string GliderFile => log.Header.GliderFile;

    public DateTimeOffset? StartUtc => log.Header.StartUtc;

    public FlownSettings Flown => log.Header.Flown;

    public IReadOnlyList<LogProblem> Problems => log.Problems;

    public long ProblemCount => log.ProblemCount;

    public bool IsCut => log.IsCut;

    public IReadOnlyList<string> Remarks => [];

    public IReplay Start(FlightSettings settings, IPictureSink sink, Func<string, StreamSettings> streams) =>
        new FlightReplay(log, new FlightPipeline(settings, sink), streams);

    public void Dispose() => log.Dispose();
}
