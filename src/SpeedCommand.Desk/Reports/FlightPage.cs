using System.Globalization;
using System.Xml.Linq;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Reports;

/// <summary>The page of one flight.</summary>
internal sealed class FlightPage(ReportFlight flight, DisplayUnits units)
{
    private readonly double _endMinutes = Math.Max(flight.DurationS, 1) / 60;
    private readonly FlightTables _tables = new(flight, units);

    public string Html() => ReportHtml.Page(
        $"Flight {flight.Name}", $"{flight.Settings.Glider.Name}{Start()}. Times are minutes and seconds since the start of the recording.",
        _tables.Facts(),
        flight.Remarks.Select(ReportHtml.Quiet),
        ReportHtml.Section("Phases", Phases()),
        ReportHtml.Section("Height", Height()),
        ReportHtml.Section("Climb and air", Climb(), Netto(),
            ReportHtml.Quiet("The band is two standard deviations either way. Long flights are drawn as means over some seconds.")),
        ReportHtml.Section("Airspeed", Airspeed()),
        ReportHtml.Section("Climbs", _tables.Climbs()),
        ReportHtml.Section("Glides", _tables.Glides()),
        ReportHtml.Section("Faults", FaultLine(), _tables.Faults()),
        ReportHtml.Section("Settings used", _tables.Settings()));

    private string Start() => flight.StartUtc is { } start ? start.UtcDateTime.ToString(", yyyy-MM-dd, 'recording from' HH:mm:ss 'UTC'", CultureInfo.InvariantCulture) : "";

    private XElement Phases() => ReportHtml.Figure("Climbing and gliding, as the cockpit saw it",
        $"{flight.Climbs.Count} climbs and {flight.Glides.Count} glides; the tables below list them.", "phases", StripFigure.OfPhases(flight.Moments, _endMinutes));

    private XElement Height() => ReportHtml.Figure("Pressure altitude and density altitude", "Both altitudes over the time of the flight.", "height",
        Drawn(units.Height,
            new ReportLine("pressure altitude", one => units.Height.Convert(one.PressureAltitudeM)),
            new ReportLine("density altitude", one => units.Height.Convert(one.DensityAltitudeM), IsSecond: true)));

    private XElement Climb() => ReportHtml.Figure("Total-energy climb", "Climb over the time of the flight, with its uncertainty.", "climb",
        Drawn(units.Vertical, new ReportLine(
            "climb", one => units.Vertical.Convert(one.ClimbMps.Value), one => units.Vertical.ConvertDifference(one.ClimbMps.Sigma))));

    private XElement Netto() => ReportHtml.Figure("Netto: vertical motion of the air", "The air's motion over the time of the flight, with its uncertainty.", "netto",
        Drawn(units.Vertical, new ReportLine(
            "netto", one => units.Vertical.Convert(one.NettoMps.Value), one => units.Vertical.ConvertDifference(one.NettoMps.Sigma))));

    private XElement Airspeed() => ReportHtml.Figure("Indicated airspeed and the speed to hold", "Both airspeeds over the time of the flight.", "airspeed",
        Drawn(units.Speed,
            new ReportLine("flown", one => units.Speed.Convert(one.IndicatedMps)),
            new ReportLine("to hold", one => units.Speed.Convert(one.HoldMps), IsSecond: true)));

    private XElement? FaultLine() => flight.Faults.Count == 0 ? null : ReportHtml.Figure("When each fault was there", "The table below lists them.", "faults",
        StripFigure.OfFaults(flight.Faults, _endMinutes));

    private string Drawn(DisplayUnit unit, params IReadOnlyList<ReportLine> lines) => ReportFigure.Svg(flight.Moments, _endMinutes, unit.Label, lines);
}
