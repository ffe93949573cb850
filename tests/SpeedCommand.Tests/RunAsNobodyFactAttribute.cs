using System.Diagnostics;

namespace SpeedCommand.Tests;

/// <summary>A test that runs the program as nobody: needs root, setpriv, and a runtime and program that nobody may read.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class RunAsNobodyFactAttribute : FactAttribute
{
    private static readonly string? Obstacle = FindObstacle();

    public RunAsNobodyFactAttribute() => Skip = Obstacle;

    private static string? FindObstacle()
    {
        if (!OperatingSystem.IsLinux() || Environment.UserName != "root" || !File.Exists("/usr/bin/setpriv"))
        {
            return "needs root and setpriv to become nobody";
        }

        var start = new ProcessStartInfo("setpriv", ["--reuid", "65534", "--regid", "65534", "--clear-groups", Environment.ProcessPath!,
            Path.Combine(AppContext.BaseDirectory, "speedcommand.dll"), "--version"])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        using var trial = Process.Start(start)!;
        trial.WaitForExit();
        return trial.ExitCode == 0 ? null : "nobody may not read the runtime or the program here";
    }
}
