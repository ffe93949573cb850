using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>How every control stands at one moment. SI units.</summary>
public readonly record struct ControlValues
{
    /// <summary>Every control as it stands before anybody touches it.</summary>
    public static ControlValues Standard { get; } = new()
    {
        ExpectedClimbSigmaMps = double.NaN,
        QnhPa = StandardAtmosphere.SeaLevelPressurePa,
        Brightness = 1,
        Volume = 0.5,
    };

    /// <summary>The climb expected in the next thermal, m/s, 0 or more.</summary>
    public double ExpectedClimbMps { get; init; }

    /// <summary>How far the next climb may be off, one standard deviation, m/s; NaN for one that is not worked out from climbs.</summary>
    public double ExpectedClimbSigmaMps { get; init; }

    /// <summary>Whether the expected climb follows the last climbs.</summary>
    public bool IsExpectedClimbAutomatic { get; init; }

    /// <summary>Mass with what is left of the ballast, kg.</summary>
    public double MassKg { get; init; }

    /// <summary>Water left, kg.</summary>
    public double BallastKg { get; init; }

    /// <summary>How fast it runs out now, kg/s; 0 when the valves are shut or nothing is left.</summary>
    public double DumpKgPerS { get; init; }

    /// <summary>Extra sink as a fraction of the clean sink, 0 or more.</summary>
    public double BugsFraction { get; init; }

    /// <summary>The phase the pilot insists on; null when the air data decide.</summary>
    public FlightPhase? ForcedPhase { get; init; }

    /// <summary>Altimeter setting, Pa; 0 in a picture that says nothing of it.</summary>
    public double QnhPa { get; init; }

    /// <summary>Brightness, 0 to 1.</summary>
    public double Brightness { get; init; }

    /// <summary>Volume, 0 to 1.</summary>
    public double Volume { get; init; }

    /// <summary>Whether sound is off for now.</summary>
    public bool IsMuted { get; init; }

    /// <summary>The control that changed last; null before the first change.</summary>
    public ControlId? LastChanged { get; init; }

    /// <summary>When, microseconds of data time.</summary>
    public long LastChangedUs { get; init; }

    /// <summary>Whether the altimeter shows pressure altitude: nobody has set it to anything else.</summary>
    public bool IsQnhStandard => QnhPa is 0 or StandardAtmosphere.SeaLevelPressurePa;

    /// <summary>The change that would bring a control to where it stands now.</summary>
    /// <param name="control">The control.</param>
    /// <returns>The change.</returns>
    public ControlChange ChangeOf(ControlId control) => control switch
    {
        ControlId.ExpectedClimb => new(control, ExpectedClimbMps, IsExpectedClimbAutomatic),
        ControlId.Ballast => new(control, BallastKg, DumpKgPerS: DumpKgPerS),
        ControlId.Bugs => new(control, BugsFraction),
        ControlId.Phase => new(control, (double)(ForcedPhase ?? FlightPhase.Gliding), ForcedPhase is null),
        ControlId.Qnh => new(control, QnhPa),
        ControlId.Brightness => new(control, Brightness),
        ControlId.Volume => new(control, Volume),
        ControlId.Mute => new(control, IsMuted ? 1 : 0),
        _ => throw new ArgumentOutOfRangeException(nameof(control), control, "there is no such control"),
    };
}
