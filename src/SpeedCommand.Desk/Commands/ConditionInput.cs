using System.CommandLine;
using SpeedCommand.Replay.Conditions;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Desk.Commands;

/// <summary>The air and glider options of a command; those that would change nothing in its answer are left out.</summary>
internal sealed class ConditionInput(params string[] without)
{
    private readonly List<Option<string?>> _options = [.. ConditionOption.All
        .Where(option => !without.Contains(option.Name))
        .Select(option => new Option<string?>(option.Name) { HelpName = option.HelpName, Description = option.Description })];

    public void AddTo(Command command) => _options.ForEach(command.Add);

    public bool IsGiven(ParseResult parsed, string name) => TextOf(parsed, name) is not null;

    /// <summary>The glider file the options name; without a path when they name none that is there.</summary>
    public InputFile GliderOf(ParseResult parsed) => new("the glider file", GliderFiles.PathOf(TextOf(parsed, "--glider"), ""));

    /// <summary>The conditions, with the mass another option gives if there is one. Warnings go to standard error.</summary>
    /// <exception cref="DeskFailure">Every fault of the options, or else of the glider file.</exception>
    public FlightConditions Read(ParseResult parsed, (string Option, string Text)? mass = null)
    {
        var reader = new ConditionsReader();
        var texts = ConditionTexts.From(name => TextOf(parsed, name));
        var conditions = reader.Read(mass is { } given ? texts with { Mass = given.Text } : texts);
        if (conditions is null)
        {
            throw reader.OptionFaults.Count > 0
                ? new DeskFailure(ExitStatus.Usage, [.. reader.OptionFaults.Select(fault => Renamed(fault, mass?.Option))])
                : new DeskFailure(reader.IsGliderMissing ? ExitStatus.NoInput : ExitStatus.BadSettings, [.. reader.GliderProblems.Select(problem => problem.ToString())]);
        }

        foreach (var warning in reader.GliderProblems)
        {
            Console.Error.WriteLine(warning);
        }

        return conditions;
    }

    private string? TextOf(ParseResult parsed, string name) =>
        _options.Find(option => option.Name == name) is { } option ? parsed.GetValue(option) : null;

    private static string Renamed(string fault, string? massOption) =>
        massOption is not null && fault.StartsWith("--mass:", StringComparison.Ordinal) ? massOption + fault["--mass".Length..] : fault;
}
