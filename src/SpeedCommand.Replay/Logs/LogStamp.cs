using System.Buffers.Text;

namespace SpeedCommand.Replay.Logs;

/// <summary>Elapsed seconds with exactly six decimals, read as whole microseconds.</summary>
internal static class LogStamp
{
    private const int Decimals = 6;

    public static bool TryParse(ReadOnlySpan<byte> text, out long timeUs)
    {
        timeUs = 0;
        var point = text.Length - Decimals - 1;
        if (point is < 1 or > 9 || text[point] != '.')
        {
            return false;
        }

        // The parsers would take a sign; digits alone they cannot refuse.
        var whole = text[..point];
        var fraction = text[(point + 1)..];
        if (whole.ContainsAnyExceptInRange((byte)'0', (byte)'9') || fraction.ContainsAnyExceptInRange((byte)'0', (byte)'9')
            || !Utf8Parser.TryParse(whole, out long seconds, out _) || !Utf8Parser.TryParse(fraction, out long microseconds, out _))
        {
            return false;
        }

        timeUs = seconds * 1_000_000 + microseconds;
        return true;
    }
}
