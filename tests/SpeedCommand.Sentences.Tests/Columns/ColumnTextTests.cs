using SpeedCommand.Sentences.Columns;

namespace SpeedCommand.Sentences.Tests.Columns;

public sealed class ColumnTextTests
{
    [Fact]
    public void TryParse_Marks()
    {
        Assert.True(ColumnText.TryParse("COUNTER over 256", out var counter, out _));
        Assert.Equal(new SampleMark(SampleMarkKind.Counter, 256), new ColumnFormat([counter]).Mark);
        Assert.True(ColumnText.TryParse("TIME us over 4294967296", out var time, out _));
        Assert.Equal(new SampleMark(SampleMarkKind.Time, 4_294_967_296), new ColumnFormat([time]).Mark);
        Assert.True(ColumnText.TryParse("TIME ms over 60000", out time, out _));
        Assert.Equal(new SampleMark(SampleMarkKind.Time, 60_000_000), new ColumnFormat([time]).Mark);
    }

    [Theory]
    [InlineData("", "expected one of STATIC, IMPACT, TEPROBE, IAS, OAT, RH, LOAD, BANK, COUNTER, TIME, skip, found ''")]
    [InlineData("static hPa", "expected one of STATIC, IMPACT, TEPROBE, IAS, OAT, RH, LOAD, BANK, COUNTER, TIME, skip, found 'static hPa'")]
    [InlineData("STATIC", "expected STATIC with a unit (Pa, hPa, mbar, kPa, bar, inHg), found 'STATIC'")]
    [InlineData("STATIC degC", "expected STATIC with a unit (Pa, hPa, mbar, kPa, bar, inHg), found 'STATIC degC'")]
    [InlineData("OAT C", "expected OAT with a unit (degC, K, degF), found 'OAT C'")]
    [InlineData("IMPACT Pa *", "expected a number other than 0 after '*', found 'IMPACT Pa *'")]
    [InlineData("IMPACT Pa * 0", "expected a number other than 0 after '*', found 'IMPACT Pa * 0'")]
    [InlineData("IMPACT Pa * 0,5", "expected a number other than 0 after '*', found 'IMPACT Pa * 0,5'")]
    [InlineData("IMPACT Pa + x", "expected a number after '+', found 'IMPACT Pa + x'")]
    [InlineData("IMPACT Pa - 3 * 2", "expected nothing after 'IMPACT Pa - 3', found 'IMPACT Pa - 3 * 2'")]
    [InlineData("skip this", "expected nothing after 'skip', found 'skip this'")]
    [InlineData("TIME h", "expected TIME with a unit (s, ms, us), found 'TIME h'")]
    [InlineData("COUNTER over 1", "expected the number of values, at least 2, after 'over', found 'COUNTER over 1'")]
    public void TryParse_Nonsense_SaysWhatWasExpected(string text, string expected)
    {
        Assert.False(ColumnText.TryParse(text, out _, out var problem));
        Assert.Equal(expected, problem);
    }

    [Fact]
    public void ColumnFormat_WithoutColumnsOrWithTooMany_IsRefused()
    {
        Assert.Throws<ArgumentException>(() => new ColumnFormat([]));
        Assert.Throws<ArgumentException>(() => new ColumnFormat(new Column[33]));
    }
}
