using System.CommandLine;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Simulation;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Desk.Commands;

/// <summary>simulate SCENARIO --seed N --out LOG: flies a scenario and writes its flight log.</summary>
internal static class SimulateCommand
{
    public static Command Create()
    {
        var scenario = new Argument<string>("SCENARIO")
        {
            Description = $"A scenario file, or one of {string.Join(", ", BundledScenarios.Names)}.",
        };
        var seed = new Option<long>("--seed") { Description = "Seed of every random number; the same seed gives the same bytes.", Required = true };
        var output = new Option<string>("--out") { Description = "The flight log to write (.log or .log.gz).", HelpName = "FILE", Required = true };
        var grade = GradeOption();
        var command = new Command("simulate", "Fly a scenario with simulated air and sensors; write a flight log with truth records.")
        {
            scenario, seed, output, grade,
        };
        command.SetAction(parsed =>
        {
            Run(parsed.GetRequiredValue(scenario), parsed.GetRequiredValue(seed), parsed.GetRequiredValue(output), parsed.GetValue(grade));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    public static Option<SensorGrade?> GradeOption() => new("--grade")
    {
        Description = "Sensor grade instead of the scenario's own: fine, common or poor.",
    };

    private static void Run(string nameOrPath, long seed, string output, SensorGrade? grade)
    {
        var (scenario, glider) = ScenarioInput.Read(nameOrPath, grade);
        DeskOutput.Check("--out", output, ScenarioInput.FilesOf(nameOrPath, scenario));
        foreach (var line in KnobList.Of(scenario, seed))
        {
            Console.Error.WriteLine(line);
        }

        using var log = FlightLogFile.Create(output, FlightRecording.HeaderOf(scenario, seed));
        var simulator = new FlightSimulator(scenario, glider, seed);
        try
        {
            simulator.Fly(new FlightRecording(log));
        }
        catch (InvalidOperationException fault)
        {
            throw new DeskFailure(ExitStatus.BadData, $"{nameOrPath}: plan: {fault.Message}");
        }

        log.WriteEnd(simulator.TimeUs);
    }
}
