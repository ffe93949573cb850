using System.Globalization;
using System.Text;
using System.Text.Json;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Fitting;

/// <summary>A glider file with another polar: every other byte, comments too, stays as it is.</summary>
internal static class FittedGliderFile
{
    private static readonly string[] PolarKeys = ["dragPolar", "sinkTable", "quadraticPolar"];

    /// <summary>Puts a drag polar where the file's polar stands.</summary>
    /// <param name="utf8">A readable glider file with one polar.</param>
    /// <param name="polar">The polar.</param>
    /// <param name="origin">Where it is from, for a comment line before it; one line.</param>
    /// <returns>The new file.</returns>
    public static byte[] Of(ReadOnlySpan<byte> utf8, DragPolar polar, string origin)
    {
        var (start, end) = PlaceOfPolar(utf8);
        var clMax = double.IsNaN(polar.ClMax) ? "" : string.Create(CultureInfo.InvariantCulture, $", \"clMax\": {polar.ClMax:G5}");
        var member = string.Create(CultureInfo.InvariantCulture,
            $"// {origin}\n  \"dragPolar\": {{ \"cd0\": {polar.Cd0:F6}, \"k1\": {polar.K1:F6}, \"k2\": {polar.K2:F6}{clMax} }}");
        return [.. utf8[..start], .. Encoding.UTF8.GetBytes(member), .. utf8[end..]];
    }

    private static (int Start, int End) PlaceOfPolar(ReadOnlySpan<byte> utf8)
    {
        var reader = new Utf8JsonReader(utf8, new JsonReaderOptions { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true });
        while (reader.Read())
        {
            if (reader.TokenType != JsonTokenType.PropertyName || reader.CurrentDepth != 1)
            {
                continue;
            }

            var (start, isPolar) = ((int)reader.TokenStartIndex, PolarKeys.Contains(reader.GetString()));
            reader.Skip();
            if (isPolar)
            {
                return (start, (int)reader.BytesConsumed);
            }
        }

        throw new ArgumentException("a glider file without a polar is not readable as one", nameof(utf8));
    }
}
