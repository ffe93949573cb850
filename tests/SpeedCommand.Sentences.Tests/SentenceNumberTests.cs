using System.Globalization;
using CsCheck;

namespace SpeedCommand.Sentences.Tests;

public sealed class SentenceNumberTests
{
    [Theory]
    [InlineData("0", 0)]
    [InlineData("95461.2", 95461.2)]
    [InlineData("-12.30", -12.3)]
    [InlineData("+0.5", 0.5)]
    [InlineData("007.50", 7.5)]
    [InlineData("0.0000001", 1e-7)]
    public void TryRead_Number_IsRead(string field, double expected)
    {
        Assert.True(SentenceNumber.TryRead(WireText.Bytes(field), out var value));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData("")]
    [InlineData("+")]
    [InlineData("-")]
    [InlineData(".")]
    [InlineData(".5")]
    [InlineData("5.")]
    [InlineData("-.5")]
    [InlineData("1e3")]
    [InlineData("1E3")]
    [InlineData("NaN")]
    [InlineData("Infinity")]
    [InlineData("-\u221E")]
    [InlineData("0x10")]
    [InlineData(" 1")]
    [InlineData("1 ")]
    [InlineData("1\0")]
    [InlineData("1,5")]
    [InlineData("1 000")]
    [InlineData("1.2.3")]
    [InlineData("--1")]
    [InlineData("1-")]
    [InlineData("(1)")]
    [InlineData("\u0661")]
    public void TryRead_AnythingElse_IsRefused(string field)
    {
        Assert.False(SentenceNumber.TryRead(WireText.Bytes(field), out var value));
        Assert.True(double.IsNaN(value));
    }

    [Fact]
    public void TryRead_BeyondADouble_IsRefused()
    {
        // The largest double is 1.797e308 (IEEE 754).
        Assert.True(SentenceNumber.TryRead(WireText.Bytes("1" + new string('0', 308)), out _));
        Assert.False(SentenceNumber.TryRead(WireText.Bytes("1" + new string('0', 309)), out _));
    }

    [Fact]
    public void TryRead_AnyDecimal_IsTheNearestDouble() =>
        // decimal holds these numbers exactly, and its conversion to double goes another way than the reader's.
        Gen.Select(Gen.Int[-999_999_999, 999_999_999], Gen.Int[0, 9]).Sample((digits, decimals) =>
        {
            var exact = new decimal(Math.Abs(digits), 0, 0, digits < 0, (byte)decimals);
            var text = exact.ToString(CultureInfo.InvariantCulture);
            Assert.True(SentenceNumber.TryRead(WireText.Bytes(text), out var value));
            Assert.Equal((double)exact, value);
        });
}
