using SpeedCommand.Ports;

namespace SpeedCommand.Settings;

/// <summary>How the pilot's controls are reached, and where they are kept.</summary>
/// <param name="Socket">Path of the local socket; null for none.</param>
/// <param name="StateFile">Where controls are kept over a restart; null for nowhere.</param>
/// <param name="HasKeys">Whether the panel takes keys.</param>
/// <param name="Port">Serial port of knobs and buttons; null for none.</param>
/// <param name="DumpKgPerS">How fast ballast runs out when the pilot does not say, kg/s.</param>
internal sealed record ControlSettings(string? Socket, string? StateFile, bool HasKeys, ControlPortSettings? Port, double DumpKgPerS)
{
    /// <summary>Two valves of a usual wing, kg/s: 100 l in two and a half minutes (common practice).</summary>
    public const double StandardDumpKgPerS = 0.7;

    /// <summary>No way in but the program's own.</summary>
    public static ControlSettings None { get; } = new(null, null, HasKeys: false, null, StandardDumpKgPerS);
}

/// <summary>Serial port of knobs and buttons.</summary>
/// <param name="Device">Path of the device, or "usb:" with its serial number.</param>
/// <param name="Baud">Bits a second.</param>
/// <param name="Framing">Data bits, parity, stop bits, flow control.</param>
internal sealed record ControlPortSettings(string Device, int Baud, LineFraming Framing);
