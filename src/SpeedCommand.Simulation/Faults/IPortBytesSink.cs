namespace SpeedCommand.Simulation.Faults;

/// <summary>Takes what serial ports would deliver.</summary>
public interface IPortBytesSink
{
    /// <summary>Takes bytes that arrived on a port.</summary>
    /// <param name="timeUs">When, microseconds since the start; may run back when the clock was stepped.</param>
    /// <param name="stream">Name of the port's stream.</param>
    /// <param name="bytes">The bytes; valid during the call.</param>
    void OnBytes(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> bytes);

    /// <summary>Hears that a port hung up; it opens again by itself.</summary>
    /// <param name="stream">Name of the port's stream.</param>
    void OnHangUp(ReadOnlySpan<byte> stream);
}
