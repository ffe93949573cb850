using System.Buffers.Binary;
using System.Runtime.InteropServices;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Linux;

namespace SpeedCommand.Controls;

/// <summary>
/// The keyboard of the terminal the service was started from: keys come at once and are not echoed, Ctrl-C stays what it is. What was
/// changed is put back, however the program ends but by SIGKILL. A service in the background takes no keys: they are the shell's.
/// </summary>
internal sealed partial class TerminalInput : IDisposable
{
    /// <summary>The local flags are the fourth word; ICANON and ECHO in it (termios(3), asm-generic).</summary>
    private const int LocalWord = 12;
    private const uint WholeLines = 2, Echo = 8;

    /// <summary>Which process group the terminal belongs to: TIOCGPGRP.</summary>
    private const nuint GetForeground = 0x540F;

    private readonly int _file;
    private readonly byte[] _before;
    private readonly PosixSignalRegistration? _continued;
    private readonly EventHandler _exiting;
    private int _isRestored;

    private TerminalInput(int file, byte[] before)
    {
        _file = file;
        _before = before;
        // After Ctrl-Z and "fg" the shell has put its own settings there.
        _continued = OperatingSystem.IsWindows() ? null : PosixSignalRegistration.Create(PosixSignal.SIGCONT, _ => TakeKeys());
        _exiting = (_, _) => Restore();
        AppDomain.CurrentDomain.ProcessExit += _exiting;
    }

    /// <summary>Takes the keyboard; null when the file is no terminal, or this is not Linux.</summary>
    public static TerminalInput? TryOpen(int file)
    {
        var before = new byte[TerminalSettings.Size];
        if (!OperatingSystem.IsLinux() || SystemCalls.GetSettings(file, before) != 0)
        {
            return null;
        }

        var input = new TerminalInput(file, before);
        input.TakeKeys();
        return input;
    }

    /// <summary>Reads until told to stop, or until the terminal is gone.</summary>
    public void Run(PanelKeys keys, CancellationToken stop)
    {
        using var wake = new WakeUp();
        using var stopping = stop.Register(wake.Signal);
        Span<PollEntry> entries = [wake.Entry, new PollEntry { File = _file, Wanted = SystemCalls.Readable }];
        Span<byte> buffer = stackalloc byte[64];
        while (!stop.IsCancellationRequested)
        {
            if (SystemCalls.Poll(ref entries[0], (nuint)entries.Length, Timeout.Infinite) < 0)
            {
                if (Marshal.GetLastPInvokeError() != PortFault.Interrupted)
                {
                    return;
                }

                continue;
            }

            if (entries[1].Returned == 0)
            {
                continue;
            }

            if (!IsForeground)
            {
                // Reading would stop the whole service (SIGTTIN).
                stop.WaitHandle.WaitOne(500);
                continue;
            }

            var count = (int)SystemCalls.Read(_file, buffer, buffer.Length);
            if (count <= 0 && !(count < 0 && Marshal.GetLastPInvokeError() is PortFault.Again or PortFault.Interrupted))
            {
                return;
            }

            keys.Take(buffer[..Math.Max(0, count)]);
        }
    }

    public void Dispose()
    {
        _continued?.Dispose();
        AppDomain.CurrentDomain.ProcessExit -= _exiting;
        Restore();
    }

    /// <summary>A terminal that is nobody's controlling terminal has no background.</summary>
    private bool IsForeground
    {
        get
        {
            Span<byte> group = stackalloc byte[sizeof(int)];
            return SystemCalls.Control(_file, GetForeground, group) != 0 || BinaryPrimitives.ReadInt32LittleEndian(group) == ProcessGroup();
        }
    }

    private void TakeKeys()
    {
        if (_isRestored != 0 || !IsForeground)
        {
            return;
        }

        Span<byte> settings = stackalloc byte[TerminalSettings.Size];
        _before.CopyTo(settings);
        var local = BinaryPrimitives.ReadUInt32LittleEndian(settings[LocalWord..]) & ~(WholeLines | Echo);
        BinaryPrimitives.WriteUInt32LittleEndian(settings[LocalWord..], local);
        _ = SystemCalls.SetSettings(_file, 0, settings);
    }

    private void Restore()
    {
        if (Interlocked.Exchange(ref _isRestored, 1) == 0 && IsForeground)
        {
            _ = SystemCalls.SetSettings(_file, 0, _before);
        }
    }

    [LibraryImport("libc", EntryPoint = "getpgrp")]
    private static partial int ProcessGroup();
}
