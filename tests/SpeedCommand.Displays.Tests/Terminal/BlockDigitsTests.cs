using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Terminal;

/// <summary>Reads the big number back with a 3 x 5 dot alphabet drawn here by hand, at every size of panel.</summary>
public class BlockDigitsTests
{
    private static readonly string[] Alphabet =
    [
        "### #.# #.# #.# ###", "..# ..# ..# ..# ..#", "### ..# ### #.. ###", "### ..# ### ..# ###", "#.# #.# ### ..# ..#",
        "### #.. ### ..# ###", "### #.. ### #.# ###", "### ..# ..# ..# ..#", "### #.# ### #.# ###", "### #.# ### ..# ###",
    ];

    [Theory]
    [InlineData(60, 16)]
    [InlineData(80, 24)]
    [InlineData(100, 30)]
    [InlineData(132, 50)]
    public void Draw_EverySpeed_ReadsBackAtEverySize(int width, int height)
    {
        for (var speedKmh = 45; speedKmh < 400; speedKmh += 7)
        {
            var hold = new Gauge(speedKmh / 3.6, 0.1, 0);
            var page = TerminalPanel.Render(
                Pictures.GlidingTooSlow with { HoldIndicatedMps = hold },
                new PanelStyle(width, height, PanelLook.Text, DisplayUnits.Metric));

            Assert.Equal(speedKmh, Read(page));
        }
    }

    private static int Read(string page)
    {
        var lines = page.Split('\n').Where(line => line.Contains('█')).ToArray();
        var height = lines.Length;
        // A digit is one column wider than it is high, the gap is two; the last one ends at the rightmost block.
        var right = lines.Max(line => line.LastIndexOf('█')) + 1;
        var number = 0;
        for (var (place, worth) = (0, 1); place < 3; place++, worth *= 10)
        {
            var left = right - height - 1 - place * (height + 3);
            var dots = string.Join(' ', Enumerable.Range(0, 5).Select(row => string.Concat(Enumerable.Range(0, 3).Select(column =>
            {
                var line = lines[row * (height - 1) / 4];
                var at = left + column * height / 2;
                return at >= 0 && at < line.Length && line[at] == '█' ? '#' : '.';
            }))));
            if (dots.Contains('#'))
            {
                number += worth * Array.IndexOf(Alphabet, dots);
                Assert.Contains(dots, Alphabet);
            }
        }

        return number;
    }
}
