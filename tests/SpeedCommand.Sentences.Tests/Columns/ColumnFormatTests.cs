using System.Globalization;
using SpeedCommand.Sentences.Columns;

namespace SpeedCommand.Sentences.Tests.Columns;

public sealed class ColumnFormatTests
{
    private static readonly ColumnFormat Board = new([Parse("TIME ms"), Parse("STATIC hPa"), Parse("skip"), Parse("IMPACT Pa * 0.25 - 128")]);

    [Fact]
    public void Read_BoardsLine_GivesReadingsAndItsTime()
    {
        var (content, readings) = Read(Board, "1234,954.612,whatever,2961");
        Assert.Equal(new LineContent(true, 2, 0, 1_234_000), content);
        Assert.Equal(new SampleMark(SampleMarkKind.Time, double.NaN), Board.Mark);
        Assert.Equal((ReadingKind.StaticPressurePa, 95461.2), (readings[0].Kind, Math.Round(readings[0].Value, 9)));
        Assert.Equal(new Reading(ReadingKind.ImpactPressurePa, 612.25), readings[1]);
    }

    [Theory]
    [InlineData("")]
    [InlineData("1234,954.612,x")]
    [InlineData("1234,954.612,x,2961,")]
    [InlineData("1234,954.612,x,2961,7")]
    [InlineData("1234,954.612,x,29 61")]
    [InlineData("1234,9,54.612,x,2961")]
    [InlineData("1234,954.612,x,1e3")]
    [InlineData("1234,954.612,x,0x1F")]
    [InlineData("1234,954.,x,2961")]
    [InlineData("1234;954.612;x;2961")]
    [InlineData("time,static,note,impact")]
    [InlineData("1234,954.612,x,\xFF")]
    public void Read_LineWithAnythingElse_IsBadAsAWhole(string line) => Assert.Equal(LineContent.Bad, Read(Board, line).Content);

    [Theory]
    [InlineData("1234,954.612,x,", 1)]
    [InlineData("1234,,,", 0)]
    [InlineData(" 1234 , 954.612\t, , nan ", 1)]
    [InlineData("1234,NaN,NAN,2961", 1)]
    public void Read_EmptyColumnAndNan_HaveNothingToSay(string line, int expected) =>
        Assert.Equal(new LineContent(true, expected, 0, 1_234_000), Read(Board, line).Content);

    [Theory]
    [InlineData(',', "95461.2,612.4", true)]
    [InlineData(';', "95461.2;612.4", true)]
    [InlineData(';', "95461,2;612,4", false)]
    [InlineData('\t', "95461.2\t612.4", true)]
    [InlineData('\t', "95461.2 612.4", false)]
    [InlineData(' ', "95461.2 612.4", true)]
    [InlineData(' ', "   95461.2    612.4  ", true)]
    [InlineData(' ', "95461.2,612.4", false)]
    public void Read_Separators(char separator, string line, bool isSound)
    {
        var (content, readings) = Read(new ColumnFormat([Parse("STATIC Pa"), Parse("IMPACT Pa")], separator), line);
        Assert.Equal(isSound, content.IsSound);
        Assert.Equal(isSound ? [95461.2, 612.4] : [], readings.Select(reading => reading.Value));
    }

    [Theory]
    [InlineData("P,95461.2", true, 1)]
    [InlineData("T,23.5", true, 0)]
    [InlineData("PRESSURE,1,2,3", true, 0)]
    [InlineData("95461.2", false, 0)]
    [InlineData("P", false, 0)]
    [InlineData("P,", true, 0)]
    [InlineData("P;95461.2", false, 0)]
    [InlineData("\xFF,95461.2", false, 0)]
    public void Read_Prefix_TellsOtherLinesFromBrokenOnes(string line, bool isSound, int count)
    {
        var content = Read(new ColumnFormat([Parse("STATIC Pa")], ',', "P"), line).Content;
        Assert.Equal((isSound, count), (content.IsSound, content.Count));
    }

