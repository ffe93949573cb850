using System.Text.RegularExpressions;

namespace SpeedCommand.Sentences.Tests;

/// <summary>What docs/sentences.md shows to the builder of a board is what the reader takes.</summary>
public sealed partial class DocumentedSentencesTests
{
    private static int Out => s_document.IndexOf("\n## Sentences out", StringComparison.Ordinal);

    private static int AfterOut => s_document.IndexOf("\n## To add a measurement", StringComparison.Ordinal);

    private static readonly string s_document = File.ReadAllText(Path.Combine(RepositoryRoot(), "docs", "sentences.md"));

    [Fact]
    public void EverySentenceShown_IsSoundAndGivesReadingsOnly()
    {
        var lines = WholeSentence().Matches(s_document[..Out]).Concat(WholeSentence().Matches(s_document[AfterOut..])).Select(match => match.Value).ToList();
        Assert.True(lines.Count >= 5);
        Assert.All(lines, AssertUnderstood);
    }

    /// <summary>What goes out to another instrument must never be taken for a sensor's word, should it come back on a wire.</summary>
    [Fact]
    public void EverySentenceSentOut_IsSoundAndGivesNoReading()
    {
        var lines = WholeSentence().Matches(s_document[Out..AfterOut]).Select(match => match.Value).ToList();
        Assert.True(lines.Count >= 5);
        Assert.All(lines, line =>
        {
            Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Required, out var sentence));
            Assert.Equal(0, new XdrReadings(sentence).Count);
        });
    }

    [Fact]
    public void EveryExampleOfTheTable_GivesAReading_AndNoKindIsLeftOut()
    {
        var examples = TableExample().Matches(s_document).Select(match => match.Groups[1].Value).ToList();
        Assert.Equal(Enum.GetValues<ReadingKind>().Length, examples.Count);
        Assert.All(examples, example => AssertUnderstood(WireText.Signed("YXXDR," + example)));
    }

    private static void AssertUnderstood(string line)
    {
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(WireText.Bytes(line), ChecksumRule.Required, out var sentence));
        var readings = new XdrReadings(sentence);
        Assert.True(readings is { Count: > 0, UnknownCount: 0, BadCount: 0 }, line);
    }

    private static string RepositoryRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "SpeedCommand.sln")))
        {
            folder = Path.GetDirectoryName(folder) ?? throw new InvalidOperationException("the solution is not above the tests");
        }

        return folder;
    }

    [GeneratedRegex(@"\$[A-Z]{5},[^*\n`]*\*[0-9A-F]{2}")]
    private static partial Regex WholeSentence();

    [GeneratedRegex(@"\| `([A-Z],[^`]*,[A-Z]*,[A-Z]+)` \|")]
    private static partial Regex TableExample();
}
