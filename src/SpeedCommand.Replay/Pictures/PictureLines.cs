using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Pictures;

/// <summary>Writes each picture as one JSON object on one line; docs/log-format.md lists the keys. No allocation a picture.</summary>
public sealed class PictureLines(Stream stream) : IPictureSink
{
    /// <summary>All keys, the longest numbers and every fault together stay below this.</summary>
    private readonly byte[] _line = new byte[2048];

    /// <summary>Pictures written so far.</summary>
    public long Count { get; private set; }

    /// <inheritdoc/>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void OnPicture(in CockpitPicture picture)
    {
        var line = new JsonLineBuilder(_line);
        line.Begin();
        line.Number("t"u8, picture.TimeS, 1);
        line.Word("phase"u8, picture.Phase == FlightPhase.Climbing ? "climbing" : "gliding");
        WriteAirData(ref line, picture);
        WriteTargets(ref line, picture);
        line.BeginWords("faults"u8);
        for (var i = 0; i < FaultNames.All.Count; i++)
        {
            if ((picture.Faults & FaultNames.All[i].Key) != 0)
            {
                line.Element(FaultNames.All[i].Value);
            }
        }

        line.EndWords();
        line.End();
        stream.Write(_line, 0, line.Length);
        Count++;
    }

    private static void WriteAirData(ref JsonLineBuilder line, in CockpitPicture picture)
    {
        line.Number("pressureAltitudeM"u8, picture.PressureAltitudeM.Value, 1);
        line.Number("densityAltitudeM"u8, picture.DensityAltitudeM.Value, 1);
        line.Number("temperatureC"u8, picture.TemperatureK.Value - 273.15, 2);
        line.Number("indicatedAirspeedMps"u8, picture.IndicatedAirspeedMps.Value, 2);
        line.Number("trueAirspeedMps"u8, picture.TrueAirspeedMps.Value, 2);
        line.Number("climbMps"u8, picture.ClimbMps.Value, 3);
        line.Number("climbSigmaMps"u8, picture.ClimbMps.Sigma, 3);
        line.Number("averageClimbMps"u8, picture.AverageClimbMps.Value, 3);
        line.Number("thermalAverageMps"u8, picture.ThermalAverageMps.Value, 3);
        line.Number("nettoMps"u8, picture.NettoMps.Value, 3);
        line.Number("nettoSigmaMps"u8, picture.NettoMps.Sigma, 3);
        line.Number("relativeNettoMps"u8, picture.RelativeNettoMps.Value, 3);
    }

    private static void WriteTargets(ref JsonLineBuilder line, in CockpitPicture picture)
    {
        line.Number("minSinkIndicatedMps"u8, picture.MinSinkIndicatedMps.Value, 2);
        line.Number("bestGlideIndicatedMps"u8, picture.BestGlideIndicatedMps.Value, 2);
        line.Number("speedToFlyIndicatedMps"u8, picture.SpeedToFlyIndicatedMps.Value, 2);
        line.Number("holdIndicatedMps"u8, picture.HoldIndicatedMps.Value, 2);
        if (LimitWords.Of(picture.LimitedBy) is { } limit)
        {
            line.Word("limitedBy"u8, limit);
        }
        else
        {
            line.Null("limitedBy"u8);
        }

        line.Number("enduranceS"u8, picture.EnduranceS.Value, 0);
        line.Number("rangeM"u8, picture.RangeM.Value, 0);
    }
}
