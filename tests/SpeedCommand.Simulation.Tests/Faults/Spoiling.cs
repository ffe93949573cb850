using System.Globalization;
using System.Text;
using SpeedCommand.Simulation.Faults;

namespace SpeedCommand.Simulation.Tests.Faults;

/// <summary>Two boards with ideal sensors for twenty seconds, spoilt.</summary>
internal static class Spoiling
{
    public const double EndS = 20;

    /// <summary>The static pressure falls, the impact pressure rises, both steadily.</summary>
    public static double StaticPa(double timeS) => 90_000 - 40 * timeS;

    public static double ImpactPa(double timeS) => 500 + 10 * timeS;

    public static List<(double TimeS, string Stream, string Line)> Spoil(FaultSpec? fault = null, long seed = 1, double endS = EndS) =>
        Spoil(fault is null ? [] : [fault], seed, endS);

    public static List<(double TimeS, string Stream, string Line)> Spoil(FaultSpec[] faults, long seed, double endS = EndS)
    {
        var lines = new List<(double, string, string)>();
        var spoiler = new FlightSpoiler(new FaultPlan("test", faults), seed, new PortLines((timeUs, stream, line) =>
            lines.Add((timeUs / 1e6, Encoding.ASCII.GetString(stream), Encoding.Latin1.GetString(line)))));
        for (var i = 0; i < endS * 20; i++)
        {
            var timeUs = i * 50_000L;
            spoiler.OnLine(timeUs, "static"u8, Sentence(StaticPa(timeUs / 1e6), "STATIC"));
            spoiler.OnLine(timeUs + 20_000, "pitot"u8, Sentence(ImpactPa(timeUs / 1e6), "IMPACT"));
        }

        spoiler.Finish((long)(endS * 1e6));
        return lines;
    }

    /// <summary>The value of the first measurement; NaN when it is no valid sentence.</summary>
    public static double ValueOf(string line)
    {
        var (dollar, star) = (line.LastIndexOf('$'), line.LastIndexOf('*'));
        return dollar >= 0 && star == line.Length - 3
            && line[(dollar + 1)..star].Aggregate(0, (sum, letter) => sum ^ letter).ToString("X2", CultureInfo.InvariantCulture) == line[(star + 1)..]
            && double.TryParse(line[(dollar + 1)..].Split(',').ElementAtOrDefault(2), CultureInfo.InvariantCulture, out var value)
            ? value
            : double.NaN;
    }

    private static byte[] Sentence(double value, string id)
    {
        var content = string.Create(CultureInfo.InvariantCulture, $"YXXDR,P,{value:F1},P,{id}");
        return Encoding.ASCII.GetBytes($"${content}*{content.Aggregate(0, (sum, letter) => sum ^ letter):X2}");
    }
}
