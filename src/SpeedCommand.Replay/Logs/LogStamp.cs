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

        // By hand, since the parsers would take a sign, and every record has a stamp.
        for (var i = 0; i < text.Length; i++)
        {
            var digit = (uint)(text[i] - '0');
            if (digit <= 9)
            {
                timeUs = timeUs * 10 + digit;
            }
            else if (i != point)
            {
                return false;
            }
        }

        return true;
    }
}
