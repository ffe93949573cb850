namespace SpeedCommand.Flight.Polars;

/// <summary>
/// A glider with flaps, always flown with the setting that sinks least at its speed: the lower envelope of one polar a setting.
/// The envelope is not convex where two settings meet, so optima are sought in each setting and the best is taken.
/// </summary>
public sealed class FlappedPolar : IPolar
{
    private readonly FlapSetting[] _settings;

    /// <summary>Makes the envelope.</summary>
    /// <param name="settings">At least one setting; same mass and wing area; no gap between their speed ranges.</param>
    /// <exception cref="ArgumentException">There is no setting, masses or wing areas differ, or a speed range is not covered.</exception>
    public FlappedPolar(IReadOnlyList<FlapSetting> settings)
    {
        _settings = [.. settings];
        if (_settings.Length == 0)
        {
            throw new ArgumentException("at least one setting is needed", nameof(settings));
        }

        var reach = _settings.Min(setting => setting.Polar.MinAirspeedMps);
        foreach (var polar in _settings.Select(setting => setting.Polar).OrderBy(polar => polar.MinAirspeedMps))
        {
            if (polar.ReferenceMassKg != ReferenceMassKg || !polar.WingAreaM2.Equals(WingAreaM2) || polar.MinAirspeedMps > reach)
            {
                throw new ArgumentException("settings must share mass and wing area, and leave no gap of speed", nameof(settings));
            }

            reach = Math.Max(reach, polar.MaxAirspeedMps);
        }

        (MinAirspeedMps, MaxAirspeedMps) = (_settings.Min(setting => setting.Polar.MinAirspeedMps), reach);
    }

    /// <summary>The settings.</summary>
    public IReadOnlyList<FlapSetting> Settings => _settings;

    /// <inheritdoc/>
    public double MinAirspeedMps { get; }

    /// <inheritdoc/>
    public double MaxAirspeedMps { get; }

    /// <inheritdoc/>
    public double ReferenceMassKg => _settings[0].Polar.ReferenceMassKg;

    /// <inheritdoc/>
    public double WingAreaM2 => _settings[0].Polar.WingAreaM2;

    /// <summary>The setting that sinks least.</summary>
    /// <param name="equivalentMps">Equivalent airspeed in the polar's own scale (reference mass, straight flight), m/s.</param>
    /// <returns>The setting; null out of range.</returns>
    public FlapSetting? SettingAt(double equivalentMps)
    {
        FlapSetting? best = null;
        var least = double.PositiveInfinity;
        foreach (var setting in _settings)
        {
            var sink = setting.Polar.SinkMps(equivalentMps);
            if (sink < least)
            {
                (best, least) = (setting, sink);
            }
        }

        return best;
    }

    /// <inheritdoc/>
    public double SinkMps(double equivalentMps) => SettingAt(equivalentMps)?.Polar.SinkMps(equivalentMps) ?? double.NaN;

    /// <inheritdoc/>
    public double SlopeAt(double equivalentMps) => SettingAt(equivalentMps)?.Polar.SlopeAt(equivalentMps) ?? double.NaN;

    /// <inheritdoc/>
    public double CurvatureAt(double equivalentMps) => SettingAt(equivalentMps)?.Polar.CurvatureAt(equivalentMps) ?? double.NaN;

    /// <inheritdoc/>
    public double MinSinkAirspeedMps(double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        foreach (var setting in _settings)
        {
            if (Overlap(setting, lowMps, highMps, out var low, out var high))
            {
                var v = setting.Polar.MinSinkAirspeedMps(low, high);
                Offer(v, setting.Polar.SinkMps(v), ref best, ref least);
            }
        }

        return best;
    }

    /// <inheritdoc/>
    public double BestRatioAirspeedMps(double addedSinkMps, double headwindMps, double lowMps, double highMps)
    {
        var (best, least) = (lowMps, double.PositiveInfinity);
        foreach (var setting in _settings)
        {
            if (Overlap(setting, lowMps, highMps, out var low, out var high) && high > headwindMps)
            {
                var v = setting.Polar.BestRatioAirspeedMps(addedSinkMps, headwindMps, low, high);
                Offer(v, (addedSinkMps + setting.Polar.SinkMps(v)) / (v - headwindMps), ref best, ref least);
            }
        }

        return best;
    }

    /// <inheritdoc/>
    public IPolar WithAddedDrag(double zeroLiftDragIncrement) => new FlappedPolar(
        [.. _settings.Select(setting => setting with { Polar = setting.Polar.WithAddedDrag(zeroLiftDragIncrement) })]);

    private static bool Overlap(FlapSetting setting, double lowMps, double highMps, out double low, out double high)
    {
        low = Math.Max(lowMps, setting.Polar.MinAirspeedMps);
        high = Math.Min(highMps, setting.Polar.MaxAirspeedMps);
        return low < high;
    }

    private static void Offer(double v, double value, ref double best, ref double least)
    {
        if (value < least)
        {
            (best, least) = (v, value);
        }
    }
}
