using System.Globalization;
using Microsoft.Extensions.DependencyInjection;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;

namespace SpeedCommand.Bench;

/// <summary>What a bench flight tells at its end.</summary>
internal static class BenchSummary
{
    // The last line's sleep alone may end some milliseconds late: 2 % of the shortest flight worth playing.
    private const double KeptShare = 0.98;

    /// <summary>Writes the summary; a line lost on the way is an input fault of the bench.</summary>
    /// <returns>The exit status.</returns>
    public static int Write(IServiceProvider services, BenchFlight flight, int exitStatus)
    {
        var machine = services.GetRequiredService<CockpitMachine>();
        var player = services.GetRequiredService<BenchPlayer>();
        var received = machine.Streams.Sum(stream => stream.Lines);
        var faults = services.GetRequiredService<LatestPicture>().FaultsSeen;
        services.GetRequiredService<LatestPicture>().TryGet(out _, out var pictures);
        var output = Console.Out;
        output.WriteLine(player.IsComplete ? "Bench flight complete." : "Bench flight stopped before its end.");
        output.WriteLine(FormattableString.Invariant($"  flight    {flight.LogPath}, {flight.DurationUs / 60e6:F1} min, {flight.LineCount} lines"));
        output.WriteLine($"  lines     {player.LinesSent} sent, {received} received, {player.LinesSent - received} lost");
        if (PaceWarning(services.GetRequiredService<CockpitClock>().Pace, player.ReachedPace) is { } warning)
        {
            output.WriteLine($"  pace      {warning}");
        }

        foreach (var stream in machine.Streams)
        {
            output.WriteLine($"  {stream.Name,-9} {stream.Lines} lines, {stream.BadLines} bad; {stream.Readings} readings, {stream.BadReadings} bad");
        }

        output.WriteLine($"  pictures  {pictures}");
        var names = FaultNames.All.Where(pair => (faults & pair.Key) != 0).Select(pair => pair.Value);
        output.WriteLine($"  faults    {string.Join(", ", names.DefaultIfEmpty("none"))}");
        output.WriteLine($"  recorded  {machine.Recorder?.Path ?? "not recorded"}");
        return exitStatus != ExitStatus.Done || !player.IsComplete || received == player.LinesSent ? exitStatus : ExitStatus.InputOutput;
    }

    /// <summary>Says that the machine was too slow for the pace asked: what comes late is stamped late, so the flight was stretched.</summary>
    /// <param name="asked">The pace asked for.</param>
    /// <param name="reached">The pace reached; NaN when the flight was not played to its end.</param>
    /// <returns>The words; null when it kept the pace.</returns>
    internal static string? PaceWarning(double asked, double reached) => reached < asked * KeptShare
        ? string.Create(CultureInfo.InvariantCulture, $"{asked:0.##} asked, {reached:0.##} reached: this machine could not keep it, so numbers came late or stayed blank")
        : null;
}
