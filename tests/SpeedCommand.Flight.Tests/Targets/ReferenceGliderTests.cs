using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests.Targets;

/// <summary>Closed forms of the drag polar, worked out independently with scipy; ten or more digits hold.</summary>
public sealed class ReferenceGliderTests
{
    private const double Digits = 2e-7;

    [Theory] // V = √(2W/(ρ S CL)) at CL = (K1 + √(K1² + 12 K2 CD0))/(2 K2); w = V CD/CL
    [InlineData(0, 19.950963, 0.6717739, 92.80586, 0.7591615)]
    [InlineData(1000, 20.943503, 0.7051940, 97.42286, 0.7969290)]
    [InlineData(2000, 22.010360, 0.7411164, 102.38555, 0.8375244)]
    [InlineData(3000, 23.159056, 0.7797944, 107.72894, 0.8812338)]
    [InlineData(4000, 24.398083, 0.8215141, 113.49252, 0.9283805)]
    [InlineData(6000, 27.186902, 0.9154171, 126.46526, 1.0344989)]
    public void MinSinkAndBestGlide_WithAltitude_ClosedForm(
        double altitudeM, double minSinkMps, double sinkMps, double glideKmh, double glideSinkMps)
    {
        var air = ReferenceGlider.StandardAirAt(altitudeM);
        var minSink = ReferenceGlider.Unlimited.MinSink(air, ReferenceGlider.Straight);
        var bestGlide = ReferenceGlider.Unlimited.BestGlide(air, ReferenceGlider.Straight, 0, 0);
        Close.Relative(minSinkMps, minSink.TrueAirspeedMps, Digits);
        Close.Relative(19.950963, minSink.EquivalentAirspeedMps, Digits);
        Close.Relative(1.22109024, minSink.LiftCoefficient, Digits);
        Close.Relative(sinkMps, minSink.SinkMps, Digits);
        Close.Relative(glideKmh / 3.6, bestGlide.Speed.TrueAirspeedMps, Digits);
        Close.Relative(25.779405, bestGlide.Speed.EquivalentAirspeedMps, Digits);
        Close.Relative(0.73135745, bestGlide.Speed.LiftCoefficient, Digits);
        Close.Relative(glideSinkMps, bestGlide.Speed.SinkMps, Digits);
        Close.Relative(33.957736, bestGlide.GlideRatio, Digits);
    }

    [Theory] // the root of 2A V⁴ - MC V - 2B = 0 and V_av = V MC/(MC + s), sea level
    [InlineData(0, 92.80586, 0.7591615, 0)]
    [InlineData(0.5, 106.04450, 0.9005960, 37.85692)]
    [InlineData(1, 117.39428, 1.0756945, 56.55663)]
    [InlineData(1.5, 127.27612, 1.2704435, 68.91106)]
    [InlineData(2, 136.03201, 1.4775288, 78.23487)]
    [InlineData(3, 151.08614, 1.9140546, 92.23716)]
    [InlineData(4, 163.82235, 2.3682631, 102.89923)]
    [InlineData(5, 174.93930, 2.8329012, 111.66954)]
    public void SpeedToFly_StillAir_RootOfTheQuartic(double climbMps, double kmh, double sinkMps, double averageKmh)
    {
        var target = ReferenceGlider.Unlimited.SpeedToFly(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, climbMps, 0);
        Close.Relative(kmh / 3.6, target.Speed.EquivalentAirspeedMps, Digits);
        Close.Relative(sinkMps, target.Speed.SinkMps, Digits);
        Close.Relative(averageKmh / 3.6, target.AverageSpeedMps, Digits);
        Assert.Equal(LimitedBy.None, target.LimitedBy);
    }

    [Fact] // sinking air counts like a better climb
    public void SpeedToFly_SinkOfOne_AsClimbOneHigher()
    {
        var target = ReferenceGlider.Unlimited.SpeedToFly(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, 2, -1);
        Close.Relative(151.08614 / 3.6, target.Speed.EquivalentAirspeedMps, Digits);
    }

