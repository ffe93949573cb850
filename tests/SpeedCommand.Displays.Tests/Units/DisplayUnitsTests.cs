using CsCheck;
using SpeedCommand.Displays.Units;
using UnitsNet;

namespace SpeedCommand.Displays.Tests.Units;

public class DisplayUnitsTests
{
    // Reference: the UnitsNet package.
    private static readonly Dictionary<(string Quantity, string Symbol), Func<double, double>> References = new()
    {
        [("speed", "km/h")] = mps => Speed.FromMetersPerSecond(mps).KilometersPerHour,
        [("speed", "kt")] = mps => Speed.FromMetersPerSecond(mps).Knots,
        [("speed", "mph")] = mps => Speed.FromMetersPerSecond(mps).MilesPerHour,
        [("vertical", "m/s")] = mps => mps,
        [("vertical", "kt")] = mps => Speed.FromMetersPerSecond(mps).Knots,
        [("vertical", "ft/min")] = mps => Speed.FromMetersPerSecond(mps).FeetPerMinute,
        [("height", "m")] = m => m,
        [("height", "ft")] = m => Length.FromMeters(m).Feet,
        [("temperature", "C")] = k => Temperature.FromKelvins(k).DegreesCelsius,
        [("temperature", "F")] = k => Temperature.FromKelvins(k).DegreesFahrenheit,
        [("distance", "km")] = m => Length.FromMeters(m).Kilometers,
        [("distance", "NM")] = m => Length.FromMeters(m).NauticalMiles,
        [("pressure", "hPa")] = pa => Pressure.FromPascals(pa).Hectopascals,
        [("pressure", "inHg")] = pa => pa / 3386.389, // conventional (ISO 80000-4); UnitsNet's has a few digits more
    };

    public static TheoryData<string, string> Choices
    {
        get
        {
            var data = new TheoryData<string, string>();
            foreach (var (quantity, symbol) in References.Keys)
            {
                data.Add(quantity, symbol);
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Choices))]
    public void Convert_AnyValue_AgreesWithUnitsNet(string quantity, string symbol)
    {
        var unit = Unit(quantity, symbol);
        var reference = References[(quantity, symbol)];

        Gen.Double[-1000, 40_000].Sample(si =>
            Assert.Equal(reference(si), unit.Convert(si), 1e-9 * Math.Max(1, Math.Abs(reference(si)))));
    }

    [Theory]
    [MemberData(nameof(Choices))]
    public void ConvertDifference_AnyTwoValues_IsTheDifferenceOfTheirConversions(string quantity, string symbol)
    {
        var unit = Unit(quantity, symbol);
        var reference = References[(quantity, symbol)];

        Gen.Select(Gen.Double[0, 500], Gen.Double[0, 500]).Sample((first, second) =>
        {
            Assert.Equal(reference(first) - reference(second), unit.ConvertDifference(first - second), 1e-6);
            Assert.Equal(first - second, unit.DifferenceToSi(unit.ConvertDifference(first - second)), 1e-9);
        });
    }

    [Theory]
    [InlineData("metric", "km/h m/s m C km hPa")]
    [InlineData("aviation", "kt kt ft C NM hPa")]
    [InlineData("british", "kt kt ft C km hPa")]
    [InlineData("american", "kt kt ft F NM inHg")]
    public void TryFromSet_NamedSet_HasTheUnitsDocumented(string word, string symbols)
    {
        Assert.True(DisplayUnits.TryFromSet(word, out var units, out var problem));

        Assert.Null(problem);
        Assert.Equal(symbols, $"{units.Speed.Symbol} {units.Vertical.Symbol} {units.Height.Symbol} "
            + $"{units.Temperature.Symbol} {units.Distance.Symbol} {units.Pressure.Symbol}");
    }

    [Theory]
    [InlineData("Metric")]
    [InlineData("")]
    [InlineData("imperial")]
    public void TryFromSet_UnknownWord_SaysWhatWasExpected(string word)
    {
        Assert.False(DisplayUnits.TryFromSet(word, out var units, out var problem));

        Assert.Null(units);
        Assert.Equal($"expected metric, aviation, british or american, found '{word}'", problem);
    }

    [Theory]
    [InlineData("speed", "m/s", "expected km/h or kt or mph, found 'm/s'")]
    [InlineData("vertical", "km/h", "expected m/s or kt or ft/min, found 'km/h'")]
    [InlineData("height", "FT", "expected m or ft, found 'FT'")]
    [InlineData("temperature", "K", "expected C or F, found 'K'")]
    [InlineData("distance", "", "expected km or NM, found ''")]
    [InlineData("pressure", "mbar", "expected hPa or inHg, found 'mbar'")]
    [InlineData("mass", "kg", "expected speed, vertical, height, temperature, distance or pressure, found 'mass'")]
    public void TryWith_WrongWord_ChangesNothingAndSaysWhatWasExpected(string quantity, string symbol, string expected)
    {
        Assert.False(DisplayUnits.Metric.TryWith(quantity, symbol, out var units, out var problem));

        Assert.Same(DisplayUnits.Metric, units);
        Assert.Equal(expected, problem);
    }

    [Fact]
    public void TryWith_OneQuantity_LeavesTheOthers()
    {
        Assert.True(DisplayUnits.Metric.TryWith("height", "ft", out var units, out _));

        Assert.Equal("km/h m/s ft C km hPa", $"{units.Speed.Symbol} {units.Vertical.Symbol} {units.Height.Symbol} "
            + $"{units.Temperature.Symbol} {units.Distance.Symbol} {units.Pressure.Symbol}");
    }

    private static DisplayUnit Unit(string quantity, string symbol)
    {
        Assert.True(DisplayUnits.Metric.TryWith(quantity, symbol, out var units, out _));
        return quantity switch
        {
            "speed" => units.Speed,
            "vertical" => units.Vertical,
            "height" => units.Height,
            "temperature" => units.Temperature,
            "distance" => units.Distance,
            _ => units.Pressure,
        };
    }
}
