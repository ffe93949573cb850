using SpeedCommand.Replay.Files;

namespace SpeedCommand.Desk.Commands;

/// <summary>Checks what a command was told to write before any work is done.</summary>
internal static class DeskOutput
{
    /// <summary>A file to write: none of those that are read, and the disk takes it.</summary>
    /// <exception cref="DeskFailure">It must not, or cannot, be written.</exception>
    public static void Check(string option, string path, params IEnumerable<InputFile> inputs) => Throw(OutputFile.FaultOf(option, path, inputs));

    /// <summary>A folder to write into, made when it is not there.</summary>
    /// <exception cref="DeskFailure">It cannot be made.</exception>
    public static void MakeFolder(string option, string path) => Throw(OutputFile.MakeFolder(option, path));

    private static void Throw(OutputFault? fault)
    {
        if (fault is not null)
        {
            throw new DeskFailure(fault.IsUsage ? ExitStatus.Usage : ExitStatus.InputOutput, fault.Message);
        }
    }
}