    [Theory] // (V - Wh)/s greatest, by scipy; headwind m/s, km/h, ratio over the ground
    [InlineData(-10, 86.5987, 47.5865)]
    [InlineData(-5, 89.2213, 40.6737)]
    [InlineData(5, 97.8558, 27.5461)]
    [InlineData(10, 105.1295, 21.6082)]
    [InlineData(15, 115.5952, 16.3803)]
    public void BestGlide_InWind_BestOverTheGround(double headwindMps, double kmh, double ratio)
    {
        var glide = ReferenceGlider.Unlimited.BestGlide(ReferenceGlider.StandardAirAt(0), ReferenceGlider.Straight, headwindMps, 0);
        Close.Relative(kmh / 3.6, glide.Speed.TrueAirspeedMps, 1e-6);
        Close.Relative(ratio, glide.GlideRatio, 3e-6);
    }

    [Theory] // mass in kg; V ~ √m, w ~ √m at sea level
    [InlineData(300, 67.46640, 0.6310217)]
    [InlineData(400, 77.90349, 0.7286411)]
    [InlineData(450, 82.62913, 0.7728406)]
    [InlineData(500, 87.09875, 0.8146455)]
    public void MinSink_WithMass_ClosedForm(double massKg, double kmh, double sinkMps)
    {
        var target = ReferenceGlider.Unlimited.MinSink(ReferenceGlider.StandardAirAt(0), new Loading(massKg, 1, 0));
        Close.Relative(kmh / 3.6, target.EquivalentAirspeedMps, Digits);
        Close.Relative(sinkMps, target.SinkMps, Digits);
    }

    [Theory] // bank in degrees at sea level: V ~ √n, w ~ n^1.5 with n = 1/cos φ, from 71.82347 km/h and 0.6717739 m/s
    [InlineData(15, 73.07931, 0.7076320)]
    [InlineData(30, 77.17934, 0.8335414)]
    [InlineData(45, 85.41298, 1.1297845)]
    [InlineData(60, 101.57372, 1.9000637)]
    public void MinSink_WithBank_ClosedForm(double bankDegrees, double kmh, double sinkMps)
    {
        var load = 1 / Math.Cos(bankDegrees * Math.PI / 180);
        var target = ReferenceGlider.Unlimited.MinSink(ReferenceGlider.StandardAirAt(0), new Loading(340, load, 0));
        Close.Relative(kmh / 3.6, target.EquivalentAirspeedMps, Digits);
        Close.Relative(sinkMps, target.SinkMps, Digits);
    }

    [Theory] // equivalent km/h, altitude m, sink: A V³ + K1 V + B/V, times √(ρ0/ρ)
    [InlineData(100, 2000, 0.913212)]
    [InlineData(80, 1500, 0.737544)]
    [InlineData(150, 1000, 1.972491)]
    public void TrySink_AtSpeed_ClosedForm(double equivalentKmh, double altitudeM, double sinkMps)
    {
        var air = ReferenceGlider.StandardAirAt(altitudeM);
        var trueAirspeed = SpeedCommand.Flight.Airspeeds.AirspeedConversion.ToTrue(new(equivalentKmh / 3.6), air);
        Assert.True(ReferenceGlider.Unlimited.TrySink(trueAirspeed, air, ReferenceGlider.Straight, out var actual));
        Close.Relative(sinkMps, actual, 1e-6);
    }

    [Fact] // bank 40°, 85 km/h equivalent, sea level: A V³ + K1 n V + B n²/V
    public void TrySink_InACircle_ClosedForm()
    {
        var loading = new Loading(340, 1 / Math.Cos(40 * Math.PI / 180), 0);
        Assert.True(ReferenceGlider.Unlimited.TrySink(new(85 / 3.6), ReferenceGlider.StandardAirAt(0), loading, out var sinkMps));
        Close.Relative(1.003999, sinkMps, 1e-6);
    }
}
