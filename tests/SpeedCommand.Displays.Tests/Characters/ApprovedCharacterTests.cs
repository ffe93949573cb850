using System.Text;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Tests.Characters;

public class ApprovedCharacterTests
{
    [Theory]
    [InlineData("gliding-too-slow", "metric")]
    [InlineData("climbing-too-fast", "metric")]
    [InlineData("climbing-too-fast", "american")]
    [InlineData("rough-air-limit", "aviation")]
    [InlineData("doubtful", "metric")]
    [InlineData("no-airspeed", "metric")]
    [InlineData("nothing", "metric")]
    public void Render_HandMadePicture_IsTheTextApproved(string picture, string set)
    {
        Assert.True(DisplayUnits.TryFromSet(set, out var units, out _));
        var frame = new byte[CharacterText20x4.Length];

        Assert.Equal(CharacterText20x4.Length, new CharacterText20x4(units).Render(Pictures.Named(picture), frame));

        // A border shows the blanks at the line ends; the bytes themselves are checked in CharacterText20x4Tests.
        var page = Encoding.ASCII.GetString(frame).Replace("\f", "|").Replace("\r\n", "|\n|").TrimEnd('|');
        ApprovedText.Matches($"characters-{picture}-{set}", page);
    }
}
