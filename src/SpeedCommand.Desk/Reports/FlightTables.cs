using System.Globalization;
using System.Xml.Linq;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Estimation.Command;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>What a flight's page says in text.</summary>
internal sealed class FlightTables(ReportFlight flight, DisplayUnits units)
{
    private const double Percent = 100;

    public XElement Facts()
    {
        var altitudes = flight.Moments.Select(one => one.PressureAltitudeM).Where(double.IsFinite).DefaultIfEmpty(double.NaN).ToList();
        var (climbs, glides) = (flight.Climbs, flight.Glides);
        var climbS = climbs.Sum(one => one.DurationS);
        return ReportHtml.Facts(
            ("duration", ReportNumbers.Time(flight.DurationS)),
            ("highest", With(units.Height, altitudes.Max())),
            ("climbs", climbs.Count.ToString(CultureInfo.InvariantCulture)),
            ("average climb", climbs.Count == 0 ? ReportNumbers.Unknown : With(units.Vertical, climbs.Sum(one => one.GainM) / climbS)),
            ("glided through the air", $"{ReportNumbers.Distance(units.Distance, glides.Sum(one => one.DistanceM))} {units.Distance.Label}"),
            ("faults", flight.Faults.Select(one => one.Fault).Distinct().Count().ToString(CultureInfo.InvariantCulture)));
    }

    public object Climbs() => flight.Circlings.Count == 0
        ? ReportHtml.Quiet("No circling was noticed.")
        : ReportHtml.Table(
            FormattableString.Invariant($"A climb is circling of at least {LastClimbs.LeastS:F0} s that gained {ReportNumbers.In(units.Height, LastClimbs.LeastGainM)} {units.Height.Label}; less is circling, and no part of the average climb. ")
            + "Gain and average count speed as the height it is worth. A turn is a load above that of a 20-degree bank.",
            ["start", "kind", "time", $"from, {units.Height.Label}", $"gain, {units.Height.Label}", $"average, {units.Vertical.Label}", "turning, %"],
            flight.Circlings.Select(one => (IReadOnlyList<object>)
            [
                ReportNumbers.Time(one.StartS), one.IsClimb ? "climb" : "circling", ReportNumbers.Time(one.DurationS), ReportNumbers.In(units.Height, one.StartHeightM),
                ReportNumbers.In(units.Height, one.GainM, isSigned: true), ReportNumbers.In(units.Vertical, one.AverageMps, isSigned: true),
                ReportNumbers.Plain(one.TurningShare * Percent, 0),
            ]));

    public object Glides() => flight.Glides.Count == 0
        ? ReportHtml.Quiet("No glide of 20 s or more was noticed.")
        : ReportHtml.Table(
            "Distance and ratio are through the air, moving air and all. Off speed is the height it cost, by the polar, not to fly the speed to fly.",
            ["start", "time", $"distance, {units.Distance.Label}", $"height lost, {units.Height.Label}", "ratio", $"flown, {units.Speed.Label}",
                $"to hold, {units.Speed.Label}", $"lost off speed, {units.Height.Label}"],
            flight.Glides.Select(one => (IReadOnlyList<object>)
            [
                ReportNumbers.Time(one.StartS), ReportNumbers.Time(one.DurationS), ReportNumbers.Distance(units.Distance, one.DistanceM),
                ReportNumbers.In(units.Height, one.LossM), ReportNumbers.Plain(one.Ratio, 1), ReportNumbers.In(units.Speed, one.MeanIndicatedMps),
                ReportNumbers.In(units.Speed, one.MeanToFlyMps), ReportNumbers.In(units.Height, one.OffSpeedM),
            ]));

    public object Faults() => flight.Faults.Count == 0
        ? ReportHtml.Quiet("None.")
        : ReportHtml.Table(
            "Names are those of the displays and, in brackets, of the documents.",
            ["fault", "times", "first", "last", "lasted in all"],
            flight.Faults.GroupBy(one => one.Fault).OrderBy(row => (uint)row.Key).Select(row => (IReadOnlyList<object>)
            [
                $"{FaultWords.Of(row.Key)} ({FaultNames.All.First(name => name.Key == row.Key).Value})", row.Count(), ReportNumbers.Time(row.Min(one => one.StartS)),
                ReportNumbers.Time(row.Max(one => one.EndS)), ReportNumbers.Time(row.Sum(one => one.EndS - one.StartS)),
            ]));

    public XElement Settings()
    {
        var settings = flight.Settings;
        return ReportHtml.Table("What the recording was replayed with.", ["setting", "value"],
        [
            ["glider", settings.Glider.Name],
            ["mass with ballast", Number(settings.MassKg, "kg")],
            ["bugs", Number(settings.BugsFraction * Percent, "%")],
            ["climb expected", With(units.Vertical, settings.ExpectedClimbMps)],
            ["stall margin", Number(settings.StallMargin * Percent, "%")],
            ["safety height", With(units.Height, settings.SafetyHeightM)],
            ["temperature offset", $"{ReportNumbers.Plain(units.Temperature.ConvertDifference(settings.TemperatureOffsetK), 1, isSigned: true)} {units.Temperature.Label}"],
            ["thermometer recovery", Number(settings.ThermometerRecovery * Percent, "%")],
            ["lag of static, impact, probe", $"{Number(settings.StaticLagS, "s")}, {Number(settings.ImpactLagS, "s")}, {Number(settings.ProbeLagS, "s")}"],
            ["phase", settings.ForcedPhase switch { FlightPhase.Climbing => "climbing", FlightPhase.Gliding => "gliding", _ => "automatic" }],
        ], isWords: true);
    }

    private static string With(DisplayUnit unit, double si) => $"{ReportNumbers.In(unit, si)} {unit.Label}";

    private static string Number(double value, string unit) => string.Create(CultureInfo.InvariantCulture, $"{value:0.###} {unit}").TrimEnd();
}
