using System.CommandLine;
using System.Text;
using System.Text.Json;
using SpeedCommand.Displays.Units;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Commands;

/// <summary>How a printed answer shall look.</summary>
internal static class AnswerOptions
{
    public static Option<string> Units() => new("--units")
    {
        HelpName = "SET",
        Description = "Units of the answer: metric, aviation, british or american.",
        DefaultValueFactory = _ => "metric",
    };

    public static Option<bool> Json() => new("--json") { Description = "One JSON object with unrounded SI numbers." };

    public static DisplayUnits ReadUnits(string? word) => DisplayUnits.TryFromSet(word ?? "", out var units, out var problem)
        ? units
        : throw new DeskFailure(ExitStatus.Usage, $"--units: {problem}");

    public static void PrintJson(Action<Utf8JsonWriter> writeMembers)
    {
        using var output = new MemoryStream();
        JsonNumbers.WriteObject(output, writeMembers);
        Console.Out.Write(Encoding.UTF8.GetString(output.ToArray()));
    }
}
