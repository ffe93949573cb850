using System.Runtime.InteropServices;

namespace SpeedCommand.Tests.Live;

/// <summary>Stops a terminal's output, as a display does that takes no more, and lets it go on (tcflow(3); the numbers of Linux).</summary>
internal static partial class TerminalFlow
{
    public const int Off = 0, On = 1;

    [LibraryImport("libc", EntryPoint = "tcflow")]
    public static partial int Set(int file, int action);
}
