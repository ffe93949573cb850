using System.Globalization;
using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Faults;

/// <summary>Changes values inside XDR sentences and mends the checksum, as a sensor that errs sends valid sentences.</summary>
internal static class SensedValues
{
    private const double IcePointK = 273.15;
    private const int FieldsPerMeasurement = 4;

    /// <summary>Puts another value into each measurement.</summary>
    /// <param name="line">A line without its end.</param>
    /// <param name="change">The new value for a kind and its value, both SI; the same value for no change.</param>
    /// <returns>The line, changed or as it was.</returns>
    public static ReadOnlySpan<byte> Change(ReadOnlySpan<byte> line, Func<ReadingKind, double, double> change)
    {
        if (SentenceReader.TryRead(line, ChecksumRule.Required, out var sentence) != SentenceFault.None || !sentence.IsOfType("XDR"u8))
        {
            return line;
        }

        var start = line.LastIndexOf((byte)'$') + 1;
        var content = line[start..];
        var fields = Encoding.ASCII.GetString(content[..content.IndexOf((byte)'*')]).Split(',');
        var isChanged = false;
        for (var i = 1; i + FieldsPerMeasurement <= fields.Length; i += FieldsPerMeasurement)
        {
            isChanged |= TryChange(fields.AsSpan(i, FieldsPerMeasurement), change);
        }

        var sent = new byte[SentenceReader.MaxLength + 2];
        return isChanged && SentenceWriter.TryWrite(sent, Encoding.ASCII.GetBytes(string.Join(',', fields)), out var length)
            ? sent.AsSpan(0, length - 2)
            : line;
    }

    private static bool TryChange(Span<string> fields, Func<ReadingKind, double, double> change)
    {
        var (number, unit, id) = (fields[1], fields[2], fields[3]);
        var at = Array.FindIndex(ScenarioSensors.Kinds, known => known.Word == id);
        if (at < 0 || !double.TryParse(number, NumberStyles.Float, CultureInfo.InvariantCulture, out var value))
        {
            return false;
        }

        var kind = ScenarioSensors.Kinds[at].Value;
        var (factor, offset) = SiOf(kind, unit);
        var si = value * factor + offset;
        var changed = change(kind, si);
        if (changed.Equals(si))
        {
            return false;
        }

        var decimals = number.Contains('.', StringComparison.Ordinal) ? number.Length - number.IndexOf('.', StringComparison.Ordinal) - 1 : 0;
        fields[1] = ((changed - offset) / factor).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return true;
    }

    /// <summary>SI = number x factor + offset, for the units of docs/sentences.md.</summary>
    private static (double Factor, double Offset) SiOf(ReadingKind kind, string unit) => kind switch
    {
        ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa or ReadingKind.TotalEnergyProbePa => (unit == "B" ? 1e5 : 1, 0),
        ReadingKind.OutsideAirTemperatureK => (1, IcePointK),
        ReadingKind.RelativeHumidity => (0.01, 0),
        ReadingKind.BankRad => (Math.PI / 180, 0),
        _ => (1, 0),
    };
}
