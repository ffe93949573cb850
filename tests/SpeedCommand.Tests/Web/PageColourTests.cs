using System.Text;
using System.Text.RegularExpressions;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Web;

/// <summary>The page's own files: colours that can be read in sun and dusk, and times that keep the promise of the blank.</summary>
public partial class PageColourTests
{
    private static readonly string Sheet = Text("/page.css");

    private static string Text(string path) => Encoding.UTF8.GetString(PageFile.ReadAll()[path].Bytes);

    [GeneratedRegex(@":root\[data-look=""(\w+)""\] \{([^}]*)\}")]
    private static partial Regex LookPattern();

    [GeneratedRegex(@"--([\w-]+): (#[0-9a-f]{6});")]
    private static partial Regex ColourPattern();

    [GeneratedRegex(@"\{[^{}]*[{ ;]color: var\(--([\w-]+)\);[^{}]*\}")]
    private static partial Regex TextRulePattern();

    [GeneratedRegex(@"background: var\(--([\w-]+)\);")]
    private static partial Regex BackgroundPattern();

    [Fact]
    public void EveryTextColour_StandsOutFromItsBackground_InBothLooks()
    {
        var looks = LookPattern().Matches(Sheet);
        Assert.Equal(["night", "day"], looks.Select(look => look.Groups[1].Value));
        var rules = TextRulePattern().Matches(Sheet).ToList();
        Assert.InRange(rules.Count, 10, 50);
        foreach (Match look in looks)
        {
            var colours = ColourPattern().Matches(look.Groups[2].Value).ToDictionary(one => one.Groups[1].Value, one => one.Groups[2].Value);
            foreach (var rule in rules)
            {
                var background = BackgroundPattern().Match(rule.Value);
                Assert.True(background.Success, $"a text colour without its background: {rule.Value}");
                var contrast = Contrast.Of(colours[rule.Groups[1].Value], colours[background.Groups[1].Value]);
                Assert.True(contrast >= 7, $"{look.Groups[1].Value}: {contrast:F1} in {rule.Value}");
            }
        }
    }

    /// <summary>Black on white is 21, and #777777 on white 4.48: the examples that every guide to WCAG gives (common knowledge).</summary>
    [Fact]
    public void ContrastFormula_GivesTheKnownExamples()
    {
        Assert.Equal(21, Contrast.Of("#000000", "rgb(255, 255, 255)"), 1e-9);
        Assert.Equal(4.48, Contrast.Of("#777777", "#ffffff"), 0.005);
    }

    [Fact]
    public void NumberThatIsNotRenewed_StandsForLessThanASecond()
    {
        var times = Regex.Matches(Text("/page.js"), @"const (\w+_MS) = (\d+);").ToDictionary(one => one.Groups[1].Value, one => int.Parse(one.Groups[2].Value));
        Assert.InRange(times["OLD_MS"] + times["CHECK_MS"], 0, 999);
    }

    [Fact]
    public void Caution_IsWordForWordThatOfTheOtherDisplays() => Assert.Equal(
        string.Join(' ', Displays.CautionText.Lines.Where(line => line.Length > 0)),
        Regex.Replace(Regex.Match(Text("/"), "<section id=\"caution\">(.*)</section>", RegexOptions.Singleline).Groups[1].Value, @"(<[^>]*>|\s)+", " ").Trim());
}
