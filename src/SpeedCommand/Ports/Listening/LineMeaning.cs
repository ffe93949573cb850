using System.Text;
using SpeedCommand.Pipeline;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Ports.Listening;

/// <summary>What one line says, for a person who maps a board's lines.</summary>
/// <param name="Fault">Why there is no sentence in it.</param>
/// <param name="Kind">What lines are counted under: the sentence and its measurements, or the fault.</param>
/// <param name="Text">What was understood.</param>
/// <param name="Readings">The kinds of possible readings in it.</param>
/// <param name="Impossible">Readings outside their range.</param>
/// <param name="Malformed">Measurements of ours that could not be read.</param>
internal sealed record LineMeaning(
    SentenceFault Fault, string Kind, string Text, IReadOnlyList<ReadingKind> Readings, int Impossible, int Malformed)
{
    private const double DegreesPerRadian = 180 / Math.PI;

    /// <summary>Whether the sentence is one this program has no use for.</summary>
    public bool IsUnknown { get; private init; }

    /// <summary>A line of plain numbers, in the columns of the port's settings.</summary>
    public static LineMeaning OfColumns(ReadOnlySpan<byte> line, LineFormat format)
    {
        Span<Reading> readings = stackalloc Reading[LineFormat.MaxReadings];
        var content = format.Read(line, readings);
        if (!content.IsSound)
        {
            return new LineMeaning(SentenceFault.Malformed, "other columns", "not the columns of the settings", [], 0, 0);
        }

        var words = new List<string>();
        var kinds = new List<ReadingKind>();
        foreach (var reading in readings[..content.Count])
        {
            var isPossible = ReadingRanges.IsPossible(reading, out _);
            words.Add(ReadingWords.Show(reading) + (isPossible ? "" : " (out of range)"));
            if (isPossible)
            {
                kinds.Add(reading.Kind);
            }
        }

        AddCount(words, content.BadCount, "malformed");
        return new LineMeaning(SentenceFault.None, "columns", string.Join(", ", words), kinds, words.Count - kinds.Count, content.BadCount);
    }

    public static LineMeaning Of(ReadOnlySpan<byte> line, ChecksumRule rule)
    {
        var fault = SentenceReader.TryRead(line, rule, out var sentence);
        if (fault != SentenceFault.None)
        {
            return new LineMeaning(fault, Name(fault), Explain(fault, line), [], 0, 0);
        }

        var address = Encoding.ASCII.GetString(sentence.Talker) + Encoding.ASCII.GetString(sentence.Type);
        return sentence.IsOfType("XDR"u8) ? OfMeasurements(address, new XdrReadings(sentence)) : OfReceiver(address, sentence);
    }

    private static LineMeaning OfMeasurements(string address, XdrReadings measurements)
    {
        var kinds = new List<ReadingKind>();
        var words = new List<string>();
        var names = new List<string>();
        var impossible = 0;
        foreach (var reading in measurements)
        {
            var isPossible = ReadingRanges.IsPossible(reading, out _);
            var judged = isPossible ? "" : " (out of range)";
            words.Add(ReadingWords.Show(reading) + judged);
            names.Add(ReadingWords.Name(reading.Kind) + judged);
            impossible += isPossible ? 0 : 1;
            if (isPossible)
            {
                kinds.Add(reading.Kind);
            }
        }

        AddCount(words, measurements.BadCount, "malformed");
        AddCount(words, measurements.UnknownCount, "not ours");
        return new LineMeaning(SentenceFault.None, $"{address} {string.Join(", ", names)}".TrimEnd(), string.Join(", ", words), kinds, impossible, measurements.BadCount)
        {
            IsUnknown = names.Count == 0 && measurements.BadCount == 0,
        };
    }

    private static void AddCount(List<string> words, int count, string what)
    {
        if (count > 0)
        {
            words.Add($"{count} {(count == 1 ? "measurement" : "measurements")} {what}");
        }
    }

    private static LineMeaning OfReceiver(string address, in Sentence sentence)
    {
        var text = RmcSentence.TryRead(sentence, out var rmc) ? Show(rmc.HasFix, $"{Position(rmc.LatitudeRad, rmc.LongitudeRad)}, {Motion(rmc.GroundSpeedMps, rmc.TrackRad)}")
            : GgaSentence.TryRead(sentence, out var gga) ? Show(gga.HasFix, FormattableString.Invariant($"{Position(gga.LatitudeRad, gga.LongitudeRad)}, altitude {gga.AltitudeM:F1} m, {gga.SatelliteCount} satellites"))
            : VtgSentence.TryRead(sentence, out var vtg) ? Show(vtg.HasFix, Motion(vtg.GroundSpeedMps, vtg.TrackRad))
            : null;
        return new LineMeaning(SentenceFault.None, address, text ?? "not used by this program", [], 0, 0) { IsUnknown = text is null };
    }

    private static string Show(bool hasFix, string text) => hasFix ? text : "receiver without a fix";

    private static string Position(double latitudeRad, double longitudeRad) => FormattableString.Invariant(
        $"{Math.Abs(latitudeRad) * DegreesPerRadian:F4} {(latitudeRad < 0 ? 'S' : 'N')} {Math.Abs(longitudeRad) * DegreesPerRadian:F4} {(longitudeRad < 0 ? 'W' : 'E')}");

    private static string Motion(double groundSpeedMps, double trackRad) => double.IsNaN(trackRad)
        ? FormattableString.Invariant($"{groundSpeedMps:F1} m/s over the ground")
        : FormattableString.Invariant($"{groundSpeedMps:F1} m/s over the ground, track {trackRad * DegreesPerRadian:F0} deg");

    private static string Name(SentenceFault fault) => fault switch
    {
        SentenceFault.NoSentence => "no sentence",
        SentenceFault.TooLong => "too long",
        SentenceFault.MissingChecksum => "no checksum",
        SentenceFault.WrongChecksum => "wrong checksum",
        _ => "malformed",
    };

    private static string Explain(SentenceFault fault, ReadOnlySpan<byte> line) => fault switch
    {
        SentenceFault.NoSentence => "no '$' in it",
        SentenceFault.TooLong => $"longer than {SentenceReader.MaxLength} characters",
        SentenceFault.WrongChecksum => $"wrong checksum: expected {Checksum(line)}",
        SentenceFault.MissingChecksum => $"no checksum: expected *{Checksum(line)} at the end",
        _ => "malformed",
    };

    /// <summary>The checksum the line should carry: exclusive or of what stands between '$' and '*'.</summary>
    private static string Checksum(ReadOnlySpan<byte> line)
    {
        var content = line[(line.LastIndexOf((byte)'$') + 1)..];
        var star = content.IndexOf((byte)'*');
        byte sum = 0;
        foreach (var one in star < 0 ? content : content[..star])
        {
            sum ^= one;
        }

        return sum.ToString("X2", System.Globalization.CultureInfo.InvariantCulture);
    }
}
