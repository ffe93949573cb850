namespace SpeedCommand.Simulation.Gliding;

/// <summary>
/// How the pilot follows a speed: the acceleration wanted is (wanted - present) / speed lag within the pitch limit, the
/// acceleration follows it with the stick lag, and the load factor that makes it follow comes with the load lag.
/// </summary>
/// <param name="SpeedLagS">Speed lag, s, above 0.</param>
/// <param name="StickLagS">Stick lag, s, above 0.</param>
/// <param name="LoadLagS">Load lag, s, above 0.</param>
/// <param name="PitchLimitRad">Steepest path up or down that the pilot flies to change speed, rad.</param>
/// <param name="WanderMps">Standard deviation of the speed the pilot holds about the speed wanted, m/s.</param>
/// <param name="WanderTimeS">Correlation time of that wander, s.</param>
public sealed record PilotModel(
    double SpeedLagS = 2, double StickLagS = 0.8, double LoadLagS = 0.3, double PitchLimitRad = 0.35,
    double WanderMps = 0, double WanderTimeS = 8)
{
    /// <summary>Bank follows the wanted bank with this lag, s: common practice for a glider rolled without hurry.</summary>
    public const double BankLagS = 1.2;

    /// <summary>Least load factor of a push-over a pilot flies with a passenger aboard: common practice.</summary>
    public const double LeastLoad = 0.3;

    /// <summary>Greatest load factor of a brisk pull-up: common practice.</summary>
    public const double GreatestLoad = 2.5;
}
