using System.Globalization;
using System.Runtime.InteropServices;

namespace SpeedCommand.Ports;

/// <summary>
/// Says why a port does not open and how to mend it. System.IO.Ports throws UnauthorizedAccessException for everything and
/// hides the cause in the inner message, so the file itself is asked.
/// </summary>
internal static partial class PortFault
{
    public static string Explain(string device, Exception fault)
    {
        var cause = fault.InnerException?.Message ?? fault.Message;
        if (!File.Exists(device))
        {
            return $"{device}: no such device; is it plugged in? 'ls -l /dev/serial/by-id' lists those that are";
        }

        if (cause.Contains("ermission denied", StringComparison.Ordinal))
        {
            var group = GroupOf(device);
            return $"{device}: no permission; its group is '{group}': run 'sudo usermod -aG {group} $USER', then log in again";
        }

        return cause.Contains("busy", StringComparison.OrdinalIgnoreCase)
            ? $"{device}: in use by another program; 'fuser -v {device}' names it"
            : $"{device}: cannot be opened as a serial port: {cause}";
    }

    /// <summary>Name of the group that owns a file, or its number when it has no name.</summary>
    internal static string GroupOf(string path)
    {
        var status = default(FileStatus);
        if (ReadStatus(CurrentFolder, path, 0, GroupWanted, ref status) != 0)
        {
            return "dialout";
        }

        var number = status.GroupId.ToString(CultureInfo.InvariantCulture);
        try
        {
            return File.ReadLines("/etc/group").Select(line => line.Split(':'))
                .FirstOrDefault(fields => fields.Length > 2 && fields[2] == number)?[0] ?? number;
        }
        catch (IOException)
        {
            return number;
        }
    }

    private const int CurrentFolder = -100;
    private const uint GroupWanted = 0x10;

    /// <summary>The kernel's own file status record has one layout on every machine, unlike the C library's.</summary>
    [StructLayout(LayoutKind.Explicit, Size = 256)]
    private struct FileStatus
    {
        [FieldOffset(24)]
        public uint GroupId;
    }

    [LibraryImport("libc", EntryPoint = "statx", StringMarshalling = StringMarshalling.Utf8)]
    private static partial int ReadStatus(int folder, string path, int flags, uint mask, ref FileStatus status);
}
