using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Simulation.AirMass;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>Reads a scenario's atmosphere, wind and moving air.</summary>
internal static class ScenarioAir
{
    public static AirProfile? ReadAtmosphere(JsonFields fields, List<JsonProblem> problems, ref double relativeHumidity)
    {
        relativeHumidity = fields.Quantity("humidity", QuantityKind.Fraction, double.NaN);
        var pressure = fields.Quantity("seaLevelPressure", QuantityKind.Pressure, StandardAtmosphere.SeaLevelPressurePa);
        var offset = fields.Quantity("temperatureOffset", QuantityKind.TemperatureDifference, 0);
        var soundings = fields.Objects("soundings").Select(ReadSounding).ToArray();
        fields.RejectUnknown();
        if (soundings.Length == 1 || soundings.Zip(soundings.Skip(1)).Any(pair => !(pair.Second.HeightM > pair.First.HeightM)))
        {
            fields.Problem("soundings: expected at least two, with rising heights");
        }

        if (problems.Count > 0)
        {
            return null;
        }

        var temperature = soundings.Length == 0
            ? TemperatureProfile.Standard(offset)
            : TemperatureProfile.Soundings([.. soundings.Select(s => s.HeightM)], [.. soundings.Select(s => s.TemperatureK)]);
        try
        {
            return new AirProfile(temperature, relativeHumidity, pressure);
        }
        catch (ArgumentException fault)
        {
            fields.Problem($"expected air that exists up to {AirProfile.HighestM} m, found: {fault.Message}");
            return null;
        }
    }

    public static Wind ReadWind(IEnumerable<JsonFields> levels)
    {
        var read = levels.Select(level =>
        {
            var wind = (Height: level.Quantity("height", QuantityKind.Length), From: level.Quantity("from", QuantityKind.Angle),
                Speed: level.Quantity("speed", QuantityKind.Speed, least: 0));
            level.RejectUnknown();
            return wind;
        }).OrderBy(level => level.Height).ToArray();
        return new Wind([.. read.Select(w => w.Height)], [.. read.Select(w => w.From)], [.. read.Select(w => w.Speed)]);
    }

    public static (List<IVerticalMotion> Vertical, Turbulence Turbulence) ReadMotion(JsonFields fields)
    {
        var vertical = new List<IVerticalMotion>();
        foreach (var thermal in fields.Objects("thermals"))
        {
            vertical.Add(new Thermal(thermal.Quantity("at", QuantityKind.Length), thermal.Quantity("side", QuantityKind.Length, 0),
                thermal.Quantity("radius", QuantityKind.Length, least: 1), thermal.Quantity("strength", QuantityKind.Speed)));
            thermal.RejectUnknown();
        }

        foreach (var ripple in fields.Objects("ripples"))
        {
            vertical.Add(new Ripple(ripple.Quantity("from", QuantityKind.Length, -1e6), ripple.Quantity("to", QuantityKind.Length, 1e6),
                ripple.Quantity("length", QuantityKind.Length, least: 1), ripple.Quantity("amplitude", QuantityKind.Speed),
                ripple.Quantity("mean", QuantityKind.Speed, 0)));
            ripple.RejectUnknown();
        }

        foreach (var belt in fields.Objects("belts"))
        {
            vertical.Add(new Belt(belt.Quantity("from", QuantityKind.Length), belt.Quantity("to", QuantityKind.Length),
                belt.Quantity("edge", QuantityKind.Length, 100, 1), belt.Quantity("strength", QuantityKind.Speed)));
            belt.RejectUnknown();
        }

        var turbulence = ReadTurbulence(fields.Object("turbulence"));
        fields.RejectUnknown();
        return (vertical, turbulence);
    }

    private static Turbulence ReadTurbulence(JsonFields fields)
    {
        var turbulence = new Turbulence(
            fields.Quantity("vertical", QuantityKind.Speed, 0, 0), fields.Quantity("verticalTime", QuantityKind.Duration, 4, 0.1),
            fields.Quantity("horizontal", QuantityKind.Speed, 0, 0), fields.Quantity("horizontalTime", QuantityKind.Duration, 2, 0.1));
        fields.RejectUnknown();
        return turbulence;
    }

    private static (double HeightM, double TemperatureK) ReadSounding(JsonFields fields)
    {
        var sounding = (fields.Quantity("height", QuantityKind.Length), fields.Quantity("temperature", QuantityKind.Temperature));
        fields.RejectUnknown();
        return sounding;
    }
}
