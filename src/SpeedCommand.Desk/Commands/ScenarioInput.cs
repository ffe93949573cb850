using SpeedCommand.Flight.Gliders;
using SpeedCommand.Replay.Files;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Desk.Commands;

/// <summary>Finds scenarios and gliders as the user names them: a file, or something that comes with the program.</summary>
internal static class ScenarioInput
{
    /// <summary>The gliders' folder beside the program.</summary>
    private static string GliderFolder => Path.Combine(AppContext.BaseDirectory, "gliders");

    public static (Scenario Scenario, Glider Glider) Read(string nameOrPath, SensorGrade? grade)
    {
        var isFile = File.Exists(nameOrPath);
        var bytes = isFile
            ? File.ReadAllBytes(nameOrPath)
            : BundledScenarios.Find(nameOrPath) ?? throw new DeskFailure(ExitStatus.NoInput,
                $"SCENARIO: expected a file or one of {string.Join(", ", BundledScenarios.Names)}, found {(Directory.Exists(nameOrPath) ? "the folder " : "")}'{nameOrPath}'");
        var result = ScenarioFile.Read(bytes, isFile ? nameOrPath : $"{nameOrPath}.json", grade);
        if (result.Scenario is not { } scenario)
        {
            throw new DeskFailure(ExitStatus.BadData, result.Problems[0].ToString());
        }

        return (scenario, ReadGlider(scenario.GliderFile, isFile ? Path.GetDirectoryName(nameOrPath) : null));
    }

    /// <summary>The files of a scenario: its own, when it is one, and its glider's.</summary>
    public static IEnumerable<InputFile> FilesOf(string nameOrPath, Scenario scenario)
    {
        var isFile = File.Exists(nameOrPath);
        return
        [
            new("the scenario", isFile ? nameOrPath : null),
            new("the glider file", PathOfGlider(scenario.GliderFile, isFile ? Path.GetDirectoryName(nameOrPath) : null)),
        ];
    }

    /// <summary>The glider file that a name stands for; null when there is none.</summary>
    public static string? PathOfGlider(string file, string? folder = null) =>
        new[] { Path.Combine(folder ?? "", file), Path.Combine(GliderFolder, file) }.FirstOrDefault(File.Exists);

    /// <summary>A glider file beside what names it, or one that comes with the program.</summary>
    public static Glider ReadGlider(string file, string? folder) => ReadGliderBytes(file, folder).Glider;

    /// <summary>The same, with the bytes of the file.</summary>
    public static (byte[] Bytes, Glider Glider) ReadGliderBytes(string file, string? folder = null)
    {
        var path = PathOfGlider(file, folder)
            ?? throw new DeskFailure(ExitStatus.NoInput, $"glider: expected a file here or in {GliderFolder}, found {InputFile.Found(file)}");
        var bytes = File.ReadAllBytes(path);
        var result = GliderFile.Read(bytes, file);
        return (bytes, result.Glider ?? throw new DeskFailure(ExitStatus.BadData, result.Problems.First(problem => !problem.IsWarning).ToString()));
    }
}
