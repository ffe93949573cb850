using System.Globalization;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Igc;

/// <summary>
/// A flight recorder's IGC file. Its fixes come every one to four seconds, so a value counts as fresh for one and a half of the
/// file's own intervals instead of the cockpit's second; the remarks say so.
/// </summary>
public sealed class IgcRecording : IRecording
{
    /// <summary>So many intervals a value stays: one fix may come a little late, but none may be missed.</summary>
    private const double FreshIntervals = 1.5;

    /// <summary>However slow the file is: in six seconds a glider flies 200 m and through half a thermal.</summary>
    private const long MaxFreshnessUs = 6_000_000;

    /// <summary>Over longer gaps the climb estimator starts anew each time.</summary>
    private const long MaxClimbIntervalUs = 2_000_000;

    private readonly IgcReader _reader;
    private IgcReplay? _replay;

    private IgcRecording(IgcReader reader, IgcSurvey survey) => (_reader, Survey) = (reader, survey);

    /// <summary>What the file holds.</summary>
    public IgcSurvey Survey { get; }

    /// <summary>The file's header.</summary>
    public IgcHeader Header => _reader.Header;

    /// <inheritdoc/>
    public string GliderFile => "";

    /// <inheritdoc/>
    public DateTimeOffset? StartUtc => Header.Date is { } date && double.IsFinite(Survey.StartTimeOfDayS)
        ? new DateTimeOffset(date, TimeOnly.MinValue, TimeSpan.Zero).AddSeconds(Survey.StartTimeOfDayS)
        : null;

    /// <inheritdoc/>
    public FlownSettings Flown => FlownSettings.None;

    /// <inheritdoc/>
    public IReadOnlyList<LogProblem> Problems => _reader.Problems;

    /// <inheritdoc/>
    public long ProblemCount => _reader.ProblemCount;

    /// <summary>Never: the last record of an IGC file may lack its line end.</summary>
    public bool IsCut => false;

    /// <summary>How long a value stays, microseconds.</summary>
    public long FreshnessUs =>
        Math.Clamp((long)(FreshIntervals * Survey.IntervalUs), PipelineBounds.FreshnessUs, MaxFreshnessUs);

    /// <inheritdoc/>
    public IReadOnlyList<string> Remarks => [.. WhatIsMissing()];

    /// <summary>The climbs by height and track; null before the start.</summary>
    public IgcClimbs? Climbs => _replay?.Climbs;

    /// <summary>Opens a file; it is read twice, first to learn what it holds.</summary>
    /// <param name="open">Opens the file's stream.</param>
    /// <returns>The recording.</returns>
    /// <exception cref="FormatException">It is not an IGC file, or has no usable fix.</exception>
    /// <exception cref="IOException">The file cannot be opened or read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static IgcRecording Open(Func<Stream> open)
    {
        ArgumentNullException.ThrowIfNull(open);
        IgcSurvey survey;
        using (var first = IgcReader.Open(open()))
        {
            survey = IgcSurvey.Of(first);
            if (survey.FixCount == 0)
            {
                throw new FormatException(first.ProblemCount > 0
                    ? $"line {first.Problems[0].LineNumber}: {first.Problems[0].Message}; there is no usable fix"
                    : "expected B records, found none");
            }
        }

        return new IgcRecording(IgcReader.Open(open()), survey);
    }

    /// <inheritdoc/>
    public IReplay Start(FlightSettings settings, IPictureSink sink, Func<string, StreamSettings> streams)
    {
        ArgumentNullException.ThrowIfNull(settings);
        var pipeline = new FlightPipeline(settings with { FreshnessUs = FreshnessUs }, sink);
        return _replay = new IgcReplay(_reader, Survey, pipeline, settings.Glider.AirspeedCorrection);
    }

    /// <inheritdoc/>
    public void Dispose() => _reader.Dispose();

    private IEnumerable<string> WhatIsMissing()
    {
        if (FreshnessUs > PipelineBounds.FreshnessUs)
        {
            yield return string.Create(CultureInfo.InvariantCulture,
                $"a fix every {Survey.IntervalUs * 1e-6:0.0} s: a value stays for {FreshnessUs * 1e-6:0.0} s instead of {PipelineBounds.FreshnessUs * 1e-6:0.0} s");
        }

        if (!Survey.HasPressure)
        {
            yield return "no pressure altitude: heights and everything that rests on the air are blank; climbs are by GNSS height";
        }

        if (!Survey.HasAirspeed)
        {
            yield return "no airspeed (IAS or TAS): airspeeds, total-energy climb, netto and targets are blank; climbs are by height and track";
        }
        else if (!Survey.HasIndicated && Survey.HasPressure)
        {
            yield return "no indicated airspeed: worked out from the true airspeed";
        }

        if (Survey.HasAirspeed && Survey.IntervalUs > MaxClimbIntervalUs)
        {
            yield return "climb and netto need fixes at most 2 s apart: they are blank";
        }

        if (!Survey.HasTemperature)
        {
            yield return "no temperature (OAT): density altitude rests on the standard atmosphere and the setting temperatureOffset";
        }
    }
}
