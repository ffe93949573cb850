using SpeedCommand.Replay.Files;

namespace SpeedCommand.Replay.Tests.Files;

/// <summary>No name, link or folder leads a command to write over what it reads; and asking changes nothing on the disk.</summary>
public sealed class OutputFileTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-files-").FullName;
    private readonly string _log;

    public OutputFileTests()
    {
        _log = Path.Combine(_folder, "flight.log");
        File.WriteAllText(_log, "flown");
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    private string? FaultOf(string path) => OutputFile.FaultOf("--out", path, new InputFile("the log", _log), new InputFile("the settings", null))?.Message;

    [Fact]
    public void TheSameFile_ByAnyName_IsRefused()
    {
        Directory.CreateDirectory(PathOf("sub"));
        File.CreateSymbolicLink(PathOf("link.jsonl"), _log);
        Directory.CreateSymbolicLink(PathOf("here"), _folder);
        foreach (var name in new[] { "flight.log", "sub/../flight.log", "./flight.log", "link.jsonl", "here/flight.log" })
        {
            Assert.Equal($"--out: expected another file than the log, found '{PathOf(name)}'", FaultOf(PathOf(name)));
        }

        File.WriteAllText(PathOf("other.log"), "flown");
        Assert.Null(FaultOf(PathOf("other.log")));
    }

    /// <summary>A copy made by ln or cp -l has no link to follow: only device and inode tell.</summary>
    [Fact]
    public void AHardLink_IsRefused_WhereTheSystemTells()
    {
        if (!OperatingSystem.IsLinux())
        {
            return;
        }

        using var link = System.Diagnostics.Process.Start("ln", [_log, PathOf("hard.jsonl")]);
        link.WaitForExit();
        Assert.Equal(0, link.ExitCode);
        Assert.Contains("another file than the log", FaultOf(PathOf("hard.jsonl")), StringComparison.Ordinal);
    }

    [Fact]
    public void AskingLeavesTheDiskAsItIs()
    {
        var other = PathOf("other.jsonl");
        File.WriteAllText(other, "older");
        Assert.Null(FaultOf(other));
        Assert.Null(FaultOf(PathOf("new.jsonl")));
        Assert.Equal(("older", false), (File.ReadAllText(other), File.Exists(PathOf("new.jsonl"))));
        Assert.Null(OperatingSystem.IsLinux() ? FaultOf("/dev/null") : null);
    }

    [Fact]
    public void WhatCannotBeWritten_SaysWhy_AndWhetherAnotherNameMends()
    {
        var missing = PathOf("nowhere/x.jsonl");
        Assert.Equal(new OutputFault(true, $"--out: expected a file, found the folder '{_folder}'"), OutputFile.FaultOf("--out", _folder));
        Assert.Equal(new OutputFault(true, "--out: expected a file, found ''"), OutputFile.FaultOf("--out", ""));
        Assert.Equal(
            new OutputFault(false, $"--out: expected a file that can be written, found '{missing}': there is no folder '{PathOf("nowhere")}'"),
            OutputFile.FaultOf("--out", missing));
        Assert.Equal(new OutputFault(true, $"--out: expected a folder, found the file '{_log}'"), OutputFile.MakeFolder("--out", _log));
        Assert.False(OutputFile.MakeFolder("--out", Path.Combine(_log, "sub"))!.IsUsage);
    }

    [Fact]
    public void Replace_KeepsALinkALink_AndLeavesNothingAside()
    {
        var link = PathOf("link.json");
        File.CreateSymbolicLink(link, _log);
        OutputFile.Replace(link, "newer"u8);
        Assert.Equal(("newer", _log), (File.ReadAllText(_log), File.ResolveLinkTarget(link, true)!.FullName));
        Assert.Equal(["flight.log", "link.json"], Directory.GetFiles(_folder).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal));
    }
}
