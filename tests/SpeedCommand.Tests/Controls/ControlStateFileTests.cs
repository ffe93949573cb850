using SpeedCommand.Controls;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Tests.Controls;

/// <summary>What is kept over a restart, and that half of it is never believed.</summary>
public sealed class ControlStateFileTests : IDisposable
{
    private static readonly ControlChange[] Changes =
    [
        new(ControlId.ExpectedClimb, 1.5, IsAutomatic: true), new(ControlId.Ballast, 62.5, DumpKgPerS: 0.7),
        new(ControlId.Qnh, 102_100), new(ControlId.Mute, 1),
    ];

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private string Path => System.IO.Path.Combine(_folder.FullName, "state", "controls.state");

    [Fact]
    public void SavedFile_LoadsTheSame_AndLeavesNothingAside()
    {
        Assert.Null(ControlStateFile.Save(Path, "older"));
        Assert.Null(ControlStateFile.Save(Path, ControlStateFile.Write(Changes)));
        Assert.Null(ControlStateFile.Load(Path, out var loaded));
        Assert.Equal(Changes, loaded);
        Assert.Equal([Path], Directory.GetFiles(System.IO.Path.GetDirectoryName(Path)!));
    }

    [Fact]
    public void NoFile_IsNoFault()
    {
        Assert.Null(ControlStateFile.Load(Path, out var loaded));
        Assert.Empty(loaded);
    }

    [Fact] // a power cut in the middle of a write, on a file system that does not keep its promises
    public void EveryCut_IsNoticed()
    {
        var text = ControlStateFile.Write(Changes);
        for (var length = 0; length < text.Length; length++)
        {
            Assert.NotNull(ControlStateFile.Read(text[..length], out var read));
            Assert.Empty(read);
        }

        Assert.Null(ControlStateFile.Read(text, out _));
    }

    [Theory]
    [InlineData("speedcommand-controls 2\nend\n", "line 1: expected 'speedcommand-controls 1', found something else")]
    [InlineData("speedcommand-controls 1\nbugs 500 %\nend\n", "line 2: bugs: expected 0 to 100 %, found '500 %'")]
    [InlineData("speedcommand-controls 1\nvolume 10 %\n\nend\n", "line 3: expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found ''")]
    public void DamagedFile_SaysWhere(string text, string problem)
    {
        Assert.Equal(problem, ControlStateFile.Read(text, out var read));
        Assert.Empty(read);
    }

    [Fact]
    public void HugeFile_IsNotRead()
    {
        Assert.Null(ControlStateFile.Save(Path, new string('x', 5000)));
        Assert.Equal("expected at most 4096 bytes, found 5000", ControlStateFile.Load(Path, out _));
    }

    [Fact]
    public void FolderThatCannotBeMade_IsTold() => Assert.NotNull(ControlStateFile.Save("/proc/none/controls.state", "x"));
}
