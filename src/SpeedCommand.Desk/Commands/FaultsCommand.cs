using System.CommandLine;
using System.Globalization;
using System.Text;
using SpeedCommand.Simulation.Faults;
using SpeedCommand.Simulation.Faults.Trials;

namespace SpeedCommand.Desk.Commands;

/// <summary>faults --flights N: how often a faulty cockpit shows a wrong target.</summary>
internal static class FaultsCommand
{
    /// <summary>Seeds of the good flights a scenario and grade: enough that air and noise differ, few enough to keep in memory.</summary>
    private const int GoodFlightSeeds = 20;

    private const int WrongFlightsTold = 50;

    public static Command Create()
    {
        var flights = new Option<int>("--flights") { Description = "Flights, each with one drawn fault.", DefaultValueFactory = _ => 1000 };
        var seed = new Option<long>("--seed") { Description = "Seed of the first flight; the others follow.", DefaultValueFactory = _ => 1 };
        var command = new Command("faults", "Count the wrong targets that drawn faults bring about on short flights.") { flights, seed };
        command.SetAction(parsed =>
        {
            var (count, first) = (parsed.GetValue(flights), parsed.GetValue(seed));
            if (count is < 1 or > 1_000_000)
            {
                throw new DeskFailure(ExitStatus.Usage, $"--flights: expected 1 to 1000000, found {count}");
            }

            if (first < 0)
            {
                throw new DeskFailure(ExitStatus.Usage, $"--seed: expected 0 or more, found {first}");
            }

            return (int)Run(first, count);
        });
        return command;
    }

    private static ExitStatus Run(long firstSeed, int count)
    {
        var glider = ScenarioInput.Read(FaultTrials.ScenarioNames[0], null).Glider;
        var results = new FaultTrials(glider, GoodFlightSeeds).FlyMany(firstSeed, count);
        Console.Out.Write(Table(results));
        var wrong = results.Where(result => result.Wrong.Count > 0).ToList();
        foreach (var result in wrong.Take(WrongFlightsTold))
        {
            Console.Out.WriteLine($"{result.Wrong.MaxBy(number => number.BeyondMps)} ({result.Wrong.Count} numbers)");
        }

        return wrong.Count == 0 ? ExitStatus.Done : ExitStatus.BadData;
    }

    private static string Table(IReadOnlyList<(FaultSpec Fault, IReadOnlyList<WrongNumber> Wrong)> results)
    {
        var text = new StringBuilder();
        text.AppendLine("fault            flights  with a wrong number  worst, m/s beyond what may be shown");
        foreach (var kind in Enum.GetValues<FaultKind>())
        {
            var ofKind = results.Where(result => result.Fault.Kind == kind).ToList();
            var worst = ofKind.SelectMany(result => result.Wrong).Select(number => number.BeyondMps).DefaultIfEmpty(0).Max();
            text.AppendLine(CultureInfo.InvariantCulture,
                $"{FaultPlanFile.WordOf(kind),-15}  {ofKind.Count,7}  {ofKind.Count(result => result.Wrong.Count > 0),19}  {worst,6:F2}");
        }

        text.AppendLine(CultureInfo.InvariantCulture,
            $"{"all",-15}  {results.Count,7}  {results.Count(result => result.Wrong.Count > 0),19}");
        return text.ToString();
    }
}
