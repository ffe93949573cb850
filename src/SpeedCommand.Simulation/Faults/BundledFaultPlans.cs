namespace SpeedCommand.Simulation.Faults;

/// <summary>The fault plans that come with the program: one fault each, at exact times.</summary>
public static class BundledFaultPlans
{
    private static readonly BundledFiles Files = new("fault-plans/");

    /// <summary>Their names, in alphabetical order.</summary>
    public static IReadOnlyList<string> Names => Files.Names;

    /// <summary>The file of a plan.</summary>
    /// <param name="name">Its name.</param>
    /// <returns>The file's bytes; null when there is no such plan.</returns>
    public static byte[]? Find(string name) => Files.Find(name);
}
