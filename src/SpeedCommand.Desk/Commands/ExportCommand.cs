using System.CommandLine;
using SpeedCommand.Desk.Exports;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Igc;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Sentences;

namespace SpeedCommand.Desk.Commands;

/// <summary>export LOG --to FILE: a flight for other programs, its replay output as a table or its track as an IGC file.</summary>
internal static class ExportCommand
{
    private static readonly string[] Endings = [".parquet", ".csv", ".jsonl", ".igc"];

    public static Command Create()
    {
        var log = new Argument<string>("LOG") { Description = "A flight log (.log, .log.gz) or a recorder's file (.igc)." };
        var to = new Option<string>("--to") { Description = $"The file to write; its ending says what: {string.Join(", ", Endings)}.", HelpName = "FILE", Required = true };
        var settings = new Option<string?>("--settings") { Description = "Settings of the replay.", HelpName = "FILE" };
        var glider = new Option<string?>("--glider") { Description = "A glider file that beats settings and the log's header.", HelpName = "FILE" };
        var command = new Command("export", "Write a flight for other programs: Parquet, CSV, JSON lines or IGC.") { log, to, settings, glider };
        command.SetAction(parsed =>
        {
            Run(new FlightInput(parsed.GetRequiredValue(log), parsed.GetValue(settings), parsed.GetValue(glider)), parsed.GetRequiredValue(to));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static void Run(FlightInput flight, string to)
    {
        var ending = Endings.FirstOrDefault(one => to.EndsWith(one, StringComparison.OrdinalIgnoreCase))
            ?? throw new DeskFailure(ExitStatus.Usage, $"--to: expected a file name ending in {string.Join(", ", Endings)}, found '{to}'");
        DeskOutput.Check("--to", to, flight.Files);
        if (ending == ".igc")
        {
            WriteIgc(flight, to);
            return;
        }

        using var recording = flight.Open();
        var settings = flight.ReadSettings(recording.GliderFile, recording.Flown, out var streams);
        foreach (var remark in recording.Remarks)
        {
            Console.Error.WriteLine($"{flight.Path}: {remark}");
        }

        using var stream = new FileStream(to, FileMode.Create, FileAccess.ReadWrite, FileShare.Read, 1 << 16);
        IPictureSink sink = ending switch
        {
            ".parquet" => new ParquetPictures(stream),
            ".csv" => new PictureTable(stream),
            _ => new PictureLines(stream),
        };
        using var ended = sink as IDisposable;
        recording.Start(settings, sink, streams).RunToEnd();
    }

    private static void WriteIgc(FlightInput flight, string to)
    {
        if (!File.Exists(flight.Path))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"LOG: expected a flight log (.log, .log.gz), found {InputFile.Found(flight.Path)}");
        }

        if (flight.Path.EndsWith(".igc", StringComparison.OrdinalIgnoreCase))
        {
            throw new DeskFailure(ExitStatus.BadData, $"LOG: expected a flight log (.log, .log.gz), found the recorder's file '{flight.Path}'");
        }

        try
        {
            using var log = FlightLogFile.Open(flight.Path);
            var count = IgcExport.Run(log, StreamsOf(flight, log), () => new FileStream(to, FileMode.Create, FileAccess.Write));
            if (count == 0)
            {
                throw new DeskFailure(ExitStatus.BadData, $"{flight.Path}: expected positions (RMC or GGA sentences with a fix), found none");
            }

            Console.Error.WriteLine($"{to}: {count} fixes, unsigned: no proof of a flight");
        }
        catch (FormatException fault)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{flight.Path}: {fault.Message}");
        }
    }

    /// <summary>Positions need no glider, so without settings none is asked for.</summary>
    private static Func<string, StreamSettings> StreamsOf(FlightInput flight, FlightLogReader log)
    {
        if (flight.SettingsFile is null)
        {
            return _ => StreamSettings.Sentences(ChecksumRule.Required);
        }

        flight.ReadSettings(log.Header.GliderFile, log.Header.Flown, out var streams);
        return streams;
    }
}
