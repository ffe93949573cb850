using System.Globalization;

namespace SpeedCommand.Sentences.Tests;

/// <summary>A machine set to German conventions: comma for the decimals, point for the thousands.</summary>
public sealed class CultureTests : IDisposable
{
    private readonly CultureInfo _before = CultureInfo.CurrentCulture;

    public CultureTests()
    {
        // Cultures have no data of their own in an invariant build, so the conventions are written out here.
        var german = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        german.NumberFormat = new NumberFormatInfo
        {
            NumberDecimalSeparator = ",",
            NumberGroupSeparator = ".",
            NegativeSign = "\u2212",
        };
        CultureInfo.CurrentCulture = german;
    }

    public void Dispose() => CultureInfo.CurrentCulture = _before;

    [Fact]
    public void CurrentCulture_IsIndeedACommaCulture() =>
        Assert.Equal("\u22121,5", (-1.5).ToString("F1", CultureInfo.CurrentCulture));

    [Fact]
    public void TryWriteXdr_CommaCulture_WritesPointsAndComesBack()
    {
        var buffer = new byte[82];
        Assert.True(SentenceWriter.TryWriteXdr(buffer, "YX"u8,
            [new(ReadingKind.ImpactPressurePa, -1612.4, 1), new(ReadingKind.OutsideAirTemperatureK, 260.85, 1)], out var written));
        var line = WireText.Text(buffer.AsSpan(0, written));
        Assert.Equal(WireText.Signed("YXXDR,P,-1612.4,P,IMPACT,C,-12.3,C,OAT") + "\r\n", line);

        var sent = buffer.AsSpan(0, written - 2);
        Assert.Equal(SentenceFault.None, SentenceReader.TryRead(sent, ChecksumRule.Required, out var sentence));
        var readings = new XdrReadings(sentence);
        Assert.True(readings.MoveNext());
        Assert.Equal(new Reading(ReadingKind.ImpactPressurePa, -1612.4), readings.Current);
    }

    [Fact]
    public void TryRead_CommaCulture_StillRefusesACommaAndThousands()
    {
        Assert.False(SentenceNumber.TryRead("1,5"u8, out _));
        Assert.False(SentenceNumber.TryRead("1.612.4"u8, out _));
        Assert.True(SentenceNumber.TryRead("1.612"u8, out var value));
        Assert.Equal(1.612, value);
    }
}
