using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;
using static SpeedCommand.Pipeline.Tests.IdealAir;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>The numbers of the picture against physics worked out here, with ideal sensors.</summary>
public sealed class PictureTests
{
    [Fact]
    public void BoardThatSendsAirspeed_IsAsGoodAsOneThatSendsPressure()
    {
        // NASA RP-1046 table: 100 kt calibrated is 34.0493 psf = 1630.28 Pa of impact pressure.
        var byPressure = new Cockpit();
        byPressure.Fly(5, _ => 90_000, _ => 34.0493 * 47.880259);
        var bySpeed = new Cockpit();
        for (var i = 0; i < 100; i++)
        {
            bySpeed.Fly(0.05, _ => 90_000, null);
            bySpeed.SendPitot(Cockpit.Number($"G,{100 * 1852 / 3600.0:F4},,IAS"));
        }

        bySpeed.Fly(0.05, _ => 90_000, null);
        Assert.Equal(100 * 1852 / 3600.0, byPressure.Last.IndicatedAirspeedMps.Value, 0.001);
        Assert.Equal(byPressure.Last.TrueAirspeedMps.Value, bySpeed.Last.TrueAirspeedMps.Value, 0.001);
    }

    [Fact]
    public void Circling_HoldsMinimumSinkAtTheLoad_Straight_HoldsSpeedToFly()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 2 });
        cockpit.Fly(20, _ => 90_000, _ => 400);
        Assert.Equal(FlightPhase.Gliding, cockpit.Last.Phase);
        Assert.Equal(cockpit.Last.SpeedToFlyIndicatedMps, cockpit.Last.HoldIndicatedMps);
        var straight = cockpit.Last.MinSinkIndicatedMps.Value;

        // A 40-degree bank has load factor 1/cos 40° = 1.3054; minimum-sink speed goes with its square root.
        cockpit.Fly(20, _ => 90_000, _ => 400, "A,40.0,D,BANK");
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Assert.Equal(cockpit.Last.MinSinkIndicatedMps, cockpit.Last.HoldIndicatedMps);
        Assert.Equal(Math.Sqrt(1.3054), cockpit.Last.MinSinkIndicatedMps.Value / straight, 0.002);

        cockpit.Fly(20, _ => 90_000, _ => 400, "G,1.00,,LOAD");
        Assert.Equal(FlightPhase.Gliding, cockpit.Last.Phase);
    }

    [Theory]
    [InlineData("G,1.50,,LOAD")]
    [InlineData("A,40.0,D,BANK")]
    public void UnderLoad_NoTargetLiesBelowTheStallOfThatLoad(string load)
    {
        // Stall speed goes with the square root of the load factor (textbook), here 66 km/h at 1 g with 5 per cent of margin.
        var loadFactor = load[0] == 'G' ? 1.5 : 1 / Math.Cos(40 * Math.PI / 180);
        var cockpit = new Cockpit();
        cockpit.Fly(5, t => 90_000 - 40 * t, _ => 400, load);
        cockpit.Fly(10, t => 90_000 - 40 * t, _ => 400, load);
        var floor = 66 / 3.6 * 1.05 * Math.Sqrt(loadFactor) - 0.05;
        Assert.All(cockpit.Pictures.Skip(50), picture => Assert.InRange(picture.HoldIndicatedMps.Value, floor, 60));
        Assert.All(cockpit.Pictures.Skip(50), picture => Assert.InRange(picture.SpeedToFlyIndicatedMps.Value, floor, 60));
    }

    [Fact]
    public void ThermalWithoutLoadSensor_HoldsTheSpeedOfAUsualTurn()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => 90_000, _ => 300);
        var straight = cockpit.Last.MinSinkIndicatedMps.Value;
        cockpit.Fly(30, t => 90_000 - 30 * t, _ => 300);
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Assert.Equal(Math.Sqrt(1 / Math.Cos(40 * Math.PI / 180)), cockpit.Last.HoldIndicatedMps.Value / straight, 0.005);
    }

    [Fact]
    public void SlowerThanThePolarBegins_TheCallToSpeedUpStays_AndTheReasonIsNamed()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => 90_000, _ => 150);
        Assert.False(cockpit.Last.NettoMps.IsKnown);
        Assert.True(cockpit.Last.HoldIndicatedMps.Value > cockpit.Last.IndicatedAirspeedMps.Value);
        Assert.Equal(Faults.OutsidePolar | Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void PhaseThePilotInsistsOn_Stays()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ForcedPhase = FlightPhase.Climbing });
        cockpit.Fly(20, _ => 90_000, _ => 600, "G,1.00,,LOAD");
        Assert.All(cockpit.Pictures, picture => Assert.Equal(FlightPhase.Climbing, picture.Phase));
        Assert.Equal(cockpit.Last.MinSinkIndicatedMps, cockpit.Last.HoldIndicatedMps);
    }

    [Fact]
    public void ShortPull_IsNoThermal()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(10, _ => 90_000, _ => 500, "G,1.00,,LOAD");
        cockpit.Fly(3, _ => 90_000, _ => 500, "G,1.60,,LOAD");
        cockpit.Fly(5, _ => 90_000, _ => 500, "G,1.00,,LOAD");
        Assert.All(cockpit.Pictures, picture => Assert.Equal(FlightPhase.Gliding, picture.Phase));
    }

    [Fact]
    public void GliderWithoutLimits_ShowsNoSpeedToFly_AndSaysWhy()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithoutLimits));
        cockpit.Fly(10, _ => 90_000, _ => 500);
        Assert.False(cockpit.Last.SpeedToFlyIndicatedMps.IsKnown || cockpit.Last.HoldIndicatedMps.IsKnown);
        Assert.True(cockpit.Last.MinSinkIndicatedMps.IsKnown);
        Assert.Equal(Faults.NoLimits | Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void StrongSinkAndHighSetting_SpeedToFlyStopsAtTheRoughAirLimit()
    {
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { ExpectedClimbMps = 8 });
        cockpit.Fly(10, _ => 90_000, _ => 800);
        Assert.Equal(LimitedBy.RoughAir, cockpit.Last.LimitedBy);
        Assert.Equal(180 / 3.6, cockpit.Last.SpeedToFlyIndicatedMps.Value, 0.01);
    }

    [Fact]
    public void HeightInHand_AgreesWithTheClosedForm()
    {
        // Minimum sink from 3000 m to 300 m in the standard atmosphere takes 3709.03 s (closed form of the integral of
        // sqrt(ρ/ρ0)/w0 over the troposphere); best glide covers (L/D)max · 2700 m = 91 686 m.
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithLimits) { SafetyHeightM = 300 });
        cockpit.Fly(5, _ => StandardPa(3000), _ => 500);
        Assert.Equal(3709.03, cockpit.Last.EnduranceS.Value, 3709 * 0.005);
        Assert.Equal(91_686, cockpit.Last.RangeM.Value, 91_686 * 0.005);
    }

    [Fact]
    public void StaticPortThatErrs_IsPutRightInAirspeedAndAltitude()
    {
        // At 103 km/h calibrated the indicator reads 100 km/h: sensed impact pressure is that of 100 km/h, 473.396 Pa, and the
        // static port reads as much too high as the impact pressure is too low (pitot taken as right, NASA RP-1046).
        const double SensedImpactPa = 473.396;
        var trueImpactPa = 101_325 * (Math.Pow(1 + 0.2 * Math.Pow(103 / 3.6 / 340.294, 2), 3.5) - 1);
        var errorPa = trueImpactPa - SensedImpactPa;
        var cockpit = new Cockpit(new FlightSettings(TestGliders.WithPositionError));
        cockpit.Fly(5, _ => 101_325 + errorPa, _ => SensedImpactPa);
        Assert.Equal(100 / 3.6, cockpit.Last.IndicatedAirspeedMps.Value, 0.001);
        Assert.Equal(103 / 3.6, cockpit.Last.TrueAirspeedMps.Value, 0.001);
        Assert.Equal(0, cockpit.Last.PressureAltitudeM.Value, 0.01);
    }

    [Fact]
    public void AtRest_SensorNoiseAboutZeroGivesNoAirspeed_AndNoFault()
    {
        var cockpit = new Cockpit();
        cockpit.Fly(5, _ => 101_325, t => -0.5);
        Assert.False(cockpit.Last.IndicatedAirspeedMps.IsKnown);
        Assert.Equal(Faults.TemperatureSilent, cockpit.Last.Faults);
    }

    [Fact]
    public void StandardAtmosphereOfTheTest_IsThePublishedOne()
    {
        // ISO 2533:1975: 1000 m is 898.746 hPa and 1.11164 kg/m³. This test's own formulas must be right for it to judge.
        Assert.Equal(89_874.6, StandardPa(1000), 0.1);
        Assert.Equal(1.11164, StandardDensity(1000), 1e-5);
        Assert.True(StandardAtmosphere.TryAt(1000, out var state));
        Assert.Equal(StandardPa(1000), state.PressurePa, 0.1);
    }
}
