using System.CommandLine;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>The air and glider options of a question, and how their faults are told.</summary>
internal sealed class ConditionOptions
{
    private readonly List<Option<string?>> _options =
    [
        .. ConditionOption.All.Select(option =>
            new Option<string?>(option.Name) { HelpName = option.HelpName, Description = option.Description }),
    ];

    public void AddTo(Command command) => _options.ForEach(command.Add);

    /// <summary>Reads the conditions; null after telling what is wrong.</summary>
    public FlightConditions? Read(ParseResult parsed, out int exitStatus)
    {
        var reader = new ConditionsReader();
        var conditions = reader.Read(ConditionTexts.From(name => parsed.GetValue(_options.Single(option => option.Name == name))));
        foreach (var problem in reader.GliderProblems)
        {
            Console.Error.WriteLine(problem);
        }

        foreach (var fault in reader.OptionFaults)
        {
            Console.Error.WriteLine(fault);
        }

        exitStatus = reader.OptionFaults.Count > 0 ? ExitStatus.Usage : reader.IsGliderMissing ? ExitStatus.NoInput : ExitStatus.BadSettings;
        return conditions;
    }
}
