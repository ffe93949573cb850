using System.Diagnostics;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>A test on a small file system of its own in memory: needs Linux, and a root who may mount.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class MountFactAttribute : FactAttribute
{
    private static readonly string? Obstacle = FindObstacle();

    public MountFactAttribute() => Skip = Obstacle;

    /// <summary>Runs mount or umount; false when it may not.</summary>
    public static bool Run(string program, params string[] arguments)
    {
        using var process = Process.Start(new ProcessStartInfo(program, arguments) { RedirectStandardError = true })!;
        process.StandardError.ReadToEnd();
        process.WaitForExit();
        return process.ExitCode == 0;
    }

    private static string? FindObstacle()
    {
        if (!OperatingSystem.IsLinux() || Environment.UserName != "root" || !(File.Exists("/usr/bin/mount") || File.Exists("/bin/mount")))
        {
            return "needs Linux and root to mount a small file system";
        }

        var folder = Directory.CreateTempSubdirectory().FullName;
        var isAllowed = Run("mount", "-t", "tmpfs", "-o", "size=64k", "tmpfs", folder);
        if (isAllowed)
        {
            Run("umount", folder);
        }

        Directory.Delete(folder);
        return isAllowed ? null : "root may not mount here, as in a container without CAP_SYS_ADMIN";
    }
}
