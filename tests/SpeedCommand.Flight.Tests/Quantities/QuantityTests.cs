using System.Globalization;
using CsCheck;
using SpeedCommand.Flight.Quantities;
using UnitsNet;
using UnitsNet.Units;
using Quantity = SpeedCommand.Flight.Quantities.Quantity;

namespace SpeedCommand.Flight.Tests.Quantities;

public sealed class QuantityTests
{
    private static readonly (QuantityKind Kind, string Symbol, Func<double, double> Outside)[] Units =
    [
        (QuantityKind.Length, "m", v => Length.From(v, LengthUnit.Meter).Meters),
        (QuantityKind.Length, "km", v => Length.From(v, LengthUnit.Kilometer).Meters),
        (QuantityKind.Length, "ft", v => Length.From(v, LengthUnit.Foot).Meters),
        (QuantityKind.Length, "NM", v => Length.From(v, LengthUnit.NauticalMile).Meters),
        (QuantityKind.Speed, "m/s", v => Speed.From(v, SpeedUnit.MeterPerSecond).MetersPerSecond),
        (QuantityKind.Speed, "km/h", v => Speed.From(v, SpeedUnit.KilometerPerHour).MetersPerSecond),
        (QuantityKind.Speed, "kt", v => Speed.From(v, SpeedUnit.Knot).MetersPerSecond),
        (QuantityKind.Speed, "mph", v => Speed.From(v, SpeedUnit.MilePerHour).MetersPerSecond),
        (QuantityKind.Speed, "ft/min", v => Speed.From(v, SpeedUnit.FootPerMinute).MetersPerSecond),
        (QuantityKind.Mass, "kg", v => Mass.From(v, MassUnit.Kilogram).Kilograms),
        (QuantityKind.Mass, "g", v => Mass.From(v, MassUnit.Gram).Kilograms),
        (QuantityKind.Mass, "lb", v => Mass.From(v, MassUnit.Pound).Kilograms),
        (QuantityKind.Pressure, "Pa", v => Pressure.From(v, PressureUnit.Pascal).Pascals),
        (QuantityKind.Pressure, "hPa", v => Pressure.From(v, PressureUnit.Hectopascal).Pascals),
        (QuantityKind.Pressure, "kPa", v => Pressure.From(v, PressureUnit.Kilopascal).Pascals),
        (QuantityKind.Pressure, "mbar", v => Pressure.From(v, PressureUnit.Millibar).Pascals),
        (QuantityKind.Pressure, "bar", v => Pressure.From(v, PressureUnit.Bar).Pascals),
        (QuantityKind.Pressure, "inHg", v => Pressure.From(v, PressureUnit.InchOfMercury).Pascals),
        (QuantityKind.Pressure, "mmHg", v => Pressure.From(v, PressureUnit.MillimeterOfMercury).Pascals),
        (QuantityKind.Temperature, "C", v => Temperature.From(v, TemperatureUnit.DegreeCelsius).Kelvins),
        (QuantityKind.Temperature, "°C", v => Temperature.From(v, TemperatureUnit.DegreeCelsius).Kelvins),
        (QuantityKind.Temperature, "K", v => Temperature.From(v, TemperatureUnit.Kelvin).Kelvins),
        (QuantityKind.Temperature, "F", v => Temperature.From(v, TemperatureUnit.DegreeFahrenheit).Kelvins),
        (QuantityKind.Temperature, "°F", v => Temperature.From(v, TemperatureUnit.DegreeFahrenheit).Kelvins),
        (QuantityKind.TemperatureDifference, "C", v => TemperatureDelta.From(v, TemperatureDeltaUnit.DegreeCelsius).Kelvins),
        (QuantityKind.TemperatureDifference, "F", v => TemperatureDelta.From(v, TemperatureDeltaUnit.DegreeFahrenheit).Kelvins),
        (QuantityKind.Angle, "deg", v => Angle.From(v, AngleUnit.Degree).Radians),
        (QuantityKind.Angle, "°", v => Angle.From(v, AngleUnit.Degree).Radians),
        (QuantityKind.Angle, "rad", v => Angle.From(v, AngleUnit.Radian).Radians),
        (QuantityKind.Area, "m2", v => Area.From(v, AreaUnit.SquareMeter).SquareMeters),
        (QuantityKind.Area, "m²", v => Area.From(v, AreaUnit.SquareMeter).SquareMeters),
        (QuantityKind.Area, "ft2", v => Area.From(v, AreaUnit.SquareFoot).SquareMeters),
        (QuantityKind.Fraction, "%", v => Ratio.From(v, RatioUnit.Percent).DecimalFractions),
        (QuantityKind.Duration, "s", v => Duration.From(v, DurationUnit.Second).Seconds),
        (QuantityKind.Duration, "ms", v => Duration.From(v, DurationUnit.Millisecond).Seconds),
        (QuantityKind.Duration, "min", v => Duration.From(v, DurationUnit.Minute).Seconds),
        (QuantityKind.Duration, "h", v => Duration.From(v, DurationUnit.Hour).Seconds),
        (QuantityKind.Water, "kg", v => Mass.From(v, MassUnit.Kilogram).Kilograms),
        (QuantityKind.Water, "l", v => Volume.From(v, VolumeUnit.Liter).CubicDecimeters),
        (QuantityKind.Water, "lb", v => Mass.From(v, MassUnit.Pound).Kilograms),
        (QuantityKind.WaterFlow, "kg/s", v => MassFlow.From(v, MassFlowUnit.KilogramPerSecond).KilogramsPerSecond),
        (QuantityKind.WaterFlow, "kg/min", v => MassFlow.From(v, MassFlowUnit.KilogramPerMinute).KilogramsPerSecond),
        (QuantityKind.WaterFlow, "l/s", v => VolumeFlow.From(v, VolumeFlowUnit.LiterPerSecond).LitersPerSecond),
        (QuantityKind.WaterFlow, "l/min", v => VolumeFlow.From(v, VolumeFlowUnit.LiterPerMinute).LitersPerSecond),
    ];

