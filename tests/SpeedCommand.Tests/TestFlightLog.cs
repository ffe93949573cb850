using System.Globalization;
using System.Text;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Tests;

/// <summary>A short flight of two 20 Hz boards, steady enough that every value is known throughout.</summary>
internal static class TestFlightLog
{
    public static string Write(string folder, double seconds, Func<double, bool>? isPitotAlive = null)
    {
        var path = Path.Combine(folder, "flight.log");
        using var writer = FlightLogFile.Create(path, new FlightLogHeader(DateTimeOffset.UnixEpoch, "", []));
        for (var timeUs = 0L; timeUs < seconds * 1e6; timeUs += 50_000)
        {
            var t = timeUs * 1e-6;
            writer.WriteLine(timeUs, "static"u8, Sentence($"P,{90_000 + 8 * t:F1},P,STATIC"));
            if (isPitotAlive?.Invoke(t) ?? true)
            {
                writer.WriteLine(timeUs + 12_000, "pitot"u8, Sentence($"P,{600 + Math.Sin(t):F1},P,IMPACT"));
            }
        }

        return path;
    }

    public static byte[] Sentence(FormattableString body)
    {
        var content = "YXXDR," + body.ToString(CultureInfo.InvariantCulture);
        return Encoding.ASCII.GetBytes($"${content}*{content.Aggregate(0, (sum, one) => sum ^ one):X2}");
    }
}
