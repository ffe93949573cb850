using System.Xml.Linq;

namespace SpeedCommand.House.Tests.Projects;

/// <summary>Which project may refer to which, and to which packages: docs/architecture.md draws the same picture.</summary>
public class ProjectDirectionTests
{
    private static readonly string[] Flight = ["SpeedCommand.Flight"];
    private static readonly string[] BelowPipeline = ["SpeedCommand.Flight", "SpeedCommand.Estimation", "SpeedCommand.Sentences"];
    private static readonly string[] Pipeline = [.. BelowPipeline, "SpeedCommand.Pipeline"];
    private static readonly string[] Replay = [.. Pipeline, "SpeedCommand.Replay"];
    private static readonly string[] CockpitPackages =
    [
        "Microsoft.Extensions.Hosting", "Microsoft.Extensions.Hosting.Systemd", "System.IO.Ports", "NLog", "NLog.Extensions.Logging",
        "System.CommandLine",
    ];

    /// <summary>What may be referred to; null packages mean any.</summary>
    private static readonly Dictionary<string, (string[] Projects, string[]? Packages)> Allowed = new()
    {
        ["SpeedCommand.Flight"] = ([], ["MathNet.Numerics"]),
        ["SpeedCommand.Estimation"] = (Flight, []),
        ["SpeedCommand.Sentences"] = ([], []),
        ["SpeedCommand.Pipeline"] = (BelowPipeline, []),
        ["SpeedCommand.Replay"] = (Pipeline, []),
        ["SpeedCommand.Simulation"] = (Replay, []),
        ["SpeedCommand.Displays"] = (Pipeline, ["System.Device.Gpio"]),
        ["SpeedCommand"] = ([.. Replay, "SpeedCommand.Displays"], CockpitPackages),
        ["SpeedCommand.Desk"] = ([.. Replay, "SpeedCommand.Displays", "SpeedCommand.Simulation"], null),
    };

    [Fact]
    public void Projects_ReferOnlyDownwards() => Offences.None(ProjectFile.AllIn("src").SelectMany(Trespasses));

    [Fact]
    public void Trespass_IsNoticed()
    {
        var upwards = XDocument.Parse("""
            <Project><ItemGroup>
              <ProjectReference Include="../SpeedCommand.Replay/SpeedCommand.Replay.csproj" />
              <PackageReference Include="ScottPlot" />
            </ItemGroup></Project>
            """);
        Assert.Equal(2, Trespasses(ProjectFile.Read("SpeedCommand.Pipeline", upwards)).Count());
    }

    [Fact]
    public void EverySourceProject_HasItsTests()
    {
        var tests = ProjectFile.AllIn("tests").ToList();
        var untested = ProjectFile.AllIn("src").Where(project =>
            !tests.Exists(test => test.Name == project.Name + ".Tests" && test.Projects.Contains(project.Name)));
        Offences.None(untested.Select(project => project.Name));
    }

    [Fact]
    public void EveryProject_IsInTheSolution()
    {
        var solution = File.ReadAllText(Repository.PathOf("SpeedCommand.sln"));
        var missing = ProjectFile.AllIn("src").Concat(ProjectFile.AllIn("tests"))
            .Where(project => !solution.Contains($"\"{project.Name}\"", StringComparison.Ordinal));
        Offences.None(missing.Select(project => project.Name));
    }

    private static IEnumerable<string> Trespasses(ProjectFile project)
    {
        if (!Allowed.TryGetValue(project.Name, out var allowed))
        {
            return [$"{project.Name} is not in the picture: say in this test what it may refer to"];
        }

        return project.Projects.Except(allowed.Projects).Concat(allowed.Packages is null ? [] : project.Packages.Except(allowed.Packages))
            .Select(reference => $"{project.Name} must not refer to {reference}");
    }
}
