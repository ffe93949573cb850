using SpeedCommand.Commands;

namespace SpeedCommand.Tests.Commands;

/// <summary>Whatever is wrong with a command line is told by what a person typed, never by a type of the program.</summary>
public class ParseFaultsTests
{
    [Theory]
    [InlineData("--out: expected a file, found ''", "replay", "a.log", "--out", "")]
    [InlineData("--out-dir: expected a folder, found ''", "replay", "a.log", "--out-dir", "")]
    [InlineData("--sound: expected a file, found ''", "replay", "a.log", "--sound", "")]
    [InlineData("LOG: expected a flight log, found ''", "replay", "")]
    [InlineData("LOG: expected a flight log, found nothing", "replay")]
    [InlineData("--bench: expected a flight log, found ''", "run", "--bench", "")]
    [InlineData("--settings: expected a file, found ''", "check", "--settings", "")]
    [InlineData("--out: expected a file, found nothing", "replay", "a.log", "--out")]
    [InlineData("--jobs: expected a whole number, found 'many'", "replay", "a.log", "--jobs", "many")]
    [InlineData("--seconds: expected a number, found 'soon'", "check", "--seconds", "soon")]
    [InlineData("--display: expected none or terminal, found 'lamp'", "replay", "a.log", "--display", "lamp")]
    [InlineData("--to: expected HEIGHT, found nothing", "descent", "--from", "2000m")]
    public void AFault_NamesOption_Expected_Found(string expected, params string[] args) =>
        Assert.Equal(expected, Assert.Single(ParseFaults.Of(CommandTree.Build().Parse(args))));

    [Theory]
    [InlineData("replay", "a.log", "--out", "x.jsonl", "--with", "bugs=10 %", "--with", "mass=340 kg")]
    [InlineData("run", "--bench")]
    [InlineData("replay", "--help")]
    [InlineData("set", "bugs", "")]
    public void GoodLines_HaveNone(params string[] args) => Assert.Empty(ParseFaults.Of(CommandTree.Build().Parse(args)));
}
