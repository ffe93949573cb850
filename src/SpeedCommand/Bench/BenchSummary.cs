using Microsoft.Extensions.DependencyInjection;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;

namespace SpeedCommand.Bench;

/// <summary>What a bench flight tells at its end.</summary>
internal static class BenchSummary
{
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
}
