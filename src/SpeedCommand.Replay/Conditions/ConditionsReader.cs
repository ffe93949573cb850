using System.Globalization;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Replay.Settings;

namespace SpeedCommand.Replay.Conditions;

/// <summary>
/// Reads air and glider options. Faults of options and faults of the glider file are kept apart: they have different exit
/// statuses.
/// </summary>
public sealed class ConditionsReader
{
    private const double MaxBankRad = 75 * Math.PI / 180;

    private readonly List<string> _optionFaults = [];

    /// <summary>What is wrong with the options, one line each, each naming its option.</summary>
    public IReadOnlyList<string> OptionFaults => _optionFaults;

    /// <summary>What is wrong or doubtful in the glider file.</summary>
    public IReadOnlyList<JsonProblem> GliderProblems { get; private set; } = [];

    /// <summary>Whether the glider file named does not exist.</summary>
    public bool IsGliderMissing { get; private set; }

    /// <summary>Reads the options.</summary>
    /// <param name="texts">The options as written.</param>
    /// <returns>The conditions, or null when something is wrong.</returns>
    public FlightConditions? Read(ConditionTexts texts)
    {
        ArgumentNullException.ThrowIfNull(texts);
        var glider = ReadGlider(texts.Glider);
        var massKg = ReadMass(texts.Mass, glider);
        var air = ReadAir(texts);
        var climb = Quantity("--climb", texts.Climb, QuantityKind.Speed, 0, 0, 15);
        var airMps = Quantity("--air", texts.Air, QuantityKind.Speed, 0, -15, 15);
        var headwind = Quantity("--headwind", texts.Headwind, QuantityKind.Speed, 0, -50, 50);
        var bank = Quantity("--bank", texts.Bank, QuantityKind.Angle, 0, -MaxBankRad, MaxBankRad);
        var bugs = Quantity("--bugs", texts.Bugs, QuantityKind.Fraction, 0, 0, 1);
        if (_optionFaults.Count > 0 || glider is null || air is not { } known)
        {
            return null;
        }

        StandardAtmosphere.TryAt(known.PressureAltitudeM, out var standard);
        return new FlightConditions(glider, known, new Loading(massKg, 1 / Math.Cos(bank), bugs), climb, airMps, headwind, bank,
            known.TemperatureK - standard.TemperatureK);
    }

    private Glider? ReadGlider(string? name)
    {
        if (name is null)
        {
            _optionFaults.Add($"--glider: expected a glider file; these lie beside the program: {string.Join(", ", GliderFiles.Bundled())}");
            return null;
        }

        IsGliderMissing = !GliderFiles.Exists(name, "");
        var result = GliderFiles.Read(name, "");
        GliderProblems = result.Problems;
        return result.Glider;
    }

    private double ReadMass(string? text, Glider? glider)
    {
        var least = glider is { EmptyMassKg: > 0 } ? glider.EmptyMassKg : 50;
        var most = glider is { MaxMassKg: > 0 } ? glider.MaxMassKg : 1500;
        return Quantity("--mass", text, QuantityKind.Mass, glider?.ReferenceMassKg ?? 300, least, most);
    }

    private Air? ReadAir(ConditionTexts texts)
    {
        if (texts.Altitude is not null && texts.Pressure is not null)
        {
            _optionFaults.Add("--pressure: expected either --altitude or --pressure, found both");
            return null;
        }

        if (texts.Humidity is not null && texts.Oat is null)
        {
            _optionFaults.Add("--humidity: expected --oat beside it, since moist air needs its temperature");
            return null;
        }

        var faultsBefore = _optionFaults.Count;
        var pressurePa = ReadPressure(texts);
        var temperatureK = Quantity("--oat", texts.Oat, QuantityKind.Temperature, double.NaN, Air.LowestTemperatureK, Air.HighestTemperatureK);
        var humidity = Quantity("--humidity", texts.Humidity, QuantityKind.Fraction, double.NaN, 0, 1);
        if (_optionFaults.Count > faultsBefore)
        {
            return null;
        }

        if (double.IsNaN(temperatureK)
            ? Air.TryStandard(pressurePa, 0, out var air, out var reason)
            : Air.TryMeasured(pressurePa, temperatureK, humidity, out air, out reason))
        {
            return air;
        }

        _optionFaults.Add($"{(texts.Pressure is null ? "--altitude" : "--pressure")}: expected air between 2 km below and 32 km above sea level, found {reason}");
        return null;
    }

    private double ReadPressure(ConditionTexts texts)
    {
        if (texts.Pressure is not null)
        {
            return Quantity("--pressure", texts.Pressure, QuantityKind.Pressure, StandardAtmosphere.SeaLevelPressurePa, 868.1, 127_773);
        }

        var altitudeM = Quantity("--altitude", texts.Altitude, QuantityKind.Length, 0,
            StandardAtmosphere.LowestAltitudeM, StandardAtmosphere.HighestAltitudeM);
        StandardAtmosphere.TryAt(altitudeM, out var state);
        return state.PressurePa;
    }

    private double Quantity(string option, string? text, QuantityKind kind, double standard, double least, double most)
    {
        if (text is null)
        {
            return standard;
        }

        if (!Flight.Quantities.Quantity.TryParse(text, kind, out var value, out var problem))
        {
            _optionFaults.Add($"{option}: {problem}");
            return standard;
        }

        if (value >= least && value <= most)
        {
            return value;
        }

        _optionFaults.Add(string.Create(CultureInfo.InvariantCulture,
            $"{option}: expected {QuantityWords.Show(least, kind)} to {QuantityWords.Show(most, kind)}, found '{text}'"));
        return standard;
    }
}
