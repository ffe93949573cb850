using System.CommandLine;

namespace SpeedCommand.Commands;

/// <summary>The commands of the cockpit program, one file each.</summary>
internal static class CommandTree
{
    public static RootCommand Build() => new("Speeds to fly for glider pilots, live. Advisory only: the flight manual and the placards prevail.")
    {
        RunCommand.Create(),
        CheckCommand.Create(),
        SetCommand.Create(),
        ReplayCommand.Create(),
        TargetsCommand.Create(),
        DescentCommand.Create(),
    };

    /// <summary>Runs a command line; a fault in it is told in one line, without a page of help.</summary>
    public static async Task<int> InvokeAsync(this RootCommand root, string[] args)
    {
        var parsed = root.Parse(args);
        if (ParseFaults.Of(parsed) is { Count: > 0 } faults)
        {
            foreach (var fault in faults)
            {
                await Console.Error.WriteLineAsync(fault).ConfigureAwait(false);
            }

            return ExitStatus.Usage;
        }

        // In the service the host answers signals: the flight's log must be closed first. Other commands are simply cancelled.
        var configuration = new InvocationConfiguration();
        if (parsed.CommandResult.Command.Name == RunCommand.Name)
        {
            configuration.ProcessTerminationTimeout = null;
        }

        return await parsed.InvokeAsync(configuration).ConfigureAwait(false);
    }
}
