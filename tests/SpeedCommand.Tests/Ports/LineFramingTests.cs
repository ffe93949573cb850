using System.Buffers.Binary;
using System.Diagnostics;
using SpeedCommand.Bench;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Linux;

namespace SpeedCommand.Tests.Ports;

public sealed class LineFramingTests
{
    [Theory]
    [InlineData("8N1", 10)]
    [InlineData("7E1", 10)]
    [InlineData("8O2", 12)]
    [InlineData("7N2 rts/cts", 10)]
    [InlineData("8N1 xon/xoff", 10)]
    public void UsualNotation_IsReadAndWritten(string text, int bitsPerByte)
    {
        Assert.True(LineFraming.TryParse(text, out var framing, out _));
        Assert.Equal((text, bitsPerByte), (framing.ToString(), framing.BitsPerByte));
    }

    [Theory]
    [InlineData("")]
    [InlineData("8N")]
    [InlineData("6N1")]
    [InlineData("8n1")]
    [InlineData("8N3")]
    [InlineData("8N1 ")]
    [InlineData("8N1rts/cts")]
    [InlineData("8N1 dtr/dsr")]
    public void AnythingElse_SaysWhatIsExpected(string text)
    {
        Assert.False(LineFraming.TryParse(text, out _, out var problem));
        Assert.Equal($"expected 7 or 8, N, E or O, 1 or 2, and perhaps 'rts/cts' or 'xon/xoff', such as '8N1', found '{text}'", problem);
    }

    /// <summary>stty (GNU coreutils), which knows nothing of this program, reads back what was set. A pseudo-terminal has no parity and always 8 bits.</summary>
    [LinuxTheory]
    [InlineData(4800, "8N1", "speed 4800 baud", "-cstopb", "-crtscts", "-ixon", "-icanon", "-echo", "clocal")]
    [InlineData(115200, "8N2", "speed 115200 baud", "cstopb")]
    [InlineData(4000000, "8N1 rts/cts", "speed 4000000 baud", "crtscts")]
    [InlineData(9600, "8N1 xon/xoff", "speed 9600 baud", "ixon", "ixoff")]
    [InlineData(9600, "8E1", "inpck")]
    public void Settings_AreThoseThatSttySees(int baud, string text, params string[] expected)
    {
        using var terminal = new PseudoTerminal();
        Assert.True(LineFraming.TryParse(text, out var framing, out _));
        using var line = LinuxLine.TryOpen("test", terminal.DevicePath, baud, framing, out var trouble);
        Assert.True(line is not null, trouble.Text);
        using var stty = Process.Start(new ProcessStartInfo("stty", ["-a", "-F", terminal.DevicePath]) { RedirectStandardOutput = true })!;
        var words = stty.StandardOutput.ReadToEnd().Replace(";", " ; ", StringComparison.Ordinal).ReplaceLineEndings(" ");
        Assert.All(expected, word => Assert.Contains($" {word} ", $" {words} ", StringComparison.Ordinal));
    }

    [LinuxFact]
    public void RateWithoutAName_GoesToTheKernelAsANumber()
    {
        using var terminal = new PseudoTerminal();
        using var line = LinuxLine.TryOpen("test", terminal.DevicePath, 250_000, LineFraming.Standard, out var trouble);
        Assert.True(line is not null, trouble.Text);
        // struct termios2 of asm-generic/termbits.h: four flag words, the line, 19 control characters, then the two rates.
        var settings = new byte[44];
        Assert.Equal(0, SystemCalls.Control(line.File, 0x802C_542A, settings));
        Assert.Equal([250_000, 250_000], [BitConverter.ToInt32(settings, 36), BitConverter.ToInt32(settings, 40)]);
    }

    /// <summary>Flag bits of asm-generic/termbits.h, written there in octal: CSIZE 060, CS7 040, CS8 060, CSTOPB 0100, PARENB 0400, PARODD 01000.</summary>
    [Theory]
    [InlineData("7E1", 0x20 | 0x100)]
    [InlineData("7O2", 0x20 | 0x100 | 0x200 | 0x40)]
    [InlineData("8N1", 0x30)]
    [InlineData("8N1 rts/cts", 0x80000030)]
    public void Framing_SetsTheFlagsOfTheKernel(string text, uint expected)
    {
        Assert.True(LineFraming.TryParse(text, out var framing, out _));
        foreach (var before in new byte[] { 0x00, 0xFF })
        {
            var settings = new byte[TerminalSettings.Size];
            Array.Fill(settings, before);
            TerminalSettings.Frame(settings, framing);
            Assert.Equal(expected, BinaryPrimitives.ReadUInt32LittleEndian(settings.AsSpan(8)) & 0x8000_0370);
        }
    }
}
