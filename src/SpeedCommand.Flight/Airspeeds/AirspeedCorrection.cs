namespace SpeedCommand.Flight.Airspeeds;

/// <summary>
/// A glider's airspeed correction, indicated to calibrated and back: straight lines between the table's points. Below the first
/// point the ratio stays (so that nothing reads 0 at rest), above the last point the difference stays. Strictly rising, hence
/// exactly invertible.
/// </summary>
public sealed class AirspeedCorrection
{
    private readonly CorrectionPoint[] _points;

    /// <summary>Makes a correction from its table.</summary>
    /// <param name="points">At least one point, both columns above 0 and strictly rising.</param>
    /// <exception cref="ArgumentException">The table is empty, or a column does not rise.</exception>
    public AirspeedCorrection(IReadOnlyList<CorrectionPoint> points)
    {
        _points = [.. points];
        var before = default(CorrectionPoint);
        foreach (var point in _points)
        {
            if (!(point.IndicatedMps > before.IndicatedMps && point.CalibratedMps > before.CalibratedMps))
            {
                throw new ArgumentException("both airspeeds must rise from point to point", nameof(points));
            }

            before = point;
        }

        if (_points.Length == 0)
        {
            throw new ArgumentException("at least one point is needed", nameof(points));
        }
    }

    /// <summary>No correction: indicated is calibrated.</summary>
    public static AirspeedCorrection None { get; } = new([new(1, 1)]);

    /// <summary>Calibrated airspeed for an indication.</summary>
    /// <param name="indicated">Indicated airspeed.</param>
    /// <returns>Calibrated airspeed.</returns>
    public CalibratedAirspeed ToCalibrated(IndicatedAirspeed indicated)
    {
        var i = 0;
        while (i < _points.Length && _points[i].IndicatedMps < indicated.Mps)
        {
            i++;
        }

        var (from, slope) = SegmentBelow(i);
        return new(from.CalibratedMps + (indicated.Mps - from.IndicatedMps) * slope);
    }

    /// <summary>The indication at a calibrated airspeed.</summary>
    /// <param name="calibrated">Calibrated airspeed.</param>
    /// <returns>Indicated airspeed.</returns>
    public IndicatedAirspeed ToIndicated(CalibratedAirspeed calibrated)
    {
        var (from, slope) = SegmentBelow(SegmentOf(calibrated));
        return new(from.IndicatedMps + (calibrated.Mps - from.CalibratedMps) / slope);
    }

    /// <summary>How much the indication moves with calibrated airspeed, for sensitivities.</summary>
    /// <param name="calibrated">Calibrated airspeed.</param>
    /// <returns>dVi/dVc, above 0; at a point of the table that of the segment below.</returns>
    public double IndicatedSlopeAt(CalibratedAirspeed calibrated) => 1 / SegmentBelow(SegmentOf(calibrated)).Slope;

    private int SegmentOf(CalibratedAirspeed calibrated)
    {
        var i = 0;
        while (i < _points.Length && _points[i].CalibratedMps < calibrated.Mps)
        {
            i++;
        }

        return i;
    }

    /// <summary>The straight line that ends at point <paramref name="i"/>: where it starts, and dVc/dVi.</summary>
    private (CorrectionPoint From, double Slope) SegmentBelow(int i)
    {
        if (i == _points.Length)
        {
            return (_points[i - 1], 1);
        }

        var from = i == 0 ? default : _points[i - 1];
        return (from, (_points[i].CalibratedMps - from.CalibratedMps) / (_points[i].IndicatedMps - from.IndicatedMps));
    }
}
