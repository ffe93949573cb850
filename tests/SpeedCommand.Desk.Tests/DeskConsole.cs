using SpeedCommand.Desk.Commands;

namespace SpeedCommand.Desk.Tests;

/// <summary>Runs the desk program in this process; the console is shared, so its tests stand in one collection.</summary>
internal static class DeskConsole
{
    public static (int Status, string Errors) Run(params string[] args)
    {
        var (status, _, errors) = RunToText(args);
        return (status, errors);
    }

    public static (int Status, string Output, string Errors) RunToText(params string[] args)
    {
        var (outputBefore, errorsBefore) = (Console.Out, Console.Error);
        using var output = new StringWriter();
        using var errors = new StringWriter();
        Console.SetOut(output);
        Console.SetError(errors);
        try
        {
            return (DeskProgram.Run(args), output.ToString(), errors.ToString());
        }
        finally
        {
            Console.SetOut(outputBefore);
            Console.SetError(errorsBefore);
        }
    }
}
