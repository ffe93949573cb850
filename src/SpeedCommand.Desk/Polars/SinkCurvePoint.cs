namespace SpeedCommand.Desk.Polars;

/// <summary>One speed on a sink curve. SI units; sink through the air, positive down.</summary>
internal readonly record struct SinkCurvePoint(double IndicatedMps, double EquivalentMps, double TrueMps, double SinkMps)
{
    /// <summary>Distance through the air per height lost in it.</summary>
    public double GlideRatio => TrueMps / SinkMps;

    /// <summary>Distance over the ground per height lost; infinite where the air carries the glider.</summary>
    public double RatioOverGround(double headwindMps, double airMps) =>
        SinkMps > airMps ? (TrueMps - headwindMps) / (SinkMps - airMps) : double.PositiveInfinity;
}
