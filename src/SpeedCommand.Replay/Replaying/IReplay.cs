using SpeedCommand.Pipeline;

namespace SpeedCommand.Replay.Replaying;

/// <summary>A recorded flight in front of a pipeline. Time comes from the recording alone.</summary>
public interface IReplay
{
    /// <summary>Lines or fixes fed so far.</summary>
    long LineCount { get; }

    /// <summary>The pipeline they are fed to.</summary>
    FlightPipeline Pipeline { get; }

    /// <summary>Replays one record.</summary>
    /// <param name="before">Called with the record's stamp before the pipeline sees it, to keep a pace; null for none.</param>
    /// <returns>False at the end of the recording.</returns>
    /// <exception cref="IOException">The recording cannot be read, or the pipeline's sink cannot be written.</exception>
    bool Step(Action<long>? before = null);

    /// <summary>Replays the rest as fast as it goes.</summary>
    /// <exception cref="IOException">The recording cannot be read, or the pipeline's sink cannot be written.</exception>
    void RunToEnd()
    {
        while (Step())
        {
        }
    }
}
