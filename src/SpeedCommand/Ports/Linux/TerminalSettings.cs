using System.Buffers.Binary;

namespace SpeedCommand.Ports.Linux;

/// <summary>
/// Sets a terminal to raw bytes, a rate and a framing. The C library's record is opaque except for its first four words, the
/// input, output, control and local flags, which every Linux C library keeps in this order (termios(3)).
/// </summary>
internal static class TerminalSettings
{
    /// <summary>Larger than any platform's terminal settings record.</summary>
    internal const int Size = 128;

    private const int InputWord = 0, ControlWord = 8;

    /// <summary>Input flags: check parity, XON/XOFF out and in.</summary>
    internal const uint CheckParity = 0x10, SoftwareFlow = 0x400 | 0x1000;

    /// <summary>Control flags.</summary>
    internal const uint BitsMask = 0x30, SevenBits = 0x20, EightBits = 0x30, TwoStopBits = 0x40, Receiver = 0x80,
        Parity = 0x100, OddParity = 0x200, IgnoreModemLines = 0x800, HardwareFlow = 0x8000_0000;

    /// <summary>The kernel's own record, for rates the C library has no name for (TCGETS2, TCSETS2, ioctl_tty(2)).</summary>
    private const nuint GetKernelSettings = 0x802C_542A, SetKernelSettings = 0x402C_542B;

    private const int KernelSize = 44, InputRateWord = 36, OutputRateWord = 40;
    private const uint NamedRateMask = 0x100F, RateAsNumber = 0x1000;

    /// <summary>Whether a file is a terminal at all; else the error is the last one.</summary>
    public static bool IsTerminal(int file) => SystemCalls.GetSettings(file, stackalloc byte[Size]) == 0;

    /// <summary>Sets a terminal; false with the last error when it cannot be set so.</summary>
    public static bool TrySet(int file, int baud, LineFraming framing)
    {
        Span<byte> settings = stackalloc byte[Size];
        if (SystemCalls.GetSettings(file, settings) != 0)
        {
            return false;
        }

        SystemCalls.MakeRaw(settings);
        Frame(settings, framing);
        var isNamedRate = SystemCalls.SetSpeed(settings, (uint)baud) == 0;
        return SystemCalls.SetSettings(file, 0, settings) == 0 && (isNamedRate || TrySetRate(file, baud));
    }

    /// <summary>Puts a framing into a record.</summary>
    internal static void Frame(Span<byte> settings, LineFraming framing)
    {
        var control = BinaryPrimitives.ReadUInt32LittleEndian(settings[ControlWord..]);
        control &= ~(BitsMask | TwoStopBits | Parity | OddParity | HardwareFlow);
        control |= Receiver | IgnoreModemLines | (framing.DataBits == 7 ? SevenBits : EightBits);
        control |= framing.StopBits == 2 ? TwoStopBits : 0;
        control |= framing.Parity switch { LineParity.Even => Parity, LineParity.Odd => Parity | OddParity, _ => 0 };
        control |= framing.Flow == LineFlow.RtsCts ? HardwareFlow : 0;
        BinaryPrimitives.WriteUInt32LittleEndian(settings[ControlWord..], control);
        var input = BinaryPrimitives.ReadUInt32LittleEndian(settings[InputWord..]) & ~(CheckParity | SoftwareFlow);
        // A byte of wrong parity comes in as NUL, which no sentence survives.
        input |= framing.Parity == LineParity.None ? 0 : CheckParity;
        input |= framing.Flow == LineFlow.XonXoff ? SoftwareFlow : 0;
        BinaryPrimitives.WriteUInt32LittleEndian(settings[InputWord..], input);
    }

    private static bool TrySetRate(int file, int baud)
    {
        Span<byte> settings = stackalloc byte[KernelSize];
        if (SystemCalls.Control(file, GetKernelSettings, settings) != 0)
        {
            return false;
        }

        var control = BinaryPrimitives.ReadUInt32LittleEndian(settings[ControlWord..]);
        BinaryPrimitives.WriteUInt32LittleEndian(settings[ControlWord..], (control & ~NamedRateMask) | RateAsNumber);
        BinaryPrimitives.WriteUInt32LittleEndian(settings[InputRateWord..], (uint)baud);
        BinaryPrimitives.WriteUInt32LittleEndian(settings[OutputRateWord..], (uint)baud);
        return SystemCalls.Control(file, SetKernelSettings, settings) == 0;
    }
}
