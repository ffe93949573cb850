using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>Draws a fault for a short flight: any kind, on any stream and sensor, mild or wild, over well before the flight is.</summary>
public static class DrawnFaults
{
    private const double EarliestS = 3, LatestS = 9, LongestS = 3;

    private static readonly string[] Streams = ["static", "pitot", ""];
    private static readonly ReadingKind[] Sensors =
        [ReadingKind.StaticPressurePa, ReadingKind.ImpactPressurePa, ReadingKind.OutsideAirTemperatureK, ReadingKind.LoadFactor];

    private static readonly double[] Bauds = [4800, 9600, 19_200, 38_400, 57_600, 115_200];

    /// <summary>Draws a fault.</summary>
    /// <param name="seed">The seed.</param>
    /// <returns>The fault, at an exact time.</returns>
    public static FaultSpec Draw(long seed)
    {
        var random = new SeededNoise(seed, "drawn fault");
        T Pick<T>(IReadOnlyList<T> among) => among[(int)(random.NextUniform() * among.Count)];
        double Between(double least, double most) => least * Math.Exp(random.NextUniform() * Math.Log(most / least));
        var kind = Pick(Enum.GetValues<FaultKind>());
        var sent = Pick(Bauds);
        var spec = new FaultSpec(kind)
        {
            Stream = Pick(Streams),
            // Whole tenths of a second, so that pictures before and after a step of the clock can be compared.
            AtS = Math.Round(EarliestS + random.NextUniform() * (LatestS - EarliestS), 1),
            ForS = Between(0.1, LongestS),
            PerLine = Between(0.02, 1),
            Bytes = (int)Between(1, 5000),
            Times = (int)Between(2, 20),
            SentBaud = sent,
            HeardBaud = Pick(Bauds.Where(baud => !baud.Equals(sent)).ToArray()),
            IsDrainBlocked = random.NextUniform() < 0.5,
            DrainS = Between(0.2, 5),
            NoisePa = Between(0.1, 4),
            ByS = Math.Round(Between(0.1, 3), 1) * (random.NextUniform() < 0.5 ? -1 : 1),
        };
        var measures = Pick(Sensors);
        var size = SizeOf(measures) * Between(0.1, 10);
        return kind switch
        {
            FaultKind.Frozen => spec with { Stream = "", Measures = measures },
            FaultKind.Spike => spec with { Stream = "", Measures = measures, Size = size, ForS = random.NextUniform() < 0.5 ? 0 : spec.ForS },
            FaultKind.PitotBlocked or FaultKind.StaticBlocked => spec with { Stream = "" },
            FaultKind.ClockStep => spec with { Stream = "", ForS = 0 },
            FaultKind.Garbage => spec with { ForS = 0 },
            _ => spec,
        };
    }

    /// <summary>A deviation that a pilot would notice, SI.</summary>
    private static double SizeOf(ReadingKind kind) => kind switch
    {
        ReadingKind.StaticPressurePa => 300,
        ReadingKind.ImpactPressurePa => 100,
        ReadingKind.OutsideAirTemperatureK => 5,
        _ => 0.3,
    };
}