    [Fact] // outside reference: UnitsNet 5.75.1; its foot of mercury has a few digits more, hence 1e-6
    public void TryParse_EveryUnit_AsUnitsNet() =>
        Gen.Select(Gen.Int[0, Units.Length - 1], Gen.Int[-9_999_999, 9_999_999], Gen.Bool).Sample((index, thousandths, isSpaced) =>
        {
            var unit = Units[index];
            var number = (thousandths / 1000m).ToString(CultureInfo.InvariantCulture);
            Assert.True(Quantity.TryParse(number + (isSpaced ? " " : "") + unit.Symbol, unit.Kind, out var si, out _));
            var value = double.Parse(number, CultureInfo.InvariantCulture);
            var expected = unit.Outside(value);
            Close.Absolute(expected, si, 1e-6 * Math.Abs(expected) + 1e-9);
            Close.Absolute(value, Quantity.FromSi(si, unit.Kind, unit.Symbol), 1e-9 * (1000 + Math.Abs(thousandths)));
        });

    [Theory]
    [InlineData("")]
    [InlineData(" ")]
    [InlineData("hPa")]
    [InlineData("1013.25")]
    [InlineData("1013,25 hPa")] // UnitsNet reads 101325 hPa here
    [InlineData("1,013.25 hPa")]
    [InlineData("1 013 hPa")]
    [InlineData("1013.25  hPa")]
    [InlineData(" 1013.25 hPa")]
    [InlineData("1013.25 hPa ")]
    [InlineData("1013.25 HPA")]
    [InlineData("1013. hPa")]
    [InlineData(".5 hPa")]
    [InlineData("1.013e3 hPa")]
    [InlineData("--5 hPa")]
    [InlineData("+ 5 hPa")]
    [InlineData("5 kg")]
    [InlineData("NaN hPa")]
    [InlineData("Infinity hPa")]
    [InlineData("٣ hPa")]
    [InlineData("5\u00a0hPa")]
    [InlineData("0x10 hPa")]
    public void TryParse_Junk_SaysWhatWasExpected(string text)
    {
        Assert.False(Quantity.TryParse(text, QuantityKind.Pressure, out var si, out var problem));
        Assert.Equal(0, si);
        Assert.Equal($"expected a number with a unit (Pa, hPa, kPa, mbar, bar, inHg, mmHg), found '{text}'", problem);
    }

    [Fact]
    public void TryParse_RandomText_NeverThrows() =>
        Gen.Select(Gen.String, Gen.Enum<QuantityKind>()).Sample((text, kind) =>
        {
            var isRead = Quantity.TryParse(text, kind, out _, out var problem);
            Assert.Equal(isRead, problem is null);
        });

    [Fact]
    public void TryParse_CommaDecimalCulture_SameAnswer()
    {
        var before = CultureInfo.CurrentCulture;
        var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NumberGroupSeparator = ".";
        culture.NumberFormat.NegativeSign = "−";
        try
        {
            CultureInfo.CurrentCulture = culture;
            Assert.True(Quantity.TryParse("-1.5 m/s", QuantityKind.Speed, out var si, out _));
            Assert.Equal(-1.5, si);
            Assert.False(Quantity.TryParse("1,5 m/s", QuantityKind.Speed, out _, out _));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void FromSi_UnitOfAnotherKind_Throws() =>
        Assert.Throws<ArgumentException>(() => Quantity.FromSi(1, QuantityKind.Mass, "m"));
}
