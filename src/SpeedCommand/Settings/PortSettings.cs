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
}
