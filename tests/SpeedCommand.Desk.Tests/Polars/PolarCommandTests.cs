using System.Globalization;
using System.Text.Json;

namespace SpeedCommand.Desk.Tests.Polars;

[Collection("console")]
public sealed class PolarCommandTests(ReferenceGlider glider) : IClassFixture<ReferenceGlider>
{
    // Sink at sea level A V³ + K1 V + B/V over equivalent airspeed, from the glider's numbers.
    private const double A = 2.3660415656e-5, K1 = -0.002, B = 10.449943213;

    /// <summary>ISA density at 1000 m over that at sea level (ISO 2533: 1.111643 and 1.225 kg/m³).</summary>
    private const double DensityRatio1000 = 1.111643 / 1.225;

    [Fact]
    public void Json_Targets_ClosedForms()
    {
        var answer = glider.Json("polar", "--altitude", "1000m");
        Close.Relative(20.943503, Number(answer, "minSink", "trueAirspeedMps"), 2e-7);
        Close.Relative(0.7051940, Number(answer, "minSink", "sinkMps"), 2e-7);
        Close.Relative(97.42286 / 3.6, Number(answer, "bestGlide", "trueAirspeedMps"), 2e-7);
        Close.Relative(33.957736, Number(answer, "bestGlide", "glideRatio"), 2e-7);
        answer = glider.Json("polar", "--climb", "2 m/s");
        Close.Relative(136.03201 / 3.6, Number(answer, "speedToFly", "equivalentAirspeedMps"), 2e-7);
        Close.Relative(78.23487 / 3.6, Number(answer, "speedToFly", "averageSpeedMps"), 2e-7);
    }

    [Fact]
    public void Json_Curve_ClosedFormAtEachSpeed()
    {
        var curve = glider.Json("polar", "--altitude", "1000m", "--headwind", "36km/h", "--air", "-1m/s").GetProperty("curve");
        Assert.InRange(curve.GetArrayLength(), 40, 100);
        foreach (var point in curve.EnumerateArray())
        {
            var v = point.GetProperty("equivalentAirspeedMps").GetDouble();
            var sink = ((A * v * v * v) + (K1 * v) + (B / v)) / Math.Sqrt(DensityRatio1000);
            var trueMps = v / Math.Sqrt(DensityRatio1000);
            Close.Relative(trueMps, point.GetProperty("trueAirspeedMps").GetDouble(), 1e-6);
            Close.Relative(sink, point.GetProperty("sinkMps").GetDouble(), 1e-5);
            Close.Relative(trueMps / sink, point.GetProperty("glideRatio").GetDouble(), 1e-5);
            Close.Relative((trueMps - 10) / (sink + 1), point.GetProperty("glideRatioOverGround").GetDouble(), 1e-5);
        }
    }

    [Theory] // closed forms, rounded for reading; 1 kt = 1852/3600 m/s
    [InlineData("metric", "minimum sink", "72", "75", "0.71")]
    [InlineData("metric", "best glide", "93", "97", "0.80")]
    [InlineData("aviation", "minimum sink", "39", "41", "1.37")]
    [InlineData("aviation", "best glide", "50", "53", "1.55")]
    public void Table_TargetRows_ClosedForms(string units, string name, string equivalent, string trueAirspeed, string sink)
    {
        var cells = Row(glider.Text("polar", "--altitude", "1000m", "--units", units), name);
        Assert.Equal([equivalent, trueAirspeed, sink], cells[1..4]);
    }

    [Fact]
    public void Table_SaysSpeedToFlyAndItsAverage()
    {
        var row = glider.Text("polar", "--climb", "2m/s").Split('\n').Single(line => line.StartsWith("speed to fly", StringComparison.Ordinal));
        Assert.EndsWith("average 78 km/h", row, StringComparison.Ordinal);
        Assert.Contains(" 136 ", row, StringComparison.Ordinal);
        Assert.Contains(" 1.48 ", row, StringComparison.Ordinal);
    }

    [Fact]
    public void Table_IsAligned()
    {
        var lines = glider.Text("polar", "--headwind", "10m/s").Split('\n');
        var head = Array.FindIndex(lines, line => line.Contains("indicated", StringComparison.Ordinal));
        var rows = lines[(head + 2)..].TakeWhile(line => line.Length > 0).ToList();
        Assert.True(rows.Count > 10);
        Assert.All(rows, row => Assert.Equal(lines[head].Length, row.Length));
    }

