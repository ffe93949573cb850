using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Tests;

/// <summary>Units by the words of the settings: a set, or a set with one unit changed ("american,vertical,ft/min").</summary>
internal static class NamedUnits
{
    public static DisplayUnits Of(string words)
    {
        var parts = words.Split(',');
        Assert.True(DisplayUnits.TryFromSet(parts[0], out var units, out _));
        if (parts.Length == 3)
        {
            Assert.True(units.TryWith(parts[1], parts[2], out units, out _));
        }

        return units;
    }

    public static IReadOnlyList<DisplayUnits> Varied { get; } =
    [
        DisplayUnits.Metric, DisplayUnits.Aviation, DisplayUnits.British, DisplayUnits.American,
        Of("american,vertical,ft/min"), Of("american,speed,mph"),
    ];
}
