using System.Globalization;
using System.Text;

namespace SpeedCommand.Sentences.Tests;

/// <summary>Wire bytes as text and back, and a checksum written without looking at the project's.</summary>
internal static class WireText
{
    public static byte[] Bytes(string text) => Encoding.Latin1.GetBytes(text);

    public static string Text(ReadOnlySpan<byte> bytes) => Encoding.Latin1.GetString(bytes);

    /// <summary>The definition of NMEA 0183: exclusive or of the characters between '$' and '*', two upper-case digits.</summary>
    public static string Sum(string content) =>
        content.Aggregate(0, (sum, character) => sum ^ character).ToString("X2", CultureInfo.InvariantCulture);

    public static string Signed(string content) => $"${content}*{Sum(content)}";
}
