namespace SpeedCommand.Displays.Tests;

/// <summary>
/// Compares a rendered page with the approved one beside the tests. The approved pages were read by a person; a change of
/// layout is approved by copying the page that the failure leaves in the test output's Received folder over the old one.
/// </summary>
internal static class ApprovedText
{
    public static void Matches(string name, string rendered)
    {
        var approvedPath = Path.Combine(AppContext.BaseDirectory, "Approved", name + ".txt");
        var approved = File.Exists(approvedPath) ? File.ReadAllText(approvedPath) : string.Empty;
        if (approved != rendered)
        {
            var received = Directory.CreateDirectory(Path.Combine(AppContext.BaseDirectory, "Received"));
            File.WriteAllText(Path.Combine(received.FullName, name + ".txt"), rendered);
        }

        Assert.Equal(approved, rendered);
    }
}
