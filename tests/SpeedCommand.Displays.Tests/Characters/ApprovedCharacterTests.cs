using System.Text;
using SpeedCommand.Displays.Characters;

namespace SpeedCommand.Displays.Tests.Characters;

public class ApprovedCharacterTests
{
    [Theory]
    [InlineData("gliding-too-slow", "metric")]
    [InlineData("climbing-too-fast", "metric")]
    [InlineData("climbing-too-fast", "american,vertical,ft/min")]
    [InlineData("rough-air-limit", "aviation")]
    [InlineData("doubtful", "metric")]
    [InlineData("no-airspeed", "metric")]
    [InlineData("nothing", "metric")]
    public void Render_FourLines_AreTheTextApproved(string picture, string set) => Matches("characters", CharacterFrame.Of20x4, picture, set);

    [Theory]
    [InlineData("gliding-too-slow", "metric")]
    [InlineData("climbing-too-fast", "metric")]
    [InlineData("rough-air-limit", "aviation")]
    [InlineData("doubtful", "metric")]
    [InlineData("no-airspeed", "metric")]
    public void Render_TwoLines_AreTheTextApproved(string picture, string set) => Matches("characters-16x2", CharacterFrame.Of16x2, picture, set);

    private static void Matches(string name, CharacterFrame size, string picture, string set)
    {
        var frame = new byte[size.Length];

        Assert.Equal(size.Length, CharacterText.For(size, NamedUnits.Of(set)).Render(Pictures.Named(picture), frame));

        // A border shows the blanks at the line ends; the bytes themselves are checked in CharacterTextTests.
        var page = Encoding.ASCII.GetString(frame).Replace("\f", "|").Replace("\r\n", "|\n|").TrimEnd('|');
        ApprovedText.Matches($"{name}-{picture}-{FileWord(set)}", page);
    }

    private static string FileWord(string set) => set.Replace(',', '-').Replace("/", "-per-");
}
