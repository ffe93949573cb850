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
    public void Render_HandMadePicture_IsTheTextApproved(string picture, string set)
    {
        var units = NamedUnits.Of(set);
        var frame = new byte[CharacterText20x4.Length];

        Assert.Equal(CharacterText20x4.Length, new CharacterText20x4(units).Render(Pictures.Named(picture), frame));

        // A border shows the blanks at the line ends; the bytes themselves are checked in CharacterText20x4Tests.
        var page = Encoding.ASCII.GetString(frame).Replace("\f", "|").Replace("\r\n", "|\n|").TrimEnd('|');
        ApprovedText.Matches($"characters-{picture}-{FileWord(set)}", page);
    }

    private static string FileWord(string set) => set.Replace(',', '-').Replace("/", "-per-");
}
