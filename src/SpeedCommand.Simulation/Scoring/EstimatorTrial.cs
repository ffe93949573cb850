using System.Text;
using SpeedCommand.Estimation.Energy;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>Shows one flight, simulated or from a log, to the pipeline with several estimators in it, and notes what they say at each truth.</summary>
public sealed class EstimatorTrial : ISimulatedFlightSink, IPictureSink
{
    private readonly IEnergyEstimator[] _candidates;
    private readonly FlightPipeline _pipeline;
    private readonly Dictionary<string, int> _streams = [];

    /// <summary>Makes ready.</summary>
    /// <param name="settings">The glider and its settings.</param>
    /// <param name="candidates">The estimators, fresh ones.</param>
    public EstimatorTrial(FlightSettings settings, IEnumerable<IEnergyEstimator> candidates)
    {
        _candidates = [.. candidates];
        _pipeline = new FlightPipeline(settings, this, new EstimatorPanel(_candidates));
    }

    /// <summary>The newest picture's netto, m/s; NaN when blank.</summary>
    public double NettoMps { get; private set; } = double.NaN;

    /// <summary>What was noted, in the order of time.</summary>
    public List<ScoredPoint> Points { get; } = [];

    /// <inheritdoc/>
    public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
    {
        var name = Encoding.ASCII.GetString(stream);
        if (!_streams.TryGetValue(name, out var number))
        {
            number = _pipeline.AddStream(name, ChecksumRule.Required);
            _streams.Add(name, number);
        }

        _pipeline.Accept(timeUs, number, line);
    }

    /// <inheritdoc/>
    public void OnTruth(in TruthSample truth)
    {
        _pipeline.AdvanceTo(truth.TimeUs);
        var timeUs = truth.TimeUs;
        Points.Add(new ScoredPoint(truth, Array.ConvertAll(_candidates, candidate => candidate.EstimateAt(timeUs)), NettoMps,
            Array.ConvertAll(_candidates, candidate => candidate.NormalisedInnovationSquared)));
    }

    /// <inheritdoc/>
    public void OnPicture(in CockpitPicture picture) => NettoMps = picture.NettoMps.Value;
}
