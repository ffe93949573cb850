using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Terminal;

/// <summary>The small numbers behind the speed to hold, each in a phase always in its place so that the eye finds it.</summary>
internal static class ReasonRows
{
    private const int LeftLabelWidth = 15;
    private const int RightLabelWidth = 18;
    private const int NumberWidth = 5;

    public static void Draw(TextGrid grid, PanelLayout layout, in CockpitPicture picture, DisplayUnits units)
    {
        DrawLeft(grid, layout, picture, units);
        DrawRight(grid, layout, picture, units);
    }

    /// <summary>
    /// Speeds, and what the air does: where the speed to hold comes from. Climbing, a pilot asks whether this thermal is still
    /// worth it; gliding, whether this air is.
    /// </summary>
    private static void DrawLeft(TextGrid grid, PanelLayout layout, in CockpitPicture picture, DisplayUnits units)
    {
        var row = layout.ReasonTop;
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var speed = units.Speed;
        var column = new Column(grid, 0, LeftLabelWidth, grid.Width / 2 - 1);
        column.Row(row++, isClimbing ? "  speed to fly" : "> speed to fly",
            Readout.Of(picture.SpeedToFlyIndicatedMps, speed, Trust.Airspeed), speed, false, !isClimbing);
        column.Row(row++, isClimbing ? "> minimum sink" : "  minimum sink",
            Readout.Of(picture.MinSinkIndicatedMps, speed, Trust.Airspeed), speed, false, isClimbing);
        if (layout.ReasonRows > 5)
        {
            column.Row(row++, "  best glide", Readout.Of(picture.BestGlideIndicatedMps, speed, Trust.Airspeed), speed, false);
        }

        var vertical = units.Vertical;
        column.Row(row++, "  climb", Readout.Of(picture.ClimbMps, vertical, Trust.Vertical), vertical, true);
        if (isClimbing)
        {
            column.Row(row++, "  30 s average", Readout.Of(picture.AverageClimbMps, vertical, Trust.Vertical), vertical, true, true);
            column.Row(row, "  this thermal", Readout.Of(picture.ThermalAverageMps, vertical, Trust.Vertical), vertical, true);
        }
        else
        {
            column.Row(row++, "  air (netto)", Readout.Of(picture.NettoMps, vertical, Trust.Vertical), vertical, true);
            column.Row(row, "  if circling", Readout.Of(picture.RelativeNettoMps, vertical, Trust.Vertical), vertical, true);
        }
    }

    /// <summary>Heights, the air's state, and what the height is worth.</summary>
    private static void DrawRight(TextGrid grid, PanelLayout layout, in CockpitPicture picture, DisplayUnits units)
    {
        var row = layout.ReasonTop;
        var column = new Column(grid, grid.Width / 2, RightLabelWidth, grid.Width);
        if (layout.ReasonRows > 5)
        {
            // A climb worked out from others is shown whatever its spread: the spread stands beside it.
            var expected = new Gauge(picture.ExpectedClimbMps, double.NaN, 0);
            column.Row(row++, picture.Controls.IsExpectedClimbAutomatic ? "expected, auto" : "expected climb", Readout.Of(expected, units.Vertical, Trust.Vertical), units.Vertical, true);
        }

        column.Row(row++, AltitudeLabel(picture, units),
            Readout.Of(picture.Controls.IsQnhStandard ? picture.PressureAltitudeM : picture.AltitudeM, units.Height, Trust.Height), units.Height, false);
        column.Row(row++, "density altitude",
            Readout.Of(picture.DensityAltitudeM, units.Height, Trust.Height), units.Height, false);
        var temperature = Readout.Of(picture.TemperatureK, units.Temperature, Trust.Temperature);
        column.Row(row++, TemperatureLabel(temperature, picture.TemperatureSource), temperature, units.Temperature, false);
        column.Row(row++, "time in hand",
            Readout.Of(picture.EnduranceS, DisplayUnit.Minutes, Trust.ShareOf(picture.EnduranceS.Value)), DisplayUnit.Minutes, false);
        column.Row(row, "distance in hand",
            Readout.Of(picture.RangeM, units.Distance, Trust.ShareOf(picture.RangeM.Value)), units.Distance, false);
    }

    /// <summary>Once the altimeter is set, the altitude it shows takes the place of pressure altitude, and the setting stands there.</summary>
    private static string AltitudeLabel(in CockpitPicture picture, DisplayUnits units) =>
        picture.Controls.IsQnhStandard ? "pressure altitude" : $"alt. {ControlWords.Pressure(picture.Controls.QnhPa, units)}";

    private static string TemperatureLabel(Readout temperature, TemperatureSource source) =>
        !temperature.IsKnown ? "temperature"
        : source == TemperatureSource.Measured ? "temp, measured"
        : "temp, standard";

    private readonly struct Column(TextGrid grid, int left, int labelWidth, int end)
    {
        /// <summary>Label, number, mark (in the place of the space, so that the digits stay where they are), unit, uncertainty. The uncertainty is left out whole where it has no room.</summary>
        public void Row(int row, string label, Readout readout, DisplayUnit unit, bool isVertical, bool isStrong = false)
        {
            var tone = !readout.IsKnown || readout.IsDoubtful ? Tone.Faint : isStrong ? Tone.Strong : Tone.Normal;
            var number = readout.Text(isVertical);
            var unitLeft = left + labelWidth + NumberWidth + 1;
            grid.Put(row, left, label, isStrong ? Tone.Strong : Tone.Normal);
            grid.Put(row, unitLeft - 1 - number.Length, number, tone);
            grid.Put(row, unitLeft - 1, readout.IsDoubtful ? Readout.DoubtMark : string.Empty, tone);
            grid.Put(row, unitLeft, unit.Label, Tone.Faint);
            var sigma = isVertical ? readout.SigmaText() : string.Empty;
            var sigmaLeft = unitLeft + unit.Label.Length + 1;
            if (sigmaLeft + sigma.Length <= end)
            {
                grid.Put(row, sigmaLeft, sigma, Tone.Faint);
            }
        }
    }
}
