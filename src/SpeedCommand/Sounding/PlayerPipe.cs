using System.ComponentModel;
using System.Diagnostics;
using System.Globalization;
using System.IO.Pipes;
using System.Runtime.InteropServices;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Ports.Linux;

namespace SpeedCommand.Sounding;

/// <summary>
/// A running player program and the pipe to it. The pipe is one page, which counts as full until the player has emptied it: so what
/// waits in it is never more than the block written last, and what is heard is never old.
/// </summary>
internal sealed class PlayerPipe : IDisposable
{
    /// <summary>What waits in the player itself, µs: short for the ear, long enough for a busy small computer (common practice).</summary>
    private const int BufferUs = 100_000, PeriodUs = 20_000;

    private const int PageBytes = 4096;

    /// <summary>A player that takes nothing for so long hangs.</summary>
    private const int WriteLimitMs = 1000, EndLimitMs = 500;

    /// <summary>A player that ended has said all it will; on a busy machine it takes a while to be read.</summary>
    private const int LastWordsLimitMs = 5000;

    private readonly Process _process;
    private readonly SafeHandle _pipe;
    private readonly string _program;
    private readonly Task<string> _lastWords;

    private PlayerPipe(Process process, string program)
    {
        _process = process;
        _program = program;
        _pipe = ((PipeStream)process.StandardInput.BaseStream).SafePipeHandle;
        var file = (int)_pipe.DangerousGetHandle();
        _ = SystemCalls.FileControl(file, SystemCalls.SetPipeSize, PageBytes);
        _ = SystemCalls.FileControl(file, SystemCalls.SetFlags, SystemCalls.NonBlocking);
        _lastWords = LastLineAsync(process.StandardError);
    }

    /// <summary>What went wrong when a block could not be written: the player's own last words, if it had any.</summary>
    public string Trouble { get; private set; } = "";

    public static PlayerPipe? TryStart(string program, string device, out string trouble)
    {
        string[] arguments =
        [
            "-q", "-t", "raw", "-f", "S16_LE", "-c", "1", "-r", Synthesizer.SampleRateHz.ToString(CultureInfo.InvariantCulture), "-D", device,
            FormattableString.Invariant($"--buffer-time={BufferUs}"), FormattableString.Invariant($"--period-time={PeriodUs}"),
        ];
        try
        {
            var start = new ProcessStartInfo(program, arguments) { RedirectStandardInput = true, RedirectStandardError = true };
            trouble = "";
            return new PlayerPipe(Process.Start(start)!, program);
        }
        catch (Win32Exception fault)
        {
            trouble = $"{program} cannot be started: {fault.Message}; Debian's package alsa-utils has it";
            return null;
        }
    }

    /// <summary>Writes a block; waits for the player to take the one before, but not for ever.</summary>
    /// <returns>False when the player is gone or hangs.</returns>
    public bool TryWrite(ReadOnlySpan<byte> block)
    {
        while (!block.IsEmpty)
        {
            var entry = new PollEntry { File = (int)_pipe.DangerousGetHandle(), Wanted = SystemCalls.Writable };
            if (SystemCalls.Poll(ref entry, 1, WriteLimitMs) == 0)
            {
                Trouble = $"{_program} takes no more samples";
                return false;
            }

            var sent = SystemCalls.Write(entry.File, block, block.Length);
            if (sent < 0 && Marshal.GetLastPInvokeError() is not (SystemCalls.TryAgain or SystemCalls.Interrupted))
            {
                Trouble = $"{_program} ended: {(_lastWords.Wait(LastWordsLimitMs) ? _lastWords.Result : "it gave no reason")}";
                return false;
            }

            block = block[(int)Math.Max(0, sent)..];
        }

        return true;
    }

    /// <summary>Reads all that the player complains about, or it would hang when nobody does.</summary>
    private static async Task<string> LastLineAsync(StreamReader lines)
    {
        var last = "it gave no reason";
        while (await lines.ReadLineAsync().ConfigureAwait(false) is { } line)
        {
            last = string.IsNullOrWhiteSpace(line) ? last : line.Trim();
        }

        return last;
    }

    /// <summary>Ends the player: at the end of its input if it will, else by force.</summary>
    public void Dispose()
    {
        _pipe.Dispose();
        if (!_process.WaitForExit(EndLimitMs))
        {
            _process.Kill();
        }

        _process.Dispose();
    }
}
