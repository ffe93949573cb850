using SpeedCommand.Estimation.Energy;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Health;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Pipeline.Stages;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline;

/// <summary>
/// The deterministic machine between stamped lines and pictures, and the one place where its stages are wired. It reads no
/// clock, never waits, does not allocate once running, and nothing that comes from outside makes it throw. The same calls
/// give the same pictures; the service and the replay make the same calls. Not thread-safe: one caller at a time.
/// </summary>
public sealed class FlightPipeline
{
    private readonly IPictureSink _picturesTo;
    private readonly AirDataStage _airData;
    private readonly PilotStage _pilot;
    private readonly LoadStage _load = new();
    private readonly HydrostaticHeight _height = new();
    private readonly TotalEnergyProbe _probe = new();
    private readonly SinkStage _sink;
    private readonly IEnergyEstimator _energy;
    private readonly EventFaults _events = new();
    private readonly HealthStage _health;
    private readonly PictureStage _pictures;
    private readonly List<InputStream> _inputs = [];
    private readonly List<StreamHealth> _streams = [];
    private readonly Reading[] _readings = new Reading[LineFormat.MaxReadings];
    private long _nextPictureUs = PipelineBounds.PicturePeriodUs;

    /// <summary>Makes a pipeline for one flight.</summary>
    /// <param name="settings">The glider and the pilot's choices.</param>
    /// <param name="sink">Takes the pictures.</param>
    /// <param name="energy">The climb estimator; null for the usual one.</param>
    public FlightPipeline(FlightSettings settings, IPictureSink sink, IEnergyEstimator? energy = null)
    {
        ArgumentNullException.ThrowIfNull(settings);
        _energy = energy ?? new AdaptiveEnergyEstimator(new TubeLags(settings.StaticLagS, settings.ImpactLagS, settings.ProbeLagS));
        _picturesTo = sink;
        _pilot = new PilotStage(settings);
        _airData = new AirDataStage(settings);
        _health = new HealthStage(_airData, _events);
        _sink = new SinkStage(settings, _pilot, _load, _energy);
        _pictures = new PictureStage(settings, _pilot, _airData, _load, _energy, _events);
    }

    /// <summary>The streams added so far, with their counts.</summary>
    public IReadOnlyList<StreamHealth> Streams => _streams;

    /// <summary>When each fault came and went.</summary>
    public FaultHistory FaultHistory { get; } = new();

    /// <summary>How the pilot's controls stand at the newest stamp.</summary>
    public ControlValues Controls => _pilot.Values;

    /// <summary>The newest stamp seen, microseconds.</summary>
    public long TimeUs { get; private set; }

    /// <summary>Adds a stream of sentences on a line of unknown speed.</summary>
    /// <param name="name">Its name in settings and logs.</param>
    /// <param name="rule">Whether its sentences may lack a checksum.</param>
    /// <returns>The stream's number for <see cref="Accept(long, int, ReadOnlySpan{byte})"/>.</returns>
    /// <exception cref="InvalidOperationException">There are <see cref="PipelineBounds.MaxStreams"/> already.</exception>
    public int AddStream(string name, ChecksumRule rule) => AddStream(name, StreamSettings.Sentences(rule));

    /// <summary>Adds a stream that lines may come from.</summary>
    /// <param name="name">Its name in settings and logs.</param>
    /// <param name="settings">What its board speaks, and how fast.</param>
    /// <returns>The stream's number for <see cref="Accept(long, int, ReadOnlySpan{byte})"/>.</returns>
    /// <exception cref="InvalidOperationException">There are <see cref="PipelineBounds.MaxStreams"/> already.</exception>
    public int AddStream(string name, StreamSettings settings)
    {
        if (_inputs.Count == PipelineBounds.MaxStreams)
        {
            throw new InvalidOperationException($"expected at most {PipelineBounds.MaxStreams} streams, found one more: '{name}'");
        }

        var input = new InputStream(name, settings);
        _inputs.Add(input);
        _streams.Add(input.Health);
        return _inputs.Count - 1;
    }

    /// <summary>Lets data time begin later than at 0, for a recording that is the continuation of another: no picture is made up to then.</summary>
    /// <param name="timeUs">Microseconds since the start. Call before the first line.</param>
    public void BeginAt(long timeUs)
    {
        TimeUs = timeUs;
        _nextPictureUs = (timeUs / PipelineBounds.PicturePeriodUs + 1) * PipelineBounds.PicturePeriodUs;
    }

