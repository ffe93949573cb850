using System.Text;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Replay.Igc;

/// <summary>
/// Makes an IGC file of a flight log that has a receiver's sentences: one fix for each whole second of the receiver's time, with the
/// newest pressure, airspeed and temperature at that moment.
/// </summary>
public sealed class IgcExport
{
    /// <summary>A sensor that was silent for longer says nothing about this fix, microseconds.</summary>
    private const long FreshUs = 2_000_000;

    private readonly FlightLogReader _log;
    private readonly Func<string, StreamSettings> _streams;
    private readonly Reading[] _readings = new Reading[LineFormat.MaxReadings];
    private readonly Func<Stream> _open;
    private IgcWriter? _writer;
    private Sensed _pressureAltitudeM = Sensed.Never, _indicatedMps = Sensed.Never, _temperatureK = Sensed.Never;
    private DateOnly _date;
    private IgcFix _epoch = new() { TimeOfDayS = double.NaN };
    private double _writtenS = double.NaN;

    private IgcExport(FlightLogReader log, Func<string, StreamSettings> streams, Func<Stream> open)
    {
        (_log, _streams, _open) = (log, streams, open);
        _date = DateOnly.FromDateTime(log.Header.StartUtc.UtcDateTime);
    }

    /// <summary>Makes the file.</summary>
    /// <param name="log">The log, standing before its first record.</param>
    /// <param name="streams">What is to be known of each stream, by name.</param>
    /// <param name="open">Opens the file to write, once the first position was found.</param>
    /// <returns>Fixes written; 0 when the log has no position, and then nothing was opened.</returns>
    /// <exception cref="IOException">The log cannot be read or the file not be written.</exception>
    public static long Run(FlightLogReader log, Func<string, StreamSettings> streams, Func<Stream> open)
    {
        ArgumentNullException.ThrowIfNull(log);
        ArgumentNullException.ThrowIfNull(streams);
        ArgumentNullException.ThrowIfNull(open);
        return new IgcExport(log, streams, open).Run();
    }

    private long Run()
    {
        var formats = new Dictionary<string, LineFormat>(StringComparer.Ordinal);
        while (_log.TryRead(out var record))
        {
            if (record.Kind != LogRecordKind.Line)
            {
                continue;
            }

            var name = Encoding.ASCII.GetString(record.StreamName);
            if (!formats.TryGetValue(name, out var format))
            {
                formats[name] = format = _streams(name).Format;
            }

            Take(record.TimeUs, record.Content, format);
        }

        WriteEpoch();
        _writer?.Dispose();
        return _writer?.Count ?? 0;
    }

    /// <summary>Receivers always send checksums; what boards send is read as their stream's settings say.</summary>
    private void Take(long timeUs, ReadOnlySpan<byte> line, LineFormat format)
    {
        SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence);
        if (RmcSentence.TryRead(sentence, out var rmc) && rmc.HasFix)
        {
            if (rmc.Date is { } date && _writer is null)
            {
                _date = date;
            }

            MoveTo(timeUs, rmc.TimeOfDayS);
            _epoch = _epoch with { LatitudeRad = rmc.LatitudeRad, LongitudeRad = rmc.LongitudeRad };
        }
        else if (GgaSentence.TryRead(sentence, out var gga) && gga.HasFix)
        {
            MoveTo(timeUs, gga.TimeOfDayS);
            _epoch = _epoch with
            {
                LatitudeRad = gga.LatitudeRad,
                LongitudeRad = gga.LongitudeRad,
                GnssAltitudeM = gga.AltitudeM,
                IsThreeDimensional = double.IsFinite(gga.AltitudeM),
            };
        }
        else
        {
            var count = format.Read(line, _readings).Count;
            foreach (ref readonly var reading in _readings.AsSpan(0, count))
            {
                Take(timeUs, reading);
            }
        }
    }

    private void Take(long timeUs, in Reading reading)
    {
        if (!ReadingRanges.IsPossible(reading, out _))
        {
            return;
        }

        switch (reading.Kind)
        {
            case ReadingKind.StaticPressurePa when StandardAtmosphere.TryAltitudeOfPressure(reading.Value, out var altitudeM):
                _pressureAltitudeM = new Sensed(timeUs, altitudeM);
                break;
            case ReadingKind.ImpactPressurePa:
                _indicatedMps = new Sensed(timeUs, AirspeedConversion.TryCalibrated(reading.Value, out var airspeed) ? airspeed.Mps : 0);
                break;
            case ReadingKind.IndicatedAirspeedMps:
                _indicatedMps = new Sensed(timeUs, reading.Value);
                break;
            case ReadingKind.OutsideAirTemperatureK:
                _temperatureK = new Sensed(timeUs, reading.Value);
                break;
        }
    }

    /// <summary>A receiver's sentences of one moment carry one time; a new time means that the last moment is complete.</summary>
    private void MoveTo(long timeUs, double timeOfDayS)
    {
        if (timeOfDayS == _epoch.TimeOfDayS || double.IsNaN(timeOfDayS))
        {
            return;
        }

        WriteEpoch();
        _epoch = new IgcFix
        {
            TimeOfDayS = timeOfDayS,
            GnssAltitudeM = double.NaN,
            PressureAltitudeM = _pressureAltitudeM.At(timeUs, FreshUs),
            IndicatedMps = _indicatedMps.At(timeUs, FreshUs),
            OutsideTemperatureK = _temperatureK.At(timeUs, PipelineBounds.TemperatureFreshnessUs),
        };
    }

    private void WriteEpoch()
    {
        var second = Math.Floor(_epoch.TimeOfDayS);
        if (double.IsNaN(second) || second == _writtenS || double.IsNaN(_epoch.LatitudeRad) || double.IsNaN(_epoch.LongitudeRad))
        {
            return;
        }

        _writtenS = second;
        _writer ??= new IgcWriter(_open(), _date, Path.GetFileNameWithoutExtension(_log.Header.GliderFile));
        _writer.Write(_epoch);
    }

    private readonly record struct Sensed(long TimeUs, double Value)
    {
        public static readonly Sensed Never = new(0, double.NaN);

        public double At(long nowUs, long freshUs) => nowUs - TimeUs <= freshUs ? Value : double.NaN;
    }
}
