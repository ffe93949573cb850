using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Airspeeds;

public sealed class AirspeedConversionTests
{
    private const double Knot = 1852.0 / 3600;

    [Theory] // NASA RP-1046 (Gracey 1980) tables, as quoted in the aerocalc project's tests; tolerance: the printed digits
    [InlineData(55 * Knot, 0.145052 * 3386.389)]
    [InlineData(100 * Knot, 34.0493 * 47.880259)]
    [InlineData(299 / 3.6, 4288.5)]
    [InlineData(300 / 3.6, 32.385 * 133.322387)]
    [InlineData(244 * Knot, 9983.7)]
    [InlineData(300 * 0.44704, 3.38145 * 3386.389)]
    public void TryImpactPressure_CalibratedAirspeed_AsTabulated(double calibratedMps, double impactPressurePa)
    {
        Assert.True(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(calibratedMps), out var actual));
        Close.Relative(impactPressurePa, actual, 2e-5);
        Assert.True(AirspeedConversion.TryCalibrated(impactPressurePa, out var back));
        Close.Relative(calibratedMps, back.Mps, 1e-5);
    }

    [Fact] // same: qc/p = 0.52434 at Mach 0.8
    public void TryTrue_MachEightTenths_AsTabulated()
    {
        var air = StandardAirAt(4000);
        Assert.True(AirspeedConversion.TryTrue(0.52434 * air.PressurePa, air, out _, out var mach));
        Close.Relative(0.8, mach, 1e-5);
    }

    [Theory] // MathWorks' page on correctairspeed: true to calibrated at 1000 m with the speed of sound taken as 336.4 m/s
    [InlineData(25.7222, 24.5077)]
    [InlineData(10.2889, 9.8024)]
    [InlineData(3.0867, 2.9407)]
    public void TryCalibrated_OfTrueAirspeed_AsPublished(double trueMps, double calibratedMps)
    {
        var air = StandardAirAt(1000);
        Assert.True(AirspeedConversion.TryImpactPressure(new TrueAirspeed(trueMps / 336.4 * air.SpeedOfSoundMps), air, out var impactPressurePa));
        Assert.True(AirspeedConversion.TryCalibrated(impactPressurePa, out var calibrated));
        Close.Absolute(calibratedMps, calibrated.Mps, 1e-4);
    }

    [Fact] // same page: 25.7222 m/s calibrated is 25.7199 equivalent
    public void TryEquivalent_OfCalibrated_AsPublished()
    {
        Assert.True(AirspeedConversion.TryEquivalent(new CalibratedAirspeed(25.7222), StandardAirAt(1000), out var equivalent));
        Close.Absolute(25.7199, equivalent.Mps, 1e-4);
    }

    [Theory] // 250 kt calibrated in standard air, github.com/ignmiz/ATC_Console, test_atcmath.cpp
    [InlineData(1000, 261.8680)]
    [InlineData(2000, 274.5248)]
    [InlineData(3000, 288.0309)]
    [InlineData(5000, 317.8517)]
    [InlineData(6000, 334.3056)]
    public void TryTrue_OfCalibrated_AsPublished(double altitudeM, double trueKnots)
    {
        var air = StandardAirAt(altitudeM);
        Assert.True(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(250 * Knot), out var impactPressurePa));
        Assert.True(AirspeedConversion.TryTrue(impactPressurePa, air, out var airspeed, out _));
        Close.Relative(trueKnots * Knot, airspeed.Mps, 1e-5);
    }

    /// <summary>Worked out in python from RP-1046's formulas: calibrated km/h, qc Pa, altitude m, equivalent and true km/h; last digit.</summary>
    [Theory]
    [InlineData(50, 118.2012, 1000, 49.9987, 52.4861)]
    [InlineData(75, 266.0912, 3000, 74.9844, 87.0418)]
    [InlineData(100, 473.3958, 6000, 99.9049, 136.1390)]
    [InlineData(120, 682.1896, 1000, 119.9817, 125.9507)]
    [InlineData(150, 1067.3596, 3000, 149.8757, 173.9755)]
    [InlineData(180, 1539.5324, 6000, 179.4507, 244.5350)]
    [InlineData(200, 1903.0622, 1000, 199.9159, 209.8615)]
    [InlineData(250, 2984.6814, 3000, 249.4312, 289.5395)]
    [InlineData(300, 4317.6247, 6000, 297.5208, 405.4275)]
    public void Conversions_GlidersSpeeds_AsTheFormulas(double calibratedKmh, double impactPa, double altitudeM, double equivalentKmh, double trueKmh)
    {
        var air = StandardAirAt(altitudeM);
        Assert.True(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(calibratedKmh / 3.6), out var actualPa));
        Assert.True(AirspeedConversion.TryTrue(actualPa, air, out var trueAirspeed, out _));
        Close.Absolute(impactPa, actualPa, 1e-4);
        Close.Absolute(trueKmh, trueAirspeed.Mps * 3.6, 1e-4);
        Close.Absolute(equivalentKmh, AirspeedConversion.ToEquivalent(trueAirspeed, air).Mps * 3.6, 1e-4);
    }

    [Theory]
    [InlineData(-0.01)]
    [InlineData(double.NaN)]
    [InlineData(95_000)]
    public void TryCalibrated_OutOfRange_Refuses(double impactPressurePa)
    {
        Assert.False(AirspeedConversion.TryCalibrated(impactPressurePa, out _));
        Assert.False(AirspeedConversion.TryTrue(impactPressurePa, StandardAirAt(0), out _, out _));
    }

    [Fact]
    public void TryImpactPressure_SupersonicOrNegative_Refuses()
    {
        Assert.False(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(341), out _));
        Assert.False(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(-1), out _));
        Assert.False(AirspeedConversion.TryImpactPressure(new TrueAirspeed(300), StandardAirAt(12_000), out _));
        Assert.True(AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(400 * Knot), out var impactPressurePa));
        Assert.False(AirspeedConversion.TryTrue(impactPressurePa, StandardAirAt(9144), out _, out _)); // Mach 1.02
    }

    private static Air StandardAirAt(double altitudeM)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Assert.True(Air.TryStandard(state.PressurePa, 0, out var air, out _));
        return air;
    }
}
