using CsCheck;
using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Flight.Tests.Polars;

public sealed class SinkTablePolarTests
{
    private static readonly Gen<double> Digits = Gen.OneOf(Gen.Const(0.001), Gen.Const(0.01), Gen.Const(0.05));

    /// <summary>Handbook tables: a drag polar read off every 5 to 20 km/h and rounded to a centimetre per second, or finer or coarser.</summary>
    private static readonly Gen<(DragPolar True, SinkPoint[] Points)> Tables = Gen.Select(
        Gen.Double[0.008, 0.014], Gen.Double[-0.004, 0.002], Gen.Double[0.012, 0.03], Gen.Int[6, 20], Digits,
        (cd0, k1, k2, count, digit) =>
        {
            var polar = new DragPolar(11, 350, cd0, k1, k2);
            var points = Enumerable.Range(0, count).Select(i =>
            {
                var v = 21 + 45.0 * i / (count - 1);
                return new SinkPoint(v, Math.Round(polar.SinkMps(v) / digit) * digit, digit / 2);
            });
            return (polar, points.ToArray());
        });

    [Fact]
    public void Curve_RoundedTable_WithinRoundingConvexAndSmooth() => Tables.Sample(table =>
    {
        var curve = new SinkTablePolar(table.Points, 350, 11);
        Assert.True(curve.IsConvex);
        for (var i = 0; i < table.Points.Length; i++)
        {
            var point = table.Points[i];
            Close.Absolute(point.SinkMps, curve.SinkMps(point.AirspeedMps), point.RoundingMps + 1e-12);
            Close.Absolute(point.SinkMps + curve.ResidualsMps[i], curve.SinkMps(point.AirspeedMps), 1e-12);
        }

        const double Step = 45.0 / 2000;
        for (var i = 1; i < 2000; i++)
        {
            var (v, before) = (21 + i * Step, 21 + (i - 1) * Step);
            Assert.True(curve.SlopeAt(v) > curve.SlopeAt(before), $"the slope falls at {v}");
            // The trapezium rule holds only where the slope does not jump; a kink of 1 % of the slope would show.
            Close.Absolute(curve.SinkMps(v) - curve.SinkMps(before), (curve.SlopeAt(v) + curve.SlopeAt(before)) / 2 * Step, 1e-5);
        }
    }, iter: 300);

    [Fact]
    public void Curve_FineTable_CloseToTheTruth() => Tables.Where(table => table.Points.Length >= 8 && IsFine(table)).Sample(table =>
    {
        var curve = new SinkTablePolar(table.Points, 350, 11);
        for (var m = 0.0; m < 4; m += 0.1)
        {
            var (expected, actual) = (table.True.BestRatioAirspeedMps(m, 0, 21, 66), curve.BestRatioAirspeedMps(m, 0, 21, 66));
            Close.Relative(expected, actual, 0.015); // a thousandth of sink moves the tangent by 0.5 % at most points
        }
    }, iter: 100);

    [Fact]
    public void Optima_AnyTable_BeatEveryPointOfAGrid() =>
        Gen.Select(Gen.Double[0.5, 3].Array[4, 12], Gen.Double[0, 5], Gen.Double[-10, 15]).Sample((sinks, added, wind) =>
        {
            var points = sinks.Select((sink, i) => new SinkPoint(20 + 4 * i, sink, 0)).ToArray();
            var curve = new SinkTablePolar(points, 350);
            var (low, high) = (21.0, points[^1].AirspeedMps - 0.5);
            var grid = Enumerable.Range(0, 3001).Select(i => low + (high - low) * i / 3000).ToArray();
            var minSink = curve.MinSinkAirspeedMps(low, high);
            Assert.InRange(minSink, low, high);
            var least = grid.Min(curve.SinkMps);
            Assert.InRange(curve.SinkMps(minSink), least - 1e-3, least + 1e-12);
            var best = curve.BestRatioAirspeedMps(added, wind, low, high);
            Assert.InRange(best, low, high);
            Assert.True(Ratio(best) <= grid.Min(Ratio) + 1e-12);

            double Ratio(double v) => (added + curve.SinkMps(v)) / (v - wind);
        });

