using System.IO.Ports;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports.Linux;

namespace SpeedCommand.Ports.Portable;

/// <summary>An open System.IO.Ports port, with the care that library needs, and on Linux the lock that keeps a second service out.</summary>
internal sealed class PortableLine : IAsyncDisposable
{
    /// <summary>A port whose other end is gone may hang in Dispose for ever; after this it is left to itself.</summary>
    private static readonly TimeSpan CloseLimit = TimeSpan.FromSeconds(1);

    private readonly LinuxLine? _lock;
    private Task? _closing;

    private PortableLine(SerialPort port, LinuxLine? held)
    {
        Port = port;
        _lock = held;
    }

    public SerialPort Port { get; }

    /// <summary>The closing of the port, begun by asking; on a thread of its own, as it may hang.</summary>
    public Task Closing => _closing ??= Task.Factory.StartNew(Port.Dispose, CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);

    /// <summary>Opens a port; false and why when it cannot be.</summary>
    public static bool TryOpen(string device, string path, int baud, LineFraming framing, out PortableLine line, out PortTrouble trouble)
    {
        line = null!;
        trouble = default;
        LinuxLine? held = null;
        // Taking the lock also tells the true cause of a failure, which the library hides in an inner message.
        if (OperatingSystem.IsLinux() && (held = LinuxLine.TryLock(device, path, baud, out trouble)) is null)
        {
            return false;
        }

        SerialPort? port = null;
        try
        {
            port = new SerialPort(path, baud, ParityOf(framing), framing.DataBits, framing.StopBits == 2 ? StopBits.Two : StopBits.One)
            {
                Handshake = HandshakeOf(framing),
            };
            port.Open();
            line = new PortableLine(port, held);
            return true;
        }
        catch (Exception fault) when (IsPortFault(fault))
        {
            trouble = new PortTrouble(Faults.PortRefused, $"{device}: cannot be opened as a serial port: {fault.InnerException?.Message ?? fault.Message}");
            port?.Dispose();
            held?.Dispose();
            return false;
        }
    }

    /// <summary>What opening, reading, writing or closing a port may throw because of the world outside.</summary>
    public static bool IsPortFault(Exception fault) =>
        fault is IOException or UnauthorizedAccessException or ObjectDisposedException or InvalidOperationException or ArgumentException;

    public async ValueTask DisposeAsync()
    {
        try
        {
            await Closing.WaitAsync(CloseLimit).ConfigureAwait(false);
        }
        catch (Exception fault) when (IsPortFault(fault) || fault is TimeoutException)
        {
            // It is gone either way.
        }
        finally
        {
            _lock?.Dispose();
        }
    }

    private static Parity ParityOf(LineFraming framing) => framing.Parity switch
    {
        LineParity.Even => Parity.Even,
        LineParity.Odd => Parity.Odd,
        _ => Parity.None,
    };

    private static Handshake HandshakeOf(LineFraming framing) => framing.Flow switch
    {
        LineFlow.RtsCts => Handshake.RequestToSend,
        LineFlow.XonXoff => Handshake.XOnXOff,
        _ => Handshake.None,
    };
}
