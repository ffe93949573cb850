using System.Reflection;

namespace SpeedCommand;

/// <summary>What the program calls itself in what it writes.</summary>
internal static class ProgramName
{
    /// <summary>Name and version.</summary>
    public static string WithVersion { get; } =
        $"speedcommand {typeof(ProgramName).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "of unknown version"}";
}
