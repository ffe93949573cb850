using System.CommandLine;
using SpeedCommand.Desk.Cards;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Displays.Units;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Commands;

/// <summary>card: one page of speeds for the knee-board, as text or as a page.</summary>
internal static class CardCommand
{
    private const string MassesName = "--masses";
    private const int MostMasses = 2;

    public static Command Create()
    {
        var units = AnswerOptions.Units();
        var masses = new Option<string?>(MassesName)
        {
            HelpName = "MASS,MASS",
            Description = "The two weights, \"340kg,400kg\"; standard is --mass and the glider's greatest mass.",
        };
        var output = new Option<string?>("--out")
        {
            HelpName = "FILE",
            Description = "Write it to a file (.txt, .svg, .pdf or .png) instead of printing it.",
        };
        var options = new ConditionInput();
        var command = new Command("card", "One page of speeds over climb and air motion, for two weights. "
            + "--climb, --air, --headwind and --bank join its ranges.");
        options.AddTo(command);
        command.Add(units);
        command.Add(masses);
        command.Add(output);
        command.SetAction(parsed =>
        {
            var chosen = AnswerOptions.ReadUnits(parsed.GetValue(units));
            var file = parsed.GetValue(output) is { } path ? PictureFile.Named("--out", path, ".txt", ".svg", ".pdf", ".png").Checked(options.GliderOf(parsed)) : null;
            var card = new SpeedCard(Read(options, parsed, parsed.GetValue(masses), chosen));
            if (file is null)
            {
                Console.Out.Write(CardText.Write(card));
            }
            else if (file.IsText)
            {
                file.Write(CardText.Write(card));
            }
            else
            {
                file.Write(CardPage.WidthPt, CardPage.HeightPt, new CardPage(card).Draw, CardPage.PixelsPerPt);
            }

            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static CardRequest Read(ConditionInput options, ParseResult parsed, string? massesText, DisplayUnits units)
    {
        if (massesText is null)
        {
            var conditions = options.Read(parsed);
            var (mass, most) = (conditions.Loading.MassKg, conditions.Glider.MaxMassKg);
            return new CardRequest(conditions, most > mass ? [mass, most] : [mass], units);
        }

        var texts = massesText.Split(',');
        if (options.IsGiven(parsed, "--mass") || texts.Length > MostMasses)
        {
            throw new DeskFailure(ExitStatus.Usage, texts.Length > MostMasses
                ? $"{MassesName}: expected one or two masses, found '{massesText}'"
                : $"{MassesName}: expected either --mass or {MassesName}, found both");
        }

        FlightConditions[] read = [.. texts.Select(text => options.Read(parsed, (MassesName, text.Trim())))];
        return new CardRequest(read[0], [.. read.Select(conditions => conditions.Loading.MassKg)], units);
    }
}
