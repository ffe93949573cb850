using System.CommandLine;
using System.Globalization;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Noise;

namespace SpeedCommand.Desk.Commands;

/// <summary>noise LOG: the noise of each sensor in a recorded log, so that a maker learns his board's grade.</summary>
internal static class NoiseCommand
{
    private static readonly double[] AveragingTimesS = [0.1, 1, 10];

    public static Command Create()
    {
        var log = new Argument<string>("LOG") { Description = "A flight log; best recorded with the glider at rest and out of the wind." };
        var command = new Command("noise", "Noise of each sensor in a log: single reading, quantum, Allan deviation.") { log };
        command.SetAction(parsed =>
        {
            Run(parsed.GetRequiredValue(log));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static void Run(string path)
    {
        if (!File.Exists(path))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"LOG: expected a file, found {InputFile.Found(path)}");
        }

        IReadOnlyList<SensorNoise> sensors;
        try
        {
            using var log = FlightLogFile.Open(path);
            sensors = SensorNoise.Of(log);
        }
        catch (Exception fault) when (fault is FormatException or InvalidDataException)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{path}: {fault.Message}");
        }

        Console.Out.WriteLine("| stream | reading | readings | every, s | noise of one | quantum | Allan 0.1 s | Allan 1 s | Allan 10 s |");
        Console.Out.WriteLine("| --- | --- | --- | --- | --- | --- | --- | --- | --- |");
        foreach (var sensor in sensors)
        {
            var allan = AveragingTimesS.Select(time => AllanDeviation.Of(sensor.Readings, Math.Max(1, (int)Math.Round(time / sensor.SpacingS))));
            Console.Out.WriteLine(string.Create(CultureInfo.InvariantCulture,
                $"| {sensor.Stream} | {sensor.Kind} | {sensor.Readings.Length} | {sensor.SpacingS:F3} | {sensor.White:G3} | {sensor.Quantum:G3} | {string.Join(" | ", allan.Select(value => value.ToString("G3", CultureInfo.InvariantCulture)))} |"));
        }
    }
}
