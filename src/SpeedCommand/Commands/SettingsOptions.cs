using System.Collections;
using System.CommandLine;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>The options of every command that reads settings, and how settings are opened and their faults told.</summary>
internal static class SettingsOptions
{
    public static Option<FileInfo?> File() => new("--settings")
    {
        Description = "The settings file; without it ~/.config/speedcommand/settings.json, then /etc/speedcommand/settings.json.",
        HelpName = "FILE",
    };

    public static Option<string[]> With() => new("--with")
    {
        Description = "One setting, beating file and environment, for example --with \"expectedClimb=2 m/s\". May be given again.",
        HelpName = "NAME=VALUE",
    };

    /// <summary>Opens the settings; false after telling what is wrong.</summary>
    public static bool TryOpen(
        FileInfo? file, IReadOnlyList<string>? with, out SettingsSource source, out int exitStatus, TextWriter? errors = null)
    {
        errors ??= Console.Error;
        exitStatus = ExitStatus.BadSettings;
        var commandLine = new Dictionary<string, string>(StringComparer.Ordinal);
        foreach (var pair in with ?? [])
        {
            var equals = pair.IndexOf('=');
            if (equals <= 0)
            {
                errors.WriteLine($"--with: expected NAME=VALUE, found '{pair}'");
                exitStatus = ExitStatus.Usage;
                source = new SettingsSource(null, "", new Dictionary<string, string>(), commandLine);
                return false;
            }

            commandLine[pair[..equals]] = pair[(equals + 1)..];
        }

        var path = file?.ToString() ?? StateFolder.DefaultSettings;
        if (SettingsFile.TryOpen(path, EnvironmentVariables(), commandLine, out source, out var problem))
        {
            return true;
        }

        errors.WriteLine(problem);
        exitStatus = System.IO.Path.Exists(path) ? ExitStatus.BadSettings : ExitStatus.NoInput;
        return false;
    }

    /// <summary>Whether there is a settings file, without which there are no ports; tells where one is looked for.</summary>
    public static bool HasFile(SettingsSource source)
    {
        if (source.File.Length == 0)
        {
            Console.Error.WriteLine($"--settings: expected a settings file, found none here or at {string.Join(" or ", StateFolder.SettingsFiles)}; docs/settings.md has one to copy");
        }

        return source.File.Length > 0;
    }

    /// <summary>Tells every fault, one a line.</summary>
    public static void Tell(SettingsSource source, TextWriter? errors = null)
    {
        foreach (var problem in source.Problems)
        {
            (errors ?? Console.Error).WriteLine(problem);
        }
    }

    private static Dictionary<string, string> EnvironmentVariables() => Environment.GetEnvironmentVariables().Cast<DictionaryEntry>()
        .ToDictionary(pair => (string)pair.Key, pair => (string?)pair.Value ?? "", StringComparer.Ordinal);
}
