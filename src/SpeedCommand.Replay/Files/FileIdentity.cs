using System.Runtime.InteropServices;

namespace SpeedCommand.Replay.Files;

/// <summary>
/// What makes two names one file. On Linux device and inode, so that symbolic and hard links count; elsewhere, and for a file that
/// is not there, the full path with links followed.
/// </summary>
/// <param name="Device">The device, major and minor; 0 when only the path is known.</param>
/// <param name="Inode">The inode; 0 when only the path is known.</param>
/// <param name="Path">The path when nothing better is known, else empty.</param>
/// <param name="IsSpecial">Whether it is a pipe or a device, which opening to try would disturb.</param>
internal readonly partial record struct FileIdentity(ulong Device, ulong Inode, string Path, bool IsSpecial)
{
    private const int AtCurrentFolder = -100;
    private const uint TypeModeAndInode = 0x001 | 0x002 | 0x100;
    private const int TypeBits = 0xF000, RegularFile = 0x8000;

    public static FileIdentity Of(string path)
    {
        if (OperatingSystem.IsLinux() && TryStat(path, out var status))
        {
            return new FileIdentity((ulong)status.DeviceMajor << 32 | status.DeviceMinor, status.Inode, "", (status.Mode & TypeBits) != RegularFile);
        }

        var full = System.IO.Path.GetFullPath(path);
        var target = File.Exists(path) ? File.ResolveLinkTarget(path, returnFinalTarget: true)?.FullName ?? full : full;
        return new FileIdentity(0, 0, OperatingSystem.IsWindows() ? target.ToUpperInvariant() : target, false);
    }

    private static bool TryStat(string path, out FileStatus status)
    {
        try
        {
            return StatX(AtCurrentFolder, path, 0, TypeModeAndInode, out status) == 0;
        }
        catch (EntryPointNotFoundException)
        {
            // A C library older than the call: the path must do.
            status = default;
            return false;
        }
    }

    [LibraryImport("libc", EntryPoint = "statx", StringMarshalling = StringMarshalling.Utf8)]
    private static partial int StatX(int folder, string path, int flags, uint mask, out FileStatus status);

    /// <summary>struct statx of linux/stat.h; unlike struct stat it is laid out alike on every processor.</summary>
    [StructLayout(LayoutKind.Explicit, Size = 256)]
    private struct FileStatus
    {
        [FieldOffset(28)]
        public ushort Mode;

        [FieldOffset(32)]
        public ulong Inode;

        [FieldOffset(136)]
        public uint DeviceMajor;

        [FieldOffset(140)]
        public uint DeviceMinor;
    }
}
