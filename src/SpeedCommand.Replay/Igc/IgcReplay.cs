using System.Globalization;
using System.Text;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Sentences;

namespace SpeedCommand.Replay.Igc;

/// <summary>
/// Feeds an IGC file to a pipeline: each fix becomes sentences of a stream named "igc", stamped with the time since the first fix: static
/// pressure, indicated airspeed and temperature as far as the fix has them, and the receiver's height. Nothing is made up between
/// fixes.
/// </summary>
public sealed class IgcReplay : IReplay
{
    private const double SecondsPerDay = 86_400;
    private const int LineEndLength = 2;

    private static readonly byte[] Talker = [.. "IG"u8];

    private readonly IgcReader _file;
    private readonly IgcSurvey _survey;
    private readonly FlightPipeline _pipeline;
    private readonly AirspeedCorrection _correction;
    private readonly byte[] _sentence = new byte[SentenceReader.MaxLength + 2];
    private readonly int _stream;
    private long _lastUs;

    /// <summary>Puts a file in front of a pipeline.</summary>
    /// <param name="file">The file, standing before its first fix.</param>
    /// <param name="survey">What it holds.</param>
    /// <param name="pipeline">A new pipeline.</param>
    /// <param name="correction">The glider's airspeed correction, to get from a true airspeed to what the indicator reads.</param>
    public IgcReplay(IgcReader file, IgcSurvey survey, FlightPipeline pipeline, AirspeedCorrection correction)
    {
        ArgumentNullException.ThrowIfNull(survey);
        ArgumentNullException.ThrowIfNull(pipeline);
        (_file, _survey, _pipeline, _correction) = (file, survey, pipeline, correction);
        _stream = pipeline.AddStream("igc", ChecksumRule.Required);
        Climbs = new IgcClimbs(useGnss: !survey.HasPressure);
    }

    /// <summary>The climbs found by height and track.</summary>
    public IgcClimbs Climbs { get; }

    /// <inheritdoc/>
    public long LineCount { get; private set; }

    /// <inheritdoc/>
    public FlightPipeline Pipeline => _pipeline;

    /// <inheritdoc/>
    public bool Step(Action<long>? before = null)
    {
        if (!_file.TryRead(out var fix))
        {
            // A picture shows what came before it: the last fix needs one more.
            _pipeline.AdvanceTo(_lastUs + PipelineBounds.PicturePeriodUs);
            Climbs.End();
            return false;
        }

        _lastUs = fix.TimeUs;
        before?.Invoke(fix.TimeUs);
        LineCount++;
        Climbs.Add(fix);
        var length = Write(fix);
        if (length > 0)
        {
            _pipeline.Accept(fix.TimeUs, _stream, _sentence.AsSpan(0, length));
        }

        if (fix.IsThreeDimensional && SentenceWriter.TryWrite(_sentence, Position(fix), out var written))
        {
            _pipeline.Accept(fix.TimeUs, _stream, _sentence.AsSpan(0, written - LineEndLength));
        }

        _pipeline.AdvanceTo(fix.TimeUs);
        return true;
    }

    /// <summary>The receiver's part as a GGA sentence, against which the pipeline checks the pressure.</summary>
    private static byte[] Position(in IgcFix fix)
    {
        var time = TimeSpan.FromSeconds(fix.TimeOfDayS % SecondsPerDay);
        return Encoding.ASCII.GetBytes(string.Create(CultureInfo.InvariantCulture,
            $"IGGGA,{time:hhmmss\\.ff},{Angle(fix.LatitudeRad, "00")},{(fix.LatitudeRad < 0 ? 'S' : 'N')},{Angle(fix.LongitudeRad, "000")},{(fix.LongitudeRad < 0 ? 'W' : 'E')},1,,,{fix.GnssAltitudeM:0.0},M,,M,,"));
    }

    private static string Angle(double angleRad, string degreeFormat)
    {
        var thousandths = (long)Math.Round(Math.Abs(double.RadiansToDegrees(angleRad)) * 60_000);
        return (thousandths / 60_000).ToString(degreeFormat, CultureInfo.InvariantCulture)
            + (thousandths % 60_000 / 1000.0).ToString("00.000", CultureInfo.InvariantCulture);
    }

    /// <summary>Writes the fix as a sentence without its line end; 0 when it has nothing for the pipeline.</summary>
    private int Write(in IgcFix fix)
    {
        Span<XdrMeasurement> measurements = stackalloc XdrMeasurement[3];
        var count = 0;
        // The thermometer first: the pressure's air rests on it.
        if (double.IsFinite(fix.OutsideTemperatureK))
        {
            measurements[count++] = new XdrMeasurement(ReadingKind.OutsideAirTemperatureK, fix.OutsideTemperatureK, 2);
        }

        if (_survey.HasPressure && StandardAtmosphere.TryAt(fix.PressureAltitudeM, out var state))
        {
            measurements[count++] = new XdrMeasurement(ReadingKind.StaticPressurePa, state.PressurePa, 2);
        }

        if (IndicatedMps(fix) is var indicatedMps && double.IsFinite(indicatedMps))
        {
            measurements[count++] = new XdrMeasurement(ReadingKind.IndicatedAirspeedMps, indicatedMps, 3);
        }

        return count > 0 && SentenceWriter.TryWriteXdr(_sentence, Talker, measurements[..count], out var written) ? written - LineEndLength : 0;
    }

    /// <summary>As recorded, else from the true airspeed in the air of this height and temperature.</summary>
    private double IndicatedMps(in IgcFix fix)
    {
        if (double.IsFinite(fix.IndicatedMps) || !double.IsFinite(fix.TrueMps) || !_survey.HasPressure
            || !StandardAtmosphere.TryAt(fix.PressureAltitudeM, out var standard))
        {
            return fix.IndicatedMps;
        }

        var temperatureK = double.IsFinite(fix.OutsideTemperatureK) ? fix.OutsideTemperatureK : standard.TemperatureK;
        return Air.TryMeasured(standard.PressurePa, temperatureK, double.NaN, out var air, out _)
            && AirspeedConversion.TryCalibrated(AirspeedConversion.ToEquivalent(new TrueAirspeed(fix.TrueMps), air), air, out var calibrated)
                ? _correction.ToIndicated(calibrated).Mps
                : double.NaN;
    }
}
