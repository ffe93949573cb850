using System.Globalization;

namespace SpeedCommand.Displays.Tests.Terminal;

/// <summary>
/// A small terminal after ECMA-48: cursor position (CUP) and graphic rendition (SGR) only, and it fails on everything else,
/// on a character outside its page and on any control character.
/// </summary>
internal sealed class TerminalModel(int width, int height)
{
    private readonly char[,] _cells = new char[height, width];
    private int _row;
    private int _column;

    public HashSet<string> Renditions { get; } = [];

    public string Rendition { get; private set; } = "0";

    public void Send(string text)
    {
        for (var at = 0; at < text.Length; at++)
        {
            if (text[at] == '\u001b')
            {
                at = Control(text, at);
                continue;
            }

            Assert.False(char.IsControl(text[at]));
            Assert.InRange(_row, 0, height - 1);
            Assert.InRange(_column, 0, width - 1);
            _cells[_row, _column++] = text[at];
            Renditions.Add(Rendition);
        }
    }

    /// <summary>The page; a cell never written is a NUL.</summary>
    public string[] Page()
    {
        var lines = new string[height];
        for (var row = 0; row < height; row++)
        {
            lines[row] = string.Concat(Enumerable.Range(0, width).Select(column => _cells[row, column]));
        }

        return lines;
    }

    private int Control(string text, int at)
    {
        Assert.Equal('[', text[at + 1]);
        var end = at + 2;
        while (char.IsAsciiDigit(text[end]) || text[end] == ';')
        {
            end++;
        }

        var parameters = text[(at + 2)..end];
        if (text[end] == 'H')
        {
            var place = parameters.Split(';').Select(part => int.Parse(part, CultureInfo.InvariantCulture) - 1).ToArray();
            (_row, _column) = (place[0], place[1]);
        }
        else
        {
            Assert.Equal('m', text[end]);
            Rendition = parameters;
        }

        return end;
    }
}
