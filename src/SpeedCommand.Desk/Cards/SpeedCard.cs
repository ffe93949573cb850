using System.Globalization;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Desk.Cards;

/// <summary>A knee-board card: every number worked out and rounded, ready to be laid out as text or as a page.</summary>
internal sealed class SpeedCard
{
    /// <summary>Rounding in binary must not push a whole number over itself.</summary>
    private const double Hair = 1e-6;

    private readonly CardRequest _request;
    private readonly SpeedTargets _targets;
    private readonly DisplayUnits _units;
    private readonly List<(Loading Loading, SpeedLimits Limits)> _loads;

    public SpeedCard(CardRequest request)
    {
        var (conditions, masses, units) = request;
        (_request, _units, _targets) = (request, units, new SpeedTargets(conditions.Glider));
        _loads = [.. masses.Select(mass => new Loading(mass, 1, conditions.Loading.BugsFraction))
            .Select(loading => (loading, SpeedLimits.At(_targets, conditions.Air, loading)))];
        Heading =
        [
            ConditionLines.Air(conditions, units),
            $"speeds: indicated, {units.Speed.Symbol}; climb, sink and air (positive up): {units.Vertical.Symbol}",
        ];
        Tables = [SpeedsToFly(), MinSinks(), BestGlides()];
        Notes = [.. MissingSpeeds(), .. Limits(), .. new[] { LimitSigns.Legend(Tables) }.Where(legend => legend.Length > 0), ConditionLines.Caution];
    }

    public string Title => _request.Conditions.Glider.Name + ConditionLines.Bugs(_request.Conditions);

    public IReadOnlyList<string> Heading { get; }

    public IReadOnlyList<CardTable> Tables { get; }

    public IReadOnlyList<string> Notes { get; }

    private CardTable SpeedsToFly()
    {
        var airs = _request.Airs.ToList();
        var rows = _request.Climbs.Select(climb => (Vertical(climb, 1), Cells(load => airs.Select(air =>
            SpeedCell(_targets.SpeedToFly(_request.Conditions.Air, load.Loading, climb, air).Speed, load.Limits)))));
        return new CardTable("speed to fly", "climb \\ air", Groups(), [.. airs.Select(air => Vertical(air, 1))], [.. rows]);
    }

    private CardTable MinSinks()
    {
        var rows = _request.BanksRad.Select(bank => (
            bank == 0 ? "straight" : string.Create(CultureInfo.InvariantCulture, $"bank {bank * 180 / Math.PI:F0} deg"),
            Cells(load =>
            {
                var banked = load.Loading with { LoadFactor = 1 / Math.Cos(bank) };
                var target = _targets.MinSink(_request.Conditions.Air, banked);
                var limits = SpeedLimits.At(_targets, _request.Conditions.Air, banked);
                return [SpeedCell(target, limits), new CardCell(target.IsKnown ? Vertical(target.SinkMps, 2) : "--")];
            })));
        return new CardTable("minimum sink", "", Groups(), ["speed", "sink"], [.. rows]);
    }

    private CardTable BestGlides()
    {
        var rows = _request.Headwinds.Select(wind => (
            wind == 0 ? "still air" : ConditionLines.Wind(wind, _units),
            Cells(load =>
            {
                var glide = _targets.BestGlide(_request.Conditions.Air, load.Loading, wind, 0);
                return [SpeedCell(glide.Speed, load.Limits), new CardCell(glide.Speed.IsKnown ? ConditionLines.Number(glide.GlideRatio, 1) : "--")];
            })));
        return new CardTable("best glide, over the ground", "", Groups(), ["speed", "ratio"], [.. rows]);
    }

    private List<CardCell> Cells(Func<(Loading Loading, SpeedLimits Limits), IEnumerable<CardCell>> ofLoad) => [.. _loads.SelectMany(ofLoad)];

    private List<string> Groups() => [.. _request.MassesKg.Select(Mass)];

    private CardCell SpeedCell(in TargetSpeed target, SpeedLimits limits) => target.IsKnown
        ? new CardCell(ConditionLines.Number(limits.Rounded(target.IndicatedAirspeedMps, _units.Speed), 0), LimitSigns.Of(target.LimitedBy))
        : new CardCell("--");

    private string Vertical(double mps, int decimals) => ConditionLines.Number(_units.Vertical.Convert(mps), decimals);

    private IEnumerable<string> MissingSpeeds() => _loads
        .Select(load => LimitNames.WhyNoSpeedToFly(_request.Conditions.Glider, load.Limits)).Where(reason => reason.Length > 0)
        .Distinct().Select(reason => "no speed to fly: " + reason);

    private IEnumerable<string> Limits()
    {
        if (_request.Conditions.Glider.Limits is null)
        {
            return [];
        }

        // One mass a stall margin; the others do not depend on it. A margin is rounded up, the others down.
        var margins = _loads.Select(load => $"{Ceiling(load.Limits.StallMarginMps)} at {Mass(load.Loading.MassKg)}");
        var limits = _loads[0].Limits;
        return [$"stall margin {string.Join(", ", margins)}; rough air {Floor(limits.RoughAirMps)}; never exceed {Floor(limits.NeverExceedMps)}"];
    }

    private string Ceiling(double mps) => ConditionLines.Number(Math.Ceiling(_units.Speed.Convert(mps) - Hair), 0);

    private string Floor(double mps) => ConditionLines.Number(Math.Floor(_units.Speed.Convert(mps) + Hair), 0);

    private static string Mass(double massKg) => string.Create(CultureInfo.InvariantCulture, $"{massKg:F0} kg");
}
