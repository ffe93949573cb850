namespace SpeedCommand.Tests;

/// <summary>As <see cref="LinuxFactAttribute"/>, for tests with rows.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class LinuxTheoryAttribute : TheoryAttribute
{
    public LinuxTheoryAttribute()
    {
        if (!OperatingSystem.IsLinux())
        {
            Skip = "needs Linux pseudo-terminals";
        }
    }
}
