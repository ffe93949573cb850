namespace SpeedCommand.Tests;

/// <summary>A test that needs a program the machine may lack; continuous integration has it.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class ToolFactAttribute : FactAttribute
{
    public ToolFactAttribute(string tool)
    {
        Tool = tool;
        if (!OperatingSystem.IsLinux() || Find(tool) is null)
        {
            Skip = $"needs {tool}";
        }
    }

    public string Tool { get; }

    /// <summary>Path of a program that the shell would find; null when there is none.</summary>
    public static string? Find(string tool) => (Environment.GetEnvironmentVariable("PATH") ?? "").Split(':')
        .Select(folder => Path.Combine(folder, tool)).FirstOrDefault(File.Exists);
}
