using NLog.Config;
using NLog.Targets;
using SpeedCommand.Settings;

namespace SpeedCommand.Service;

/// <summary>Where the service's own log goes: a file of bounded size, or standard error when no panel needs the terminal.</summary>
internal static class ServiceLog
{
    private const string Layout = "${longdate} ${level:uppercase=true:padding=-5} ${logger:shortName=true}: ${message}${onexception: ${exception:format=tostring}}";
    private const long MaxFileBytes = 1 << 20;

    public static LoggingConfiguration Configure(CockpitSettings settings, bool isPanelShown)
    {
        var configuration = new LoggingConfiguration();
        var file = settings.LogFile.Length > 0 ? settings.LogFile : isPanelShown ? StateFolder.LogFile : null;
        Target target = file is not null && CanWrite(file)
            ? new FileTarget("file") { FileName = file, Layout = Layout, ArchiveAboveSize = MaxFileBytes, MaxArchiveFiles = 2, KeepFileOpen = true }
            : new ConsoleTarget("standard-error") { StdErr = true, Layout = Layout };
        configuration.AddRule(NLog.LogLevel.Warn, NLog.LogLevel.Fatal, target, "Microsoft.*", final: true);
        configuration.AddRule(NLog.LogLevel.Info, NLog.LogLevel.Fatal, target);
        return configuration;
    }

    /// <summary>A log that goes nowhere helps nobody: better on standard error, and said so.</summary>
    private static bool CanWrite(string file)
    {
        try
        {
            Directory.CreateDirectory(Path.GetDirectoryName(Path.GetFullPath(file))!);
            using var probe = new FileStream(file, FileMode.Append, FileAccess.Write, FileShare.ReadWrite);
            return true;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            Console.Error.WriteLine($"{file}: the service's log cannot be written there and goes to standard error: {fault.Message}");
            return false;
        }
    }
}
