using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Terminal;

namespace SpeedCommand.Displays;

/// <summary>The caution that every display shows for a moment at start.</summary>
public static class CautionText
{
    private static readonly string[] Character20x4Lines =
    [
        "   ADVISORY ONLY    ",
        "Placards, manual and",
        "airspeed indicator  ",
        "come first. Look out",
    ];

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
        var lines = style.IsFull ? Lines : Character20x4Lines;
        var grid = new TextGrid(style.Width, style.Height);
        var top = Math.Max(0, (style.Height - lines.Count) / 2);
        var left = Math.Max(0, (style.Width - lines.Max(line => line.Length)) / 2);
        for (var i = 0; i < lines.Count; i++)
        {
            grid.Put(top + i, left, lines[i], i == 0 ? Tone.Strong : Tone.Normal);
        }

        return grid.ToText(style.Look);
    }

    /// <summary>Writes the caution as a frame of the 20 x 4 character display.</summary>
    /// <param name="destination">Where to write; at least <see cref="CharacterText20x4.Length"/> bytes.</param>
    /// <returns>The bytes written; 0 when they do not fit.</returns>
    public static int RenderCharacters20x4(Span<byte> destination)
    {
        if (!CharacterText20x4.TryFrame(destination))
        {
            return 0;
        }

        for (var row = 0; row < CharacterText20x4.Rows; row++)
        {
            new AsciiLine(CharacterText20x4.Line(destination, row)).Add(Character20x4Lines[row]);
        }

        return CharacterText20x4.Length;
    }
}
