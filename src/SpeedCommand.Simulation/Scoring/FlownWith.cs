using System.Globalization;
using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Scoring;

/// <summary>What an instrument aboard would have had in its settings; simulated logs say it in a note.</summary>
/// <param name="MassKg">Mass with everything aboard, kg; NaN when not known.</param>
/// <param name="Lags">The tubes' lags.</param>
public readonly record struct FlownWith(double MassKg, TubeLags Lags)
{
    private const string Start = "flown with: ";

    /// <summary>The note of a log.</summary>
    public string Note => string.Create(CultureInfo.InvariantCulture,
        $"{Start}mass {MassKg} kg, staticLag {Lags.HeightS} s, impactLag {Lags.KineticS} s, probeLag {Lags.ProbeS} s");

    /// <summary>A simulated flight's.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <returns>Mass and lags.</returns>
    public static FlownWith Of(Scenario scenario)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        return new FlownWith(scenario.MassKg, new TubeLags(scenario.LagOf(ReadingKind.StaticPressurePa),
            scenario.LagOf(ReadingKind.ImpactPressurePa), scenario.LagOf(ReadingKind.TotalEnergyProbePa)));
    }

    /// <summary>Reads it from a log's notes.</summary>
    /// <param name="notes">The notes.</param>
    /// <returns>What they say; no mass and no lags where they say nothing.</returns>
    /// <exception cref="FormatException">There is such a note and it cannot be read.</exception>
    public static FlownWith Of(IEnumerable<string> notes)
    {
        var flown = new FlownWith(double.NaN, default);
        var note = notes.FirstOrDefault(one => one.StartsWith(Start, StringComparison.Ordinal));
        return note is null ? flown : note[Start.Length..].Split(", ").Aggregate(flown, With);
    }

    private static FlownWith With(FlownWith flown, string item)
    {
        var space = item.IndexOf(' ', StringComparison.Ordinal);
        var key = space < 0 ? item : item[..space];
        var kind = key == "mass" ? QuantityKind.Mass : QuantityKind.Duration;
        if (!Quantity.TryParse(item.AsSpan(space + 1), kind, out var value, out var problem))
        {
            throw new FormatException($"note '{Start}': {key}: {problem}");
        }

        return key switch
        {
            "mass" => flown with { MassKg = value },
            "staticLag" => flown with { Lags = flown.Lags with { HeightS = value } },
            "impactLag" => flown with { Lags = flown.Lags with { KineticS = value } },
            "probeLag" => flown with { Lags = flown.Lags with { ProbeS = value } },
            _ => throw new FormatException($"note '{Start}': expected mass, staticLag, impactLag, probeLag, found '{key}'"),
        };
    }
}