    /// <summary>Takes one line. Pictures due before it are made first.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start; an earlier one than the newest counts as the newest.</param>
    /// <param name="stream">The stream's number, as it was given when added.</param>
    /// <param name="line">The line without its end; any bytes.</param>
    public void Accept(long timeUs, int stream, ReadOnlySpan<byte> line)
    {
        AdvanceTo(timeUs);
        var input = _inputs[stream];
        if (!input.TryRead(TimeUs, line, _readings, out var count, out var sampleUs))
        {
            _events.Note(Faults.BadLines, TimeUs);
            return;
        }

        if (count == 0 && SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence) == SentenceFault.None)
        {
            _health.WatchGnss(TimeUs, sentence, _height.HeightM);
        }

        foreach (ref readonly var reading in _readings.AsSpan(0, count))
        {
            if (ReadingRanges.IsPossible(reading, out var fault))
            {
                Take(reading, sampleUs);
            }
            else
            {
                input.Health.BadReadings++;
                _events.Note(fault, TimeUs);
            }
        }
    }

    /// <summary>Takes a change of a control. Pictures due before it are made first.</summary>
    /// <param name="timeUs">Its stamp, microseconds since the start; one before <see cref="BeginAt"/> tells how the controls stood when a recording went on in a new file.</param>
    /// <param name="change">The change.</param>
    public void Accept(long timeUs, in ControlChange change)
    {
        AdvanceTo(timeUs);
        _pilot.Take(timeUs, change);
        _pilot.AdvanceTo(TimeUs);
        switch (change.Control)
        {
            case ControlId.Ballast or ControlId.Bugs:
                _sink.Forget();
                break;
            case ControlId.Phase:
                _pictures.Force(_pilot.Values.ForcedPhase);
                break;
        }
    }

    /// <summary>Lets data time pass without a line; every picture due by then is made.</summary>
    /// <param name="timeUs">Microseconds since the start; an earlier one than the newest changes nothing.</param>
    public void AdvanceTo(long timeUs)
    {
        TimeUs = Math.Max(TimeUs, timeUs);
        while (_nextPictureUs <= TimeUs)
        {
            _pilot.AdvanceTo(_nextPictureUs);
            var picture = _pictures.MakeAt(_nextPictureUs);
            FaultHistory.Take(picture.TimeUs, picture.Faults);
            _picturesTo.OnPicture(picture);
            _nextPictureUs += PipelineBounds.PicturePeriodUs;
        }

        _pilot.AdvanceTo(TimeUs);
    }

    /// <summary>The age of a number counts from its arrival; what the estimator joins, it joins at the moment of the sample.</summary>
    private void Take(in Reading reading, long sampleUs)
    {
        switch (_health.Judge(TimeUs, reading))
        {
            case Verdict.Refused:
                return;
            case Verdict.NewTruth:
                _energy.Reset();
                break;
        }

        switch (reading.Kind)
        {
            case ReadingKind.StaticPressurePa when _airData.TrySetStatic(TimeUs, reading.Value):
                _energy.AddHeight(sampleUs, _height.MoveTo(_airData.Air));
                break;
            case ReadingKind.ImpactPressurePa:
                TakeKinetic(sampleUs, _airData.SetImpact(TimeUs, reading.Value));
                break;
            case ReadingKind.IndicatedAirspeedMps:
                TakeKinetic(sampleUs, _airData.SetIndicated(TimeUs, reading.Value));
                break;
            case ReadingKind.TotalEnergyProbePa when _airData.TrySetProbe(TimeUs, reading.Value, out var air):
                _energy.AddProbeHeight(sampleUs, _probe.HeightAt(reading.Value, air, _energy.EstimateAt(TimeUs).KineticHeightM));
                break;
            case ReadingKind.OutsideAirTemperatureK:
                _airData.SetTemperature(TimeUs, reading.Value);
                _health.WatchTemperature(TimeUs, reading.Value, _height.HeightM);
                break;
            case ReadingKind.RelativeHumidity:
                _airData.SetHumidity(TimeUs, reading.Value);
                break;
            case ReadingKind.LoadFactor:
                _load.SetLoadFactor(TimeUs, reading.Value);
                FollowSink();
                break;
            case ReadingKind.BankRad:
                _load.SetBank(TimeUs, reading.Value);
                FollowSink();
                break;
        }
    }

    private void TakeKinetic(long sampleUs, double kineticM)
    {
        _energy.AddKineticHeight(sampleUs, kineticM);
        FollowSink();
    }

    private void FollowSink()
    {
        if (_airData.IsStaticFresh(TimeUs))
        {
            _sink.Follow(TimeUs, _airData.Air);
        }
    }
}
