using System.CommandLine;
using System.CommandLine.Completions;
using System.CommandLine.Parsing;

namespace SpeedCommand.Commands;

/// <summary>
/// What is wrong with a command line, a line each: the option or argument, what was expected, what was found. The library's own
/// messages name types of the program. Both programs compile this file: a project for it alone would be one too many.
/// </summary>
internal static class ParseFaults
{
    /// <summary>The help names by which an option or argument takes a path, and how a person calls that.</summary>
    private static readonly Dictionary<string, string> Paths = new(StringComparer.Ordinal)
    {
        ["FILE"] = "a file",
        ["DIR"] = "a folder",
        ["LOG"] = "a flight log",
        ["SCENARIO"] = "a scenario",
        ["LOG|SCENARIO"] = "a flight log or a scenario",
        ["PLAN"] = "a fault plan",
    };

    /// <summary>Every fault; empty when there is none. Of words that nothing takes only the first is told: the others mostly follow from it.</summary>
    public static IReadOnlyList<string> Of(ParseResult parsed)
    {
        var command = parsed.CommandResult.Command;
        List<string> faults =
        [
            .. command.Arguments.Select(argument => FaultOf(argument, parsed)).OfType<string>(),
            .. command.Options.Select(option => FaultOf(option, parsed)).OfType<string>(),
        ];
        return faults.Count > 0 ? faults : [.. parsed.Errors.Take(1).Select(error => error.Message.ReplaceLineEndings(" "))];
    }

    private static string? FaultOf(Option option, ParseResult parsed)
    {
        var result = parsed.GetResult(option) is { Implicit: false } given ? given : null;
        return Fault(option.Name, Expected(option.HelpName, option.ValueType, option.GetCompletions(CompletionContext.Empty)), result, parsed,
            result is null ? option.Required : option.Arity.MinimumNumberOfValues > 0, option.Arity, option.HelpName);
    }

    private static string? FaultOf(Argument argument, ParseResult parsed) => Fault(
        argument.Name, Expected(argument.Name, argument.ValueType, []), parsed.GetResult(argument), parsed,
        argument.Arity.MinimumNumberOfValues > 0, argument.Arity, argument.Name);

    private static string? Fault(
        string name, string expected, SymbolResult? result, ParseResult parsed, bool isNeeded, ArgumentArity arity, string? helpName)
    {
        var tokens = result?.Tokens ?? [];
        if (tokens.Any(token => token.Value.Length == 0) && Paths.ContainsKey(helpName ?? ""))
        {
            return $"{name}: expected {expected}, found ''";
        }

        if (parsed.Errors.Count == 0)
        {
            return null;
        }

        if (tokens.Count == 0)
        {
            return isNeeded ? $"{name}: expected {expected}, found nothing" : null;
        }

        if (tokens.Count > arity.MaximumNumberOfValues)
        {
            return $"{name}: expected {expected}, found {tokens.Count} of them";
        }

        return parsed.Errors.Any(error => IsOf(error.SymbolResult, result)) ? $"{name}: expected {expected}, found '{tokens[^1].Value}'" : null;
    }

    private static bool IsOf(SymbolResult? error, SymbolResult? result)
    {
        while (error is not null && error != result)
        {
            error = error is CommandResult ? null : error.Parent;
        }

        return error is not null;
    }

    private static string Expected(string? helpName, Type type, IEnumerable<CompletionItem> words)
    {
        type = Nullable.GetUnderlyingType(type) ?? type;
        string[] accepted = [.. type.IsEnum ? Enum.GetNames(type).Select(name => name.ToLowerInvariant()) : words.Select(word => word.Label)];
        return accepted.Length > 1 ? $"{string.Join(", ", accepted[..^1])} or {accepted[^1]}"
            : type == typeof(int) || type == typeof(long) ? "a whole number"
            : type == typeof(double) ? "a number"
            : Paths.GetValueOrDefault(helpName ?? "") ?? helpName ?? "a value";
    }
}
