namespace SpeedCommand.Replay.Conditions;

/// <summary>One of the air and glider options, as every command that asks for conditions offers it. No library of options is assumed.</summary>
/// <param name="Name">Name with its dashes.</param>
/// <param name="HelpName">What stands for the value in a help text.</param>
/// <param name="Description">One sentence, with an example.</param>
public sealed record ConditionOption(string Name, string HelpName, string Description)
{
    /// <summary>All of them, in the order of a help text.</summary>
    public static IReadOnlyList<ConditionOption> All { get; } =
    [
        new("--glider", "FILE", "Glider file, or the name of one that lies beside the program."),
        new("--mass", "MASS", "All-up mass, \"340 kg\"; standard is the polar's reference mass."),
        new("--altitude", "HEIGHT", "Pressure altitude, \"1000 m\"; standard is sea level."),
        new("--pressure", "PRESSURE", "Static pressure instead of the altitude, \"898.7 hPa\"."),
        new("--oat", "TEMP", "Outside air temperature, \"8 C\"; standard is the standard atmosphere's."),
        new("--humidity", "SHARE", "Relative humidity over water, \"50 %\"; needs --oat."),
        new("--climb", "SPEED", "Climb expected in the next thermal (MacCready setting), \"2 m/s\"."),
        new("--air", "SPEED", "Vertical motion of the air, positive up, \"-0.5 m/s\"."),
        new("--headwind", "SPEED", "Headwind, \"10 m/s\"; a tailwind is negative."),
        new("--bank", "ANGLE", "Bank of a level turn, \"30 deg\"."),
        new("--bugs", "SHARE", "Extra sink of a dirty wing at every speed, \"10 %\"."),
    ];
}
