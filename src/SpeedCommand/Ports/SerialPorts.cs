using System.IO.Ports;

namespace SpeedCommand.Ports;

/// <summary>Opens and closes serial ports, with the care System.IO.Ports needs.</summary>
internal static class SerialPorts
{
    /// <summary>A port whose other end is gone may hang in Dispose for ever; after this it is left to itself.</summary>
    private static readonly TimeSpan CloseLimit = TimeSpan.FromSeconds(1);

    public static SerialPort Open(string device, int baud)
    {
        var port = new SerialPort(device, baud, Parity.None, 8, StopBits.One) { Handshake = Handshake.None };
        try
        {
            port.Open();
            return port;
        }
        catch
        {
            port.Dispose();
            throw;
        }
    }

    public static async Task CloseAsync(SerialPort port)
    {
        try
        {
            await Task.Run(port.Dispose).WaitAsync(CloseLimit).ConfigureAwait(false);
        }
        catch (Exception fault) when (IsPortFault(fault) || fault is TimeoutException)
        {
            // It is gone either way.
        }
    }

    /// <summary>What opening, reading or closing a port may throw because of the world outside.</summary>
    public static bool IsPortFault(Exception fault) =>
        fault is IOException or UnauthorizedAccessException or ObjectDisposedException or InvalidOperationException or ArgumentException;
}
