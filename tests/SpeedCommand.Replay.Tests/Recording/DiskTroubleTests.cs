using System.IO.Compression;
using CsCheck;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>A disk that is full or may not be written costs the recording, by name and for a while, and never the flight.</summary>
public sealed class DiskTroubleTests : IDisposable
{
    private const long SecondUs = 1_000_000;

    private readonly RecordedFiles _files = new();

    public void Dispose() => _files.Dispose();

    /// <summary>However much fits and whether it is packed: all whole lines before the last drain are read, and recording comes back.</summary>
    [Fact]
    public void FullDisk_LosesAtMostTheLastDrain_AndIsTriedAgainWithANewFile() =>
        Gen.Select(Gen.Int[200, 6_000], Gen.Bool).Sample((freeBytes, isPacked) =>
        {
            var disk = new BoundedDisk { FreeBytes = freeBytes };
            using var recorder = new FlightRecorder(_files.Options with { IsPacked = isPacked }, RecordedFiles.Header, 7, disk.Create);
            var (safe, timeUs) = (0, 0L);
            var random = new Random(freeBytes);
            while (recorder.StopReason is null)
            {
                for (var i = 0; i < 10; i++, timeUs += 50_000)
                {
                    recorder.Record(timeUs, "static"u8, System.Text.Encoding.ASCII.GetBytes($"$YXXDR,P,{random.Next(90_000, 91_000)},P,STATIC*00"));
                }

                recorder.Drain();
                safe += recorder.StopReason is null ? 10 : 0;
            }

            Assert.Equal("No space left on device", recorder.StopReason);
            Assert.InRange(LinesIn(disk.Files[0], isPacked), safe, safe + 10);
            disk.FreeBytes = 100_000;
            recorder.Record(timeUs + FlightRecorder.RetryUs - SecondUs, "static"u8, "$A"u8);
            recorder.Drain();
            Assert.NotNull(recorder.StopReason);
            recorder.Record(timeUs + FlightRecorder.RetryUs, "static"u8, "$A"u8);
            recorder.Drain();
            Assert.Null(recorder.StopReason);
            Assert.Equal(1, LinesIn(disk.Files[1], isPacked));
        }, iter: 100, threads: 1);

    [MountFact]
    public void RealFullDisk_ThenAReadOnlyCard_ThenAGoodOne()
    {
        Assert.True(MountFactAttribute.Run("mount", "-t", "tmpfs", "-o", "size=64k", "tmpfs", _files.Folder));
        try
        {
            using (var recorder = new FlightRecorder(_files.Options, RecordedFiles.Header, 7))
            {
                recorder.Probe();
                var timeUs = Fill(recorder, 0);
                Assert.Contains("No space left on device", recorder.StopReason, StringComparison.Ordinal);
                Assert.InRange(RecordedFiles.StampsUs(recorder.Path!).Count, 500, 2_000);

                Assert.True(MountFactAttribute.Run("mount", "-o", "remount,ro", _files.Folder));
                recorder.Record(timeUs += FlightRecorder.RetryUs, "static"u8, "$A"u8);
                recorder.Drain();
                Assert.Contains("ead-only file system", recorder.StopReason, StringComparison.Ordinal);

                Assert.True(MountFactAttribute.Run("mount", "-o", "remount,rw,size=256k", _files.Folder));
                recorder.Record(timeUs + FlightRecorder.RetryUs, "static"u8, "$A"u8);
                recorder.Drain();
                Assert.Null(recorder.StopReason);
                Assert.Single(RecordedFiles.StampsUs(recorder.Path!));
                Assert.Equal(2, _files.Paths.Length);
            }
        }
        finally
        {
            MountFactAttribute.Run("umount", _files.Folder);
        }
    }

    private static long Fill(FlightRecorder recorder, long timeUs)
    {
        while (recorder.StopReason is null && timeUs < 3_600 * SecondUs)
        {
            recorder.Record(timeUs += 10_000, "static"u8, "$YXXDR,P,95461.2,P,STATIC*74"u8);
            if (timeUs % SecondUs == 0)
            {
                recorder.Drain();
            }
        }

        return timeUs;
    }

    private static int LinesIn(MemoryStream file, bool isPacked)
    {
        Stream content = new MemoryStream(file.ToArray());
        try
        {
            using var reader = FlightLogReader.Open(isPacked ? new GZipStream(content, CompressionMode.Decompress) : content);
            var count = 0;
            while (reader.TryRead(out var record))
            {
                count += record.Kind == LogRecordKind.Line ? 1 : 0;
            }

            Assert.Equal(0, reader.ProblemCount);
            return count;
        }
        catch (FormatException)
        {
            return 0;
        }
    }
}