    [Fact]
    public void Read_EveryPrefixOfALine_IsNeverTakenForOneWithFewerColumns()
    {
        const string Line = "1234,954.612,whatever,2961";
        for (var length = 0; length <= Line.LastIndexOf(','); length++)
        {
            Assert.False(Read(Board, Line[..length]).Content.IsSound);
        }
    }

    /// <summary>Units against values worked out by hand from their definitions.</summary>
    [Theory]
    [InlineData("STATIC Pa", "95461.2", 95461.2)]
    [InlineData("STATIC hPa", "954.612", 95461.2)]
    [InlineData("STATIC mbar", "954.612", 95461.2)]
    [InlineData("STATIC kPa", "95.4612", 95461.2)]
    [InlineData("TEPROBE bar", "0.954612", 95461.2)]
    [InlineData("STATIC inHg", "29.92", 101_320.75888)]
    [InlineData("IAS m/s", "31.5", 31.5)]
    [InlineData("IAS km/h", "108", 30)]
    [InlineData("IAS kt", "60", 30.866666667)]
    [InlineData("OAT degC", "-12.3", 260.85)]
    [InlineData("OAT K", "288.15", 288.15)]
    [InlineData("OAT degF", "-40", 233.15)]
    [InlineData("RH %", "48", 0.48)]
    [InlineData("LOAD g", "-1.25", -1.25)]
    [InlineData("BANK deg", "-30", -0.523598776)]
    [InlineData("BANK rad", "0.5", 0.5)]
    [InlineData("OAT degC * 0.01", "2345", 296.6)]
    [InlineData("IMPACT Pa * -1", "-612.4", 612.4)]
    [InlineData("STATIC hPa + 300", "654.612", 95461.2)]
    public void Units(string column, string number, double expected)
    {
        var before = CultureInfo.CurrentCulture;
        CultureInfo.CurrentCulture = CommaCulture();
        try
        {
            Assert.Equal(expected, Assert.Single(Read(new ColumnFormat([Parse(column)]), number).Readings).Value, Math.Abs(expected) * 1e-9);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void MillionsOfBytesOfNoise_NeverThrow_AndAllocateNothing()
    {
        var random = new Random(3);
        var noise = new byte[1_000_000];
        for (var i = 0; i < noise.Length; i++)
        {
            noise[i] = random.Next(50) == 0 ? (byte)random.Next(256) : "0123456789.,,;- \t\nnaNP"u8[random.Next(22)];
        }

        LineFormat[] formats = [Board, new ColumnFormat([Parse("STATIC Pa"), Parse("COUNTER over 256")], ' ', "P"), new ColumnFormat([Parse("LOAD g")], ';')];
        var sink = new Counter(formats);
        var framer = new LineFramer();
        Assert.Equal(0, Allocation.Of(() => framer.Push(noise, sink)));
        Assert.InRange(sink.Sound, 1_000, sink.Lines);
    }

    private sealed class Counter(LineFormat[] formats) : ILineSink
    {
        private readonly Reading[] _readings = new Reading[LineFormat.MaxReadings];

        public int Lines { get; private set; }

        public int Sound { get; private set; }

        public void OnLine(ReadOnlySpan<byte> line)
        {
            foreach (var format in formats)
            {
                Lines++;
                Sound += format.Read(line, _readings).IsSound ? 1 : 0;
            }
        }
    }

    private static CultureInfo CommaCulture()
    {
        var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NegativeSign = "~";
        return culture;
    }

    private static Column Parse(string text)
    {
        Assert.True(ColumnText.TryParse(text, out var column, out var problem), problem);
        return column;
    }

    private static (LineContent Content, Reading[] Readings) Read(LineFormat format, string line)
    {
        var readings = new Reading[LineFormat.MaxReadings];
        var content = format.Read(WireText.Bytes(line), readings);
        return (content, readings[..content.Count]);
    }
}
