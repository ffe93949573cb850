namespace SpeedCommand.Simulation.AirMass;

/// <summary>
/// Air that rises and sinks in turn along the track: lee wave with a long length, lift and sink streets crossed at right
/// angles with a short one. w = mean + amplitude sin(2 pi x / length), between two distances.
/// </summary>
/// <param name="FromM">Where it begins along the track, m.</param>
/// <param name="ToM">Where it ends, m.</param>
/// <param name="LengthM">Distance from one crest to the next, m.</param>
/// <param name="AmplitudeMps">Amplitude, m/s.</param>
/// <param name="MeanMps">Mean motion, m/s, positive up.</param>
public sealed record Ripple(double FromM, double ToM, double LengthM, double AmplitudeMps, double MeanMps) : IVerticalMotion
{
    /// <inheritdoc/>
    public double AirMps(double alongM, double acrossM, double heightM, double timeS) =>
        alongM < FromM || alongM > ToM ? 0 : MeanMps + AmplitudeMps * Math.Sin(2 * Math.PI * (alongM - FromM) / LengthM);
}
