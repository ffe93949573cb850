using System.CommandLine;
using SpeedCommand.Desk.Plots;
using SpeedCommand.Desk.Screens;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Replaying;

namespace SpeedCommand.Desk.Commands;

/// <summary>screens --out DIR: every display in every state, as pictures, from recorded flights.</summary>
internal static class ScreensCommand
{
    /// <summary>An expected climb with which the speed to fly hardly depends on the moment's air, m/s.</summary>
    private const double BriskMps = 2;

    /// <summary>An expected climb that asks for more than any limit allows, m/s.</summary>
    private const double HurriedMps = 10;

    public static Command Create()
    {
        var output = new Option<string>("--out") { Description = "The folder for the pictures; made when it is not there.", HelpName = "DIR", Required = true };
        var logs = new Option<string>("--logs")
        {
            Description = "The folder with a flight, demo.log, and a folder of faults, a log for each.",
            HelpName = "DIR",
            DefaultValueFactory = _ => "replay-logs",
        };
        var units = AnswerOptions.Units();
        var command = new Command("screens", "Draw every display in every phase and fault, from recorded flights.") { output, logs, units };
        command.SetAction(parsed =>
        {
            Run(parsed.GetRequiredValue(logs), parsed.GetRequiredValue(output), AnswerOptions.ReadUnits(parsed.GetValue(units)));
            return (int)ExitStatus.Done;
        });
        return command;
    }

    private static void Run(string logs, string folder, DisplayUnits units)
    {
        var faults = Path.Combine(logs, "faults");
        if (!Directory.Exists(faults))
        {
            throw new DeskFailure(ExitStatus.NoInput, $"--logs: expected a folder of logs, found no '{faults}'");
        }

        DeskOutput.MakeFolder("--out", folder);
        List<ScreenMoment> moments = [.. Phases(Path.Combine(logs, "demo.log"), units), .. Faults(faults, units)];
        foreach (var missing in PhaseMoments.Names.Except(moments.Select(moment => moment.Name)))
        {
            Console.Error.WriteLine($"{logs}: no moment of '{missing}' in these flights");
        }

        // The terminal is large: its sheet has the phases only.
        Write(new PixelScreen(units), folder, 4, 2, 4, moments);
        Write(new CharacterScreen(CharacterFrame.Of20x4, units), folder, 4, 2, 4, moments);
        Write(new CharacterScreen(CharacterFrame.Of16x2, units), folder, 4, 2, 5, moments);
        Write(new TerminalScreen(units), folder, 2, 2, 2, moments, [.. moments.Where(moment => !moment.IsFault)]);
    }

    /// <summary>A picture for each state, and a sheet of them.</summary>
    private static void Write(
        Screen screen, string folder, int scale, int sheetScale, int perRow, List<ScreenMoment> moments, List<ScreenMoment>? onSheet = null)
    {
        var own = Directory.CreateDirectory(Path.Combine(folder, screen.Name)).FullName;
        WriteOne("caution", null);
        moments.ForEach(moment => WriteOne(moment.Name, moment.Picture));
        var sheet = new ContactSheet(screen, sheetScale, perRow, onSheet ?? moments);
        PictureFile.Named("--out", Path.Combine(folder, screen.Name + ".png"), ".png").Write(sheet.Width, sheet.Height, sheet.Draw);

        void WriteOne(string name, CockpitPicture? picture) => PictureFile.Named("--out", Path.Combine(own, name + ".png"), ".png")
            .Write(screen.Width, screen.Height, canvas => screen.Draw(canvas, picture), scale);
    }

    /// <summary>What the flight itself does not have may come when it is flown heavier, and in more of a hurry.</summary>
    private static IEnumerable<ScreenMoment> Phases(string log, DisplayUnits units)
    {
        var found = new List<(ScreenMoment Moment, bool IsDoubtful)>();
        foreach (var change in Changes)
        {
            var moments = new PhaseMoments(units);
            Replay(log, moments, change);
            found.AddRange(moments.Found.Select(moment => (moment, moments.IsDoubtful(moment))));
        }

        // The first of each name, one that is not doubtful before one that is.
        return PhaseMoments.Names.SelectMany(name =>
            found.Where(one => one.Moment.Name == name).OrderBy(one => one.IsDoubtful).Select(one => one.Moment).Take(1));
    }

    private static Func<FlightSettings, FlightSettings>[] Changes =>
    [
        settings => settings,
        settings => settings with { MassKg = Heavier(settings, 1) },
        settings => settings with { MassKg = Heavier(settings, 0.5) },
        settings => settings with { ExpectedClimbMps = BriskMps },
        settings => settings with { ExpectedClimbMps = HurriedMps },
    ];

    private static double Heavier(FlightSettings settings, double share) =>
        double.IsNaN(settings.Glider.MaxMassKg) ? settings.MassKg : settings.MassKg + share * (settings.Glider.MaxMassKg - settings.MassKg);

    private static IEnumerable<ScreenMoment> Faults(string folder, DisplayUnits units)
    {
        foreach (var log in Directory.GetFiles(folder, "*.log").Order(StringComparer.Ordinal))
        {
            var moment = new FaultMoment("fault-" + RecordingFile.StemOf(log), units);
            Replay(log, moment, settings => settings);
            if (moment.Found is { } found)
            {
                yield return found;
            }
        }
    }

    private static void Replay(string log, IPictureSink sink, Func<FlightSettings, FlightSettings> change)
    {
        var input = new FlightInput(log, null, null);
        using var recording = input.Open();
        var settings = input.ReadSettings(recording.GliderFile, recording.Flown, out var streams);
        recording.Start(change(settings), sink, streams).RunToEnd();
    }
}
