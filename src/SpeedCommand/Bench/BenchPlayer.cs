using System.Text;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Service;

namespace SpeedCommand.Bench;

/// <summary>
/// Plays a log into pseudo-terminals as the sensor boards would: each line is written at its stamp. When the flight is over
/// and everything has arrived, it asks the service to stop.
/// </summary>
internal sealed class BenchPlayer(
    BenchFlight flight, IReadOnlyList<PortState> ports, CockpitMachine machine, CockpitClock clock, TimeProvider time,
    IHostApplicationLifetime lifetime, ILogger<BenchPlayer> log) : BackgroundService
{
    private static readonly TimeSpan Poll = TimeSpan.FromMilliseconds(5);

    /// <summary>How long the ports may take to open, and the last lines to arrive.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(5);

    private readonly byte[] _line = new byte[1024];

    /// <summary>Lines written in full.</summary>
    public long LinesSent { get; private set; }

    /// <summary>How fast the flight was really played, as a multiple of its own time; NaN before its end.</summary>
    public double ReachedPace { get; private set; } = double.NaN;

    /// <summary>Whether the whole flight was played.</summary>
    public bool IsComplete { get; private set; }

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        try
        {
            await WaitForAsync(() => ports.All(port => port.IsOpen), stoppingToken).ConfigureAwait(false);
            await PlayAsync(stoppingToken).ConfigureAwait(false);
            await WaitForAsync(() => machine.Streams.Sum(stream => stream.Lines) >= LinesSent, stoppingToken).ConfigureAwait(false);
            IsComplete = true;
        }
        catch (OperationCanceledException)
        {
            // Stopped from outside.
        }
        catch (IOException fault)
        {
            log.LogError("the bench flight broke off: {Cause}", fault.Message);
        }

        lifetime.StopApplication();
    }

    private async Task PlayAsync(CancellationToken stop)
    {
        using var records = FlightLogFile.Open(flight.LogPath);
        var (startUs, began, lastUs) = (clock.NowUs, time.GetTimestamp(), flight.Header.FromUs);
        while (TryReadLine(records, out var timeUs, out var streamName, out var length))
        {
            await WaitUntilAsync(startUs + timeUs - flight.Header.FromUs, stop).ConfigureAwait(false);
            var line = flight.Lines[streamName];
            for (var sent = 0; sent < length;)
            {
                sent += line.Write(_line.AsSpan(sent, length - sent));
                if (sent < length)
                {
                    await Task.Delay(Poll, time, stop).ConfigureAwait(false);
                }
            }

            LinesSent++;
            lastUs = timeUs;
        }

        ReachedPace = (lastUs - flight.Header.FromUs) / time.GetElapsedTime(began).TotalMicroseconds;
    }

    private bool TryReadLine(FlightLogReader records, out long timeUs, out string streamName, out int length)
    {
        while (records.TryRead(out var record))
        {
            if (record.Kind == LogRecordKind.Line)
            {
                timeUs = record.TimeUs;
                streamName = Encoding.ASCII.GetString(record.StreamName);
                record.Content.CopyTo(_line);
                "\r\n"u8.CopyTo(_line.AsSpan(record.Content.Length));
                length = record.Content.Length + 2;
                return true;
            }
        }

        (timeUs, streamName, length) = (0, "", 0);
        return false;
    }

    private async Task WaitUntilAsync(long timeUs, CancellationToken stop)
    {
        // Sleeps are whole milliseconds at best; a line that is due within half of one goes now.
        while (timeUs - clock.NowUs is var aheadUs && aheadUs > 500 * clock.Pace)
        {
            await Task.Delay(TimeSpan.FromMicroseconds(aheadUs / clock.Pace), time, stop).ConfigureAwait(false);
        }

        stop.ThrowIfCancellationRequested();
    }

    private async Task WaitForAsync(Func<bool> isReached, CancellationToken stop)
    {
        var deadline = time.GetUtcNow() + Patience;
        while (!isReached() && time.GetUtcNow() < deadline)
        {
            await Task.Delay(Poll, time, stop).ConfigureAwait(false);
        }
    }
}
