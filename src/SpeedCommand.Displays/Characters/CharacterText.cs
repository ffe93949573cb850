using System.Globalization;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Characters;

/// <summary>The picture as text for a character display; docs/display.md describes the lines. Nothing is allocated.</summary>
/// <param name="frame">The size of the display.</param>
/// <param name="units">The units shown.</param>
public abstract class CharacterText(CharacterFrame frame, DisplayUnits units)
{
    // Strokes of the correction: one for each of these, in m/s (about 5 km/h).
    private const double StrokeMps = 1.5;

    /// <summary>The size of the display.</summary>
    public CharacterFrame Frame { get; } = frame;

    /// <summary>The units shown.</summary>
    protected DisplayUnits Units { get; } = units;

    /// <summary>The caution, line by line, each of at most the display's width.</summary>
    public abstract IReadOnlyList<string> Caution { get; }

    /// <summary>Makes the text for a size of display.</summary>
    /// <param name="frame">One of the sizes that <see cref="CharacterFrame"/> names.</param>
    /// <param name="units">The units shown.</param>
    /// <returns>The text.</returns>
    /// <exception cref="ArgumentOutOfRangeException">There is no text for that size.</exception>
    public static CharacterText For(CharacterFrame frame, DisplayUnits units) => frame switch
    {
        (4, 20) => new CharacterText20x4(units),
        (2, 16) => new CharacterText16x2(units),
        _ => throw new ArgumentOutOfRangeException(nameof(frame), frame, "expected 4 lines of 20 or 2 of 16"),
    };

    /// <summary>Writes one frame.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="destination">Where to write; at least the frame's length.</param>
    /// <returns>The bytes written; 0 when they do not fit.</returns>
    public int Render(in CockpitPicture picture, Span<byte> destination)
    {
        if (!Frame.TryBegin(destination))
        {
            return 0;
        }

        WriteLines(picture, destination);
        return Frame.Length;
    }

    /// <summary>Writes the caution.</summary>
    /// <param name="destination">Where to write; at least the frame's length.</param>
    /// <returns>The bytes written; 0 when they do not fit.</returns>
    public int RenderCaution(Span<byte> destination)
    {
        if (!Frame.TryBegin(destination))
        {
            return 0;
        }

        for (var row = 0; row < Frame.Rows; row++)
        {
            new AsciiLine(Frame.Line(destination, row)).Add(Caution[row]);
        }

        return Frame.Length;
    }

    /// <summary>Writes the lines of a frame that has been begun.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="frame">The frame.</param>
    protected abstract void WriteLines(in CockpitPicture picture, Span<byte> frame);

    /// <summary>How many strokes tell a correction.</summary>
    /// <param name="correction">A correction to faster or slower.</param>
    /// <param name="most">As many as there is room for.</param>
    /// <returns>1 to <paramref name="most"/>.</returns>
    protected int Strokes(SpeedCorrection correction, int most) =>
        (int)Math.Clamp(Units.Speed.DifferenceToSi(correction.Amount) / StrokeMps, 1, most);

    /// <summary>Writes words and the amount of a correction.</summary>
    /// <param name="destination">16 characters are enough.</param>
    /// <param name="words">What stands before the number.</param>
    /// <param name="amount">The number, shown without decimals.</param>
    /// <returns>The characters written.</returns>
    protected static int Words(Span<char> destination, string words, double amount)
    {
        words.CopyTo(destination);
        return amount.TryFormat(destination[words.Length..], out var written, "0", CultureInfo.InvariantCulture)
            ? words.Length + written
            : words.Length;
    }
}
