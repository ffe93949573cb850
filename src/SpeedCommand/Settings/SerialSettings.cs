using SpeedCommand.Ports;

namespace SpeedCommand.Settings;

/// <summary>The ways there are to serial lines.</summary>
internal enum PortReaderKind
{
    /// <summary>System.IO.Ports.</summary>
    Portable,

    /// <summary>poll(2) and read(2), on Linux.</summary>
    Poll,
}

/// <summary>How serial lines are found and read.</summary>
/// <param name="Reader">Which way.</param>
/// <param name="LinkFolder">Where udev keeps a link with the serial number of each device.</param>
internal sealed record SerialSettings(PortReaderKind Reader, string LinkFolder)
{
    /// <summary>What is used unless the settings say otherwise.</summary>
    public static SerialSettings Standard { get; } =
        new(OperatingSystem.IsLinux() ? PortReaderKind.Poll : PortReaderKind.Portable, DeviceNames.StandardLinkFolder);
}
