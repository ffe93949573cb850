using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>What the phase is judged by.</summary>
/// <param name="IsLoadMeasured">Whether the load factor comes from a sensor.</param>
/// <param name="SteadyLoad">Load factor smoothed over a second.</param>
/// <param name="ClimbMps">Total-energy climb, m/s; NaN when blank.</param>
/// <param name="IndicatedMps">Indicated airspeed, m/s; NaN when blank.</param>
/// <param name="MinSinkMps">Indicated minimum-sink speed, m/s; NaN when blank.</param>
internal readonly record struct PhaseEvidence(bool IsLoadMeasured, double SteadyLoad, double ClimbMps, double IndicatedMps, double MinSinkMps);

/// <summary>
/// Climbing or gliding. With a load or bank sensor a lasting turn means climbing; without one, slow flight that climbs does.
/// The evidence must last, and the thresholds to enter and to leave lie apart, so that the display does not flicker. A phase
/// the pilot insists on stays.
/// </summary>
internal sealed class PhaseStage(FlightPhase? forcedAtStart)
{
    /// <summary>A pull-up or a bend in the track is over sooner than this.</summary>
    public const long LastingUs = 6_000_000;

    /// <summary>Load factor of a 20-degree bank; thermalling turns are steeper (common practice).</summary>
    private const double TurningLoad = 1.064;

    /// <summary>Load factor of an 11-degree bank; straight flight stays below.</summary>
    private const double StraightLoad = 1.019;

    private const double ClimbSmoothingS = 5;
    private const double ClimbingMps = 0.5;
    private const double SlowRatio = 1.25;
    private const double FastRatio = 1.4;

    private double _smoothClimbMps;
    private long _contraryUs;

    public FlightPhase Phase { get; private set; } = forcedAtStart ?? FlightPhase.Gliding;

    /// <summary>Whether the pilot insists on the phase.</summary>
    public bool IsForced { get; private set; } = forcedAtStart is not null;

    /// <summary>The pilot insists on a phase, from now on, or no longer on any.</summary>
    public void Force(FlightPhase? forced)
    {
        IsForced = forced is not null;
        if (forced is { } phase && phase != Phase)
        {
            Phase = phase;
            _contraryUs = 0;
        }
    }

    /// <summary>Judges once a picture.</summary>
    public FlightPhase Judge(in PhaseEvidence evidence)
    {
        const double Step = PipelineBounds.PicturePeriodUs * 1e-6 / ClimbSmoothingS;
        _smoothClimbMps += double.IsNaN(evidence.ClimbMps) ? 0 : (evidence.ClimbMps - _smoothClimbMps) * Step;
        var speedRatio = evidence.IndicatedMps / evidence.MinSinkMps;
        var contrary = Phase == FlightPhase.Gliding ? LooksLikeClimbing(evidence, speedRatio) : LooksLikeGliding(evidence, speedRatio);
        _contraryUs = contrary ? _contraryUs + PipelineBounds.PicturePeriodUs : 0;
        if (!IsForced && _contraryUs >= LastingUs)
        {
            Phase = Phase == FlightPhase.Gliding ? FlightPhase.Climbing : FlightPhase.Gliding;
            _contraryUs = 0;
        }

        return Phase;
    }

    private bool LooksLikeClimbing(in PhaseEvidence evidence, double speedRatio) => evidence.IsLoadMeasured
        ? evidence.SteadyLoad > TurningLoad && speedRatio < FastRatio
        : _smoothClimbMps > ClimbingMps && speedRatio < SlowRatio;

    private bool LooksLikeGliding(in PhaseEvidence evidence, double speedRatio) => evidence.IsLoadMeasured
        ? evidence.SteadyLoad < StraightLoad || speedRatio > FastRatio
        : _smoothClimbMps < 0 || speedRatio > FastRatio;
}
