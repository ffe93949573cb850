using System.CommandLine;
using SpeedCommand.Desk.Fitting;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Commands;

/// <summary>fit-trials --seeds N: how well fit finds a polar that is known, on simulated flights.</summary>
internal static class FitTrialsCommand
{
    public static Command Create()
    {
        var glider = new Option<string>("--glider") { Description = "A glider file with a drag polar.", HelpName = "FILE", DefaultValueFactory = _ => "marram-15.json" };
        var seeds = new Option<int>("--seeds") { Description = "Trials of ten flights each, with seeds from 1.", DefaultValueFactory = _ => 50 };
        var quiet = new Option<bool>("--quiet") { Description = "Fly in a morning's quiet air instead of a thermal day's." };
        var command = new Command("fit-trials", "Fit simulated flights of a glider worse than its handbook, and count how often the truth is caught.") { glider, seeds, quiet };
        command.SetAction(parsed =>
        {
            var (name, count) = (parsed.GetRequiredValue(glider), parsed.GetValue(seeds));
            if (count is < 1 or > 1000)
            {
                throw new DeskFailure(ExitStatus.Usage, $"--seeds: expected 1 to 1000, found {count}");
            }

            var (_, read) = ScenarioInput.ReadGliderBytes(name);
            if (read.Polar is not DragPolar)
            {
                throw new DeskFailure(ExitStatus.BadData, $"{name}: expected a dragPolar, found another kind of polar");
            }

            var trial = new FitTrial(read, parsed.GetValue(quiet));
            Console.Out.Write(FitTrialTable.Of(trial, [.. Enumerable.Range(1, count).AsParallel().AsOrdered().Select(seed => trial.Run(seed))]));
            return (int)ExitStatus.Done;
        });
        return command;
    }
}
