using System.Text.Json;

namespace SpeedCommand.House.Tests.Projects;

/// <summary>
/// Everything that travels to the cockpit, packages of packages included. A library that is not named here is a decision:
/// it costs size, start-up time and a risk for the build ahead of time.
/// </summary>
public class CockpitClosureTests
{
    private static readonly string[] Allowed =
        ["SpeedCommand", "MathNet.Numerics", "Microsoft.Extensions.", "NLog", "System.", "runtime."];

    [Fact]
    public void CockpitProgram_CarriesOnlyLightLibraries()
    {
        var path = Repository.PathOf($"src/SpeedCommand/bin/{Repository.Configuration}/net10.0/speedcommand.deps.json");
        using var dependencies = JsonDocument.Parse(File.ReadAllText(path));
        var names = dependencies.RootElement.GetProperty("libraries").EnumerateObject().Select(library => library.Name.Split('/')[0]).ToList();
        Assert.Contains("System.IO.Ports", names);
        Assert.DoesNotContain(names, name => name is "SpeedCommand.Desk" or "SpeedCommand.Simulation");
        Offences.None(names.Where(name => name != "speedcommand" && !Allowed.Any(allowed => name.StartsWith(allowed, StringComparison.Ordinal))));
    }
}
