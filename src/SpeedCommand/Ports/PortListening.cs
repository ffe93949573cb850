using System.Diagnostics;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>Listens to one port for some seconds and says what it heard and, if that is nothing good, what to mend.</summary>
internal sealed class PortListening(PortSettings settings) : ILineSink
{
    private readonly LineFramer _framer = new();
    private long _bytes;
    private long _lines;
    private long _sentences;
    private long _readings;
    private long _withoutChecksum;

    /// <summary>The verdict in one line.</summary>
    public string Verdict { get; private set; } = "";

    void ILineSink.OnLine(ReadOnlySpan<byte> line)
    {
        _lines++;
        switch (SentenceReader.TryRead(line, settings.Checksum, out var sentence))
        {
            case SentenceFault.None:
                _sentences++;
                _readings += new XdrReadings(sentence).Count;
                break;
            case SentenceFault.MissingChecksum:
                _withoutChecksum++;
                break;
        }
    }

    /// <summary>Listens; true when the port gives readings.</summary>
    public async Task<bool> ListenAsync(TimeSpan length, CancellationToken cancel)
    {
        try
        {
            var port = SerialPorts.Open(settings.Device, settings.Baud);
            var watch = Stopwatch.StartNew();
            await ReadAsync(port.BaseStream, length, cancel).ConfigureAwait(false);
            var seconds = watch.Elapsed.TotalSeconds;
            await SerialPorts.CloseAsync(port).ConfigureAwait(false);
            Verdict = $"{settings.Name}: {settings.Device}: {Judge(seconds)}";
            return _readings > 0;
        }
        catch (Exception fault) when (SerialPorts.IsPortFault(fault))
        {
            Verdict = $"{settings.Name}: {PortFault.Explain(settings.Device, fault)}";
            return false;
        }
    }

    private async Task ReadAsync(Stream bytes, TimeSpan length, CancellationToken cancel)
    {
        using var limit = CancellationTokenSource.CreateLinkedTokenSource(cancel);
        limit.CancelAfter(length);
        var buffer = new byte[4096];
        try
        {
            while (await bytes.ReadAsync(buffer, limit.Token).ConfigureAwait(false) is var count and > 0)
            {
                _bytes += count;
                _framer.Push(buffer.AsSpan(0, count), this);
            }
        }
        catch (OperationCanceledException) when (limit.IsCancellationRequested)
        {
            // The time is up.
        }
    }

    private string Judge(double seconds)
    {
        if (_bytes == 0)
        {
            return FormattableString.Invariant($"no data in {seconds:F0} s; is the board powered, and its transmit line wired to our receive line?");
        }

        if (_sentences == 0)
        {
            return _withoutChecksum > 0
                ? $"{_withoutChecksum} sentences without a checksum; if the board cannot send one, set \"checksum\": \"optional\" for this port"
                : $"{_bytes} bytes but no valid line; is {settings.Baud} baud what the board sends at?";
        }

        return _readings == 0
            ? $"{_sentences} valid sentences, but none with a measurement of ours; docs/sentences.md lists them"
            : FormattableString.Invariant($"good: {_lines / seconds:F1} lines and {_readings / seconds:F1} readings a second, {_lines - _sentences} bad lines");
    }
}
