using System.CommandLine;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Commands;

/// <summary>The air and glider options of a question, and how their faults are told.</summary>
internal sealed class ConditionOptions
{
    private readonly Option<string?> _glider = Text("--glider", "FILE", "Glider file, or the name of one that lies beside the program.");
    private readonly Option<string?> _mass = Text("--mass", "MASS", "All-up mass, \"340 kg\"; standard is the polar's reference mass.");
    private readonly Option<string?> _altitude = Text("--altitude", "HEIGHT", "Pressure altitude, \"1000 m\"; standard is sea level.");
    private readonly Option<string?> _pressure = Text("--pressure", "PRESSURE", "Static pressure instead of the altitude, \"898.7 hPa\".");
    private readonly Option<string?> _oat = Text("--oat", "TEMP", "Outside air temperature, \"8 C\"; standard is the standard atmosphere's.");
    private readonly Option<string?> _humidity = Text("--humidity", "SHARE", "Relative humidity over water, \"50 %\"; needs --oat.");
    private readonly Option<string?> _climb = Text("--climb", "SPEED", "Climb expected in the next thermal (MacCready setting), \"2 m/s\".");
    private readonly Option<string?> _air = Text("--air", "SPEED", "Vertical motion of the air, positive up, \"-0.5 m/s\".");
    private readonly Option<string?> _headwind = Text("--headwind", "SPEED", "Headwind, \"10 m/s\"; a tailwind is negative.");
    private readonly Option<string?> _bank = Text("--bank", "ANGLE", "Bank of a level turn, \"30 deg\".");
    private readonly Option<string?> _bugs = Text("--bugs", "SHARE", "Extra sink of a dirty wing at every speed, \"10 %\".");

    public void AddTo(Command command)
    {
        foreach (var option in new[] { _glider, _mass, _altitude, _pressure, _oat, _humidity, _climb, _air, _headwind, _bank, _bugs })
        {
            command.Add(option);
        }
    }

    /// <summary>Reads the conditions; null after telling what is wrong.</summary>
    public FlightConditions? Read(ParseResult parsed, out int exitStatus)
    {
        var reader = new ConditionsReader();
        var conditions = reader.Read(new ConditionTexts
        {
            Glider = parsed.GetValue(_glider),
            Mass = parsed.GetValue(_mass),
            Altitude = parsed.GetValue(_altitude),
            Pressure = parsed.GetValue(_pressure),
            Oat = parsed.GetValue(_oat),
            Humidity = parsed.GetValue(_humidity),
            Climb = parsed.GetValue(_climb),
            Air = parsed.GetValue(_air),
            Headwind = parsed.GetValue(_headwind),
            Bank = parsed.GetValue(_bank),
            Bugs = parsed.GetValue(_bugs),
        });
        foreach (var problem in reader.GliderProblems)
        {
            Console.Error.WriteLine(problem);
        }

        foreach (var fault in reader.OptionFaults)
        {
            Console.Error.WriteLine(fault);
        }

        exitStatus = reader.OptionFaults.Count > 0 ? ExitStatus.Usage : ExitStatus.BadSettings;
        return conditions;
    }

    private static Option<string?> Text(string name, string helpName, string description) =>
        new(name) { HelpName = helpName, Description = description };
}
