using System.CommandLine;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Desk.Polars;

namespace SpeedCommand.Desk.Commands;

/// <summary>polar: the sink curve in one set of conditions, as a table, as JSON, as a picture.</summary>
internal static class PolarCommand
{
    public static Command Create()
    {
        var units = AnswerOptions.Units();
        var json = AnswerOptions.Json();
        var plot = new Option<string?>("--plot")
        {
            HelpName = "FILE",
            Description = "Draw the curve, its tangents and targets too (.png or .svg).",
        };
        var options = new ConditionInput();
        var command = new Command("polar", "The sink curve for given air and glider, with the three targets and the limits.");
        options.AddTo(command);
        command.Add(units);
        command.Add(json);
        command.Add(plot);
        command.SetAction(parsed =>
        {
            var chosen = AnswerOptions.ReadUnits(parsed.GetValue(units));
            var file = parsed.GetValue(plot) is { } path ? PictureFile.Named("--plot", path, ".png", ".svg").Checked(options.GliderOf(parsed)) : null;
            var curve = new SinkCurve(options.Read(parsed));
            if (!curve.IsKnown)
            {
                throw new DeskFailure(ExitStatus.BadData, "no speed is both above the stall and below the never-exceed speed in these conditions");
            }

            if (file is not null)
            {
                var picture = new PolarPicture(curve, chosen);
                file.Write(PolarPicture.WidthPx, PolarPicture.HeightPx, picture.Draw);
            }

            if (parsed.GetValue(json))
            {
                AnswerOptions.PrintJson(writer => PolarJson.WriteMembers(writer, curve));
            }
            else
            {
                Console.Out.Write(new PolarTable(curve, chosen).Write());
            }

            return (int)ExitStatus.Done;
        });
        return command;
    }
}
