using System.Net.Sockets;
using System.Text;

namespace SpeedCommand.Controls;

/// <summary>The other end of the socket: one line out, one line back.</summary>
internal sealed class ControlClient : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(3);

    private readonly Socket _socket = new(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified)
    {
        ReceiveTimeout = (int)Patience.TotalMilliseconds,
        SendTimeout = (int)Patience.TotalMilliseconds,
    };

    /// <summary>Connects.</summary>
    /// <exception cref="SocketException">Nobody listens there, or it is not ours.</exception>
    public ControlClient(string path)
    {
        try
        {
            _socket.Connect(new UnixDomainSocketEndPoint(path));
        }
        catch
        {
            _socket.Dispose();
            throw;
        }
    }

    /// <summary>Asks.</summary>
    /// <param name="line">The line.</param>
    /// <param name="message">What the service says.</param>
    /// <returns>Whether it did what was asked.</returns>
    /// <exception cref="SocketException">The service does not answer.</exception>
    public bool Ask(string line, out string message)
    {
        _socket.Send(Encoding.ASCII.GetBytes(line + "\n"));
        var answer = new StringBuilder();
        var buffer = new byte[512];
        while (answer.Length == 0 || answer[^1] != '\n')
        {
            var count = _socket.Receive(buffer);
            if (count == 0)
            {
                throw new SocketException((int)SocketError.ConnectionReset);
            }

            answer.Append(Encoding.ASCII.GetString(buffer, 0, count));
        }

        message = answer.ToString().TrimEnd();
        var isDone = message.StartsWith(ControlLines.Done, StringComparison.Ordinal);
        message = message[(isDone ? ControlLines.Done.Length : Math.Min(message.Length, ControlLines.Refused.Length))..];
        return isDone;
    }

    public void Dispose() => _socket.Dispose();
}
