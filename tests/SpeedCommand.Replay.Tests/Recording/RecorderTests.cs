using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>The recorder keeps what it promised, keeps its bounds, and stops by name when it cannot.</summary>
public sealed class RecorderTests : IDisposable
{
    private const long SecondUs = 1_000_000;

    private readonly RecordedFiles _files = new();

    public void Dispose() => _files.Dispose();

    private FlightRecorder Open(RecorderOptions? options = null) => new(options ?? _files.Options, RecordedFiles.Header, 7);

    private static void Record(FlightRecorder recorder, long fromUs, int count, int length = 30, long stepUs = 10_000)
    {
        var line = new byte[length];
        line.AsSpan().Fill((byte)'A');
        for (var i = 0; i < count; i++)
        {
            recorder.Record(fromUs + i * stepUs, "static"u8, line);
            if (i % 50 == 49)
            {
                recorder.Drain();
            }
        }

        recorder.Drain();
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void DrainedLines_AreInTheFileWhileTheFlightGoesOn(bool isPacked)
    {
        using var recorder = Open(_files.Options with { IsPacked = isPacked });
        for (var i = 0; i < 10; i++)
        {
            recorder.Record(i, "static"u8, "$A"u8);
            recorder.Drain();
            Assert.Equal(i + 1, RecordedFiles.StampsUs(recorder.Path!).Count);
        }

        recorder.RecordEnd(99);
        recorder.Drain();
        using var log = Logs.FlightLogFile.Open(Assert.Single(_files.Paths));
        while (log.TryRead(out var record))
        {
            Assert.True(record.Kind == Logs.LogRecordKind.Line || record.TimeUs == 99);
        }

        Assert.False(log.IsCut);
    }

    [Fact]
    public void NoLine_NoFile()
    {
        using (var recorder = Open())
        {
            recorder.Probe();
            recorder.Drain();
            recorder.RecordEnd(5);
        }

        Assert.Empty(Directory.GetFileSystemEntries(_files.Folder));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void LongFlight_GoesOnInNewFiles_WithoutLosingALine(bool isPacked)
    {
        using (var recorder = Open(_files.Options with { MaxFileBytes = 4_000, IsPacked = isPacked }))
        {
            Record(recorder, 0, 5_000);
            recorder.RecordEnd(60 * SecondUs);
        }

        Assert.True(_files.Paths.Length > 2);
        Assert.Equal(Enumerable.Range(0, 5_000).Select(i => i * 10_000L), _files.Paths.SelectMany(RecordedFiles.StampsUs));
        Assert.All(_files.Paths, path => Assert.InRange(new FileInfo(path).Length, 1, 4_000 + 50 * 60));
        for (var i = 1; i < _files.Paths.Length; i++)
        {
            var header = RecordedFiles.HeaderOf(_files.Paths[i]);
            Assert.Equal(RecordedFiles.Header.StartUtc, header.StartUtc);
            Assert.Equal(RecordedFiles.StampsUs(_files.Paths[i - 1])[^1], header.FromUs);
            Assert.Equal(["a note", $"part {i + 1} of the flight that begins in {Path.GetFileName(_files.Paths[0])}"], header.Notes);
        }
    }

    [Fact]
    public void FullFolder_StopsTheRecording_AndTouchesNothing()
    {
        var old = Old("2026-06-13T100000Z-3.log", 700_000);
        using var recorder = Open(_files.Options with { MaxFolderBytes = 1 << 20 });
        Record(recorder, 0, 4_000, length: 100);
        Assert.Equal($"the recordings in {_files.Folder} reached their limit of 1 MB", recorder.StopReason);
        Assert.True(File.Exists(old));
        Assert.InRange(_files.Paths.Sum(path => new FileInfo(path).Length), 1 << 20, (1 << 20) + 50 * 130);
    }

    [Fact]
    public void FullFolder_LosesItsOldestRecordings_WhenASettingSaysSo_AndNothingElse()
    {
        string[] oldest = [Old("2025-06-13T100000Z-99.log", 400_000), Old("2026-06-13T100000Z-3.log.gz", 300_000)];
        string[] kept = [Old("2026-06-13T100000Z-3-2.log", 300_000), Old("2025-holidays.log", 400_000), Old("2024-06-13T100000Z-x.log", 400_000)];
        using var recorder = Open(_files.Options with { MaxFolderBytes = 1 << 20, DeletesOldest = true });
        Record(recorder, 0, 5_000, length: 100);
        Assert.Null(recorder.StopReason);
        Assert.DoesNotContain(oldest, File.Exists);
        Assert.All(kept, path => Assert.True(File.Exists(path), path));
        Assert.Equal(5_000, RecordedFiles.StampsUs(recorder.Path!).Count);
    }

    [Fact]
    public void DiskThatDoesNotKeepUp_StopsTheRecordingNotTheFlight_AndIsTriedAgain()
    {
        using var recorder = Open();
        var line = new byte[500];
        for (var i = 0; i < 3000; i++)
        {
            recorder.Record(i, "static"u8, line);
        }

        Assert.Equal("the disk did not keep up", recorder.StopReason);
        Record(recorder, FlightRecorder.RetryUs / 2, 10);
        Assert.NotNull(recorder.StopReason);
        Record(recorder, FlightRecorder.RetryUs + SecondUs, 10);
        Assert.Null(recorder.StopReason);
        Assert.Equal(2, _files.Paths.Length);
        Assert.Equal(10, RecordedFiles.StampsUs(_files.Paths[1]).Count);
        Assert.Equal(FlightRecorder.RetryUs + SecondUs, RecordedFiles.HeaderOf(_files.Paths[1]).FromUs);
    }

    [Fact]
    public void FileOfTheSameMoment_IsNotOverwritten()
    {
        var path = Path.Combine(_files.Folder, "2026-06-14T100000Z-7.log");
        File.WriteAllText(path, "precious");
        using var recorder = Open();
        Record(recorder, 0, 3);
        Assert.Equal("precious", File.ReadAllText(path));
        Assert.EndsWith("2026-06-14T100000Z-7-2.log", recorder.Path, StringComparison.Ordinal);
    }

    [Fact]
    public void Recording_AllocatesNothing()
    {
        using var recorder = Open();
        var line = new byte[60];
        var timeUs = 0L;
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 2_000; i++)
            {
                recorder.Record(timeUs++, "static"u8, line);
            }
        }));
    }

    private string Old(string name, int length)
    {
        var path = Path.Combine(_files.Folder, name);
        File.WriteAllBytes(path, new byte[length]);
        return path;
    }
}
