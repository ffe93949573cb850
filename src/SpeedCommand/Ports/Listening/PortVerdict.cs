namespace SpeedCommand.Ports.Listening;

/// <summary>What is good or wrong with a port that was listened to, and how to mend it.</summary>
internal static class PortVerdict
{
    public static string Judge(PortListening port)
    {
        var counts = port.Counts;
        if (counts.Bytes == 0)
        {
            return FormattableString.Invariant($"no data in {counts.Seconds:F0} s; is the board powered, and its transmit line wired to our receive line?");
        }

        if (counts.Sentences == 0)
        {
            return WithoutSentence(port);
        }

        if (counts.Readings == 0)
        {
            return counts.Impossible > 0
                ? $"{counts.Impossible} readings, every one impossible; are the units those of docs/sentences.md?"
                : $"{counts.Sentences} valid sentences, but none with a measurement of ours; docs/sentences.md lists them";
        }

        var rejected = counts.Impossible > 0 ? $", {counts.Impossible} impossible readings" : "";
        var dropOuts = counts.DropOuts > 0 ? $", went away {counts.DropOuts} times; is a plug loose?" : "";
        return FormattableString.Invariant(
            $"good: {counts.Lines / counts.Seconds:F1} lines and {counts.Readings / counts.Seconds:F1} readings a second, {counts.Lines - counts.Sentences} bad lines{rejected}{dropOuts}");
    }

    /// <summary>Readable lines point to the board's sentences, unreadable ones to the line.</summary>
    private static string WithoutSentence(PortListening port)
    {
        var counts = port.Counts;
        var line = $"{port.Settings.Baud} baud";
        if (port.BetterFraming is { } framing)
        {
            return $"the board seems to send 7 bits with parity: set \"framing\": \"{framing}\" for this port";
        }

        if (counts.Lines == 0)
        {
            return $"{counts.Bytes} bytes without a line end; is {line} what the board sends at, and does it end lines with CR LF?";
        }

        if (counts.WrongChecksums * 2 > counts.Lines)
        {
            return $"{counts.WrongChecksums} lines with a wrong checksum; docs/sentences.md shows how the board must compute it";
        }

        if (counts.ValidButForChecksum * 2 > counts.Lines)
        {
            return $"{counts.ValidButForChecksum} sentences without a checksum; if the board cannot send one, set \"checksum\": \"optional\" for this port";
        }

        // Read at the wrong rate, text turns into bytes of any value; read at the right one it is text, if not ours.
        var garbage = 100 * counts.UnprintableBytes / counts.Bytes;
        return garbage >= 5
            ? $"{counts.Bytes} bytes but no valid line, and {garbage} % of them are no text; is {line} what the board sends at? Usual are 4800, 9600, 38400, 57600 and 115200"
            : $"{counts.Bytes} bytes of text but no valid line; docs/sentences.md tells what this program reads";
    }
}
