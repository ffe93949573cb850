using System.Text.RegularExpressions;

namespace SpeedCommand.House.Tests.SourceRules;

/// <summary>Reads the shape of a C# file from its layout, which the formatter keeps: members of a type are indented once.</summary>
internal static partial class SourceShape
{
    private const string MemberOpens = "    {", MemberCloses = "    }";

    [GeneratedRegex(@"^(public|internal) ([a-z]+ )*(class|struct|interface|enum|record|delegate)( class| struct)? \w+")]
    private static partial Regex TopType();

    [GeneratedRegex(@"^public (?!enum)")]
    private static partial Regex PublicButNoEnum();

    [GeneratedRegex(@"\b(class|struct|interface|enum|record)\b")]
    private static partial Regex NestedType();

    /// <summary>Types at the top of a file.</summary>
    public static IEnumerable<string> TopTypes(IEnumerable<string> lines) => lines.Where(line => TopType().IsMatch(line));

    /// <summary>Public types at the top of a file; an enum may stand beside the type it belongs to.</summary>
    public static IEnumerable<string> PublicTypes(IEnumerable<string> lines) =>
        TopTypes(lines).Where(line => PublicButNoEnum().IsMatch(line));

    /// <summary>Lines of each member with a body, from its opening brace to its closing one.</summary>
    public static IEnumerable<(int Line, int Length)> MemberLengths(string[] lines)
    {
        for (var start = 1; start < lines.Length; start++)
        {
            if (lines[start] != MemberOpens || NestedType().IsMatch(lines[start - 1]))
            {
                continue;
            }

            var end = Array.FindIndex(lines, start, line => line.StartsWith(MemberCloses, StringComparison.Ordinal));
            yield return (start, end - start + 1);
        }
    }
}
