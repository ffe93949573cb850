using System.Diagnostics;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>Listens to one port for some seconds and says what it heard and, if that is nothing good, what to mend.</summary>
internal sealed class PortListening(PortSettings settings) : ILineSink
{
    private readonly LineFramer _framer = new();
    private readonly Reading[] _found = new Reading[LineFormat.MaxReadings];
    private long _bytes;
    private long _lines;
    private long _sentences;
    private long _readings;
    private long _withoutChecksum;
    private long _wrongChecksum;
    private long _impossible;

    /// <summary>The verdict in one line.</summary>
    public string Verdict { get; private set; } = "";

    /// <summary>The kinds of reading that came, as far as their values were possible.</summary>
    public HashSet<ReadingKind> Kinds { get; } = [];

    void ILineSink.OnLine(ReadOnlySpan<byte> line)
    {
        _lines++;
        var content = settings.Stream.Format.Read(line, _found);
        if (content.IsSound)
        {
            _sentences++;
            foreach (var reading in _found.AsSpan(0, content.Count))
            {
                Take(reading);
            }

            return;
        }

        switch (SentenceReader.TryRead(line, settings.Checksum, out _))
        {
            case SentenceFault.MissingChecksum when SentenceReader.TryRead(line, ChecksumRule.Optional, out _) == SentenceFault.None:
                _withoutChecksum++;
                break;
            case SentenceFault.WrongChecksum:
                _wrongChecksum++;
                break;
        }
    }

    private void Take(in Reading reading)
    {
        if (ReadingRanges.IsPossible(reading, out _))
        {
            _readings++;
            Kinds.Add(reading.Kind);
        }
        else
        {
            _impossible++;
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
            return WithoutSentence();
        }

        if (_readings == 0)
        {
            return _impossible > 0
                ? $"{_impossible} readings, every one impossible; are the units those of docs/sentences.md?"
                : $"{_sentences} valid sentences, but none with a measurement of ours; docs/sentences.md lists them";
        }

        var rejected = _impossible > 0 ? $", {_impossible} impossible readings" : "";
        return FormattableString.Invariant(
            $"good: {_lines / seconds:F1} lines and {_readings / seconds:F1} readings a second, {_lines - _sentences} bad lines{rejected}");
    }

    /// <summary>Readable lines point to the board's sentences, unreadable ones to the line.</summary>
    private string WithoutSentence()
    {
        if (_lines == 0)
        {
            return $"{_bytes} bytes without a line end; is {settings.Baud} baud what the board sends at, and does it end lines with CR LF?";
        }

        if (_wrongChecksum * 2 > _lines)
        {
            return $"{_wrongChecksum} lines with a wrong checksum; docs/sentences.md shows how the board must compute it";
        }

        return _withoutChecksum * 2 > _lines
            ? $"{_withoutChecksum} sentences without a checksum; if the board cannot send one, set \"checksum\": \"optional\" for this port"
            : $"{_bytes} bytes but no valid line; is {settings.Baud} baud what the board sends at?";
    }
}
