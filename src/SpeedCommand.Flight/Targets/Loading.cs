namespace SpeedCommand.Flight.Targets;

/// <summary>What the wing carries now.</summary>
/// <param name="MassKg">Flying mass, kg, above 0: glider, crew, ballast.</param>
/// <param name="LoadFactor">Lift over weight, above 0; 1 in straight flight, 1/cos(bank) in a steady circle.</param>
/// <param name="BugsFraction">Sink added by a dirty wing, as a fraction of the clean sink at every speed; 0 or more.</param>
public readonly record struct Loading(double MassKg, double LoadFactor, double BugsFraction)
{
    internal bool IsValid =>
        MassKg > 0 && LoadFactor > 0 && BugsFraction >= 0 && double.IsFinite(MassKg + LoadFactor + BugsFraction);
}
