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

        var whole = text[..point];
        var fraction = text[(point + 1)..];
        if (whole.IndexOfAnyExceptInRange((byte)'0', (byte)'9') >= 0 || fraction.IndexOfAnyExceptInRange((byte)'0', (byte)'9') >= 0)
        {
            return false;
        }

        Utf8Parser.TryParse(whole, out long seconds, out _);
        Utf8Parser.TryParse(fraction, out long microseconds, out _);
        timeUs = seconds * 1_000_000 + microseconds;
        return true;
    }
}
