using SpeedCommand.Sentences;

namespace SpeedCommand.Simulation.Faults;

/// <summary>
/// One fault of a plan: what happens, to whom and when. It happens at an exact time, or at random times at a rate an hour; while
/// it lasts, faults of single lines hit each line with their own probability. Without either time it lasts the whole flight.
/// </summary>
/// <param name="Kind">What happens.</param>
public sealed record FaultSpec(FaultKind Kind)
{
    /// <summary>Name of the stream concerned; empty for every stream, each on its own.</summary>
    public string Stream { get; init; } = "";

    /// <summary>The sensor concerned, for <see cref="FaultKind.Frozen"/> and <see cref="FaultKind.Spike"/>.</summary>
    public ReadingKind? Measures { get; init; }

    /// <summary>When it begins, s since the start of the flight; NaN for random or all the time.</summary>
    public double AtS { get; init; } = double.NaN;

    /// <summary>How often an hour it begins, a Poisson process; 0 for never at random.</summary>
    public double PerHour { get; init; }

    /// <summary>How long it lasts, s; 0 for one line only.</summary>
    public double ForS { get; init; }

    /// <summary>For faults of single lines: the probability that a line is hit while the fault lasts, 0 to 1.</summary>
    public double PerLine { get; init; } = 1;

    /// <summary>How far a <see cref="FaultKind.Spike"/> is off, up or down at random, in the SI unit of the reading.</summary>
    public double Size { get; init; }

    /// <summary>Bytes in a burst of <see cref="FaultKind.Garbage"/>.</summary>
    public int Bytes { get; init; } = 64;

    /// <summary>How often each line comes in a <see cref="FaultKind.Flood"/>.</summary>
    public int Times { get; init; } = 10;

    /// <summary>Speeds of board and port for <see cref="FaultKind.WrongBaud"/>, bits a second.</summary>
    public double SentBaud { get; init; } = 9600;

    /// <summary>Speed the port listens at.</summary>
    public double HeardBaud { get; init; } = 4800;

    /// <summary>Whether the drain of a <see cref="FaultKind.PitotBlocked"/> is blocked too.</summary>
    public bool IsDrainBlocked { get; init; }

    /// <summary>Time constant with which a blocked pitot tube drains, s.</summary>
    public double DrainS { get; init; } = 1;

    /// <summary>Noise that the sensor adds to a pressure shut in by a blockage, Pa, standard deviation.</summary>
    public double NoisePa { get; init; } = 1;

    /// <summary>How far the clock jumps in a <see cref="FaultKind.ClockStep"/>, s.</summary>
    public double ByS { get; init; }

    /// <summary>Whether a stream is concerned.</summary>
    /// <param name="stream">Its name.</param>
    /// <returns>True when it is.</returns>
    public bool Concerns(string stream) => Stream.Length == 0 || Stream == stream;
}
