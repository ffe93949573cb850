namespace SpeedCommand.Simulation.Sensors;

/// <summary>A satellite receiver aboard, and where on earth the flight begins.</summary>
/// <param name="Stream">Name of the stream its sentences come in on.</param>
/// <param name="EveryS">Time between fixes, s, a multiple of the simulator's step.</param>
/// <param name="LatencyS">Time from a fix to its sentences, s.</param>
/// <param name="PositionNoiseM">Standard deviation of the position error along each axis, m; it wanders with <see cref="WanderTimeS"/>.</param>
/// <param name="HeightNoiseM">The same of the height, m.</param>
/// <param name="SpeedNoiseMps">Standard deviation of each component of the velocity, m/s, white.</param>
/// <param name="LatitudeRad">Latitude of the start, rad, positive north.</param>
/// <param name="LongitudeRad">Longitude of the start, rad, positive east.</param>
/// <param name="TrackRad">Heading of the initial track, rad clockwise from true north.</param>
public sealed record GnssSpec(
    string Stream, double EveryS = 1, double LatencyS = 0.2, double PositionNoiseM = 2, double HeightNoiseM = 4, double SpeedNoiseMps = 0.1,
    double LatitudeRad = 0, double LongitudeRad = 0, double TrackRad = 0)
{
    /// <summary>Correlation time of the position error, s: satellites and ionosphere change within minutes (common practice).</summary>
    public const double WanderTimeS = 120;
}
