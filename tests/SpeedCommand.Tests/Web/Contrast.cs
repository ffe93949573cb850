using System.Globalization;

namespace SpeedCommand.Tests.Web;

/// <summary>The contrast of two colours, 1 to 21 (WCAG 2.1, definitions of relative luminance and contrast ratio, from memory).</summary>
internal static class Contrast
{
    public static double Of(string one, string other)
    {
        var (a, b) = (Luminance(one), Luminance(other));
        return (Math.Max(a, b) + 0.05) / (Math.Min(a, b) + 0.05);
    }

    /// <summary>"#rrggbb", or "rgb(r, g, b)" as a browser tells it.</summary>
    private static double Luminance(string colour)
    {
        var parts = colour.StartsWith('#')
            ? Enumerable.Range(0, 3).Select(i => int.Parse(colour.AsSpan(1 + 2 * i, 2), NumberStyles.HexNumber, CultureInfo.InvariantCulture))
            : colour["rgb(".Length..^1].Split(',').Select(part => int.Parse(part, CultureInfo.InvariantCulture));
        double[] weights = [0.2126, 0.7152, 0.0722];
        return parts.Select(part => part / 255.0)
            .Select(part => part <= 0.03928 ? part / 12.92 : Math.Pow((part + 0.055) / 1.055, 2.4))
            .Zip(weights, (part, weight) => part * weight).Sum();
    }
}
