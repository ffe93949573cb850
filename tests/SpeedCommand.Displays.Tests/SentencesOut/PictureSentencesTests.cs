using System.Globalization;
using System.Text;
using CsCheck;
using SpeedCommand.Displays.SentencesOut;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Displays.Tests.SentencesOut;

/// <summary>What goes out, read back by the reader of the sensors' sentences.</summary>
public class PictureSentencesTests
{
    private static readonly string[] AgreedOrder =
    [
        "HOLD", "FLY", "MINSINK", "GLIDE", "CLIMB", "AVERAGE", "NETTO", "EXPECT", "PALT", "DALT", "AIRTEMP", "PHASE", "LIMIT", "TIME", "RANGE",
    ];

    [Fact]
    public void Render_Glide_SaysItInTheAgreedOrder()
    {
        var (values, text) = Read(Pictures.GlidingTooSlow);

        Assert.Equal(AgreedOrder, values.Select(value => value.Id));
        Assert.Equal(
            [33.33, 33.33, 22.78, 26.39, -1.8, -1.1, -0.64, 2, 1320, 1480, 8, 0, 0, 1320, 34_000],
            values.Select(value => value.Number!.Value));
        Assert.Equal("", text);
    }

    /// <summary>Whoever programs the other instrument reads the document.</summary>
    [Fact]
    public void Document_HoldsTheSentences() => Assert.Contains(
        "```\n" + string.Join('\n', Lines(Pictures.GlidingTooSlow)) + "\n```",
        File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "sentences.md")));

    [Fact]
    public void Render_ClimbAtALimitWithFaults_SaysThem()
    {
        var (values, text) = Read(Pictures.ClimbingTooFast with
        {
            LimitedBy = LimitedBy.RoughAir,
            Faults = Faults.RecorderStopped | Faults.TemperatureSilent,
        });

        Assert.Equal(1, values.Single(value => value.Id == "PHASE").Number);
        Assert.Equal(1, values.Single(value => value.Id == "LIMIT").Number);
        Assert.Equal("temperature-silent", text);
    }

    [Fact]
    public void Render_WhatIsNotKnownOrWorthNothing_IsAnEmptyField()
    {
        Assert.All(Read(Pictures.Nothing).Values, value => Assert.Equal(value.Id is "PHASE" or "LIMIT", value.Number is not null));
        var doubtful = Read(Pictures.GlidingTooSlow with { NettoMps = new Gauge(1, 2.1, 0), ClimbMps = new Gauge(1, 1.9, 0) }).Values;
        Assert.Null(doubtful.Single(value => value.Id == "NETTO").Number);
        Assert.Equal(1, doubtful.Single(value => value.Id == "CLIMB").Number);
    }

    [Fact]
    public void Render_AnyPicture_IsFiveSoundSentences_AndNeverAReadingOfASensor() => RandomPictures.Any.Sample(picture =>
    {
        Assert.Equal(AgreedOrder, Read(picture).Values.Select(value => value.Id));
        Assert.Equal(Lines(picture), AnotherCulture.Run(() => Lines(picture)));
    }, iter: 300);

    [Fact]
    public void Render_TooLittleRoom_WritesNothing() =>
        Assert.Equal(0, PictureSentences.Render(Pictures.GlidingTooSlow, new byte[PictureSentences.MaxLength - 1]));

    [Fact]
    public void RenderCaution_IsASoundSentence()
    {
        var frame = new byte[82];
        var line = Encoding.ASCII.GetString(frame, 0, PictureSentences.RenderCaution(frame));
        Assert.StartsWith("$YXTXT,01,01,01,advisory only", line);
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(Encoding.ASCII.GetBytes(line.TrimEnd()), ChecksumRule.Required, out _));
    }

    [Fact]
    public void Render_ManyPictures_AllocatesNothing()
    {
        var frame = new byte[PictureSentences.MaxLength];
        var pictures = Pictures.Names.Select(Pictures.Named).ToArray();
        Assert.Equal(0, Allocation.Of(i => PictureSentences.Render(pictures[i % pictures.Length], frame)));
    }

    private static string[] Lines(CockpitPicture picture)
    {
        var frame = new byte[PictureSentences.MaxLength];
        var text = Encoding.ASCII.GetString(frame, 0, PictureSentences.Render(picture, frame));
        var lines = text.Split("\r\n");
        Assert.Equal((6, ""), (lines.Length, lines[5]));
        return lines[..5];
    }

    private static (List<(string Id, double? Number)> Values, string Text) Read(CockpitPicture picture)
    {
        var values = new List<(string, double?)>();
        var text = "";
        foreach (var line in Lines(picture))
        {
            Assert.InRange(line.Length, 1, SentenceReader.MaxLength);
            Assert.Equal(SentenceFault.None, SentenceReader.TryRead(Encoding.ASCII.GetBytes(line), ChecksumRule.Required, out var sentence));
            var fields = new List<string>();
            foreach (var field in sentence.Fields)
            {
                fields.Add(Encoding.ASCII.GetString(field));
            }

            if (sentence.IsOfType("TXT"u8))
            {
                text = fields[3];
                continue;
            }

            Assert.True(sentence.IsOfType("XDR"u8));
            Assert.Equal(0, fields.Count % 4);
            Assert.False(new XdrReadings(sentence).MoveNext());
            values.AddRange(fields.Chunk(4).Select(group => (group[3], group[1].Length == 0 ? (double?)null : double.Parse(group[1], CultureInfo.InvariantCulture))));
        }

        return (values, text);
    }
}
