using System.Diagnostics.CodeAnalysis;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Displays.Units;

/// <summary>
/// The units a pilot reads, one for each quantity. Start from a named set (<see cref="TryFromSet"/>) and change single
/// quantities by the words of the settings (<see cref="TryWith"/>).
/// </summary>
public sealed record DisplayUnits
{
    // Steps: what a pilot can use (common practice). Airspeed indicators are read to about one unit; a vertical speed to a
    // tenth of a metre per second; heights by the needle of an altimeter.
    private static readonly DisplayUnit[] SpeedChoices =
        [new(QuantityKind.Speed, "km/h", 1), new(QuantityKind.Speed, "kt", 1), new(QuantityKind.Speed, "mph", 1)];

    private static readonly DisplayUnit[] VerticalChoices =
        [new(QuantityKind.Speed, "m/s", 0.1), new(QuantityKind.Speed, "kt", 0.1), new(QuantityKind.Speed, "ft/min", 10)];

    private static readonly DisplayUnit[] HeightChoices =
        [new(QuantityKind.Length, "m", 5), new(QuantityKind.Length, "ft", 10)];

    private static readonly DisplayUnit[] TemperatureChoices =
        [new(QuantityKind.Temperature, "C", 1), new(QuantityKind.Temperature, "F", 1)];

    private static readonly DisplayUnit[] DistanceChoices =
        [new(QuantityKind.Length, "km", 1), new(QuantityKind.Length, "NM", 1)];

    private static readonly DisplayUnit[] PressureChoices =
        [new(QuantityKind.Pressure, "hPa", 1), new(QuantityKind.Pressure, "inHg", 0.01)];

    private DisplayUnits(string speed, string vertical, string height, string temperature, string distance, string pressure)
    {
        Speed = Pick(SpeedChoices, speed)!;
        Vertical = Pick(VerticalChoices, vertical)!;
        Height = Pick(HeightChoices, height)!;
        Temperature = Pick(TemperatureChoices, temperature)!;
        Distance = Pick(DistanceChoices, distance)!;
        Pressure = Pick(PressureChoices, pressure)!;
    }

    /// <summary>km/h, m/s, m, °C, km, hPa.</summary>
    public static DisplayUnits Metric { get; } = new("km/h", "m/s", "m", "C", "km", "hPa");

    /// <summary>kt, kt, ft, °C, NM, hPa.</summary>
    public static DisplayUnits Aviation { get; } = new("kt", "kt", "ft", "C", "NM", "hPa");

    /// <summary>kt, kt, ft, °C, km, hPa.</summary>
    public static DisplayUnits British { get; } = new("kt", "kt", "ft", "C", "km", "hPa");

    /// <summary>kt, kt, ft, °F, NM, inHg.</summary>
    public static DisplayUnits American { get; } = new("kt", "kt", "ft", "F", "NM", "inHg");

    /// <summary>Unit of airspeeds: km/h, kt or mph.</summary>
    public DisplayUnit Speed { get; private init; }

    /// <summary>Unit of vertical speeds: m/s, kt or ft/min.</summary>
    public DisplayUnit Vertical { get; private init; }

    /// <summary>Unit of heights: m or ft.</summary>
    public DisplayUnit Height { get; private init; }

    /// <summary>Unit of temperatures: C or F.</summary>
    public DisplayUnit Temperature { get; private init; }

    /// <summary>Unit of distances: km or NM.</summary>
    public DisplayUnit Distance { get; private init; }

    /// <summary>Unit of altimeter settings: hPa or inHg.</summary>
    public DisplayUnit Pressure { get; private init; }

    /// <summary>Finds a named set of units.</summary>
    /// <param name="word">metric, aviation, british or american; lower case.</param>
    /// <param name="units">The set; null when there is none of that name.</param>
    /// <param name="problem">What was expected and what was found, when there is none of that name.</param>
    /// <returns>Whether there is such a set.</returns>
    public static bool TryFromSet(
        string word, [NotNullWhen(true)] out DisplayUnits? units, [NotNullWhen(false)] out string? problem)
    {
        units = word switch
        {
            "metric" => Metric,
            "aviation" => Aviation,
            "british" => British,
            "american" => American,
            _ => null,
        };
        problem = units is null ? $"expected metric, aviation, british or american, found '{word}'" : null;
        return units is not null;
    }

    /// <summary>Changes the unit of one quantity.</summary>
    /// <param name="quantity">speed, vertical, height, temperature, distance or pressure.</param>
    /// <param name="symbol">A unit allowed for it, in its usual capitals.</param>
    /// <param name="units">These units with that one changed; these units unchanged when it cannot be done.</param>
    /// <param name="problem">What was expected and what was found, when it cannot be done.</param>
    /// <returns>Whether the unit was changed.</returns>
    public bool TryWith(string quantity, string symbol, out DisplayUnits units, [NotNullWhen(false)] out string? problem)
    {
        units = this;
        var choices = Choices(quantity);
        if (choices is null)
        {
            problem = $"expected speed, vertical, height, temperature, distance or pressure, found '{quantity}'";
            return false;
        }

        if (Pick(choices, symbol) is not { } unit)
        {
            problem = $"expected {string.Join(" or ", choices.Select(choice => choice.Symbol))}, found '{symbol}'";
            return false;
        }

        units = quantity switch
        {
            "speed" => this with { Speed = unit },
            "vertical" => this with { Vertical = unit },
            "height" => this with { Height = unit },
            "temperature" => this with { Temperature = unit },
            "distance" => this with { Distance = unit },
            _ => this with { Pressure = unit },
        };
        problem = null;
        return true;
    }

    private static DisplayUnit[]? Choices(string quantity) => quantity switch
    {
        "speed" => SpeedChoices,
        "vertical" => VerticalChoices,
        "height" => HeightChoices,
        "temperature" => TemperatureChoices,
        "distance" => DistanceChoices,
        "pressure" => PressureChoices,
        _ => null,
    };

    private static DisplayUnit? Pick(DisplayUnit[] choices, string symbol) =>
        Array.Find(choices, choice => choice.Symbol == symbol);
}
