using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

/// <summary>Controls as the pilot reads them, and where and how long on the panel.</summary>
public class ControlWordsTests
{
    private static readonly ControlValues Values = ControlValues.Standard with
    {
        ExpectedClimbMps = 1.5433,
        BallastKg = 62.46,
        BugsFraction = 0.125,
        QnhPa = 102_100,
        LastChanged = ControlId.ExpectedClimb,
        LastChangedUs = 10_000_000,
    };

    [Theory]
    [InlineData(ControlId.ExpectedClimb, "metric", "expected climb 1.5 m/s")]
    [InlineData(ControlId.ExpectedClimb, "aviation", "expected climb 3.0 kt")]
    [InlineData(ControlId.ExpectedClimb, "aviation,vertical,ft/min", "expected climb 304 ft/min")] // 1.5433 x 60 / 0.3048
    [InlineData(ControlId.Ballast, "metric", "ballast 62 kg")]
    [InlineData(ControlId.Bugs, "metric", "bugs 12.5 %")]
    [InlineData(ControlId.Phase, "metric", "phase auto")]
    [InlineData(ControlId.Qnh, "metric", "QNH 1021 hPa")]
    [InlineData(ControlId.Qnh, "american", "QNH 30.15 inHg")] // 102100 / 3386.389
    [InlineData(ControlId.Brightness, "metric", "brightness 100 %")]
    [InlineData(ControlId.Volume, "metric", "volume 50 %")]
    [InlineData(ControlId.Mute, "metric", "sound on")]
    public void Of_EveryControl_InThePilotsUnits(ControlId control, string units, string expected) =>
        Assert.Equal(expected, AnotherCulture.Run(() => ControlWords.Of(control, Values, NamedUnits.Of(units))));

    [Fact]
    public void Of_WhatRunsByItself_SaysSo()
    {
        var running = Values with { DumpKgPerS = 0.7, ForcedPhase = FlightPhase.Climbing, IsExpectedClimbAutomatic = true, ExpectedClimbSigmaMps = 0.6, IsMuted = true };
        string Of(ControlId control) => ControlWords.Of(control, running, DisplayUnits.Metric);
        Assert.Equal("ballast 62 kg, dumping 0.7 kg/s", Of(ControlId.Ballast));
        Assert.Equal("phase held: climbing", Of(ControlId.Phase));
        Assert.Equal("expected climb auto 1.5 m/s ±0.6", Of(ControlId.ExpectedClimb));
        Assert.Equal("sound off", Of(ControlId.Mute));
    }

    [Fact]
    public void ShortMoment_EveryControlAtItsMost_FitsTheSmallestDisplay()
    {
        var most = Values with
        {
            ExpectedClimbMps = 15,
            BallastKg = 600,
            DumpKgPerS = 10,
            BugsFraction = 0.999,
            QnhPa = 109_000,
            Volume = 1,
            ForcedPhase = FlightPhase.Climbing,
            IsMuted = true,
        };
        foreach (var control in Enum.GetValues<ControlId>())
        {
            foreach (var values in new[] { most, most with { IsExpectedClimbAutomatic = true, ExpectedClimbSigmaMps = 1.5, ForcedPhase = null } })
            {
                var picture = CockpitPicture.Blank(10_000_000, Faults.None) with { Controls = values with { LastChanged = control } };
                Assert.All(NamedUnits.Varied.Select(units => ControlWords.ShortMoment(picture, units)), text =>
                {
                    Assert.InRange(text.Length, 1, 16);
                    Assert.All(text, letter => Assert.InRange(letter, ' ', '}'));
                });
            }
        }
    }

    [Theory]
    [InlineData(10.0, "expected climb 1.5 m/s")]
    [InlineData(12.4, "expected climb 1.5 m/s")]
    [InlineData(12.5, "")]
    public void Panel_ShowsAChange_ForAMoment_BelowTheHeader(double timeS, string expected)
    {
        var rows = Rows(CockpitPicture.Blank((long)(timeS * 1e6), Faults.None) with { Controls = Values }, new PanelStyle(80, 24, PanelLook.Text, DisplayUnits.Metric));
        Assert.Equal(expected, rows[1].Trim());
    }

    [Fact]
    public void Panel_ShowsTheAltitudeOfTheAltimeter_OnceItIsSet()
    {
        var style = new PanelStyle(80, 24, PanelLook.Text, DisplayUnits.Metric);
        var picture = CockpitPicture.Blank(0, Faults.None) with { PressureAltitudeM = new Gauge(1000, double.NaN, 0), AltitudeM = new Gauge(1065, double.NaN, 0) };
        Assert.Contains(Rows(picture, style), row => row.Contains("pressure altitude  1000 m", StringComparison.Ordinal));
        var set = Rows(picture with { Controls = Values }, style);
        Assert.Contains(set, row => row.Contains("alt. 1021 hPa      1065 m", StringComparison.Ordinal));
        Assert.DoesNotContain(set, row => row.Contains("pressure altitude", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData(80, 24, 1)]
    [InlineData(60, 16, 1)]
    [InlineData(40, 10, 4)]
    public void Panel_SaysWhatItIsTold_AndShowsAPage(int width, int height, int noticeRow)
    {
        var style = new PanelStyle(width, height, PanelLook.Text, DisplayUnits.Metric);
        var picture = CockpitPicture.Blank(0, Faults.None);
        Assert.Equal("z: no such key", Rows(picture, style with { Notice = "z: no such key" })[noticeRow].Trim());
        Assert.Equal(["one", "two"], Rows(picture, style with { Page = ["one", "two"] }).Take(2).Select(row => row.Trim()));
    }

    private static string[] Rows(CockpitPicture picture, PanelStyle style) => TerminalPanel.Render(picture, style).Split('\n');
}
