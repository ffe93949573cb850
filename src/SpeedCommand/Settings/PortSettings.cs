using SpeedCommand.Pipeline;
using SpeedCommand.Ports;
using SpeedCommand.Sentences;

namespace SpeedCommand.Settings;

/// <summary>One serial port with a sensor board behind it.</summary>
/// <param name="Name">The stream's name in logs.</param>
/// <param name="Device">Path of the device, best a stable one under /dev/serial, or "usb:" with its serial number.</param>
/// <param name="Baud">Bits a second.</param>
/// <param name="Checksum">Whether sentences may lack a checksum.</param>
internal sealed record PortSettings(string Name, string Device, int Baud, ChecksumRule Checksum)
{
    /// <summary>Data bits, parity, stop bits, flow control.</summary>
    public LineFraming Framing { get; init; } = LineFraming.Standard;

    /// <summary>What the pipeline must know of its lines; standard is sentences, whose transmission took no time.</summary>
    public StreamSettings Stream { get; init; } = StreamSettings.Sentences(Checksum);

    /// <summary>Whether a stream may have this name: logs have it between spaces, and "truth" is the simulator's.</summary>
    public static bool IsStreamName(string name) => name.Length is > 0 and <= 32 && name != "truth"
        && name.All(character => char.IsAsciiLetterOrDigit(character) || character is '-' or '_');
}
