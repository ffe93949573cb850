using System.Text;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>Power may fail at any byte: a recording cut anywhere reads up to what was drained before, and tells of nothing that was not there.</summary>
public sealed class CutRecordingTests : IDisposable
{
    private const int LinesADrain = 10;

    private readonly RecordedFiles _files = new();

    public void Dispose() => _files.Dispose();

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void EveryCut_KeepsEverythingThatWasDrained(bool isPacked)
    {
        var (drained, path) = Record(isPacked);
        var whole = File.ReadAllBytes(path);
        var headerLength = (int)drained[0].Length;
        var cutPath = Path.Combine(_files.Folder, isPacked ? "cut.log.gz" : "cut.log");
        for (var length = headerLength; length <= whole.Length; length++)
        {
            File.WriteAllBytes(cutPath, whole[..length]);
            var safe = drained.Last(one => one.Length <= length).Lines;
            using var reader = FlightLogFile.Open(cutPath);
            var count = 0;
            while (reader.TryRead(out var record))
            {
                if (record.Kind == LogRecordKind.Line)
                {
                    Assert.Equal(Line(count), Encoding.ASCII.GetString(record.Content));
                    count++;
                }
            }

            Assert.Equal(0, reader.ProblemCount);
            Assert.InRange(count, safe, safe + LinesADrain);
        }
    }

    private static string Line(int i) => FormattableString.Invariant($"$YXXDR,P,{90_000 + i * 7919 % 1000}.{i % 10},P,STATIC");

    /// <summary>The file's length after each drain, and the lines it holds then.</summary>
    private (List<(long Length, int Lines)> Drained, string Path) Record(bool isPacked)
    {
        using var recorder = new FlightRecorder(_files.Options with { IsPacked = isPacked }, RecordedFiles.Header, 7);
        var drained = new List<(long Length, int Lines)>();
        for (var i = 0; i < 60; i++)
        {
            recorder.Record(i * 25_000L, "static"u8, Encoding.ASCII.GetBytes(Line(i)));
            if (i == 0 || i % LinesADrain == LinesADrain - 1)
            {
                recorder.Drain();
                drained.Add((new FileInfo(recorder.Path!).Length, i + 1));
            }
        }

        recorder.RecordEnd(5_000_000);
        recorder.Drain();
        return (drained, recorder.Path!);
    }
}
