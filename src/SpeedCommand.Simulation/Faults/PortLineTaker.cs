namespace SpeedCommand.Simulation.Faults;

/// <summary>Takes a line that was framed from the bytes of a port.</summary>
/// <param name="timeUs">When its last bytes arrived, microseconds.</param>
/// <param name="stream">Name of the port's stream.</param>
/// <param name="line">The line without its end; valid during the call.</param>
public delegate void PortLineTaker(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line);
