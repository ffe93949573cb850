using System.Globalization;
using System.Runtime.InteropServices;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Ports;

/// <summary>Says why a port does not open and how to mend it.</summary>
internal static partial class PortFault
{
    /// <summary>Errors of Linux, errno(3).</summary>
    internal const int NotPermitted = 1, NoSuchFile = 2, Interrupted = 4, InputOutput = 5, NoSuchAddress = 6, Again = 11, AccessDenied = 13,
        Busy = 16, NoSuchDevice = 19, IsFolder = 21, InvalidArgument = 22, NotATerminal = 25;

    /// <summary>Judges a failed open(2), flock(2), tcgetattr(3) or tcsetattr(3).</summary>
    /// <param name="device">The device as the settings name it.</param>
    /// <param name="path">The path that led to.</param>
    /// <param name="error">The error's number.</param>
    /// <param name="baud">The rate asked for.</param>
    public static PortTrouble Explain(string device, string path, int error, int baud)
    {
        var name = path == device ? device : $"{device} ({path})";
        return error switch
        {
            NoSuchFile or NoSuchDevice or NoSuchAddress => new PortTrouble(Faults.PortMissing,
                $"{name}: no such device; is it plugged in? 'ls -l {DeviceNames.StandardLinkFolder}' lists those that are"),
            NotPermitted or AccessDenied => new PortTrouble(Faults.PortRefused, NoPermission(name, path)),
            Busy or Again => new PortTrouble(Faults.PortRefused,
                $"{name}: in use, by another program or under another name in these settings; 'fuser -v {path}' names the program"),
            NotATerminal or IsFolder => new PortTrouble(Faults.PortRefused,
                $"{name}: is {(Directory.Exists(path) ? "a folder" : "a file")}, expected a serial device such as /dev/ttyUSB0"),
            InvalidArgument => new PortTrouble(Faults.PortRefused, $"{name}: the device refuses {baud} baud or the framing asked for"),
            _ => new PortTrouble(Faults.PortRefused, $"{name}: cannot be opened as a serial port: {Marshal.GetPInvokeErrorMessage(error)}"),
        };
    }

    private static string NoPermission(string name, string path)
    {
        var group = GroupOf(path);
        return $"{name}: no permission; its group is '{group}': run 'sudo usermod -aG {group} $USER', then log in again";
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
