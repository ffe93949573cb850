using System.CommandLine;
using SpeedCommand.Commands;

namespace SpeedCommand.Desk.Commands;

/// <summary>Runs the command line and turns every foreseeable failure into one line on standard error and an exit status.</summary>
internal static class DeskProgram
{
    public static int Run(string[] args)
    {
        var root = new RootCommand("SpeedCommand at the desk: polars, cards, plans, simulated flights, scored estimators. Advisory only; not a flight instrument.")
        {
            PolarCommand.Create(),
            CardCommand.Create(),
            PlanCommand.Create(),
            SimulateCommand.Create(),
            SpoilCommand.Create(),
            FaultsCommand.Create(),
            ScoreCommand.Create(),
            GuidanceCommand.Create(),
            NoiseCommand.Create(),
            CompareCommand.Create(),
            ExportCommand.Create(),
            ReportCommand.Create(),
            ScreensCommand.Create(),
            FitCommand.Create(),
            FitTrialsCommand.Create(),
        };
        var parsed = root.Parse(args);
        if (ParseFaults.Of(parsed) is { Count: > 0 } faults)
        {
            return Fail(ExitStatus.Usage, [.. faults]);
        }

        try
        {
            return parsed.Invoke(new InvocationConfiguration { EnableDefaultExceptionHandler = false });
        }
        catch (DeskFailure failure)
        {
            return Fail(failure.Status, [.. failure.Messages]);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Fail(ExitStatus.InputOutput, fault.Message);
        }
    }

    private static int Fail(ExitStatus status, params string[] messages)
    {
        Tell(messages);
        return (int)status;
    }

    /// <summary>Tells what is wrong, a line each.</summary>
    public static void Tell(IEnumerable<string> messages)
    {
        foreach (var message in messages)
        {
            Console.Error.WriteLine($"speedcommand-desk: {message.ReplaceLineEndings(" ")}");
        }
    }
}