    [Fact] // the printed sinks are what the residuals are measured against: half of their last digit, 0.005 m/s, bounds them
    public void SinkTable_ResidualsWithinTheRounding()
    {
        var (status, output, _) = DeskConsole.RunToText("polar", "--glider", "tern-18.json");
        Assert.Equal(0, status);
        var rows = output.Split('\n').SkipWhile(line => !line.StartsWith("sink table", StringComparison.Ordinal)).Skip(3)
            .TakeWhile(line => line.StartsWith(' ')).Select(line => line.Split(' ', StringSplitOptions.RemoveEmptyEntries)).ToList();
        Assert.Equal(16, rows.Count);
        Assert.Equal(["76.0", "0.63"], rows[0][..2]);
        Assert.All(rows, row => Assert.InRange(double.Parse(row[2], CultureInfo.InvariantCulture), -0.00501, 0.00501));
    }

    [Fact]
    public void AnotherCulture_SameText()
    {
        string[] options = ["--altitude", "-500m", "--climb", "1.5m/s", "--air", "-0.5m/s"];
        Assert.Equal(glider.Text("polar", options), AnotherCulture.Run(() => glider.Text("polar", options)));
    }

    [Fact]
    public void GliderWithoutLimits_SaysWhyThereIsNoSpeedToFly()
    {
        var file = glider.PathOf("bare.json");
        File.WriteAllText(file, """
            { "name": "Bare", "referenceMass": "300 kg",
              "sinkTable": [ { "airspeed": "70 km/h", "sink": "0.7 m/s" }, { "airspeed": "100 km/h", "sink": "0.9 m/s" },
                             { "airspeed": "160 km/h", "sink": "2.1 m/s" } ] }
            """);
        var (status, output, _) = DeskConsole.RunToText("polar", "--glider", file, "--climb", "2m/s", "--plot", glider.PathOf("bare.png"));
        Assert.Equal(0, status);
        Assert.Contains("speed to fly  not shown: the glider file has no limits", output, StringComparison.Ordinal);
    }

    [Theory] // the Marram's limits end at 12 km; at 75 deg of bank it stalls at 66 km/h √(450/340/cos 75°) = 149 km/h
    [InlineData("the glider file's limits end below this altitude", "--altitude", "14000m")]
    [InlineData("the stall margin is above the limits", "--altitude", "11900m", "--bank", "75deg", "--mass", "450kg")]
    public void NoSpeedToFly_SaysWhy(string reason, params string[] options)
    {
        var picture = glider.PathOf("none.svg");
        var (status, output, _) = DeskConsole.RunToText(["polar", "--glider", "marram-15.json", .. options, "--plot", picture]);
        Assert.Equal(0, status);
        Assert.Contains("speed to fly  not shown: " + reason, output, StringComparison.Ordinal);
        Assert.DoesNotContain("speed to fly", File.ReadAllText(picture), StringComparison.Ordinal);
    }

    [Fact] // level turn: radius V²/(g tan φ), time 2πV/(g tan φ); 22.79485 m/s at 40° of bank, worked out independently: 63.145 m
    public void Bank_TellsTheCircle() => Assert.Contains(
        "circle of radius 63 m, 17 s", glider.Text("polar", "--bank", "40deg"), StringComparison.Ordinal);

    [Fact] // of two tables the one with less sink: +8 below their crossing between 90 and 110 km/h, 0 above it
    public void Flaps_RowsNameTheSettingThatSinksLeast()
    {
        var file = glider.PathOf("flapped.json");
        File.WriteAllText(file, """
            { "name": "Flapped", "referenceMass": "450 kg", "flaps": [
                { "setting": "+8", "sinkTable": [ { "airspeed": "70 km/h", "sink": "0.60 m/s" }, { "airspeed": "90 km/h", "sink": "0.62 m/s" }, { "airspeed": "110 km/h", "sink": "0.90 m/s" } ] },
                { "setting": "0", "sinkTable": [ { "airspeed": "80 km/h", "sink": "0.70 m/s" }, { "airspeed": "110 km/h", "sink": "0.72 m/s" }, { "airspeed": "160 km/h", "sink": "1.60 m/s" } ] } ] }
            """);
        var (status, output, _) = DeskConsole.RunToText("polar", "--glider", file);
        Assert.Equal(0, status);
        var flaps = output.Split('\n').Where(line => line.StartsWith("        ", StringComparison.Ordinal) && line.Contains("flaps", StringComparison.Ordinal))
            .Select(line => line.Split(' ', StringSplitOptions.RemoveEmptyEntries)).ToDictionary(cells => cells[0], cells => cells[^1]);
        Assert.Equal(("+8", "+8", "0", "0"), (flaps["70"], flaps["90"], flaps["110"], flaps["160"]));
    }

