using SpeedCommand.Ports.Linux;
using SpeedCommand.Ports.Portable;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>Which way to serial lines the settings chose.</summary>
internal static class SerialDrivers
{
    public static IPortReader Reader(SerialSettings settings)
    {
        var names = new DeviceNames(settings.LinkFolder);
        return settings.Reader == PortReaderKind.Poll ? new PollReader(names, TimeProvider.System) : new PortableReader(names, TimeProvider.System);
    }

    public static IDisplayLine Display(SerialTextSettings display, SerialSettings settings)
    {
        var names = new DeviceNames(settings.LinkFolder);
        return settings.Reader == PortReaderKind.Poll ? new PollDisplayLine(display, names) : new PortableDisplayLine(display, names);
    }
}
