using System.CommandLine;
using SpeedCommand.Desk.Comparisons;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Replay.Comparison;
using SpeedCommand.Replay.Files;

namespace SpeedCommand.Desk.Commands;

/// <summary>compare LOG --settings ONE --against TWO: how two replays of a flight differ, or a replay and stored output.</summary>
internal static class CompareCommand
{
    private const int MaxPanels = 6;

    private sealed record Request(FlightInput Flight, string Against, bool IsExact, PictureFile? Plot);

    public static Command Create()
    {
        var log = new Argument<string>("LOG") { Description = "A flight log (.log, .log.gz) or a recorder's file (.igc)." };
        var settings = new Option<string?>("--settings") { Description = "Settings of the first replay; standard settings without.", HelpName = "FILE" };
        var against = new Option<string>("--against") { Description = "Settings of the second replay, or output stored by an earlier one (.jsonl).", HelpName = "FILE", Required = true };
        var glider = new Option<string?>("--glider") { Description = "A glider file that beats both settings and the log's header.", HelpName = "FILE" };
        var exact = new Option<bool>("--exact") { Description = "Count differences of the last printed decimal too." };
        var plot = new Option<string?>("--plot") { Description = "Picture of the columns that differ most (.png or .svg).", HelpName = "FILE" };
        var command = new Command("compare", "Compare two replays of a flight; exit status 1 when they differ.") { log, settings, against, glider, exact, plot };
        command.SetAction(parsed => (int)Run(new Request(
            new FlightInput(parsed.GetRequiredValue(log), parsed.GetValue(settings), parsed.GetValue(glider)),
            parsed.GetRequiredValue(against), parsed.GetValue(exact),
            parsed.GetValue(plot) is { } path ? PictureFile.Named("--plot", path, ".png", ".svg") : null)));
        return command;
    }

    private static ExitStatus Run(Request request)
    {
        if (!File.Exists(request.Against))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"--against: expected a settings file or stored output, found {InputFile.Found(request.Against)}");
        }

        request.Plot?.Checked([.. request.Flight.Files, new("that of --against", request.Against)]);

        var comparison = Compare(request, onNumbers: null);
        Console.Out.Write(ComparisonTable.Of(comparison));
        if (request.Plot is { } picture)
        {
            Draw(picture, request, comparison);
        }

        return comparison.AreEqual ? ExitStatus.Done : ExitStatus.Different;
    }

    private static OutputComparison Compare(Request request, Action<OutputNumbers>? onNumbers)
    {
        var isStored = request.Against.EndsWith(".jsonl", StringComparison.OrdinalIgnoreCase);
        var second = isStored ? File.ReadLines(request.Against) : ReplayedLines.Of(request.Flight with { SettingsFile = request.Against });
        try
        {
            return OutputComparison.Of(ReplayedLines.Of(request.Flight), second, request.IsExact, onNumbers: onNumbers);
        }
        catch (FormatException fault)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{request.Against}: {fault.Message}");
        }
    }

    /// <summary>Which columns are worth drawing is known only at the end, so the flight is replayed once more.</summary>
    private static void Draw(PictureFile picture, Request request, OutputComparison comparison)
    {
        var series = comparison.Columns.Where(column => column.Count > 0 && column.NumberCount > 0)
            .OrderByDescending(column => column.Count).Take(MaxPanels).Select(column => new NumberSeries(column.Name)).ToList();
        if (series.Count == 0)
        {
            Console.Error.WriteLine("speedcommand-desk: --plot: no numbers differ, no picture was made");
            return;
        }

        Compare(request, numbers => series.Find(one => one.Column == numbers.Column)?.Add(numbers.TimeS, numbers.Expected, numbers.Found));
        ComparisonPlot.Write(picture, request.Flight.SettingsFile ?? "standard settings", request.Against, series);
    }
}
