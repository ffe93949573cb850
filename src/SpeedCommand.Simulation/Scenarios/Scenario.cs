using SpeedCommand.Sentences;
using SpeedCommand.Simulation.AirMass;
using SpeedCommand.Simulation.Gliding;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>A flight to be simulated: everything but the glider's own file and the seed.</summary>
public sealed record Scenario
{
    /// <summary>Its name.</summary>
    public required string Name { get; init; }

    /// <summary>Time of day at the start.</summary>
    public required DateTimeOffset StartUtc { get; init; }

    /// <summary>File name of the glider.</summary>
    public required string GliderFile { get; init; }

    /// <summary>Mass with everything aboard, kg.</summary>
    public required double MassKg { get; init; }

    /// <summary>The day's air.</summary>
    public required AirProfile Air { get; init; }

    /// <summary>Relative humidity, 0 to 1; NaN for dry air.</summary>
    public required double RelativeHumidity { get; init; }

    /// <summary>Wind by height.</summary>
    public required Wind Wind { get; init; }

    /// <summary>What moves the air up and down, turbulence apart.</summary>
    public required IReadOnlyList<IVerticalMotion> Vertical { get; init; }

    /// <summary>The turbulence.</summary>
    public required Turbulence Turbulence { get; init; }

    /// <summary>Geopotential height at the start, m.</summary>
    public required double StartHeightM { get; init; }

    /// <summary>The pilot.</summary>
    public required PilotModel Pilot { get; init; }

    /// <summary>The legs of the flight; the first one's airspeed is flown from the start.</summary>
    public required IReadOnlyList<FlightLeg> Plan { get; init; }

    /// <summary>How often the plan is flown.</summary>
    public required int Laps { get; init; }

    /// <summary>Time between truth records, microseconds, a multiple of the simulator's step.</summary>
    public required long TruthEveryUs { get; init; }

    /// <summary>The sensors' grade, where a sensor does not say otherwise.</summary>
    public required SensorGrade Grade { get; init; }

    /// <summary>The sensors.</summary>
    public required IReadOnlyList<SensorSpec> Sensors { get; init; }

    /// <summary>The satellite receiver; null for none.</summary>
    public GnssSpec? Gnss { get; init; }

    /// <summary>Pneumatic lag of a sensor.</summary>
    /// <param name="kind">What it measures.</param>
    /// <returns>The lag, s; 0 when there is no such sensor.</returns>
    public double LagOf(ReadingKind kind) => Sensors.FirstOrDefault(sensor => sensor.Kind == kind)?.LagS ?? 0;
}
