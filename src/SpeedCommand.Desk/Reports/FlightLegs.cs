using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>Cuts a flight into climbs and glides, as the cockpit saw them, and adds each up. Moments that are not known add nothing.</summary>
internal static class FlightLegs
{
    private const double PeriodS = PipelineBounds.PicturePeriodUs * 1e-6;

    /// <summary>Shorter stretches between two climbs are a shift of the circle, s.</summary>
    private const double ShortestGlideS = 20;

    /// <summary>Load factor of a 20-degree bank, where the cockpit begins to see a turn too.</summary>
    private const double TurningLoad = 1.064;

    public static IReadOnlyList<ClimbLeg> Circlings(IReadOnlyList<ReportMoment> moments) =>
        [.. Stretches(moments, FlightPhase.Climbing).Select(Climb)];

    public static IReadOnlyList<GlideLeg> Glides(IReadOnlyList<ReportMoment> moments) =>
        [.. Stretches(moments, FlightPhase.Gliding).Where(stretch => stretch.Count * PeriodS >= ShortestGlideS).Select(Glide)];

    /// <summary>The stretches of one phase in which the glider flew.</summary>
    public static IEnumerable<List<ReportMoment>> Stretches(IReadOnlyList<ReportMoment> moments, FlightPhase phase)
    {
        var stretch = new List<ReportMoment>();
        foreach (var moment in moments)
        {
            if (moment.Phase == phase)
            {
                stretch.Add(moment);
            }
            else if (stretch.Count > 0)
            {
                yield return stretch;
                stretch = [];
            }
        }

        if (stretch.Count > 0)
        {
            yield return stretch;
        }
    }

    private static ClimbLeg Climb(List<ReportMoment> stretch)
    {
        var loads = stretch.Where(one => double.IsFinite(one.LoadFactor)).ToList();
        var gainM = Sum(stretch, one => one.ClimbMps.Value);
        return new(
            stretch[0].TimeS - PeriodS, stretch[^1].TimeS, stretch[0].PressureAltitudeM,
            gainM, gainM / (stretch.Count(one => one.ClimbMps.IsKnown) * PeriodS),
            loads.Count == 0 ? double.NaN : loads.Count(one => one.LoadFactor > TurningLoad) / (double)loads.Count);
    }

    private static GlideLeg Glide(List<ReportMoment> stretch)
    {
        var held = stretch.Where(one => double.IsFinite(one.HoldMps) && double.IsFinite(one.IndicatedMps)).ToList();
        var isGuided = held.Count > 0;
        // A ratio needs distance and height of the same moments, and after a silence the climb comes back later.
        var known = stretch.Where(one => double.IsFinite(one.TrueMps) && one.ClimbMps.IsKnown).ToList();
        return new(
            stretch[0].TimeS - PeriodS, stretch[^1].TimeS,
            Sum(known, one => one.TrueMps), -Sum(known, one => one.ClimbMps.Value),
            stretch.Where(one => double.IsFinite(one.IndicatedMps)).Select(one => one.IndicatedMps).DefaultIfEmpty(double.NaN).Average(),
            isGuided ? held.Average(one => one.HoldMps) : double.NaN,
            isGuided ? Sum(stretch, one => one.OffSpeedMps) : double.NaN);
    }

    private static double Sum(List<ReportMoment> stretch, Func<ReportMoment, double> rate) =>
        stretch.Select(rate).Where(double.IsFinite).Sum() * PeriodS;
}
