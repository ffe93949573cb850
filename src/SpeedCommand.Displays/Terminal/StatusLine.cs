using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Terminal;

/// <summary>The picture in one line of words.</summary>
internal static class StatusLine
{
    public static string Of(in CockpitPicture picture, DisplayUnits units)
    {
        var text = new StringBuilder(200);
        text.Append(TimeText(picture.TimeUs)).Append(picture.Phase == FlightPhase.Climbing ? " climbing" : " gliding");
        Add(", hold", Readout.Of(picture.HoldIndicatedMps, units.Speed, Trust.Airspeed), units.Speed, false);
        text.Append(HoldWords.IsTooUncertain(picture) ? $" ({HoldWords.TooUncertain})" : string.Empty);
        Add(", flying", Readout.Of(picture.IndicatedAirspeedMps, units.Speed, Trust.Airspeed), units.Speed, false);
        var correction = SpeedCorrection.Of(picture, units);
        if (correction.Direction != CorrectionDirection.Unknown)
        {
            text.Append(", ").Append(LeaningBar.Words(correction));
        }

        Add("; climb", Readout.Of(picture.ClimbMps, units.Vertical, Trust.Vertical), units.Vertical, true);
        Add(", average", Readout.Of(picture.AverageClimbMps, units.Vertical, Trust.Vertical), units.Vertical, true);
        if (picture.Phase == FlightPhase.Climbing)
        {
            Add(", this thermal", Readout.Of(picture.ThermalAverageMps, units.Vertical, Trust.Vertical), units.Vertical, true);
        }

        Add(", netto", Readout.Of(picture.NettoMps, units.Vertical, Trust.Vertical), units.Vertical, true);
        if (picture.Phase == FlightPhase.Gliding)
        {
            Add(", if circling", Readout.Of(picture.RelativeNettoMps, units.Vertical, Trust.Vertical), units.Vertical, true);
        }

        Add("; density altitude", Readout.Of(picture.DensityAltitudeM, units.Height, Trust.Height), units.Height, false);
        var temperature = Readout.Of(picture.TemperatureK, units.Temperature, Trust.Temperature);
        Add(", temperature", temperature, units.Temperature, false);
        if (temperature.IsKnown)
        {
            text.Append(picture.TemperatureSource == TemperatureSource.Measured ? " measured" : " standard");
        }

        AddFaults(text, picture.Faults);
        return text.ToString();

        void Add(string words, Readout readout, DisplayUnit unit, bool isSigned)
        {
            text.Append(words).Append(' ').Append(readout.MarkedText(isSigned));
            if (readout.IsKnown)
            {
                text.Append(' ').Append(unit.Label);
            }
        }
    }

    /// <summary>Data time as hours, minutes and seconds.</summary>
    public static string TimeText(long timeUs)
    {
        var seconds = timeUs / 1_000_000;
        return string.Create(CultureInfo.InvariantCulture, $"{seconds / 3600}:{seconds / 60 % 60:00}:{seconds % 60:00}");
    }

    private static void AddFaults(StringBuilder text, Faults faults)
    {
        for (var before = "; "; faults != Faults.None; before = ", ")
        {
            var fault = FaultWords.Gravest(faults);
            text.Append(before).Append(FaultWords.Of(fault));
            faults &= ~fault;
        }
    }
}
