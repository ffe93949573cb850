using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Sentences.Tests;

/// <summary>Seeded noise on valid input. A failure names its seed and round, and comes again.</summary>
public sealed class NoisyLineTests
{
    internal static readonly string[] s_valid =
    [
        "$YXXDR,P,95461.2,P,STATIC*74",
        "$YXXDR,P,612.4,P,IMPACT*62",
        "$WIXDR,C,-12.3,C,OAT,P,0.91234,B,BARO,H,45.2,P,RH*09",
        "$HCXDR,A,171,D,PITCH,A,-37,D,ROLL,G,367,,MAGX,G,2420,,MAGY,G,-8984,,MAGZ*41",
        "$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*47",
        "$GPRMC,123519,A,4807.038,N,01131.000,E,022.4,084.4,230394,003.1,W*6A",
        "$GPVTG,054.7,T,034.4,M,005.5,N,010.2,K*48",
    ];

    [Theory]
    [InlineData(ChecksumRule.Required)]
    [InlineData(ChecksumRule.Optional)]
    public void AMillionMutatedLines_NeverThrow_AndWhatPassesIsSound(ChecksumRule rule)
    {
        const int Seed = 20_260_614;
        var random = new Random(Seed);
        var accepted = 0;
        for (var round = 0; round < 1_000_000; round++)
        {
            var line = Mutate(s_valid[round % s_valid.Length], random);
            if (SentenceReader.TryRead(line, rule, out var sentence) != SentenceFault.None)
            {
                continue;
            }

            accepted++;
            var frames = WireText.Text(line).Split('$').Skip(1).Select(frame => frame.Split('*'));
            Assert.True(
                frames.Any(frame => frame.Length == 1
                    ? rule == ChecksumRule.Optional
                    : frame[1].StartsWith(WireText.Sum(frame[0]), StringComparison.OrdinalIgnoreCase)),
                $"seed {Seed}, round {round}: {WireText.Text(line)}");
            foreach (var reading in new XdrReadings(sentence))
            {
                Assert.True(double.IsFinite(reading.Value), $"seed {Seed}, round {round}: {WireText.Text(line)}");
            }

            AssertOnTheGlobe(sentence, $"seed {Seed}, round {round}: {WireText.Text(line)}");
        }

        // Some mutations hit only what stands before the '$', so a good part must pass; and most must not.
        Assert.InRange(accepted, 10_000, 500_000);
    }

    private static void AssertOnTheGlobe(Sentence sentence, string message)
    {
        if (RmcSentence.TryRead(sentence, out var rmc))
        {
            Assert.False(Math.Abs(rmc.LatitudeRad) > Math.PI / 2 || Math.Abs(rmc.LongitudeRad) > Math.PI, message);
            Assert.False(double.IsInfinity(rmc.GroundSpeedMps) || rmc.TimeOfDayS is < 0 or >= 86401, message);
        }

        if (GgaSentence.TryRead(sentence, out var gga))
        {
            Assert.False(Math.Abs(gga.LatitudeRad) > Math.PI / 2 || Math.Abs(gga.LongitudeRad) > Math.PI, message);
            Assert.False(double.IsInfinity(gga.AltitudeM) || gga.TimeOfDayS is < 0 or >= 86401, message);
        }

        if (VtgSentence.TryRead(sentence, out var vtg))
        {
            Assert.False(double.IsInfinity(vtg.GroundSpeedMps) || double.IsInfinity(vtg.TrackRad), message);
        }
    }

    internal static byte[] Mutate(string text, Random random)
    {
        var line = new List<byte>(WireText.Bytes(text));
        for (var change = random.Next(1, 4); change > 0; change--)
        {
            var at = random.Next(line.Count);
            switch (random.Next(6))
            {
                case 0: line[at] ^= (byte)(1 << random.Next(8)); break;
                case 1: line.Insert(at, (byte)random.Next(256)); break;
                case 2: line.RemoveAt(at); break;
                case 3: line[at] = "$*,.-+0Pe\0\r"u8[random.Next(11)]; break;
                case 4: line.RemoveRange(at, line.Count - at); break;
                default: line.InsertRange(0, line[..at]); break;
            }

            if (line.Count == 0)
            {
                break;
            }
        }

        return [.. line];
    }
}
