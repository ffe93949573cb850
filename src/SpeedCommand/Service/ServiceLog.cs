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
        Target target = file is null
            ? new ConsoleTarget("standard-error") { StdErr = true, Layout = Layout }
            : new FileTarget("file") { FileName = file, Layout = Layout, ArchiveAboveSize = MaxFileBytes, MaxArchiveFiles = 2, KeepFileOpen = true };
        configuration.AddRule(NLog.LogLevel.Warn, NLog.LogLevel.Fatal, target, "Microsoft.*", final: true);
        configuration.AddRule(NLog.LogLevel.Info, NLog.LogLevel.Fatal, target);
        return configuration;
    }
}
