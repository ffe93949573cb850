using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Replay.Logs;

/// <summary>
/// Reads a flight log, version 1, front to back in bounded memory. A log cut anywhere reads up to its last whole line. A line
/// that cannot be used is skipped and listed in <see cref="Problems"/>.
/// </summary>
public sealed class FlightLogReader : IDisposable
{
    /// <summary>The first problems are kept with their text; the rest only counted, so that junk cannot fill the memory.</summary>
    public const int MaxProblemsKept = 20;

    private readonly LogLines _lines;
    private readonly List<LogProblem> _problems = [];
    private readonly List<string> _notes = [];
    private readonly byte[] _content = new byte[FlightLogFormat.MaxLineLength];
    private bool _firstRecordPending;
    private long _lastTimeUs;

    private FlightLogReader(Stream stream) => _lines = new LogLines(stream);

    /// <summary>The header.</summary>
    public FlightLogHeader Header { get; private set; } = new(default, "", []);

    /// <summary>The first <see cref="MaxProblemsKept"/> lines that could not be used.</summary>
    public IReadOnlyList<LogProblem> Problems => _problems;

    /// <summary>How many lines could not be used.</summary>
    public long ProblemCount { get; private set; }

    /// <summary>Whether the log ends in the middle of a line, as after a power cut. Known once everything was read.</summary>
    public bool IsCut => _lines.IsCut;

    /// <summary>Opens a log on a stream and reads its header.</summary>
    /// <param name="stream">The log, already unpacked; closed with the reader.</param>
    /// <returns>The reader, standing before the first record.</returns>
    /// <exception cref="FormatException">It is not a flight log of a version this program reads.</exception>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static FlightLogReader Open(Stream stream)
    {
        var reader = new FlightLogReader(stream);
        reader.ReadHeader();
        return reader;
    }

    /// <summary>Reads the next usable record.</summary>
    /// <param name="record">The record; its spans are valid until the next call.</param>
    /// <returns>False at the end of the log.</returns>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public bool TryRead(out LogRecord record)
    {
        while (_firstRecordPending || _lines.MoveNext())
        {
            _firstRecordPending = false;
            var line = _lines.Current;
            if (_lines.IsTooLong)
            {
                Report($"expected at most {FlightLogFormat.MaxLineLength} bytes in a line, found more");
            }
            else if (TryReadRecord(line, out record))
            {
                return true;
            }
        }

        record = default;
        return false;
    }

    /// <inheritdoc/>
    public void Dispose() => _lines.Dispose();

    private void ReadHeader()
    {
        if (!_lines.MoveNext() || !_lines.Current.StartsWith(FlightLogFormat.Magic))
        {
            throw new FormatException($"line 1: expected '#speedcommand-log {FlightLogFormat.Version}', found '{FlightLogFormat.Show(_lines.Current)}'");
        }

        var version = Encoding.ASCII.GetString(_lines.Current[FlightLogFormat.Magic.Length..]);
        if (version != FlightLogFormat.Version.ToString(CultureInfo.InvariantCulture))
        {
            throw new FormatException($"line 1: expected version {FlightLogFormat.Version}, found '{version}'");
        }

        var header = new LogHeaderLines();
        while (_lines.MoveNext())
        {
            var line = _lines.Current;
            if (line.StartsWith(FlightLogFormat.Note))
            {
                _notes.Add(Encoding.UTF8.GetString(line[FlightLogFormat.Note.Length..]));
            }
            else if (!header.TryTake(line, out var problem))
            {
                _firstRecordPending = true;
                break;
            }
            else if (problem is not null)
            {
                Report(problem);
            }
        }

        Header = header.With(_notes);
        _lastTimeUs = Header.FromUs;
    }

    private bool TryReadRecord(ReadOnlySpan<byte> line, out LogRecord record)
    {
        record = default;
        if (line.StartsWith(FlightLogFormat.End))
        {
            return TryReadStamp(line[FlightLogFormat.End.Length..], out var endUs)
                && (record = new LogRecord(LogRecordKind.End, endUs, default, default)).Kind == LogRecordKind.End;
        }

        if (line.StartsWith(FlightLogFormat.Note))
        {
            _notes.Add(Encoding.UTF8.GetString(line[FlightLogFormat.Note.Length..]));
            return false;
        }

        var stampEnd = line.IndexOf((byte)' ');
        var nameLength = stampEnd < 0 ? -1 : line[(stampEnd + 1)..].IndexOf((byte)' ');
        if (nameLength < 0)
        {
            Report($"expected 'seconds stream line', found '{FlightLogFormat.Show(line)}'");
            return false;
        }

        if (!TryReadStamp(line[..stampEnd], out var timeUs))
        {
            return false;
        }

        if (line[(stampEnd + 1)..].StartsWith(FlightLogFormat.Control))
        {
            return TryReadControl(timeUs, line[(stampEnd + 1 + FlightLogFormat.Control.Length)..], out record);
        }

        var name = line.Slice(stampEnd + 1, nameLength);
        var content = line[(stampEnd + nameLength + 2)..];
        if (name.SequenceEqual(FlightLogFormat.Truth))
        {
            record = new LogRecord(LogRecordKind.Truth, timeUs, name, content);
            return true;
        }

        if (!FlightLogFormat.IsStreamName(name))
        {
            Report($"expected a stream name of 1 to {FlightLogFormat.MaxStreamNameLength} printable characters, found '{FlightLogFormat.Show(name)}'");
            return false;
        }

        if (!LogEscapes.TryUnescape(content, _content, out var length))
        {
            Report($"expected \\xHH or \\\\ after a backslash, found '{FlightLogFormat.Show(content)}'");
            return false;
        }

        if (length > FlightLogFormat.MaxContentLength)
        {
            Report($"expected at most {FlightLogFormat.MaxContentLength} bytes from a stream, found {length}");
            return false;
        }

        record = new LogRecord(LogRecordKind.Line, timeUs, name, _content.AsSpan(0, length));
        return true;
    }

    private bool TryReadControl(long timeUs, ReadOnlySpan<byte> text, out LogRecord record)
    {
        record = default;
        if (!ControlText.TryReadChange(Encoding.UTF8.GetString(text), out var change, out var problem))
        {
            Report(problem);
            return false;
        }

        record = new LogRecord(timeUs, change);
        return true;
    }

    /// <summary>The pipeline's time never runs backwards, and makes ten pictures for each second it runs forwards.</summary>
    private bool TryReadStamp(ReadOnlySpan<byte> text, out long timeUs)
    {
        if (!LogStamp.TryParse(text, out timeUs))
        {
            Report($"expected elapsed seconds with six decimals, found '{FlightLogFormat.Show(text)}'");
            return false;
        }

        if (timeUs < _lastTimeUs || timeUs - _lastTimeUs > FlightLogFormat.MaxSilenceUs)
        {
            Report(FormattableString.Invariant(
                $"expected a time not before {_lastTimeUs / 1e6:F6} and at most six hours after it, found '{FlightLogFormat.Show(text)}'"));
            return false;
        }

        _lastTimeUs = timeUs;
        return true;
    }

    private void Report(string message)
    {
        ProblemCount++;
        if (_problems.Count < MaxProblemsKept)
        {
            _problems.Add(new LogProblem(_lines.LineNumber, message));
        }
    }
}