    [Fact]
    public void TableNotConvex_WarnsAndWorks()
    {
        var file = glider.PathOf("bent.json");
        File.WriteAllText(file, """
            { "name": "Bent", "referenceMass": "300 kg",
              "sinkTable": [ { "airspeed": "70 km/h", "sink": "0.70 m/s" }, { "airspeed": "90 km/h", "sink": "0.95 m/s" },
                             { "airspeed": "110 km/h", "sink": "1.00 m/s" }, { "airspeed": "160 km/h", "sink": "2.10 m/s" } ] }
            """);
        var (status, output, errors) = DeskConsole.RunToText("polar", "--glider", file);
        Assert.Equal(0, status);
        Assert.Contains("the table is not convex", output, StringComparison.Ordinal);
        Assert.Contains("bent.json:2: warning: sinkTable", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(2, "--plot: expected a file name ending in .png or .svg, found 'curve.bmp'", "--plot", "curve.bmp")]
    [InlineData(2, "--units: expected metric, aviation, british or american, found 'imperial'", "--units", "imperial")]
    [InlineData(2, "--mass: expected 50 kg to 450 kg, found '900 kg'", "--mass", "900 kg")]
    [InlineData(2, "--humidity: expected --oat beside it", "--humidity", "50 %")]
    [InlineData(74, "no/such/folder", "--plot", "no/such/folder/curve.png")]
    public void WrongUse_OneLineAndItsStatus(int expected, string message, params string[] options)
    {
        var (status, output, errors) = DeskConsole.RunToText(["polar", "--glider", glider.GliderFile, .. options]);
        Assert.Equal(expected, status);
        Assert.Equal("", output);
        Assert.StartsWith("speedcommand-desk: ", errors, StringComparison.Ordinal);
        Assert.Contains(message, errors, StringComparison.Ordinal);
        Assert.Single(errors.TrimEnd('\n').Split('\n'));
    }

    [Fact]
    public void BadGliderFile_EachFaultNamesKeyAndLine_Exit78()
    {
        var file = glider.PathOf("bad.json");
        File.WriteAllText(file, "{ \"name\": \"Bad\",\n  \"wingArea\": \"11 kg\",\n  \"referenceMass\": \"340 kg\", \"maxMass\": \"300 kg\" }");
        var (status, errors) = DeskConsole.Run("polar", "--glider", file);
        Assert.Equal(78, status);
        Assert.Contains($"speedcommand-desk: {file}:2: wingArea: ", errors, StringComparison.Ordinal);
        Assert.Contains($"speedcommand-desk: {file}:3: referenceMass: ", errors, StringComparison.Ordinal);
    }

    [Fact]
    public void GliderFileThatIsNotThere_Exit66()
    {
        var (status, errors) = DeskConsole.Run("polar", "--glider", "paper-plane.json");
        Assert.Equal(66, status);
        Assert.StartsWith("speedcommand-desk: paper-plane.json: ", errors, StringComparison.Ordinal);
    }

    [Fact]
    public void NoGlider_NamesThoseThatComeWithTheProgram()
    {
        var (status, errors) = DeskConsole.Run("polar");
        Assert.Equal(2, status);
        Assert.Contains("--glider: expected a glider file; these lie beside the program: marram-15.json, tern-18.json", errors, StringComparison.Ordinal);
    }

    private static string[] Row(string table, string name) => table.Split('\n')
        .Single(line => line.StartsWith(name, StringComparison.Ordinal))[name.Length..].Split(' ', StringSplitOptions.RemoveEmptyEntries);

    private static double Number(JsonElement answer, string target, string name) => answer.GetProperty(target).GetProperty(name).GetDouble();
}
