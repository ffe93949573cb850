using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Terminal;

namespace SpeedCommand.Displays;

/// <summary>The caution that every display shows for a moment at start.</summary>
public static class CautionText
{
    /// <summary>The caution in whole sentences; lines of at most 58 characters.</summary>
    public static IReadOnlyList<string> Lines { get; } =
    [
        "ADVISORY ONLY",
        "",
        "SpeedCommand is not certified and not a flight instrument.",
        "It does not replace the placards, the flight manual,",
        "the airspeed indicator, looking out, or the rules",
        "where you fly.",
    ];

    /// <summary>Draws the caution as a frame of the terminal panel, in the middle of the page.</summary>
    /// <param name="style">Size and look; the units play no part.</param>
    /// <returns>The text to send to the terminal.</returns>
    public static string Render(PanelStyle style)
    {
        ArgumentNullException.ThrowIfNull(style);
        var lines = style.IsFull ? Lines : new CharacterText20x4(style.Units).Caution;
        var grid = new TextGrid(style.Width, style.Height);
        var top = Math.Max(0, (style.Height - lines.Count) / 2);
        var left = Math.Max(0, (style.Width - lines.Max(line => line.Length)) / 2);
        for (var i = 0; i < lines.Count; i++)
        {
            grid.Put(top + i, left, lines[i], i == 0 ? Tone.Strong : Tone.Normal);
        }

        return grid.ToText(style.Look);
    }
}
