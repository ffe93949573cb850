using System.Runtime.InteropServices;

namespace SpeedCommand.Ports.Linux;

/// <summary>One entry of poll(2); a negative file is skipped.</summary>
[StructLayout(LayoutKind.Sequential)]
internal struct PollEntry
{
    public int File;
    public short Wanted;
    public short Returned;
}

/// <summary>
/// The C library's calls that serial lines need, with the numbers Linux gives them on x64, arm, arm64 and RISC-V
/// (asm-generic). The error of a failed call is <see cref="Marshal.GetLastPInvokeError"/>.
/// </summary>
internal static partial class SystemCalls
{
    /// <summary>Flags of open(2) and posix_openpt(3).</summary>
    public const int ReadWrite = 2, NoControllingTerminal = 0x100, NonBlocking = 0x800, CloseOnExec = 0x80000;

    /// <summary>Events of poll(2); Broken is any of POLLERR, POLLHUP and POLLNVAL.</summary>
    public const short Readable = 1, Writable = 4, Broken = 8 | 16 | 32;

    /// <summary>Requests of fcntl(2): flags of an open file; how much a pipe holds, in bytes.</summary>
    public const int SetFlags = 4, SetPipeSize = 1031;

    /// <summary>Errors that are none: EINTR, EAGAIN.</summary>
    public const int Interrupted = 4, TryAgain = 11;

    /// <summary>Exclusive, and not waiting for it: flock(2).</summary>
    public const int LockExclusive = 2, LockWithoutWaiting = 4;

    /// <summary>What tcflush(3) drops: what was not sent yet.</summary>
    public const int Unsent = 1;

    /// <summary>Requests of ioctl(2): nobody else may open the terminal (TIOCEXCL); bytes not sent yet (TIOCOUTQ).</summary>
    public const nuint MakeExclusive = 0x540C, CountUnsent = 0x5411;

    [LibraryImport("libc", EntryPoint = "open", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Open(string path, int flags);

    [LibraryImport("libc", EntryPoint = "close", SetLastError = true)]
    public static partial int Close(int file);

    [LibraryImport("libc", EntryPoint = "read", SetLastError = true)]
    public static partial nint Read(int file, Span<byte> buffer, nint count);

    [LibraryImport("libc", EntryPoint = "write", SetLastError = true)]
    public static partial nint Write(int file, ReadOnlySpan<byte> bytes, nint count);

    [LibraryImport("libc", EntryPoint = "poll", SetLastError = true)]
    public static partial int Poll(ref PollEntry entries, nuint count, int timeoutMs);

    [LibraryImport("libc", EntryPoint = "eventfd", SetLastError = true)]
    public static partial int OpenEvent(uint count, int flags);

    [LibraryImport("libc", EntryPoint = "flock", SetLastError = true)]
    public static partial int Lock(int file, int operation);

    [LibraryImport("libc", EntryPoint = "ioctl", SetLastError = true)]
    public static partial int Control(int file, nuint request, Span<byte> argument);

    [LibraryImport("libc", EntryPoint = "fcntl", SetLastError = true)]
    public static partial int FileControl(int file, int request, int argument);

    [LibraryImport("libc", EntryPoint = "tcgetattr", SetLastError = true)]
    public static partial int GetSettings(int file, Span<byte> settings);

    [LibraryImport("libc", EntryPoint = "tcsetattr", SetLastError = true)]
    public static partial int SetSettings(int file, int when, ReadOnlySpan<byte> settings);

    [LibraryImport("libc", EntryPoint = "cfmakeraw")]
    public static partial void MakeRaw(Span<byte> settings);

    [LibraryImport("libc", EntryPoint = "cfsetspeed", SetLastError = true)]
    public static partial int SetSpeed(Span<byte> settings, uint baud);

    [LibraryImport("libc", EntryPoint = "tcflush", SetLastError = true)]
    public static partial int Flush(int file, int queue);
}
