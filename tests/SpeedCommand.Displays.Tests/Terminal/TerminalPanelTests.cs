using CsCheck;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Terminal;

public class TerminalPanelTests
{
    private static readonly Gen<PanelStyle> AnyStyle =
        from width in Gen.Int[1, 140]
        from height in Gen.Int[1, 55]
        from units in Gen.Int[0, NamedUnits.Varied.Count - 1]
        select new PanelStyle(width, height, PanelLook.Text, NamedUnits.Varied[units]);

    [Fact]
    public void Render_AnyPictureAndSize_FillsThePageExactlyAndNothingElse() =>
        Gen.Select(RandomPictures.Any, AnyStyle).Sample((picture, style) =>
        {
            var bare = TerminalPanel.Render(picture, style).TrimEnd('\n').PadRight(1);
            Assert.Equal(style.Height, TerminalPanel.Render(picture, style).Count(c => c == '\n'));
            Assert.All(bare.Split('\n'), line => Assert.True(line.Length <= style.Width));

            foreach (var look in new[] { PanelLook.Colour, PanelLook.Monochrome })
            {
                var terminal = new TerminalModel(style.Width, style.Height);
                terminal.Send(TerminalPanel.Render(picture, style with { Look = look }));
                Assert.Equal("0", terminal.Rendition);
                Assert.DoesNotContain(terminal.Page(), line => line.Contains('\0'));
                Assert.Equal(bare.Trim(), string.Join('\n', terminal.Page().Select(line => line.TrimEnd())).Trim());
            }
        }, iter: 2000);

    [Fact]
    public void Render_NothingKnown_ShowsNoNumber()
    {
        // Only the clock and the count of the faults that found no room are numbers; blocks would be digits too.
        var lines = Lines(Pictures.Nothing, 80, 24);

        var digits = string.Concat(lines[1..23]).Replace("30 s average", "").Where(char.IsAsciiDigit);
        Assert.Empty(digits);
        Assert.Single(lines, line => line.Contains('█'));
        Assert.Matches("[+][0-9]+ more$", lines[23].TrimEnd());
    }

    // The same picture with each gauge blanked in turn: its number must be gone from the page.
    [Fact]
    public void Render_OneBlankGauge_ShowsOneMoreBlank()
    {
        var full = Pictures.GlidingTooSlow;
        CockpitPicture[] blanked =
        [
            full with { ClimbMps = Gauge.Blank },
            full with { NettoMps = Gauge.Blank },
            full with { RelativeNettoMps = Gauge.Blank },
            full with { MinSinkIndicatedMps = Gauge.Blank },
            full with { BestGlideIndicatedMps = Gauge.Blank },
            full with { SpeedToFlyIndicatedMps = Gauge.Blank },
            full with { PressureAltitudeM = Gauge.Blank },
            full with { DensityAltitudeM = Gauge.Blank },
            full with { TemperatureK = Gauge.Blank },
            full with { EnduranceS = Gauge.Blank },
            full with { RangeM = Gauge.Blank },
        ];

        Assert.Equal(0, Blanks(full));
        Assert.All(blanked, picture => Assert.Equal(1, Blanks(picture)));
        var climbing = Pictures.ClimbingTooFast;
        Assert.Equal(0, Blanks(climbing));
        Assert.Equal(1, Blanks(climbing with { AverageClimbMps = Gauge.Blank }));
        Assert.Equal(1, Blanks(climbing with { ThermalAverageMps = Gauge.Blank }));

        static int Blanks(CockpitPicture picture) => string.Join('\n', Lines(picture, 80, 24)).Split(" -- ").Length - 1;
    }

    [Fact]
    public void Render_ClimbingOrGliding_DifferWithoutColour()
    {
        var climbing = Lines(Pictures.ClimbingTooFast, 80, 24);
        var gliding = Lines(Pictures.ClimbingTooFast with { Phase = FlightPhase.Gliding }, 80, 24);

        Assert.Contains("CLIMBING", climbing[0]);
        Assert.Contains("GLIDING", gliding[0]);
        Assert.True(climbing.Count(line => line.StartsWith(" ^", StringComparison.Ordinal)) >= 7);
        Assert.DoesNotContain(gliding, line => line.Contains('^'));
    }

    [Fact]
    public void Render_TooSlowOrTooFast_LeansToOppositeSidesOfThePost()
    {
        var faster = Lines(Pictures.GlidingTooSlow, 80, 24).Where(line => line.Contains('/') && line.Contains('|')).ToList();
        var slower = Lines(Pictures.ClimbingTooFast, 80, 24).Where(line => line.Contains('\\')).ToList();

        Assert.Equal((3, 3), (faster.Count, slower.Count));
        Assert.All(faster, line => Assert.True(line.IndexOf('/') > line.IndexOf('|')));
        Assert.All(slower, line => Assert.True(line.LastIndexOf('\\') < line.IndexOf('|')));
        // Leaning forward: each row's strokes stand further right the higher they are.
        Assert.True(faster[0].IndexOf('/') > faster[1].IndexOf('/') && faster[1].IndexOf('/') > faster[2].IndexOf('/'));
        Assert.True(slower[0].IndexOf('\\') < slower[1].IndexOf('\\') && slower[1].IndexOf('\\') < slower[2].IndexOf('\\'));
    }

