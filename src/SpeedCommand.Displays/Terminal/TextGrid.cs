using System.Text;

namespace SpeedCommand.Displays.Terminal;

/// <summary>A page of character cells. Nothing written can leave the page: what does not fit is cut at its edge.</summary>
internal sealed class TextGrid
{
    private const string Escape = "\u001b[";

    private readonly int _height;
    private readonly char[] _cells;
    private readonly Tone[] _tones;

    public TextGrid(int width, int height)
    {
        Width = width;
        _height = height;
        _cells = new char[width * height];
        _tones = new Tone[width * height];
        Array.Fill(_cells, ' ');
    }

    public int Width { get; }

    public void Put(int row, int column, ReadOnlySpan<char> text, Tone tone)
    {
        for (var i = 0; i < text.Length; i++)
        {
            Put(row, column + i, text[i], tone);
        }
    }

    public void Put(int row, int column, char cell, Tone tone)
    {
        if (row >= 0 && row < _height && column >= 0 && column < Width)
        {
            _cells[row * Width + column] = cell;
            _tones[row * Width + column] = tone;
        }
    }

    public void FillRow(int row, char cell, Tone tone)
    {
        for (var column = 0; column < Width; column++)
        {
            Put(row, column, cell, tone);
        }
    }

    public string ToText(PanelLook look) => look == PanelLook.Text ? ToBareText() : ToControlledText(look);

    private string ToBareText()
    {
        var text = new StringBuilder((Width + 1) * _height);
        for (var row = 0; row < _height; row++)
        {
            text.Append(_cells.AsSpan(row * Width, Width).TrimEnd(' ')).Append('\n');
        }

        return text.ToString();
    }

    /// <summary>
    /// Every cell is overwritten from the home position, so the terminal never shows an empty page between two frames. Each
    /// row is placed by itself: no row end is sent that could scroll the page.
    /// </summary>
    private string ToControlledText(PanelLook look)
    {
        var text = new StringBuilder((Width + 16) * _height);
        for (var row = 0; row < _height; row++)
        {
            text.Append(Escape).Append(row + 1).Append(";1H");
            var tone = Tone.Normal;
            for (var at = row * Width; at < (row + 1) * Width; at++)
            {
                if (_tones[at] != tone)
                {
                    tone = _tones[at];
                    text.Append(Escape).Append(Rendition(tone, look)).Append('m');
                }

                text.Append(_cells[at]);
            }

            if (tone != Tone.Normal)
            {
                text.Append(Escape).Append("0m");
            }
        }

        return text.ToString();
    }

    /// <summary>Select Graphic Rendition parameters (ECMA-48, 8.3.117); each begins with 0, forgetting the one before.</summary>
    private static string Rendition(Tone tone, PanelLook look) => (tone, look == PanelLook.Colour) switch
    {
        (Tone.Normal, _) => "0",
        (Tone.Faint, _) => "0;2",
        (Tone.Strong, _) => "0;1",
        (Tone.ClimbBand, true) => "0;30;42",
        (Tone.GlideBand, true) => "0;30;46",
        (Tone.Climb, true) => "0;1;32",
        (Tone.Faster, true) => "0;1;36",
        (Tone.Slower, true) => "0;1;33",
        (Tone.OnSpeed, true) => "0;1;32",
        (Tone.Fault, true) => "0;1;37;41",
        (Tone.ClimbBand or Tone.GlideBand or Tone.Fault, false) => "0;7",
        _ => "0;1",
    };
}
