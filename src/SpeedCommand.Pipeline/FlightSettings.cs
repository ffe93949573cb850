using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline;

/// <summary>What the pipeline must know of the glider and the pilot's choices. SI units.</summary>
/// <param name="Glider">The glider flown.</param>
public sealed record FlightSettings(Glider Glider)
{
    /// <summary>All-up mass with ballast, kg; default the polar's reference mass.</summary>
    public double MassKg { get; init; } = Glider.ReferenceMassKg;

    /// <summary>Water ballast in that mass, kg; default 0. The mass never falls below what it is without.</summary>
    public double BallastKg { get; init; }

    /// <summary>Extra sink of a dirty wing as a fraction of the clean sink, 0 or more; default 0.</summary>
    public double BugsFraction { get; init; }

    /// <summary>The climb expected in the next thermal (MacCready setting), m/s, 0 or more; default 0.</summary>
    public double ExpectedClimbMps { get; init; }

    /// <summary>No target lies closer than this fraction above the stall; default 0.05.</summary>
    public double StallMargin { get; init; } = 0.05;

    /// <summary>Without a thermometer, the air's temperature above the standard atmosphere's, K; default 0.</summary>
    public double TemperatureOffsetK { get; init; }

    /// <summary>Share of the full kinetic heating the thermometer senses, 0 to 1; default 0, a shaded probe out of the stream.</summary>
    public double ThermometerRecovery { get; init; }

    /// <summary>Lag of the tubes to the static pressure sensor, s, 0 to 2; default 0.</summary>
    public double StaticLagS { get; init; }

    /// <summary>Lag of the tubes to the impact pressure sensor, s, 0 to 2; default 0.</summary>
    public double ImpactLagS { get; init; }

    /// <summary>Lag of the tubes to the total-energy probe's sensor, s, 0 to 2; default 0.</summary>
    public double ProbeLagS { get; init; }

    /// <summary>The phase the pilot insists on; null, the default, lets the air data decide.</summary>
    public FlightPhase? ForcedPhase { get; init; }

    /// <summary>Pressure altitude that endurance and range are counted down to, m; default 300.</summary>
    public double SafetyHeightM { get; init; } = 300;

    /// <summary>
    /// How long a pressure or airspeed counts as fresh, microseconds; default <see cref="PipelineBounds.FreshnessUs"/>. Not the pilot's
    /// choice: only recordings that are slower than a cockpit's sensors have a longer one.
    /// </summary>
    public long FreshnessUs { get; init; } = PipelineBounds.FreshnessUs;
}
