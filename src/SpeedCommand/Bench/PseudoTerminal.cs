using System.Runtime.InteropServices;
using System.Text;

namespace SpeedCommand.Bench;

/// <summary>
/// A serial line without hardware: what is written here comes out of <see cref="DevicePath"/>, which opens like any serial
/// port. POSIX pseudo-terminals (posix_openpt), in raw mode from the start so that nothing is echoed.
/// </summary>
internal sealed partial class PseudoTerminal : IDisposable
{
    private const int ReadWrite = 2, NoControllingTerminal = 0x100, CloseOnExec = 0x80000, NonBlocking = 0x800;
    private const int WouldBlock = 11, Interrupted = 4;

    /// <summary>Larger than any platform's terminal settings record.</summary>
    private const int SettingsSize = 128;

    private int _master;

    /// <summary>Creates a pair.</summary>
    /// <exception cref="IOException">The system gives no pseudo-terminal.</exception>
    public PseudoTerminal()
    {
        _master = OpenMaster(ReadWrite | NoControllingTerminal | CloseOnExec | NonBlocking);
        var name = new byte[128];
        var settings = new byte[SettingsSize];
        Check(_master < 0 ? -1 : 0, "posix_openpt");
        Check(Grant(_master), "grantpt");
        Check(Unlock(_master), "unlockpt");
        Check(NameOf(_master, name, name.Length), "ptsname_r");
        Check(GetSettings(_master, settings), "tcgetattr");
        MakeRaw(settings);
        Check(SetSettings(_master, 0, settings), "tcsetattr");
        DevicePath = Encoding.UTF8.GetString(name, 0, Array.IndexOf(name, (byte)0));
    }

    /// <summary>Path of the end that opens like a serial port.</summary>
    public string DevicePath { get; }

    /// <summary>Writes as much as the line takes now.</summary>
    /// <param name="bytes">The bytes.</param>
    /// <returns>How many were taken: 0 when the line is full.</returns>
    /// <exception cref="IOException">The line is broken.</exception>
    public int Write(ReadOnlySpan<byte> bytes) => Result(WriteBytes(_master, bytes, bytes.Length), "write");

    /// <summary>Reads what the other end has written.</summary>
    /// <param name="buffer">Where to.</param>
    /// <returns>How many bytes: 0 when there is nothing now, or nobody has the other end open.</returns>
    public int Read(Span<byte> buffer) => Math.Max(0, (int)ReadBytes(_master, buffer, buffer.Length));

    /// <summary>Pulls the plug: the other end sees a hang-up.</summary>
    public void Dispose()
    {
        if (_master >= 0)
        {
            _ = Close(_master);
            _master = -1;
        }
    }

    private static int Result(nint result, string call)
    {
        if (result >= 0)
        {
            return (int)result;
        }

        return Marshal.GetLastPInvokeError() is WouldBlock or Interrupted ? 0 : throw Fault(call);
    }

    private static void Check(int result, string call)
    {
        if (result != 0)
        {
            throw Fault(call);
        }
    }

    private static IOException Fault(string call) => new($"{call}: {Marshal.GetLastPInvokeErrorMessage()}");

    [LibraryImport("libc", EntryPoint = "posix_openpt", SetLastError = true)]
    private static partial int OpenMaster(int flags);

    [LibraryImport("libc", EntryPoint = "grantpt", SetLastError = true)]
    private static partial int Grant(int master);

    [LibraryImport("libc", EntryPoint = "unlockpt", SetLastError = true)]
    private static partial int Unlock(int master);

    [LibraryImport("libc", EntryPoint = "ptsname_r", SetLastError = true)]
    private static partial int NameOf(int master, [Out] byte[] name, nint length);

    [LibraryImport("libc", EntryPoint = "tcgetattr", SetLastError = true)]
    private static partial int GetSettings(int terminal, [Out] byte[] settings);

    [LibraryImport("libc", EntryPoint = "cfmakeraw")]
    private static partial void MakeRaw([In, Out] byte[] settings);

    [LibraryImport("libc", EntryPoint = "tcsetattr", SetLastError = true)]
    private static partial int SetSettings(int terminal, int when, [In] byte[] settings);

    [LibraryImport("libc", EntryPoint = "write", SetLastError = true)]
    private static partial nint WriteBytes(int file, ReadOnlySpan<byte> bytes, nint count);

    [LibraryImport("libc", EntryPoint = "read", SetLastError = true)]
    private static partial nint ReadBytes(int file, Span<byte> bytes, nint count);

    [LibraryImport("libc", EntryPoint = "close", SetLastError = true)]
    private static partial int Close(int file);
}
