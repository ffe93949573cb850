namespace SpeedCommand.Simulation.Faults;

/// <summary>
/// A serial line whose two ends disagree about its speed: eight data bits, no parity, one stop bit, least significant bit first.
/// The receiver starts at a falling edge, makes sure of the start bit in its middle, and samples each bit in the middle of
/// where it expects it. A stop bit that is low is an error of framing; the byte is delivered all the same, as Linux does in raw mode
/// without input checks, and the low level is taken for the next start bit (as a 16550 does; its data sheet, from memory).
/// </summary>
public static class MisreadSerial
{
    private const int BitsPerByte = 10;

    /// <summary>What comes out at the other end.</summary>
    /// <param name="sent">Bytes sent without a pause, the line being idle before and after.</param>
    /// <param name="sentBaud">Speed of the sender, bits a second, above 0.</param>
    /// <param name="heardBaud">Speed of the receiver, bits a second, above 0.</param>
    /// <returns>The bytes received.</returns>
    public static byte[] Read(ReadOnlySpan<byte> sent, double sentBaud, double heardBaud)
    {
        var levels = LevelsOf(sent);
        // Time counts in bits of the sender.
        var bit = sentBaud / heardBaud;
        var heard = new List<byte>();
        for (var at = 0.0; TryFindStart(levels, ref at);)
        {
            if (LevelAt(levels, at + bit / 2))
            {
                // A dip too short for a start bit.
                at += bit / 2;
                continue;
            }

            var value = 0;
            for (var i = 0; i < 8; i++)
            {
                value |= (LevelAt(levels, at + bit * (1.5 + i)) ? 1 : 0) << i;
            }

            heard.Add((byte)value);
            at += bit * 9.5;
        }

        return [.. heard];
    }

    private static bool[] LevelsOf(ReadOnlySpan<byte> sent)
    {
        var levels = new bool[sent.Length * BitsPerByte];
        for (var i = 0; i < sent.Length; i++)
        {
            for (var bit = 0; bit < 8; bit++)
            {
                levels[i * BitsPerByte + 1 + bit] = ((sent[i] >> bit) & 1) != 0;
            }

            levels[i * BitsPerByte + 9] = true;
        }

        return levels;
    }

    /// <summary>The first moment from now on at which the line is low.</summary>
    private static bool TryFindStart(bool[] levels, ref double at)
    {
        if (!LevelAt(levels, at))
        {
            return true;
        }

        var next = at < levels.Length ? Array.IndexOf(levels, false, (int)at) : -1;
        at = next;
        return next >= 0;
    }

    private static bool LevelAt(bool[] levels, double at) => at >= levels.Length || levels[(int)at];
}