    [Fact]
    public void Render_FurtherOff_LeansMoreUntilTheArrowHeadSaysThereIsMore()
    {
        var strokes = new[] { 5, 12, 20, 30, 36 }.Select(off => Strokes(off, '/')).ToList();

        Assert.Equal(strokes.Order().Distinct(), strokes);
        Assert.Equal(0, Strokes(36, '>'));
        Assert.Equal(2 * 3, Strokes(60, '>'));

        static int Strokes(double offKmh, char stroke) =>
            Lines(Pictures.GlidingTooSlow with { IndicatedAirspeedMps = new Gauge((120 - offKmh) / 3.6, 0.1, 0) }, 80, 24)
                .Where(line => line.Contains('|')).Sum(line => line.Count(c => c == stroke));
    }

    [Fact]
    public void Render_EveryLimit_IsSaidBesideTheSpeedToFlyAndOnlyThere()
    {
        var reasons = Enum.GetValues<LimitedBy>().Select(limit => Lines(Pictures.GlidingTooSlow with { LimitedBy = limit }, 60, 16)[5]);

        Assert.Equal(5, reasons.Select(line => line.Replace("█", "").Trim()).Distinct().Count());
        Assert.Equal(Lines(Pictures.ClimbingTooFast, 80, 24), Lines(Pictures.ClimbingTooFast with { LimitedBy = LimitedBy.Stall }, 80, 24));
    }

    [Fact]
    public void Render_Looks_UseColourOnlyWhenAsked()
    {
        var style = new PanelStyle(80, 24, PanelLook.Colour, DisplayUnits.Metric);
        var colour = new TerminalModel(80, 24);
        var monochrome = new TerminalModel(80, 24);

        colour.Send(TerminalPanel.Render(Pictures.NoAirspeed, style));
        monochrome.Send(TerminalPanel.Render(Pictures.NoAirspeed, style with { Look = PanelLook.Monochrome }));

        // ECMA-48 8.3.117: 30-37 and 40-47 are colours; 0, 1, 2 and 7 are normal, bold, faint and reverse.
        Assert.Contains(colour.Renditions, rendition => rendition.Contains("41"));
        Assert.All(monochrome.Renditions, rendition => Assert.True(rendition is "0" or "0;1" or "0;2" or "0;7"));
    }

    [Fact]
    public void Render_AnyFullSize_KeepsTheDigitsClearOfTheBandAndOfTheReasons()
    {
        for (var width = PanelStyle.FullWidth; width <= 140; width += 4)
        {
            for (var height = PanelStyle.FullHeight; height <= 55; height++)
            {
                var lines = Lines(Pictures.GlidingTooSlow, width, height);
                Assert.Equal("", lines[1]);
                // Every part is there once, whole, in the order of a glance.
                int[] rows = [Row(lines, "km/h to hold"), Row(lines, "flying 108"), Row(lines, "//"), Row(lines, "speed up 12 km/h"),
                    Row(lines, "> speed to fly"), Row(lines, "distance in hand"), Row(lines, "no faults")];
                Assert.Equal(rows.Order().Distinct(), rows);
                Assert.True(rows[0] > 1 && rows[^1] == height - 1);
            }
        }

        static int Row(string[] lines, string words) => Array.FindIndex(lines, line => line.Contains(words));
    }

    [Fact]
    public void Render_DoubtfulSpeed_IsFaintAndMarked()
    {
        var sure = new TerminalModel(80, 24);
        var doubtful = new TerminalModel(80, 24);
        var style = new PanelStyle(80, 24, PanelLook.Colour, DisplayUnits.Metric);

        sure.Send(TerminalPanel.Render(Pictures.GlidingTooSlow, style));
        doubtful.Send(TerminalPanel.Render(Pictures.Doubtful, style));

        // Bold cyan is the bar's colour for "speed up".
        Assert.Contains("0;1;36", sure.Renditions);
        Assert.DoesNotContain("0;1;36", doubtful.Renditions);
        Assert.Equal(4, string.Concat(doubtful.Page()).Count(c => c == '~'));
        Assert.Contains("roughly, ±8", string.Concat(doubtful.Page()));
        Assert.DoesNotContain('~', string.Concat(sure.Page()));
        // A mark before a sign is read as two marks.
        Assert.Contains("-2.0~m/s", string.Concat(doubtful.Page()));
        Assert.DoesNotMatch("~ ?[-+0-9]", string.Concat(doubtful.Page()) + TerminalPanel.Plain(Pictures.Doubtful, DisplayUnits.Metric));
    }

    [Fact]
    public void Render_CultureWithDecimalComma_IsUnchanged()
    {
        foreach (var picture in Pictures.Names.Select(Pictures.Named))
        {
            var style = new PanelStyle(80, 24, PanelLook.Colour, DisplayUnits.Metric);
            Assert.Equal(TerminalPanel.Render(picture, style), AnotherCulture.Run(() => TerminalPanel.Render(picture, style)));
            Assert.Equal(TerminalPanel.Plain(picture, style.Units),
                AnotherCulture.Run(() => TerminalPanel.Plain(picture, style.Units)));
        }
    }

    [Fact]
    public void Plain_AnyPicture_IsOneLine() => RandomPictures.Any.Sample(picture =>
    {
        foreach (var units in NamedUnits.Varied)
        {
            Assert.DoesNotContain(TerminalPanel.Plain(picture, units), char.IsControl);
        }
    });

    private static string[] Lines(CockpitPicture picture, int width, int height) =>
        TerminalPanel.Render(picture, new PanelStyle(width, height, PanelLook.Text, DisplayUnits.Metric)).Split('\n');
}
