using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Benchmarks;

/// <summary>What the benchmarks share: a glider, a few lines as a sensor board sends them, a sink that keeps the last picture.</summary>
internal static class BenchFlightData
{
    /// <summary>Values that differ as a real sensor's do: one that stands still is taken for stuck, and its estimator would rest.</summary>
    public static readonly byte[][] Static = Noisy(1, 95461.2, 2, value => $"YXXDR,P,{value:F1},P,STATIC");
    public static readonly byte[][] Impact = Noisy(2, 612.4, 2, value => $"YXXDR,P,{value:F1},P,IMPACT");
    public static readonly byte[][] Temperature = Noisy(3, 18.4, 0.1, value => $"YXXDR,C,{value:F2},C,OAT");

    public static Glider Glider(string file) =>
        GliderFiles.Read(file, "").Glider ?? throw new InvalidOperationException($"{file} does not lie beside the program");

    public static FlightSettings Settings(string file) => new(Glider(file)) { ExpectedClimbMps = 2 };

    private static byte[][] Noisy(int seed, double mean, double most, Func<double, FormattableString> body)
    {
        var random = new Random(seed);
        return [.. Enumerable.Range(0, 997).Select(_ => Sentence(FormattableString.Invariant(body(mean + most * (2 * random.NextDouble() - 1)))))];
    }

    private static byte[] Sentence(string body) =>
        Encoding.ASCII.GetBytes($"${body}*{body.Aggregate(0, (sum, character) => sum ^ character):X2}");
}

/// <summary>Keeps the newest picture, as a display does.</summary>
internal sealed class NewestPicture : IPictureSink
{
    public CockpitPicture Picture { get; private set; }

    public void OnPicture(in CockpitPicture picture) => Picture = picture;
}
