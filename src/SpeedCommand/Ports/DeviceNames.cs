using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Ports;

/// <summary>
/// Finds the device that a setting names. A path stands for itself. "usb:SERIAL" is the board with that serial number in
/// whatever socket: the link in the folder whose name udev ended with it, "usb-maker_model_SERIAL-if00-port0".
/// </summary>
/// <param name="linkFolder">Where udev keeps the links.</param>
internal sealed class DeviceNames(string linkFolder)
{
    public const string SerialPrefix = "usb:";
    public const string StandardLinkFolder = "/dev/serial/by-id";

    /// <summary>Looks the path up anew, since it may change with every plugging in.</summary>
    public bool TryResolve(string device, out string path, out PortTrouble trouble)
    {
        trouble = default;
        path = device;
        if (!device.StartsWith(SerialPrefix, StringComparison.Ordinal))
        {
            return true;
        }

        var serial = device[SerialPrefix.Length..];
        var links = Links();
        var matches = Array.FindAll(links, link => HasSerial(link, serial));
        if (matches.Length == 1)
        {
            path = Path.Combine(linkFolder, matches[0]);
            return true;
        }

        trouble = matches.Length == 0
            ? new PortTrouble(Faults.PortMissing, $"{device}: no device with that serial number in {linkFolder}; is it plugged in? {Found()}")
            : new PortTrouble(Faults.PortRefused, $"{device}: {matches.Length} devices have that serial number: {string.Join(", ", matches)}; name one by its path, best under /dev/serial/by-path");
        return false;
    }

    /// <summary>What is plugged in, for someone whose device is not.</summary>
    public string Found() => Links() is { Length: > 0 } links ? $"Found: {string.Join(", ", links)}" : $"Nothing is found in {linkFolder}";

    private string[] Links()
    {
        try
        {
            var names = Array.ConvertAll(Directory.GetFileSystemEntries(linkFolder), path => Path.GetFileName(path));
            Array.Sort(names, StringComparer.Ordinal);
            return names;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            // udev makes the folder with the first device.
            return [];
        }
    }

    /// <summary>The serial number is the last part before the interface, "-if00" or "-if00-port0"; naming the interface too is allowed.</summary>
    internal static bool HasSerial(string link, string serial)
    {
        var interfaceAt = link.LastIndexOf("-if", StringComparison.Ordinal);
        return serial.Length > 0 && (EndsWithPart(link, serial) || (interfaceAt > 0 && EndsWithPart(link[..interfaceAt], serial)));
    }

    private static bool EndsWithPart(string text, string part) =>
        text.EndsWith(part, StringComparison.Ordinal) && (text.Length == part.Length || text[^(part.Length + 1)] is '_' or '-');
}
