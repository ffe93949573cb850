using SkiaSharp;

namespace SpeedCommand.Desk.Tests;

[Collection("console")]
public sealed class ScreensCommandTests : IDisposable
{
    private static readonly string[] Displays = ["pixels-128x64", "characters-20x4", "characters-16x2", "terminal-80x24"];

    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(params string[] names) => Path.Combine([_folder, .. names]);

    [Fact]
    public void Screens_OfAGlideAndAFault_AreDrawnOnEveryDisplay()
    {
        Directory.CreateDirectory(PathOf("logs", "faults"));
        Assert.Equal(0, DeskConsole.Run("simulate", "fault-glide", "--seed", "1", "--out", PathOf("logs", "demo.log")).Status);
        Assert.Equal(0, DeskConsole.Run("spoil", PathOf("logs", "demo.log"), "--plan", "silent", "--seed", "1", "--out", PathOf("logs", "faults", "silent.log")).Status);

        var (status, errors) = DeskConsole.Run("screens", "--logs", PathOf("logs"), "--out", PathOf("out"));

        Assert.Equal(0, status);
        // A glide has no climb, and says so.
        Assert.Contains("no moment of 'climbing-too-fast'", errors);
        foreach (var display in Displays)
        {
            Assert.Superset(
                new HashSet<string> { "caution.png", "no-speed-known.png", "at-a-limit.png", "fault-silent.png" },
                Directory.GetFiles(PathOf("out", display)).Select(file => Path.GetFileName(file)).ToHashSet());
            Assert.DoesNotContain(Directory.GetFiles(PathOf("out", display)), file => file.Contains("climbing", StringComparison.Ordinal));
            Assert.InRange(new FileInfo(PathOf("out", display + ".png")).Length, 2_000, 300_000);
        }

        AssertFault();
    }

    /// <summary>Both pressures are silent: dashes for the speed, and a lit line of fault; on the terminal a red one.</summary>
    private void AssertFault()
    {
        using var pixels = SKBitmap.Decode(PathOf("out", "pixels-128x64", "fault-silent.png"));
        // Four pixels a dot, a rim of two dots.
        bool IsLit(int x, int y) => pixels.GetPixel((x + 2) * 4 + 2, (y + 2) * 4 + 2).Red > 128;
        Assert.Equal((132 * 4, 68 * 4), (pixels.Width, pixels.Height));
        Assert.True(IsLit(127, 63) && IsLit(127, 56));
        Assert.False(IsLit(127, 20));
        Assert.InRange(Enumerable.Range(8, 32).Count(y => Enumerable.Range(20, 76).Any(x => IsLit(x, y))), 3, 8);

        using var terminal = SKBitmap.Decode(PathOf("out", "terminal-80x24", "fault-silent.png"));
        Assert.Equal((80 * 12, 24 * 24), (terminal.Width, terminal.Height));
        var corner = terminal.GetPixel(terminal.Width - 2, terminal.Height - 2);
        Assert.True(corner.Red > 2 * corner.Green && corner.Red > 2 * corner.Blue);
    }

    [Fact]
    public void Screens_OfNoFolder_AreRefusedInOneLine()
    {
        var (status, errors) = DeskConsole.Run("screens", "--logs", PathOf("nowhere"), "--out", PathOf("out"));

        Assert.Equal(66, status);
        Assert.Contains("nowhere", errors);
        Assert.False(Directory.Exists(PathOf("out")));
    }
}
