using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Igc;

/// <summary>
/// Reads an IGC file (FAI, Technical specification for IGC-approved GNSS flight recorders), front to back in bounded memory: the
/// B, I and H records that a replay needs. A line that cannot be used is skipped and listed in <see cref="Problems"/>. Signatures
/// are not checked.
/// </summary>
public sealed class IgcReader : IDisposable
{
    private const long SecondUs = 1_000_000;
    private const int DayS = 86_400;

    /// <summary>Time that seems to run back by more than this has passed midnight.</summary>
    private const int MidnightS = DayS / 2;

    private readonly LogLines _lines;
    private readonly List<LogProblem> _problems = [];
    private readonly IgcHeaderReader _header;
    private bool _fixPending;
    private bool _hasFix;
    private long _dayUs;
    private long _firstUs;
    private long _lastUs;

    private IgcReader(Stream stream)
    {
        _lines = new LogLines(stream);
        _header = new IgcHeaderReader(Report);
    }

    /// <summary>The header: everything before the first fix.</summary>
    public IgcHeader Header => _header.Header;

    /// <summary>The first <see cref="FlightLogReader.MaxProblemsKept"/> lines that could not be used.</summary>
    public IReadOnlyList<LogProblem> Problems => _problems;

    /// <summary>How many lines could not be used.</summary>
    public long ProblemCount { get; private set; }

    /// <summary>Opens a file on a stream and reads its header.</summary>
    /// <param name="stream">The file; closed with the reader.</param>
    /// <returns>The reader, standing before the first fix.</returns>
    /// <exception cref="FormatException">It is not an IGC file.</exception>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static IgcReader Open(Stream stream)
    {
        var reader = new IgcReader(stream);
        reader.ReadHeader();
        return reader;
    }

    /// <summary>Reads the next usable fix.</summary>
    /// <param name="fix">The fix.</param>
    /// <returns>False at the end of the file.</returns>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public bool TryRead(out IgcFix fix)
    {
        while (_fixPending || _lines.MoveNext())
        {
            _fixPending = false;
            var line = _lines.Current;
            if (line.StartsWith("B"u8))
            {
                if (TryReadFix(line, out fix))
                {
                    return true;
                }
            }
            else
            {
                _header.Skip(line);
            }
        }

        fix = default;
        return false;
    }

    /// <inheritdoc/>
    public void Dispose() => _lines.Dispose();

    private void ReadHeader()
    {
        var isFirst = true;
        while (_lines.MoveNext())
        {
            var line = _lines.Current;
            if (isFirst)
            {
                line = line.StartsWith("\uFEFF"u8) ? line[3..] : line;
                if (line.Length == 0 || line[0] is not ((byte)'A' or (byte)'H'))
                {
                    break;
                }

                isFirst = false;
            }

            if (line.StartsWith("B"u8))
            {
                _fixPending = true;
                return;
            }

            _header.Take(line);
        }

        if (isFirst)
        {
            throw new FormatException($"line 1: expected the A record of an IGC file, found '{FlightLogFormat.Show(_lines.Current)}'");
        }
    }

    private bool TryReadFix(ReadOnlySpan<byte> line, out IgcFix fix)
    {
        fix = default;
        if (line.Length < IgcExtension.BaseLength
            || !IgcField.TryTimeOfDay(line[1..7], out var seconds)
            || !IgcField.TryAngle(line[7..15], 2, 'N', 'S', out var latitudeRad)
            || !IgcField.TryAngle(line[15..24], 3, 'E', 'W', out var longitudeRad)
            || line[24] is not ((byte)'A' or (byte)'V')
            || !IgcField.TrySigned(line[25..30], out var pressureAltitudeM)
            || !IgcField.TrySigned(line[30..35], out var gnssAltitudeM))
        {
            Report($"expected a B record like B1101355206343N00006198WA0058700558, found '{FlightLogFormat.Show(line)}'");
            return false;
        }

        if (!TryMoveTo(seconds * SecondUs + FractionUs(line)))
        {
            return false;
        }

        var isThreeDimensional = line[24] == 'A';
        fix = WithExtensions(line, new IgcFix
        {
            TimeUs = _lastUs - _firstUs,
            TimeOfDayS = (_lastUs - _dayUs) * 1e-6,
            LatitudeRad = latitudeRad,
            LongitudeRad = longitudeRad,
            IsThreeDimensional = isThreeDimensional,
            PressureAltitudeM = pressureAltitudeM,
            GnssAltitudeM = isThreeDimensional ? gnssAltitudeM : double.NaN,
        });
        return true;
    }

    /// <summary>Goes on to a time of day, over midnight if need be; time that runs back is a fault of the file.</summary>
    private bool TryMoveTo(long timeOfDayUs)
    {
        if (!_hasFix)
        {
            (_hasFix, _firstUs, _lastUs) = (true, timeOfDayUs, timeOfDayUs);
            return true;
        }

        var dayUs = _dayUs + timeOfDayUs < _lastUs - MidnightS * SecondUs ? _dayUs + DayS * SecondUs : _dayUs;
        var timeUs = dayUs + timeOfDayUs;
        if (timeUs < _lastUs || timeUs - _lastUs > FlightLogFormat.MaxSilenceUs)
        {
            var time = TimeSpan.FromMicroseconds(timeOfDayUs);
            var last = TimeSpan.FromMicroseconds(_lastUs - _dayUs);
            Report(FormattableString.Invariant($"expected a time not before {last:hh\\:mm\\:ss} and at most six hours after it, found {time:hh\\:mm\\:ss}"));
            return false;
        }

        (_dayUs, _lastUs) = (dayUs, timeUs);
        return true;
    }

    /// <summary>TDS, decimal fractions of the second, of recorders that are faster than one fix a second.</summary>
    private long FractionUs(ReadOnlySpan<byte> line)
    {
        var fraction = FieldOf("TDS", line);
        if (fraction.Length > 6 || !IgcField.TryDigits(fraction, out var value))
        {
            return 0;
        }

        var us = (long)value;
        for (var i = fraction.Length; i < 6; i++)
        {
            us *= 10;
        }

        return us;
    }

    private IgcFix WithExtensions(ReadOnlySpan<byte> line, in IgcFix fix) => fix with
    {
        IndicatedMps = IgcField.Airspeed(FieldOf("IAS", line)),
        TrueMps = IgcField.Airspeed(FieldOf("TAS", line)),
        OutsideTemperatureK = IgcField.Temperature(FieldOf("OAT", line)),
        CompensatedVerticalMps = IgcField.VerticalSpeed(FieldOf("VAT", line)),
        EngineNoise = IgcField.EngineNoise(FieldOf("ENL", line)),
    };

    /// <summary>The field of an extension; empty when it was not declared or the line ends before it.</summary>
    private ReadOnlySpan<byte> FieldOf(string code, ReadOnlySpan<byte> line)
    {
        foreach (var extension in _header.Extensions)
        {
            if (extension.Code == code)
            {
                return extension.Last <= line.Length ? line[(extension.First - 1)..extension.Last] : default;
            }
        }

        return default;
    }

    private void Report(string message)
    {
        ProblemCount++;
        if (_problems.Count < FlightLogReader.MaxProblemsKept)
        {
            _problems.Add(new LogProblem(_lines.LineNumber, message));
        }
    }
}
