using System.CommandLine;
using System.Globalization;
using SpeedCommand.Desk.Reports;
using SpeedCommand.Displays.Units;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Replaying;

namespace SpeedCommand.Desk.Commands;

/// <summary>report LOG... --out DIR: a page for each flight, to be read without a network.</summary>
internal static class ReportCommand
{
    private const string IndexName = "index.html";

    public static Command Create()
    {
        var logs = new Argument<string[]>("LOG") { Description = "Flight logs (.log, .log.gz) or recorders' files (.igc).", Arity = ArgumentArity.OneOrMore };
        var output = new Option<string>("--out") { Description = "The folder for the pages; made when it is not there.", HelpName = "DIR", Required = true };
        var settings = new Option<string?>("--settings") { Description = "Settings of the replay.", HelpName = "FILE" };
        var glider = new Option<string?>("--glider") { Description = "A glider file that beats settings and the log's header.", HelpName = "FILE" };
        var units = AnswerOptions.Units();
        var command = new Command("report", "Write a page about each flight, and an index of several.") { logs, output, settings, glider, units };
        command.SetAction(parsed =>
        {
            var flights = parsed.GetRequiredValue(logs).Select(log => new FlightInput(log, parsed.GetValue(settings), parsed.GetValue(glider))).ToList();
            return (int)Run(flights, parsed.GetRequiredValue(output), AnswerOptions.ReadUnits(parsed.GetValue(units)));
        });
        return command;
    }

    /// <summary>A flight that cannot be reported spoils no other; the exit status is the worst of theirs.</summary>
    private static ExitStatus Run(IReadOnlyList<FlightInput> flights, string folder, DisplayUnits units)
    {
        var pages = PageNames(flights);
        DeskOutput.MakeFolder("--out", folder);
        InputFile[] inputs = [.. flights[0].Files, .. flights.Select(flight => new InputFile("the log", flight.Path))];
        foreach (var page in flights.Count > 1 ? pages.Append(IndexName) : pages)
        {
            DeskOutput.Check("--out", Path.Combine(folder, page), inputs);
        }

        var rows = new List<IndexRow>();
        var worst = ExitStatus.Done;
        foreach (var (input, page) in flights.Zip(pages))
        {
            try
            {
                var flight = Replay(input);
                File.WriteAllText(Path.Combine(folder, page), new FlightPage(flight, units).Html());
                rows.Add(IndexRow.Of(page, flight));
            }
            catch (DeskFailure failure)
            {
                DeskProgram.Tell(failure.Messages);
                worst = failure.Status > worst ? failure.Status : worst;
            }
            catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
            {
                DeskProgram.Tell([$"{input.Path}: {fault.Message}"]);
                worst = ExitStatus.InputOutput > worst ? ExitStatus.InputOutput : worst;
            }
        }

        if (rows.Count > 1)
        {
            File.WriteAllText(Path.Combine(folder, IndexName), IndexPage.Html(rows, units));
        }

        return worst;
    }

    /// <summary>Logs of the same name in different folders must not overwrite each other's page, nor the index.</summary>
    private static List<string> PageNames(IReadOnlyList<FlightInput> flights)
    {
        var names = new List<string>();
        foreach (var stem in flights.Select(one => RecordingFile.StemOf(one.Path)))
        {
            var name = $"{stem}.html";
            for (var i = 2; name == IndexName || names.Contains(name); i++)
            {
                name = string.Create(CultureInfo.InvariantCulture, $"{stem}-{i}.html");
            }

            names.Add(name);
        }

        return names;
    }

    /// <summary>Replays a recording into what a report needs of it.</summary>
    /// <exception cref="DeskFailure">There is none, it is not readable as one, or nothing was flown.</exception>
    public static ReportFlight Replay(FlightInput input)
    {
        using var recording = input.Open();
        var settings = input.ReadSettings(recording.GliderFile, recording.Flown, out var streams);
        var flight = new ReportFlight(RecordingFile.StemOf(input.Path), settings) { StartUtc = recording.StartUtc };
        recording.Start(settings, flight, streams).RunToEnd();

        flight.End();
        if (flight.Moments.Count == 0)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{input.Path}: expected a flight, found nothing that lasts");
        }

        flight.Remarks.AddRange(recording.Remarks);
        if (recording.IsCut)
        {
            flight.Remarks.Add("The recording ends in the middle of a line, as after a power cut.");
        }

        if (recording.ProblemCount > 0)
        {
            flight.Remarks.Add($"{recording.ProblemCount} lines could not be used; the first: line {recording.Problems[0].LineNumber}, {recording.Problems[0].Message}");
        }

        return flight;
    }
}
