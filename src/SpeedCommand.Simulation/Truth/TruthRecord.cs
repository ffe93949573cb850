using System.Globalization;
using System.Text;
using System.Text.Json;

namespace SpeedCommand.Simulation.Truth;

/// <summary>Truth samples as the JSON of a flight log's truth records, both ways.</summary>
public static class TruthRecord
{
    private const double IcePointK = 273.15;
    private const double Degree = Math.PI / 180;

    /// <summary>Writes a sample; the time is the record's own.</summary>
    /// <param name="sample">The sample.</param>
    /// <returns>One JSON object on one line, with decimals that lie well below any sensor's noise.</returns>
    public static byte[] Write(in TruthSample sample)
    {
        var text = string.Create(CultureInfo.InvariantCulture,
            $$"""
            {"heightM":{{sample.HeightM:F3}},"pressureAltitudeM":{{sample.PressureAltitudeM:F2}},"trueAirspeedMps":{{sample.TrueAirspeedMps:F4}},"indicatedAirspeedMps":{{sample.IndicatedAirspeedMps:F3}},"climbMps":{{sample.ClimbMps:F4}},"airMps":{{sample.AirMps:F4}},"temperatureC":{{sample.TemperatureK - IcePointK:F2}},"loadFactor":{{sample.LoadFactor:F3}},"bankDeg":{{sample.BankRad / Degree:F2}}}
            """);
        return Encoding.ASCII.GetBytes(text);
    }

    /// <summary>Reads a record.</summary>
    /// <param name="timeUs">Stamp of the record, microseconds.</param>
    /// <param name="json">Its JSON.</param>
    /// <param name="sample">The sample; a number that is not there is NaN.</param>
    /// <returns>Whether it could be read.</returns>
    public static bool TryRead(long timeUs, ReadOnlySpan<byte> json, out TruthSample sample)
    {
        sample = new TruthSample(timeUs, double.NaN, double.NaN, double.NaN, double.NaN, double.NaN, double.NaN, double.NaN,
            double.NaN, double.NaN);
        try
        {
            var reader = new Utf8JsonReader(json);
            while (reader.Read())
            {
                if (reader.TokenType != JsonTokenType.PropertyName)
                {
                    continue;
                }

                var name = reader.GetString();
                reader.Read();
                if (reader.TokenType == JsonTokenType.Number)
                {
                    sample = With(sample, name, reader.GetDouble());
                }
            }

            return true;
        }
        catch (JsonException)
        {
            return false;
        }
    }

    private static TruthSample With(in TruthSample sample, string? name, double value) => name switch
    {
        "heightM" => sample with { HeightM = value },
        "pressureAltitudeM" => sample with { PressureAltitudeM = value },
        "trueAirspeedMps" => sample with { TrueAirspeedMps = value },
        "indicatedAirspeedMps" => sample with { IndicatedAirspeedMps = value },
        "climbMps" => sample with { ClimbMps = value },
        "airMps" => sample with { AirMps = value },
        "temperatureC" => sample with { TemperatureK = value + IcePointK },
        "loadFactor" => sample with { LoadFactor = value },
        "bankDeg" => sample with { BankRad = value * Degree },
        _ => sample,
    };
}
