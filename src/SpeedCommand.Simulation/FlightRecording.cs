using System.Globalization;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Scoring;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation;

/// <summary>Writes a simulated flight into a flight log.</summary>
/// <param name="log">The log, header written; not closed here.</param>
public sealed class FlightRecording(FlightLogWriter log) : ISimulatedFlightSink
{
    /// <summary>The header of a simulated flight's log: it names scenario, seed and grade, so that anyone can fly it again,
    /// and mass and lags, so that anyone can score it.</summary>
    /// <param name="scenario">The scenario.</param>
    /// <param name="seed">The seed.</param>
    /// <returns>The header.</returns>
    public static FlightLogHeader HeaderOf(Scenario scenario, long seed)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var note = string.Create(CultureInfo.InvariantCulture,
            $"simulated: scenario {scenario.Name}, seed {seed}, sensors {scenario.Grade.ToString().ToLowerInvariant()}");
        return new FlightLogHeader(scenario.StartUtc, scenario.GliderFile, [note, FlownWith.Of(scenario).Note]);
    }

    /// <inheritdoc/>
    public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line) => log.WriteLine(timeUs, stream, line);

    /// <inheritdoc/>
    public void OnTruth(in TruthSample truth) => log.WriteTruth(truth.TimeUs, TruthRecord.Write(truth));
}
