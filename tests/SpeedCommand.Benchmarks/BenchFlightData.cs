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
    public static readonly byte[] Static = Sentence("YXXDR,P,95461.2,P,STATIC");
    public static readonly byte[] Impact = Sentence("YXXDR,P,612.4,P,IMPACT");
    public static readonly byte[] Temperature = Sentence("YXXDR,C,18.4,C,OAT");

    public static Glider Glider(string file) =>
        GliderFiles.Read(file, "").Glider ?? throw new InvalidOperationException($"{file} does not lie beside the program");

    public static FlightSettings Settings(string file) => new(Glider(file)) { ExpectedClimbMps = 2 };

    private static byte[] Sentence(string body) =>
        Encoding.ASCII.GetBytes($"${body}*{body.Aggregate(0, (sum, character) => sum ^ character):X2}");
}

/// <summary>Keeps the newest picture, as a display does.</summary>
internal sealed class NewestPicture : IPictureSink
{
    public CockpitPicture Picture { get; private set; }

    public void OnPicture(in CockpitPicture picture) => Picture = picture;
}
