using System.CommandLine;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Commands;

/// <summary>The option that chooses the units of a printed answer.</summary>
internal static class UnitOptions
{
    public static Option<string> Units() => new("--units")
    {
        HelpName = "SET",
        Description = "Units of the answer: metric, aviation, british or american.",
        DefaultValueFactory = _ => "metric",
    };

    /// <summary>Reads it; false after telling what is wrong.</summary>
    public static bool TryRead(string? word, out DisplayUnits units)
    {
        if (DisplayUnits.TryFromSet(word ?? "", out var found, out var problem))
        {
            units = found;
            return true;
        }

        Console.Error.WriteLine($"--units: {problem}");
        units = DisplayUnits.Metric;
        return false;
    }
}
