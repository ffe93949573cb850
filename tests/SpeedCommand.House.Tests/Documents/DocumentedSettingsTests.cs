using System.Text;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.House.Tests.Documents;

/// <summary>
/// The settings that the program asks for are the rows of the tables in docs/settings.md whose first column is headed
/// "setting". The names that a port and a kernel sensor are given stand there as NAME and SENSOR.
/// </summary>
public class DocumentedSettingsTests
{
    private static readonly Dictionary<string, string> Nothing = [];

    /// <summary>One of each list, so that what belongs to its elements is asked for too.</summary>
    private const string OnePort = """
        { "glider": "marram-15.json", "ports": [ { "name": "NAME", "device": "/dev/null" } ], "iio": [ { "name": "SENSOR", "device": "bmp280" } ] }
        """;

    [Fact]
    public void Settings_AreTheOnesInTheDocument()
    {
        var documented = MarkdownDocument.Read("docs/settings.md").Rows
            .Where(row => row.Head.Contains("setting", StringComparison.OrdinalIgnoreCase))
            .SelectMany(row => MarkdownDocument.Code(row.Cells[0])).ToHashSet();
        var asked = AskedFor().ToHashSet();
        Offences.None(asked.Except(documented).Select(path => $"{path} is not in docs/settings.md"));
        Offences.None(documented.Except(asked).Select(path => $"{path} in docs/settings.md is no setting"));
    }

    private static IEnumerable<string> AskedFor()
    {
        Assert.True(JsonPlaces.TryParse(Encoding.UTF8.GetBytes(OnePort), "settings.json", out var top, out _));
        var source = new SettingsSource(top, "settings.json", Nothing, Nothing);
        Assert.NotNull(CockpitSettingsReader.Read(source, null, null, needsPorts: true));
        Assert.Empty(source.Problems);
        return source.AskedPaths.Where(path => path is not ("ports" or "iio"));
    }
}
