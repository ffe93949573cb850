using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>The registry of controls; docs/controls.md has the same table, and a test compares the two.</summary>
public static class ControlCatalogue
{
    /// <summary>The word for the instrument's own choice.</summary>
    public const string Automatic = "auto";

    /// <summary>Words that open and shut the ballast's valves.</summary>
    public const string Dump = "dump", Stop = "stop";

    /// <summary>Least and greatest rate of dumping, kg/s: a leak, and two big valves (common practice: 0.3 to 2 kg/s).</summary>
    public const double MinDumpKgPerS = 0.01, MaxDumpKgPerS = 10;

    /// <summary>Decimals a rate is kept to, in kg/s.</summary>
    internal const int DumpDecimals = 3;

    internal const string DumpUnit = "kg/s";

    /// <summary>Every control, in the order of <see cref="ControlId"/>.</summary>
    public static IReadOnlyList<ControlSpec> All { get; } =
    [
        new(ControlId.ExpectedClimb, "expected-climb", "climb expected in the next thermal (MacCready setting); `auto` follows the last climbs")
        {
            Quantity = QuantityKind.Speed, Unit = "m/s", Decimals = 4, Max = 15, Verbs = [Automatic],
            Steps = [new("m/s", 0.5), new("kt", 1), new("ft/min", 100)],
        },
        new(ControlId.Ballast, "ballast", "water left, at most what the glider's greatest mass allows; `dump` opens the valves, `stop` shuts them")
        {
            Quantity = QuantityKind.Water, Unit = "kg", Decimals = 1, Max = 600, Steps = [new("kg", 10)], Verbs = [Dump, $"{Dump} RATE", Stop],
        },
        new(ControlId.Bugs, "bugs", "extra sink of a dirty wing at every speed")
        {
            Quantity = QuantityKind.Fraction, Unit = "%", Decimals = 1, Max = 1, Steps = [new("%", 5)],
        },
        new(ControlId.Phase, "phase", "the phase the display is held to; `auto` lets the air data decide") { Words = [Automatic, "climbing", "gliding"] },
        new(ControlId.Qnh, "qnh", "altimeter setting; the altitude shown, and nothing else, follows it")
        {
            Quantity = QuantityKind.Pressure, Unit = "hPa", Decimals = 2, Min = 87_000, Max = 109_000, Steps = [new("hPa", 1), new("inHg", 0.01)],
        },
        new(ControlId.Brightness, "brightness", "brightness of displays that have a lamp; 0 is dark")
        {
            Quantity = QuantityKind.Fraction, Unit = "%", Max = 1, Steps = [new("%", 10)],
        },
        new(ControlId.Volume, "volume", "volume of sound") { Quantity = QuantityKind.Fraction, Unit = "%", Max = 1, Steps = [new("%", 10)] },
        new(ControlId.Mute, "mute", "sound off for now") { Words = ["off", "on"] },
    ];

    /// <summary>A control's entry.</summary>
    /// <param name="control">The control.</param>
    /// <returns>Its entry.</returns>
    public static ControlSpec Of(ControlId control) => All[(int)control];

    /// <summary>Finds a control by its name.</summary>
    /// <param name="name">The name.</param>
    /// <returns>Its entry; null when there is none of that name.</returns>
    public static ControlSpec? Find(ReadOnlySpan<char> name)
    {
        foreach (var spec in All)
        {
            if (name.SequenceEqual(spec.Name))
            {
                return spec;
            }
        }

        return null;
    }
}
