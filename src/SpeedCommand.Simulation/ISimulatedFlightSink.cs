using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation;

/// <summary>Takes a simulated flight as it happens, in the order of time.</summary>
public interface ISimulatedFlightSink
{
    /// <summary>Takes a line that a sensor sent.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start.</param>
    /// <param name="stream">Name of its stream.</param>
    /// <param name="line">The line without its end; valid during the call.</param>
    void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line);

    /// <summary>Takes the truth at a moment.</summary>
    /// <param name="truth">The truth.</param>
    void OnTruth(in TruthSample truth);
}
