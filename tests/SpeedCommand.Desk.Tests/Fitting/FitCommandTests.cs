using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Tests.Fitting;

[Collection("console")]
public sealed class FitCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-desk-").FullName;
    private readonly string _log;

    public FitCommandTests()
    {
        _log = PathOf("calm.log");
        Assert.Equal(0, DeskConsole.Run("simulate", "calm-glide", "--seed", "3", "--out", _log).Status);
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private string PathOf(string name) => Path.Combine(_folder, name);

    [Theory]
    [InlineData("marram-15.json")]
    [InlineData("tern-18.json")]
    public void Out_IsTheSameGliderWithAnotherPolar(string glider)
    {
        var (fitted, picture) = (PathOf("fitted.json"), PathOf("fit.svg"));
        var (status, output, errors) = DeskConsole.RunToText("fit", _log, "--glider", glider, "--out", fitted, "--plot", picture);
        Assert.Equal((0, ""), (status, errors));
        Assert.Contains("hardly told by these flights", output, StringComparison.Ordinal);
        var before = GliderFile.Read(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "gliders", glider)), glider).Glider!;
        var result = GliderFile.Read(File.ReadAllBytes(fitted), fitted);
        Assert.Empty(result.Problems);
        var after = result.Glider!;
        Assert.IsType<DragPolar>(after.Polar);
        Assert.Equal((before.Name, before.MaxMassKg, before.WingAreaM2, before.Limits!.StallMps), (after.Name, after.MaxMassKg, after.WingAreaM2, after.Limits!.StallMps));
        // The log was flown with the Marram's own polar: 0.86 m/s at its 100 km/h indicated, whatever the file said before.
        var speed = 101 / 3.6;
        var truth = new DragPolar(11.2, 340, 0.0115, -0.002, 0.0215).SinkMps(speed);
        Assert.True(Math.Abs(after.Polar.SinkMps(speed) - truth) <= Math.Max(0.04, 0.6 * Math.Abs(before.Polar.SinkMps(speed) - truth)));
        Assert.Contains("// Fitted by speedcommand-desk fit to 15 glides of 1 flights (calm.log).", File.ReadAllText(fitted), StringComparison.Ordinal);
        Assert.StartsWith("<?xml", File.ReadAllText(picture), StringComparison.Ordinal);
    }

    [Fact]
    public void NothingToLearnFrom_SaysSo()
    {
        var log = PathOf("empty.log");
        File.WriteAllText(log, "#speedcommand-log 1\n#start 2026-06-14T10:00:00.000Z\n#glider marram-15.json\n0.000000 end\n");
        var (fitted, picture) = (PathOf("fitted.json"), PathOf("fit.svg"));
        File.WriteAllText(fitted, "older");
        var (status, output, errors) = DeskConsole.RunToText("fit", log, "--glider", "marram-15.json", "--out", fitted, "--plot", picture);
        Assert.Equal((65, $"speedcommand-desk: expected straight, steady glides to learn from, found none: '{fitted}' was not written\n"), (status, errors));
        Assert.Contains("The flights tell nothing: no glide could be used.", output, StringComparison.Ordinal);
        Assert.Equal(("older", false), (File.ReadAllText(fitted), File.Exists(picture)));
    }

    [Theory]
    [InlineData(66, "no-such.log", "no-such.log", "marram-15.json")]
    [InlineData(66, "no 'albatross.json'", "", "albatross.json")]
    public void WrongUse_OneLineAndItsStatus(int expected, string message, string log, string glider)
    {
        var (status, errors) = DeskConsole.Run("fit", log.Length > 0 ? log : _log, "--glider", glider);
        Assert.Equal(expected, status);
        Assert.Contains(message, Assert.Single(errors.TrimEnd().Split('\n')), StringComparison.Ordinal);
    }

    [Fact]
    public void Flaps_CannotBeFitted()
    {
        var glider = PathOf("flapped.json");
        File.WriteAllText(glider, """
            { "name": "Flapped", "wingArea": "11.2 m2", "referenceMass": "340 kg",
              "flaps": [ { "setting": "0", "dragPolar": { "cd0": 0.0115, "k1": -0.002, "k2": 0.0215 } } ] }
            """);
        var (status, errors) = DeskConsole.Run("fit", _log, "--glider", glider);
        Assert.Equal(65, status);
        Assert.Contains("flaps: expected one polar for all speeds", errors, StringComparison.Ordinal);
    }
}
