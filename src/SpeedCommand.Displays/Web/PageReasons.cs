using System.Text.Json;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Web;

/// <summary>The small numbers behind the speed to hold: those of the terminal panel, by the same names and in the same order.</summary>
internal readonly struct PageReasons(Utf8JsonWriter json, DisplayUnits units)
{
    public void Write(in CockpitPicture picture)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        Speed("speed to fly", picture.SpeedToFlyIndicatedMps, !isClimbing);
        Speed("minimum sink", picture.MinSinkIndicatedMps, isClimbing);
        Speed("best glide", picture.BestGlideIndicatedMps, false);
        Vertical("climb", picture.ClimbMps, false);
        if (isClimbing)
        {
            Vertical("30 s average", picture.AverageClimbMps, true);
            Vertical("this thermal", picture.ThermalAverageMps, false);
        }
        else
        {
            Vertical("air (netto)", picture.NettoMps, false);
            Vertical("if circling", picture.RelativeNettoMps, false);
        }

        Vertical("expected climb", new Gauge(picture.ExpectedClimbMps, double.NaN, 0), false);
        Row("pressure altitude", Readout.Of(picture.PressureAltitudeM, units.Height, Trust.Height), units.Height);
        Row("density altitude", Readout.Of(picture.DensityAltitudeM, units.Height, Trust.Height), units.Height);
        var temperature = Readout.Of(picture.TemperatureK, units.Temperature, Trust.Temperature);
        Row(!temperature.IsKnown ? "temperature" : picture.TemperatureSource == TemperatureSource.Measured ? "temp, measured" : "temp, standard",
            temperature, units.Temperature);
        Row("time in hand", Readout.Of(picture.EnduranceS, DisplayUnit.Minutes, Trust.ShareOf(picture.EnduranceS.Value)), DisplayUnit.Minutes);
        Row("distance in hand", Readout.Of(picture.RangeM, units.Distance, Trust.ShareOf(picture.RangeM.Value)), units.Distance);
    }

    private void Speed(string label, Gauge gauge, bool isHeld) =>
        Row(label, Readout.Of(gauge, units.Speed, Trust.Airspeed), units.Speed, isStrong: isHeld, isHeld: isHeld);

    private void Vertical(string label, Gauge gauge, bool isStrong) =>
        Row(label, Readout.Of(gauge, units.Vertical, Trust.Vertical), units.Vertical, isSigned: true, isStrong: isStrong);

    private void Row(string label, Readout readout, DisplayUnit unit, bool isSigned = false, bool isStrong = false, bool isHeld = false)
    {
        json.WriteStartObject();
        json.WriteString("label", label);
        PageFrame.WriteNumber(json, readout, unit, isSigned);
        json.WriteString("sigma", isSigned ? readout.SigmaText() : "");
        json.WriteBoolean("strong", isStrong);
        json.WriteBoolean("held", isHeld);
        json.WriteEndObject();
    }
}
