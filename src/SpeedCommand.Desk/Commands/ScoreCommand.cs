using System.CommandLine;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Scoring;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Desk.Commands;

/// <summary>score LOG|SCENARIO...: how well estimators of the climb do, next to what theory allows.</summary>
internal static class ScoreCommand
{
    private sealed record Request(
        string[] Inputs, string Grade, int Seeds, IReadOnlyList<NamedEstimator> Estimators, bool AsJson, PictureFile? Plot);

    public static Command Create()
    {
        var inputs = new Argument<string[]>("LOG|SCENARIO") { Description = "Flight logs with truth, scenario files, names of bundled scenarios.", Arity = ArgumentArity.OneOrMore };
        var grade = new Option<string>("--grade") { Description = "Sensor grade of the scenarios: fine, common, poor or all.", DefaultValueFactory = _ => "common" };
        grade.AcceptOnlyFromAmong("fine", "common", "poor", "all");
        var seeds = new Option<int>("--seeds") { Description = "Flights a scenario, with seeds from 1.", DefaultValueFactory = _ => 10 };
        var estimators = new Option<string>("--estimators")
        {
            Description = $"Which, separated by commas: {string.Join(",", EstimatorCatalogue.All.Select(one => one.Name))}.",
            DefaultValueFactory = _ => string.Join(',', EstimatorCatalogue.All.Select(one => one.Name)),
        };
        var json = new Option<bool>("--json") { Description = "JSON instead of a table." };
        var plot = new Option<string?>("--plot") { Description = "Picture of truth and estimates on the first flight (.png or .svg).", HelpName = "FILE" };
        var command = new Command("score", "Score estimators of the climb on simulated flights or on logs with truth.") { inputs, grade, seeds, estimators, json, plot };
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(seeds) is < 1 or > 10_000)
            {
                throw new DeskFailure(ExitStatus.Usage, $"--seeds: expected 1 to 10000, found {parsed.GetValue(seeds)}");
            }

            Run(new Request(parsed.GetRequiredValue(inputs), parsed.GetValue(grade)!, parsed.GetValue(seeds),
                EstimatorsOf(parsed.GetValue(estimators)!), parsed.GetValue(json),
                parsed.GetValue(plot) is { } path ? PictureFile.Named("--plot", path, ".png", ".svg") : null));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static IReadOnlyList<NamedEstimator> EstimatorsOf(string names) =>
    [
        .. names.Split(',').Select(name => EstimatorCatalogue.Find(name) ?? throw new DeskFailure(ExitStatus.Usage,
            $"--estimators: expected some of {string.Join(",", EstimatorCatalogue.All.Select(one => one.Name))}, found '{name}'")),
    ];

    private static void Run(Request request)
    {
        request.Plot?.Checked(request.Inputs.Where(File.Exists).Select(input => new InputFile("the log or scenario", input)));
        var rows = new List<ScoreRow>();
        var plotted = false;
        foreach (var input in request.Inputs)
        {
            foreach (var (found, flight) in IsLog(input) ? [OfLog(input, request)] : OfScenario(input, request))
            {
                rows.AddRange(found);
                if (request.Plot is { } picture && !plotted)
                {
                    ClimbPlot.Write(picture, $"{found[0].Flight}, {(found[0].Grade.Length > 0 ? found[0].Grade + " sensors" : "as recorded")}", flight, request.Estimators);
                    plotted = true;
                }
            }
        }

        Console.Out.Write(request.AsJson ? ScoreJson.Of(rows) : ScoreTable.Of(rows));
    }

    private static bool IsLog(string input) =>
        input.EndsWith(".log", StringComparison.OrdinalIgnoreCase) || input.EndsWith(".log.gz", StringComparison.OrdinalIgnoreCase);

    private static IEnumerable<(List<ScoreRow> Rows, IReadOnlyList<ScoredPoint> Flight)> OfScenario(string input, Request request)
    {
        SensorGrade[] grades = request.Grade == "all" ? Enum.GetValues<SensorGrade>() : [Enum.Parse<SensorGrade>(request.Grade, ignoreCase: true)];
        foreach (var grade in grades)
        {
            var (scenario, glider) = ScenarioInput.Read(input, grade);
            List<ScoreRow> rows;
            List<IReadOnlyList<ScoredPoint>> flights;
            try
            {
                rows = ScenarioScore.Of(scenario, glider, request.Estimators, request.Seeds, out flights);
            }
            catch (AggregateException fault)
            {
                throw new DeskFailure(ExitStatus.BadData, $"{input}: plan: {fault.InnerExceptions[0].Message}");
            }

            yield return (rows, flights[0]);
        }
    }

    private static (List<ScoreRow> Rows, IReadOnlyList<ScoredPoint> Flight) OfLog(string input, Request request)
    {
        if (!File.Exists(input))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"LOG: expected a file, found {InputFile.Found(input)}");
        }

        try
        {
            using var log = FlightLogFile.Open(input);
            var glider = ScenarioInput.ReadGlider(log.Header.GliderFile, Path.GetDirectoryName(input));
            var rows = LogScore.Of(Path.GetFileName(input), log, glider, request.Estimators, out var flight);
            return flight.Count > 0
                ? (rows, flight)
                : throw new DeskFailure(ExitStatus.BadData, $"{input}: expected truth records, found none");
        }
        catch (Exception fault) when (fault is FormatException or InvalidDataException)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{input}: {fault.Message}");
        }
    }
}
