namespace SpeedCommand.Settings;

/// <summary>Where the program keeps its own files, after the XDG base directory specification.</summary>
internal static class StateFolder
{
    /// <summary>Recorded flights.</summary>
    public static string Flights => Path.Combine(Root, "flights");

    /// <summary>The service's own log, when the terminal is taken by the panel.</summary>
    public static string LogFile => Path.Combine(Root, "speedcommand.log");

    /// <summary>The controls, kept over a restart.</summary>
    public static string Controls => Path.Combine(Root, "controls.state");

    /// <summary>The socket that "speedcommand set" speaks to.</summary>
    public static string Socket => Path.Combine(Root, "control.sock");

    /// <summary>Where a settings file is looked for when none is named, in order.</summary>
    public static IReadOnlyList<string> SettingsFiles =>
        [Path.Combine(BaseFolder("XDG_CONFIG_HOME", ".config"), "speedcommand", "settings.json"), "/etc/speedcommand/settings.json"];

    /// <summary>The settings file that is read when none is named; null when there is none.</summary>
    public static string? DefaultSettings => SettingsFiles.FirstOrDefault(File.Exists);

    private static string Root => Path.Combine(BaseFolder("XDG_STATE_HOME", ".local/state"), "speedcommand");

    private static string BaseFolder(string variable, string standard)
    {
        var set = Environment.GetEnvironmentVariable(variable);
        return Path.IsPathRooted(set)
            ? set
            : Path.Combine(Environment.GetFolderPath(Environment.SpecialFolder.UserProfile, Environment.SpecialFolderOption.DoNotVerify), standard);
    }
}
