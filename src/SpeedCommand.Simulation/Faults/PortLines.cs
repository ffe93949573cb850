using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Faults;

/// <summary>Cuts the bytes of each port into lines as the service does: a framer a port, emptied by a hang-up.</summary>
/// <param name="take">Who takes the lines.</param>
public sealed class PortLines(PortLineTaker take) : IPortBytesSink
{
    private readonly List<Port> _ports = [];

    /// <inheritdoc/>
    public void OnBytes(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> bytes)
    {
        var port = Find(stream);
        port.TimeUs = timeUs;
        port.Framer.Push(bytes, port);
    }

    /// <inheritdoc/>
    public void OnHangUp(ReadOnlySpan<byte> stream) => Find(stream).Framer.Reset();

    private Port Find(ReadOnlySpan<byte> stream)
    {
        foreach (var port in _ports)
        {
            if (stream.SequenceEqual(port.Stream))
            {
                return port;
            }
        }

        var added = new Port(stream.ToArray(), take);
        _ports.Add(added);
        return added;
    }

    private sealed class Port(byte[] stream, PortLineTaker take) : ILineSink
    {
        public byte[] Stream { get; } = stream;

        public LineFramer Framer { get; } = new();

        public long TimeUs { get; set; }

        public void OnLine(ReadOnlySpan<byte> line) => take(TimeUs, Stream, line);
    }
}
