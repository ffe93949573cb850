using System.Runtime.InteropServices;

namespace SpeedCommand.Ports.Linux;

/// <summary>
/// An open serial line: raw, never waiting, locked against a second reader. The lock is advisory (flock) and holds between
/// services of any user; TIOCEXCL keeps every other program out but root's.
/// </summary>
internal sealed class LinuxLine : IDisposable
{
    private const int Flags = SystemCalls.ReadWrite | SystemCalls.NoControllingTerminal | SystemCalls.CloseOnExec | SystemCalls.NonBlocking;

    private int _file;

    private LinuxLine(int file) => _file = file;

    /// <summary>The file's number for poll(2); negative once closed.</summary>
    public int File => _file;

    /// <summary>Opens a line and sets it; null and why when it cannot be.</summary>
    public static LinuxLine? TryOpen(string device, string path, int baud, LineFraming framing, out PortTrouble trouble)
    {
        var line = TryLock(device, path, baud, out trouble);
        if (line is null)
        {
            return null;
        }

        if (!TerminalSettings.TrySet(line._file, baud, framing))
        {
            trouble = PortFault.Explain(device, path, Marshal.GetLastPInvokeError(), baud);
            line.Dispose();
            return null;
        }

        _ = SystemCalls.Control(line._file, SystemCalls.MakeExclusive, []);
        return line;
    }

    /// <summary>Opens a line only to hold its lock, leaving its settings to someone else; null and why when it cannot be.</summary>
    public static LinuxLine? TryLock(string device, string path, int baud, out PortTrouble trouble)
    {
        trouble = default;
        var file = SystemCalls.Open(path, Flags);
        var line = file < 0 ? null : new LinuxLine(file);
        if (line is not null && TerminalSettings.IsTerminal(file)
            && SystemCalls.Lock(file, SystemCalls.LockExclusive | SystemCalls.LockWithoutWaiting) == 0)
        {
            return line;
        }

        trouble = PortFault.Explain(device, path, Marshal.GetLastPInvokeError(), baud);
        line?.Dispose();
        return null;
    }

    /// <summary>Reads what has come; false when the line is gone.</summary>
    /// <param name="buffer">Where to.</param>
    /// <param name="count">Bytes read; 0 when there is nothing now.</param>
    public bool TryRead(Span<byte> buffer, out int count)
    {
        count = (int)SystemCalls.Read(_file, buffer, buffer.Length);
        if (count > 0)
        {
            return true;
        }

        var isIdle = count < 0 && Marshal.GetLastPInvokeError() is PortFault.Again or PortFault.Interrupted;
        count = 0;
        return isIdle;
    }

    /// <summary>Writes as much as the line takes now; false when it is gone.</summary>
    public bool TryWrite(ReadOnlySpan<byte> bytes, out int count)
    {
        count = (int)SystemCalls.Write(_file, bytes, bytes.Length);
        if (count >= 0)
        {
            return true;
        }

        count = 0;
        return Marshal.GetLastPInvokeError() is PortFault.Again or PortFault.Interrupted;
    }

    /// <summary>Bytes written that have not left yet; 0 where the driver does not know.</summary>
    public int Unsent
    {
        get
        {
            Span<byte> count = stackalloc byte[sizeof(int)];
            return SystemCalls.Control(_file, SystemCalls.CountUnsent, count) == 0 ? BitConverter.ToInt32(count) : 0;
        }
    }

    public void Dispose()
    {
        if (_file >= 0)
        {
            if (Unsent > 0)
            {
                // Else closing may wait half a minute for a stuck receiver.
                _ = SystemCalls.Flush(_file, SystemCalls.Unsent);
            }

            _ = SystemCalls.Close(_file);
            _file = -1;
        }
    }
}
