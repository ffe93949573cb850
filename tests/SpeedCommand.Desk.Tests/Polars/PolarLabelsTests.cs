using CsCheck;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Tests.Polars;

public sealed class PolarLabelsTests
{
    [Fact]
    public void AnyConditions_EveryLabelHasAPlaceOfItsOwn() => Gen.Select(SinkCurves.Any, Gen.Bool).Sample((curve, isMetric) =>
    {
        var places = new PolarPicture(curve, isMetric ? DisplayUnits.Metric : DisplayUnits.Aviation).Labels.Places;
        Assert.True(places.Count >= 6, "three limits and three targets");
        for (var i = 0; i < places.Count; i++)
        {
            Assert.True(places[i] is not null, $"label {i}: {curve.Conditions}");
            Assert.DoesNotContain(places.Take(i), other => other!.Value.IntersectsWith(places[i]!.Value));
        }
    }, iter: 300);
}
