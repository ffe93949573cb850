using System.Text.RegularExpressions;

namespace SpeedCommand.House.Tests.SourceRules;

/// <summary>Words that must not stand in the repository. They are written in halves here, so that this file keeps its own rule.</summary>
public class WordTests
{
    private const RegexOptions Loose = RegexOptions.IgnoreCase;

    private static readonly (string Reason, Regex Pattern)[] Rules =
    [
        ("finish it, or write an issue", new Regex($@"\b({"TO" + "DO"}|{"FIX" + "ME"}|{"HA" + "CK"}|{"Not" + "ImplementedException"})\b")),
        ("a path of one machine", new Regex(@"(^|[^A-Za-z0-9_.])/(work|farm|root|Users)/")),
        ("how a text came to be is of no use to its reader",
            new Regex($@"\b({"lec" + "ture"}|{"trans" + "cript"}|{"course" + " ?work"}|{"video" + "-?[0-9]+"}|{"C" + "EO"}|{"steering" + " repo"})\b", Loose)),
    ];

    [Fact]
    public void Texts_AreFreeOfThem() => Offences.None(Repository.TextFiles.SelectMany(file => Hits(file, Repository.Lines(file))));

    [Theory]
    [InlineData("// TO" + "DO later")]
    [InlineData("see /ro" + "ot/notes.txt")]
    [InlineData("as in Lec" + "ture 3")]
    public void AnyOfThem_IsNoticed(string line) => Assert.Single(Hits("file", [line]));

    [Fact]
    public void FileNames_SayContent()
    {
        string[] empty = ["Core", "Common", "Utils", "Util", "Helpers", "Helper", "Manager", "Misc"];
        Offences.None(Repository.Files.Where(file => file.Split('/').Any(part =>
            empty.Any(word => Path.GetFileNameWithoutExtension(part).EndsWith(word, StringComparison.Ordinal)))));
    }

    private static IEnumerable<string> Hits(string file, string[] lines) =>
        from line in lines.Index()
        from rule in Rules
        where rule.Pattern.IsMatch(line.Item)
        select $"{file}:{line.Index + 1}: {rule.Reason}: {line.Item.Trim()}";
}
