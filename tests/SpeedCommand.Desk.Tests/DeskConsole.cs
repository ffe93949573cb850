using SpeedCommand.Desk.Commands;

namespace SpeedCommand.Desk.Tests;

/// <summary>Runs the desk program in this process; the console is shared, so its tests stand in one collection.</summary>
internal static class DeskConsole
{
    public static (int Status, string Errors) Run(params string[] args)
    {
        var before = Console.Error;
        using var errors = new StringWriter();
        Console.SetError(errors);
        try
        {
            return (DeskProgram.Run(args), errors.ToString());
        }
        finally
        {
            Console.SetError(before);
        }
    }
}
