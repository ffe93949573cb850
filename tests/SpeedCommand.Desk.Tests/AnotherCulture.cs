using System.Globalization;

namespace SpeedCommand.Desk.Tests;

/// <summary>Runs a function under a culture with a decimal comma and a typographic minus, as on many a pilot's machine.</summary>
internal static class AnotherCulture
{
    public static T Run<T>(Func<T> function)
    {
        var before = CultureInfo.CurrentCulture;
        var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NegativeSign = "\u2212";
        culture.NumberFormat.PositiveSign = "plus ";
        CultureInfo.CurrentCulture = culture;
        try
        {
            Assert.Equal("\u22121,5", (-1.5).ToString(culture));
            return function();
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }
}
