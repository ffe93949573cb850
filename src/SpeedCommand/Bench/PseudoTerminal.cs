using System.Runtime.InteropServices;
using System.Text;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Linux;

namespace SpeedCommand.Bench;

/// <summary>
/// A serial line without hardware: what is written here comes out of <see cref="DevicePath"/>, which opens like any serial
/// port. POSIX pseudo-terminals (posix_openpt), in raw mode from the start so that nothing is echoed.
/// </summary>
internal sealed partial class PseudoTerminal : IDisposable
{
    private int _master;

    /// <summary>Creates a pair.</summary>
    /// <exception cref="IOException">The system gives no pseudo-terminal.</exception>
    public PseudoTerminal()
    {
        _master = OpenMaster(
            SystemCalls.ReadWrite | SystemCalls.NoControllingTerminal | SystemCalls.CloseOnExec | SystemCalls.NonBlocking);
        var name = new byte[128];
        var settings = new byte[TerminalSettings.Size];
        Check(_master < 0 ? -1 : 0, "posix_openpt");
        Check(Grant(_master), "grantpt");
        Check(Unlock(_master), "unlockpt");
        Check(NameOf(_master, name, name.Length), "ptsname_r");
        Check(SystemCalls.GetSettings(_master, settings), "tcgetattr");
        SystemCalls.MakeRaw(settings);
        Check(SystemCalls.SetSettings(_master, 0, settings), "tcsetattr");
        DevicePath = Encoding.UTF8.GetString(name, 0, Array.IndexOf(name, (byte)0));
    }

    /// <summary>Path of the end that opens like a serial port.</summary>
    public string DevicePath { get; }

    /// <summary>Writes as much as the line takes now.</summary>
    /// <param name="bytes">The bytes.</param>
    /// <returns>How many were taken: 0 when the line is full.</returns>
    /// <exception cref="IOException">The line is broken.</exception>
    public int Write(ReadOnlySpan<byte> bytes) => Result(SystemCalls.Write(_master, bytes, bytes.Length), "write");

    /// <summary>Reads what the other end has written.</summary>
    /// <param name="buffer">Where to.</param>
    /// <returns>How many bytes: 0 when there is nothing now, or nobody has the other end open.</returns>
    public int Read(Span<byte> buffer) => Math.Max(0, (int)SystemCalls.Read(_master, buffer, buffer.Length));

    /// <summary>Pulls the plug: the other end sees a hang-up.</summary>
    public void Dispose()
    {
        if (_master >= 0)
        {
            _ = SystemCalls.Close(_master);
            _master = -1;
        }
    }

    private static int Result(nint result, string call)
    {
        if (result >= 0)
        {
            return (int)result;
        }

        return Marshal.GetLastPInvokeError() is PortFault.Again or PortFault.Interrupted ? 0 : throw Fault(call);
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
}
