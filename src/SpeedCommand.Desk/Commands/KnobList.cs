using System.Globalization;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Desk.Commands;

/// <summary>Seed and knobs of a run as text, printed before it starts, so that a log found later can be flown again.</summary>
internal static class KnobList
{
    public static IEnumerable<string> Of(Scenario scenario, long seed)
    {
        var pilot = scenario.Pilot;
        var turbulence = scenario.Turbulence;
        yield return Line($"seed {seed}, scenario {scenario.Name}, glider {scenario.GliderFile}, {scenario.MassKg} kg, sensors {scenario.Grade}");
        yield return Line($"pilot: speed lag {pilot.SpeedLagS} s, stick lag {pilot.StickLagS} s, load lag {pilot.LoadLagS} s, wander {pilot.WanderMps} m/s over {pilot.WanderTimeS} s");
        yield return Line($"turbulence: vertical {turbulence.VerticalMps} m/s over {turbulence.VerticalTimeS} s, horizontal {turbulence.HorizontalMps} m/s over {turbulence.HorizontalTimeS} s");
        foreach (var sensor in scenario.Sensors)
        {
            yield return Line($"{sensor.Kind} on {sensor.Stream}: every {sensor.EveryS} s, noise {sensor.Noise}, bias {sensor.Bias}, drift {sensor.Drift}, quantum {sensor.Quantum}, lag {sensor.LagS} s, jitter {sensor.JitterS} s");
        }
    }

    private static string Line(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
