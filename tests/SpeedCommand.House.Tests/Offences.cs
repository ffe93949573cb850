namespace SpeedCommand.House.Tests;

/// <summary>A rule over many files fails with all its offenders, one a line.</summary>
internal static class Offences
{
    public static void None(IEnumerable<string> offenders)
    {
        var all = offenders.ToList();
        Assert.True(all.Count == 0, string.Join('\n', all));
    }
}
