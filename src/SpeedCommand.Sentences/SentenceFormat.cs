namespace SpeedCommand.Sentences;

/// <summary>Lines with NMEA 0183 sentences; the readings of every sound sentence of a line count.</summary>
/// <param name="rule">Whether sentences may lack a checksum.</param>
public sealed class SentenceFormat(ChecksumRule rule) : LineFormat
{
    /// <inheritdoc/>
    public override LineContent Read(ReadOnlySpan<byte> line, Span<Reading> readings)
    {
        int sentenceCount = 0, count = 0, badCount = 0;
        foreach (var sentence in new SentencesInLine(line, rule))
        {
            sentenceCount++;
            var found = new XdrReadings(sentence);
            badCount += found.BadCount;
            foreach (var reading in found)
            {
                readings[count] = reading;
                count++;
            }
        }

        return sentenceCount == 0 ? LineContent.Bad : new LineContent(IsSound: true, count, badCount, double.NaN);
    }
}