    [Fact]
    public void Curve_TableWithABump_PassesThroughEveryPoint()
    {
        SinkPoint[] points = [new(20, 0.7, 0.005), new(25, 0.9, 0.005), new(30, 0.8, 0.005), new(35, 1.2, 0.005)];
        var curve = new SinkTablePolar(points, 350);
        Assert.False(curve.IsConvex);
        Assert.All(points, point => Close.Absolute(point.SinkMps, curve.SinkMps(point.AirspeedMps), 1e-12));
        Assert.All(curve.ResidualsMps, residual => Assert.Equal(0, residual));
    }

    [Theory]
    [InlineData(19.99)]
    [InlineData(40.01)]
    [InlineData(double.NaN)]
    public void Curve_BeyondTheTable_NotANumber(double v)
    {
        var curve = new SinkTablePolar([new(20, 0.7, 0), new(30, 0.8, 0), new(40, 1.4, 0)], 350);
        Assert.True(double.IsNaN(curve.SinkMps(v)));
        Assert.True(double.IsNaN(curve.SlopeAt(v)));
        Assert.True(double.IsNaN(curve.CurvatureAt(v)));
    }

    [Fact]
    public void New_BadTable_Throws()
    {
        Assert.Throws<ArgumentException>(() => new SinkTablePolar([new(20, 0.7, 0), new(30, 0.8, 0)], 350));
        Assert.Throws<ArgumentException>(() => new SinkTablePolar([new(20, 0.7, 0), new(20, 0.8, 0), new(30, 1, 0)], 350));
        Assert.Throws<ArgumentException>(() => new SinkTablePolar([new(20, 0.7, 0), new(25, -0.8, 0), new(30, 1, 0)], 350));
    }

    [Fact]
    public void WithAddedDrag_TableAndDragPolar_AgreeAtThePoints()
    {
        var polar = new DragPolar(11, 350, 0.01, -0.002, 0.02);
        var points = Enumerable.Range(0, 12).Select(i => 22 + 3.0 * i).Select(v => new SinkPoint(v, polar.SinkMps(v), 0)).ToArray();
        var (table, expected) = (new SinkTablePolar(points, 350, 11).WithAddedDrag(0.002), polar.WithAddedDrag(0.002));
        Assert.All(points, point => Close.Relative(expected.SinkMps(point.AirspeedMps), table.SinkMps(point.AirspeedMps), 1e-12));
        Assert.All(points, point => Assert.True(table.SinkMps(point.AirspeedMps) > polar.SinkMps(point.AirspeedMps)));
        Assert.Throws<InvalidOperationException>(() => new SinkTablePolar(points, 350).WithAddedDrag(0.002));
    }

    [Fact]
    public void DragPolarFit_ExactPoints_ReturnsTheCoefficients() => Tables.Sample(table =>
    {
        var points = table.Points.Select(point => point with { SinkMps = table.True.SinkMps(point.AirspeedMps) }).ToArray();
        var fit = DragPolarFit.Of(points, 350, 11)!;
        Close.Relative(table.True.Cd0, fit.Polar.Cd0, 1e-8);
        Close.Absolute(table.True.K1, fit.Polar.K1, 1e-9);
        Close.Relative(table.True.K2, fit.Polar.K2, 1e-8);
        Close.Relative(points[0].AirspeedMps, fit.Polar.MinAirspeedMps, 1e-12);
        Assert.All(fit.ResidualsMps, residual => Close.Absolute(0, residual, 1e-10));
    });

    [Fact]
    public void DragPolarFit_RoundedPoints_ResidualsOfTheSizeOfTheRounding() => Tables.Where(IsFine).Sample(table =>
    {
        var fit = DragPolarFit.Of(table.Points, 350, 11)!;
        var rms = Math.Sqrt(fit.ResidualsMps.Average(residual => residual * residual));
        Assert.True(rms <= table.Points[0].RoundingMps); // least squares cannot do worse than the truth, which is within the rounding
        Assert.Equal(fit.ResidualsMps[2], fit.Polar.SinkMps(table.Points[2].AirspeedMps) - table.Points[2].SinkMps, 1e-10);
    });

    [Fact]
    public void DragPolarFit_NoDragPolar_Null()
    {
        Assert.Null(DragPolarFit.Of([new(20, 1, 0), new(30, 0.8, 0)], 350, 11));
        Assert.Null(DragPolarFit.Of([new(20, 0.5, 0), new(30, 2, 0), new(40, 2.1, 0)], 350, 11));
    }

    private static bool IsFine((DragPolar True, SinkPoint[] Points) table) => table.Points[0].RoundingMps < 0.001;
}
