using System.CommandLine;
using System.Globalization;
using SpeedCommand.Desk.Fitting;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Replay.Files;

namespace SpeedCommand.Desk.Commands;

/// <summary>fit LOG... --glider FILE --out FILE: the glider's own polar, learnt from its glides.</summary>
internal static class FitCommand
{
    private const int MaxLogsNamed = 3;

    private sealed record Request(string[] Logs, string Glider, string? Output, string? Settings, bool IsBugsOnly, DisplayUnits Units, PictureFile? Plot);

    public static Command Create()
    {
        var logs = new Argument<string[]>("LOG") { Description = "Flight logs of one glider.", Arity = ArgumentArity.OneOrMore };
        var glider = new Option<string>("--glider") { Description = "The glider file whose polar is to be mended.", HelpName = "FILE", Required = true };
        var output = new Option<string?>("--out") { Description = "The glider file to write, with the fitted polar.", HelpName = "FILE" };
        var settings = new Option<string?>("--settings") { Description = "Settings of the flights; their mass counts.", HelpName = "FILE" };
        var bugs = new Option<bool>("--bugs-only") { Description = "Trust the polar's shape; fit only an extra sink at every speed." };
        var units = AnswerOptions.Units();
        var plot = new Option<string?>("--plot") { Description = "Picture of the fit (.png or .svg).", HelpName = "FILE" };
        var command = new Command("fit", "Learn the glider's polar from straight, steady glides.") { logs, glider, output, settings, bugs, units, plot };
        command.SetAction(parsed =>
        {
            Run(new Request(parsed.GetRequiredValue(logs), parsed.GetRequiredValue(glider), parsed.GetValue(output), parsed.GetValue(settings),
                parsed.GetValue(bugs), AnswerOptions.ReadUnits(parsed.GetValue(units)),
                parsed.GetValue(plot) is { } path ? PictureFile.Named("--plot", path, ".png", ".svg") : null));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static void Run(Request request)
    {
        var (bytes, glider) = ScenarioInput.ReadGliderBytes(request.Glider);
        CheckOutputs(request);
        var handbook = HandbookPolar.Of(glider, request.Glider);
        var (flights, segments) = (new List<FitFlight>(), new List<GlideSegment>());
        foreach (var log in request.Logs)
        {
            var cutter = Cut(new FlightInput(log, request.Settings, request.Glider), flights.Count, handbook);
            flights.Add(new FitFlight(Path.GetFileName(log), cutter.IsLoadMeasured));
            segments.AddRange(cutter.Segments);
        }

        var fit = FitResult.Of(handbook, request.IsBugsOnly, flights, segments);
        Console.Out.Write(FitTable.Of(fit, request.Units));
        if (fit.ReasonNotToTrust is { } reason)
        {
            throw new DeskFailure(ExitStatus.BadData, request.Output is null ? reason : $"{reason}: '{request.Output}' was not written");
        }

        request.Plot?.Write(FitPicture.WidthPx, FitPicture.HeightPx, canvas => FitPicture.Draw(canvas, fit, request.Units));
        if (request.Output is { } output)
        {
            WriteGlider(output, bytes, fit);
        }
    }

    private static void CheckOutputs(Request request)
    {
        InputFile[] inputs =
        [
            .. request.Logs.Select(log => new InputFile("the log", log)),
            new("the settings", request.Settings),
            new("the glider file", ScenarioInput.PathOfGlider(request.Glider)),
        ];
        if (request.Output is { } output)
        {
            DeskOutput.Check("--out", output, inputs);
        }

        request.Plot?.Checked([.. inputs, new("that of --out", request.Output)]);
    }

    private static GlideSegments Cut(FlightInput flight, int number, DragPolar handbook)
    {
        using var recording = flight.Open();
        var settings = flight.ReadSettings(recording.GliderFile, recording.Flown, out var streams);
        var cutter = new GlideSegments(number, settings, handbook);
        recording.Start(settings, cutter, streams).RunToEnd();

        cutter.End();
        return cutter;
    }

    private static void WriteGlider(string output, byte[] bytes, FitResult fit)
    {
        var used = fit.Segments.Count(one => one.Verdict == SegmentVerdict.Used);
        var logs = string.Join(", ", fit.Flights.Take(MaxLogsNamed).Select(one => one.Name)) + (fit.Flights.Count > MaxLogsNamed ? ", ..." : "");
        var origin = string.Create(CultureInfo.InvariantCulture,
            $"Fitted by speedcommand-desk fit to {used} glides of {fit.Flights.Count} flights ({logs.ReplaceLineEndings(" ")}).");
        var written = FittedGliderFile.Of(bytes, fit.Polar, origin);
        var result = GliderFile.Read(written, output);
        if (result.Glider is null)
        {
            throw new DeskFailure(ExitStatus.BadData, [.. result.Problems.Where(one => !one.IsWarning).Select(one => one.ToString())]);
        }

        OutputFile.Replace(output, written);
    }
}
