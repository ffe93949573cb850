using CsCheck;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Tests.Polars;

/// <summary>What makes a line a tangent, whatever the solver did: it meets the curve at the target and the curve lies below it everywhere else.</summary>
public sealed class MacCreadyTangentTests
{
    [Fact]
    public void SpeedToFly_TouchesAndStaysAbove() => SinkCurves.Any.Sample(curve =>
        Touches(curve, MacCreadyTangent.OfSpeedToFly(curve), curve.Answer.SpeedToFly.Speed, curve.Conditions.AirMps - curve.Conditions.ClimbMps));

    [Fact]
    public void BestGlide_TouchesAndStaysAbove() => SinkCurves.Any.Sample(curve =>
        Touches(curve, MacCreadyTangent.OfBestGlide(curve), curve.Answer.BestGlide.Speed, curve.Conditions.AirMps));

    [Fact] // similar triangles: the classic tangent cuts the line of no sink at the average speed V MC/(MC + s)
    public void SpeedToFly_StillAir_CutsNoSinkAtTheAverageSpeed() => SinkCurves.Any.Sample(curve =>
    {
        var still = new SinkCurve(curve.Conditions with { AirMps = 0, ClimbMps = curve.Conditions.ClimbMps + 0.1 });
        var tangent = MacCreadyTangent.OfSpeedToFly(still)!;
        Assert.Equal(0, tangent.SinkAt(still.Answer.SpeedToFly.AverageSpeedMps), 9);
    });

    private static void Touches(SinkCurve curve, MacCreadyTangent? tangent, in TargetSpeed target, double originSinkMps)
    {
        if (tangent is null)
        {
            // Only where the air carries the glider there is none.
            Assert.True(target.SinkMps <= originSinkMps);
            return;
        }

        Close.Relative(target.SinkMps, tangent.SinkAt(target.TrueAirspeedMps), 1e-9);
        foreach (var point in curve.Every(0.25).Where(point => IsAllowed(curve, point) && point.TrueMps > tangent.OriginTrueMps))
        {
            Assert.True(point.SinkMps >= tangent.SinkAt(point.TrueMps) - 1e-9, FormattableString.Invariant($"{point}"));
        }
    }

    private static bool IsAllowed(SinkCurve curve, in SinkCurvePoint point) =>
        point.IndicatedMps >= curve.Limits.StallMarginMps && point.IndicatedMps <= curve.Limits.FastestMps;
}
