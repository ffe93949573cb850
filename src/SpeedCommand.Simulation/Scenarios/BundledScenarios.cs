namespace SpeedCommand.Simulation.Scenarios;

/// <summary>The scenarios that come with the program.</summary>
public static class BundledScenarios
{
    private static readonly BundledFiles Files = new("scenarios/");

    /// <summary>Their names, in alphabetical order.</summary>
    public static IReadOnlyList<string> Names => Files.Names;

    /// <summary>The file of a scenario.</summary>
    /// <param name="name">Its name.</param>
    /// <returns>The file's bytes; null when there is no such scenario.</returns>
    public static byte[]? Find(string name) => Files.Find(name);
}
