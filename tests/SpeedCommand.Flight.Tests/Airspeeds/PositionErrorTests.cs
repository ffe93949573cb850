using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.Tests.Airspeeds;

/// <summary>
/// Sea level, pitot right, static port wrong by dp: what the indicator reads and the altimeter shows. Worked out in python from
/// qc' = qc - dp and dH = -dp/(ρ g), the practice of NASA RP-1046 (from memory).
/// </summary>
public sealed class PositionErrorTests
{
    [Theory] // calibrated km/h, dp Pa, indicated km/h, altitude error m
    [InlineData(100, 10, 98.9399, -0.8324)]
    [InlineData(100, -10, 101.0489, 0.8324)]
    [InlineData(150, 15, 148.9462, -1.2486)]
    [InlineData(200, 20, 198.9532, -1.6648)]
    public void TryStaticError_WorkedExample_PressureAndAltitude(double calibratedKmh, double errorPa, double indicatedKmh, double altitudeErrorM)
    {
        var correction = new AirspeedCorrection([new(indicatedKmh / 3.6, calibratedKmh / 3.6)]);
        Assert.True(PositionError.TryStaticError(correction, new(indicatedKmh / 3.6), out var actualPa));
        Close.Absolute(errorPa, actualPa, 2e-3); // four decimals of km/h are worth 1e-3 Pa
        Assert.True(Altimeter.TryAltitude(101_325 + actualPa, 101_325, out var altitudeM));
        Close.Absolute(altitudeErrorM, altitudeM, 3e-4);
    }

    [Fact]
    public void TryCorrect_SensedPressures_TotalStaysAndCalibratedComesOut()
    {
        var correction = new AirspeedCorrection([new(20, 21), new(60, 59)]);
        var sensedPa = 500.0;
        Assert.True(AirspeedConversion.TryCalibrated(sensedPa, out var indicated));
        Assert.True(PositionError.TryCorrect(correction, 90_000, sensedPa, out var staticPa, out var impactPa));
        Assert.True(AirspeedConversion.TryCalibrated(impactPa, out var calibrated));
        Close.Relative(correction.ToCalibrated(new(indicated.Mps)).Mps, calibrated.Mps, 1e-12);
        Close.Relative(90_500, staticPa + impactPa, 1e-14);
    }

    [Fact]
    public void TryCorrect_NegativeImpactPressure_Refuses() =>
        Assert.False(PositionError.TryCorrect(AirspeedCorrection.None, 90_000, -1, out _, out _));
}
