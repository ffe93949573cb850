using System.CommandLine;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation.Faults;

namespace SpeedCommand.Desk.Commands;

/// <summary>spoil LOG --plan FILE --seed N --out LOG: turns a flight log into the one a faulty cockpit would have recorded.</summary>
internal static class SpoilCommand
{
    public static Command Create()
    {
        var input = new Argument<string>("LOG") { Description = "The flight log to spoil." };
        var plan = new Option<string>("--plan")
        {
            Description = $"A fault plan, or one of {string.Join(", ", BundledFaultPlans.Names)}.",
            HelpName = "PLAN",
            Required = true,
        };
        var seed = new Option<long>("--seed") { Description = "Seed of every random number; the same seed gives the same bytes.", Required = true };
        var output = new Option<string>("--out") { Description = "The flight log to write (.log or .log.gz).", HelpName = "FILE", Required = true };
        var command = new Command("spoil", "Put faults into a flight log: unplugged boards, noise on lines, blocked tubes.") { input, plan, seed, output };
        command.SetAction(parsed =>
        {
            Run(parsed.GetRequiredValue(input), parsed.GetRequiredValue(plan), parsed.GetRequiredValue(seed), parsed.GetRequiredValue(output));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static FaultPlan ReadPlan(string nameOrPath)
    {
        var isFile = File.Exists(nameOrPath);
        var bytes = isFile
            ? File.ReadAllBytes(nameOrPath)
            : BundledFaultPlans.Find(nameOrPath) ?? throw new DeskFailure(ExitStatus.NoInput,
                $"--plan: expected a file or one of {string.Join(", ", BundledFaultPlans.Names)}, found '{nameOrPath}'");
        var result = FaultPlanFile.Read(bytes, isFile ? nameOrPath : $"{nameOrPath}.json");
        return result.Plan ?? throw new DeskFailure(ExitStatus.BadData, [.. result.Problems.Select(problem => problem.ToString())]);
    }

    private static void Run(string input, string planName, long seed, string output)
    {
        var plan = ReadPlan(planName);
        if (!File.Exists(input))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"LOG: expected a file, found {InputFile.Found(input)}");
        }

        DeskOutput.Check("--out", output, new InputFile("the log", input), new InputFile("the plan", File.Exists(planName) ? planName : null));

        Console.Error.WriteLine(FormattableString.Invariant($"seed {seed}, plan {plan.Name}, {plan.Faults.Count} faults"));
        try
        {
            using var log = FlightLogFile.Open(input);
            using var spoilt = FlightLogFile.Create(output, SpoiltLog.HeaderOf(log.Header, plan, seed));
            SpoiltLog.Write(log, plan, seed, spoilt);
        }
        catch (Exception fault) when (fault is FormatException or InvalidDataException)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{input}: {fault.Message}");
        }
    }
}
