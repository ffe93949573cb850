using SpeedCommand.Flight.Polars;

namespace SpeedCommand.Desk.Fitting;

/// <summary>A flight that was offered to a fit.</summary>
/// <param name="Name">Its file.</param>
/// <param name="IsLoadMeasured">Whether turns could be told from straight flight.</param>
internal sealed record FitFlight(string Name, bool IsLoadMeasured);

/// <summary>A fit and what it rests on.</summary>
internal sealed record FitResult
{
    public required DragPolar Handbook { get; init; }

    /// <summary>The fitted polar: the posterior's mean.</summary>
    public required DragPolar Polar { get; init; }

    public required PolarFit Fit { get; init; }

    /// <summary>What was believed without any flight.</summary>
    public required PolarBelief Before { get; init; }

    public required PolarBelief After { get; init; }

    /// <summary>Extra sink at every speed, as a fraction, when that alone was fitted.</summary>
    public required Credible? ExtraSink { get; init; }

    public required IReadOnlyList<FitFlight> Flights { get; init; }

    /// <summary>Every stretch of every flight, used or not.</summary>
    public required IReadOnlyList<GlideSegment> Segments { get; init; }

    /// <summary>Why the fit is no better than the handbook, so that no glider file should be made of it; null when something was learnt.</summary>
    public string? ReasonNotToTrust
    {
        get
        {
            if (!Segments.Any(one => one.Verdict == SegmentVerdict.Used))
            {
                return "expected straight, steady glides to learn from, found none";
            }

            // What the fit takes as given, such as the shape for bugs, counts neither way.
            var unknown = PolarBelief.Numbers.Select(number => (Before: Before.Of(number.Of), After: After.Of(number.Of))).Where(pair => !pair.Before.IsGiven);
            return unknown.All(pair => Credible.IsHardlyTold(pair.Before, pair.After))
                ? "expected glides that tell something of the polar, found that every number is hardly told by them"
                : null;
        }
    }

    /// <summary>Fits.</summary>
    /// <param name="handbook">The polar known before.</param>
    /// <param name="isBugsOnly">Whether only an extra sink at every speed is in doubt.</param>
    /// <param name="flights">The flights.</param>
    /// <param name="segments">Their segments.</param>
    public static FitResult Of(DragPolar handbook, bool isBugsOnly, IReadOnlyList<FitFlight> flights, IReadOnlyList<GlideSegment> segments)
    {
        var prior = isBugsOnly ? PolarPrior.OfBugs(handbook) : PolarPrior.Of(handbook);
        var fit = PolarFit.Of([.. segments.Where(one => one.Verdict == SegmentVerdict.Used)], prior);
        var after = PolarBelief.Of(fit, handbook);
        return new FitResult
        {
            Handbook = handbook,
            Polar = PolarBelief.PolarOf(fit.MeanCoefficients(), handbook) ?? handbook,
            Fit = fit,
            Before = PolarBelief.Of(PolarFit.Of([], prior), handbook),
            After = after,
            ExtraSink = isBugsOnly ? after.Of(polar => polar.Cd0 / handbook.Cd0 - 1) : null,
            Flights = flights,
            Segments = segments,
        };
    }
}
