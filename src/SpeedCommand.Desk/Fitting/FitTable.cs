using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Units;

namespace SpeedCommand.Desk.Fitting;

/// <summary>A fit as text: the polar with its intervals, what the flights could not tell, the segments.</summary>
internal static class FitTable
{
    public static string Of(FitResult fit, DisplayUnits units)
    {
        var text = new StringBuilder();
        var used = fit.Segments.Where(one => one.Verdict == SegmentVerdict.Used).ToList();
        text.Append(CultureInfo.InvariantCulture, $"{used.Count} glides used, {used.Sum(one => one.EndS - one.StartS) / 60:F0} min in all, of {fit.Flights.Count} flights\n");
        if (used.Count > 0)
        {
            text.Append(CultureInfo.InvariantCulture,
                $"{units.Speed.Convert(used.Min(one => one.IndicatedMps)):F0} to {units.Speed.Convert(used.Max(one => one.IndicatedMps)):F0} {units.Speed.Label} indicated, "
                + $"air moving by {units.Vertical.Convert(fit.Fit.AirSigmaMps):F2} {units.Vertical.Label} (standard deviation)\n");
        }

        AddNumbers(text, fit, units);
        AddRemarks(text, fit, used.Count);
        AddSegments(text, fit, units);
        return text.ToString();
    }

    private static void AddNumbers(StringBuilder text, FitResult fit, DisplayUnits units)
    {
        text.Append(CultureInfo.InvariantCulture, $"\n{"",-16}{"handbook",10}{"fitted",10}   {"95 % interval",-22}{"before the flights",-20}\n");
        foreach (var number in PolarBelief.Numbers)
        {
            var (unit, format) = Look(number.Kind, units);
            var (before, after) = (fit.Before.Of(number.Of), fit.After.Of(number.Of));
            text.Append(CultureInfo.InvariantCulture,
                $"{number.Name,-16}{Number(number.Of(fit.Handbook), unit, format),10}{Number(number.Of(fit.Polar), unit, format),10}   "
                + $"{Number(after.Low, unit, format) + " to " + Number(after.High, unit, format),-22}{Number(before.Low, unit, format) + " to " + Number(before.High, unit, format),-20}"
                + $"{unit?.Label}{(Credible.IsHardlyTold(before, after) ? "  hardly told by these flights" : "")}\n");
        }

        text.Append("Sink and speeds in the polar's own scale: equivalent airspeed at reference mass and sea level.\n");
        if (fit.ExtraSink is { } extra)
        {
            text.Append(CultureInfo.InvariantCulture, $"Extra sink at every speed: {extra.Middle * 100:F1} %, 95 % interval {extra.Low * 100:F1} to {extra.High * 100:F1} %\n");
        }
    }

    private static void AddRemarks(StringBuilder text, FitResult fit, int usedCount)
    {
        text.Append("Assumed: over many glides the air rises as much as it sinks, whatever the airspeed; wave, ridges and slowing down in lift break that.\n");
        if (usedCount == 0)
        {
            text.Append("The flights tell nothing: no glide could be used. What is called fitted is the handbook's polar, and the interval is what was believed before.\n");
        }
        else if (PolarBelief.Numbers.Any(number => Credible.IsHardlyTold(fit.Before.Of(number.Of), fit.After.Of(number.Of))))
        {
            text.Append("Where the flights hardly tell, the interval is the one believed before: fly steady glides at more speeds, in quieter air.\n");
        }

        foreach (var flight in fit.Flights.Where(flight => !flight.IsLoadMeasured))
        {
            text.Append(CultureInfo.InvariantCulture, $"{flight.Name}: no load or bank sensor, flat turns count as straight flight\n");
        }
    }

    private static void AddSegments(StringBuilder text, FitResult fit, DisplayUnits units)
    {
        for (var i = 0; i < fit.Flights.Count; i++)
        {
            text.Append(CultureInfo.InvariantCulture,
                $"\n{fit.Flights[i].Name}\n{"from, s",9}{"to, s",9}{"IAS, " + units.Speed.Label,12}{"climb, " + units.Vertical.Label,14}{"netto, " + units.Vertical.Label,14}\n");
            foreach (var segment in fit.Segments.Where(one => one.Flight == i))
            {
                var row = string.Create(CultureInfo.InvariantCulture,
                    $"{segment.StartS,9:F1}{segment.EndS,9:F1}{Number(segment.IndicatedMps, units.Speed, "F0"),12}{Number(segment.ClimbMps, units.Vertical, "F2"),14}"
                    + $"{Number(segment.NettoMps, units.Vertical, "F2"),14}  {SegmentVerdicts.WordsOf(segment.Verdict)}\n");
                text.Append(row);
            }
        }
    }

    private static (DisplayUnit? Unit, string Format) Look(PolarNumberKind kind, DisplayUnits units) => kind switch
    {
        PolarNumberKind.Coefficient => (null, "F5"),
        PolarNumberKind.Sink => (units.Vertical, units.Vertical.Step < 1 ? "F2" : "F0"),
        PolarNumberKind.Speed => (units.Speed, "F1"),
        _ => (null, "F1"),
    };

    private static string Number(double si, DisplayUnit? unit, string format) => double.IsNaN(si)
        ? "-"
        : (unit?.Convert(si) ?? si).ToString(format, CultureInfo.InvariantCulture);
}
