using System.Buffers.Binary;

namespace SpeedCommand.Sentences;

/// <summary>The checksum of NMEA 0183: exclusive or of all characters between '$' and '*', as two hexadecimal digits.</summary>
internal static class SentenceChecksum
{
    /// <summary>Characters it takes with its '*'.</summary>
    public const int Length = 3;

    /// <summary>Exclusive or of the bytes; 0 for none.</summary>
    public static byte Of(ReadOnlySpan<byte> content)
    {
        // Eight at a time: every line of a replayed flight comes through here.
        var sums = 0UL;
        while (content.Length >= sizeof(ulong))
        {
            sums ^= BinaryPrimitives.ReadUInt64LittleEndian(content);
            content = content[sizeof(ulong)..];
        }

        sums ^= sums >> 32;
        sums ^= sums >> 16;
        var sum = (byte)(sums ^ (sums >> 8));
        foreach (var character in content)
        {
            sum ^= character;
        }

        return sum;
    }

    /// <summary>Reads two hexadecimal digits of either case: boards are lax about it, and no other sum is meant.</summary>
    public static bool TryRead(ReadOnlySpan<byte> digits, out byte checksum)
    {
        checksum = 0;
        if (digits.Length != 2 || !char.IsAsciiHexDigit((char)digits[0]) || !char.IsAsciiHexDigit((char)digits[1]))
        {
            return false;
        }

        checksum = (byte)((ValueOf(digits[0]) << 4) | ValueOf(digits[1]));
        return true;
    }

    /// <summary>The upper-case hexadecimal digit of 0 to 15.</summary>
    public static byte Digit(int value) => "0123456789ABCDEF"u8[value];

    private static int ValueOf(byte digit) => digit <= '9' ? digit - '0' : (digit | 0x20) - 'a' + 10;
}
