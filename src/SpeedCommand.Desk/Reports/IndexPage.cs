using System.Globalization;
using System.Xml.Linq;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Reports;

/// <summary>One row of the index: what a flight came to, kept when its moments no longer are.</summary>
internal sealed record IndexRow(string Page, string Name, string Glider, double DurationS, int ClimbCount, double GainM, double ClimbS, double GlideM, int FaultCount)
{
    public static IndexRow Of(string page, ReportFlight flight) => new(
        page, flight.Name, flight.Settings.Glider.Name, flight.DurationS, flight.Climbs.Count, flight.Climbs.Sum(one => one.GainM),
        flight.Climbs.Sum(one => one.DurationS), flight.Glides.Sum(one => one.DistanceM), flight.Faults.Select(one => one.Fault).Distinct().Count());
}

/// <summary>The page that leads to those of several flights.</summary>
internal static class IndexPage
{
    public static string Html(IReadOnlyList<IndexRow> flights, DisplayUnits units) => ReportHtml.Page("Flights", $"{flights.Count} flights",
        ReportHtml.Table(
            "Gain and average count speed as the height it is worth.",
            ["flight", "glider", "duration", "climbs", $"gain, {units.Height.Label}", $"average climb, {units.Vertical.Label}", $"glided, {units.Distance.Label}", "faults"],
            flights.Select(one => (IReadOnlyList<object>)
            [
                new XElement("a", new XAttribute("href", Uri.EscapeDataString(one.Page)), one.Name), one.Glider, ReportNumbers.Time(one.DurationS),
                one.ClimbCount.ToString(CultureInfo.InvariantCulture), ReportNumbers.In(units.Height, one.GainM), ReportNumbers.In(units.Vertical, one.GainM / one.ClimbS),
                ReportNumbers.Distance(units.Distance, one.GlideM), one.FaultCount.ToString(CultureInfo.InvariantCulture),
            ])));
}
