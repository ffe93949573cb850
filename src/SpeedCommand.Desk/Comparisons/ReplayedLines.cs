using System.Text;
using SpeedCommand.Desk.Commands;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Desk.Comparisons;

/// <summary>A flight's replay output, line by line as it is made: memory does not grow with the flight.</summary>
internal static class ReplayedLines
{
    public static IEnumerable<string> Of(FlightInput flight)
    {
        using var recording = flight.Open();
        var settings = flight.ReadSettings(recording.GliderFile, recording.Flown, out var streams);
        using var buffer = new MemoryStream();
        var replay = recording.Start(settings, new PictureLines(buffer), streams);
        for (var isFlying = true; isFlying;)
        {
            // The last step, which finds the recording's end, may give a picture too.
            isFlying = replay.Step();
            if (buffer.Length == 0)
            {
                continue;
            }

            var text = Encoding.UTF8.GetString(buffer.GetBuffer(), 0, (int)buffer.Length);
            buffer.SetLength(0);
            foreach (var line in text.Split('\n', StringSplitOptions.RemoveEmptyEntries))
            {
                yield return line;
            }
        }
    }
}
