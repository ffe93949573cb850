using System.CommandLine;
using System.Globalization;
using SpeedCommand.Simulation.Scoring;

namespace SpeedCommand.Desk.Commands;

/// <summary>guidance SCENARIO: what following the instrument's speed command is worth, against perfect advice and one block speed.</summary>
internal static class GuidanceCommand
{
    public static Command Create()
    {
        var scenario = new Argument<string>("SCENARIO") { Description = "A scenario flown at the speed to fly, such as dolphin." };
        var seeds = new Option<int>("--seeds") { Description = "Flights, with seeds from 1.", DefaultValueFactory = _ => 10 };
        var grade = SimulateCommand.GradeOption();
        var command = new Command("guidance", "Average speed with the instrument's advice, with perfect advice, and with one block speed.") { scenario, seeds, grade };
        command.SetAction(parsed =>
        {
            var name = parsed.GetRequiredValue(scenario);
            var (read, glider) = ScenarioInput.Read(name, parsed.GetValue(grade));
            if (read.Plan.Any(leg => double.IsNaN(leg.ExpectedClimbMps)) || glider.Limits is null)
            {
                throw new DeskFailure(ExitStatus.BadData, $"{name}: plan: expected an expectedClimb on every leg and a glider with limits");
            }

            var score = GuidanceScore.Of(read, glider, Math.Max(1, parsed.GetValue(seeds)));
            Console.Out.WriteLine("| advice | average speed, km/h | of perfect |");
            Console.Out.WriteLine("| --- | --- | --- |");
            Write("perfect", score.PerfectMps, score);
            Write("instrument", score.InstrumentMps, score);
            Write("block speed", score.BlockMps, score);
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static void Write(string advice, double speedMps, in GuidanceScore score) => Console.Out.WriteLine(
        string.Create(CultureInfo.InvariantCulture, $"| {advice} | {speedMps * 3.6:F2} | {speedMps / score.PerfectMps * 100:F2} % |"));
}
