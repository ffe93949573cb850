using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests;

/// <summary>The recorder keeps what it promised and stops by name when it cannot.</summary>
public sealed class RecorderTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private FlightRecorder Open(long maxBytes = 1 << 20) =>
        new(Path.Combine(_folder.FullName, "flight.log"), new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []), maxBytes);

    private static int CountLines(string path)
    {
        using var reader = FlightLogFile.Open(path);
        var count = 0;
        while (reader.TryRead(out var record))
        {
            count += record.Kind == LogRecordKind.Line ? 1 : 0;
        }

        Assert.Equal(0, reader.ProblemCount);
        return count;
    }

    [Fact]
    public void DrainedLines_AreInTheFileWhileTheFlightGoesOn()
    {
        using var recorder = Open();
        for (var i = 0; i < 10; i++)
        {
            recorder.Record(i, "static"u8, "$A"u8);
            recorder.Drain();
            Assert.Equal(i + 1, CountLines(recorder.Path));
        }

        recorder.RecordEnd(99);
        recorder.Drain();
        Assert.EndsWith("#end 0.000099\n", File.ReadAllText(recorder.Path), StringComparison.Ordinal);
    }

    [Fact]
    public void FullLog_StopsWithAReason_AndStaysReadable()
    {
        using var recorder = Open(maxBytes: 1000);
        for (var i = 0; i < 200; i++)
        {
            recorder.Record(i, "static"u8, "$A"u8);
        }

        recorder.Drain();
        Assert.Equal("the log reached its limit of 1000 bytes", recorder.StopReason);
        Assert.InRange(CountLines(recorder.Path), 40, 60);
        Assert.InRange(new FileInfo(recorder.Path).Length, 1000, 1100);
    }

    [Fact]
    public void DiskThatDoesNotKeepUp_StopsTheRecordingNotTheFlight()
    {
        using var recorder = Open(maxBytes: long.MaxValue);
        var line = new byte[500];
        for (var i = 0; i < 3000; i++)
        {
            recorder.Record(i, "static"u8, line);
        }

        Assert.Equal("the disk did not keep up", recorder.StopReason);
    }

    [Fact]
    public void FileThatExists_IsNotOverwritten()
    {
        File.WriteAllText(Path.Combine(_folder.FullName, "flight.log"), "precious");
        Assert.Throws<IOException>(() => Open());
        Assert.Equal("precious", File.ReadAllText(Path.Combine(_folder.FullName, "flight.log")));
    }
}
