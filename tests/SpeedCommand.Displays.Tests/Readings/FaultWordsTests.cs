using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Readings;

public class FaultWordsTests
{
    [Fact]
    public void Of_EveryFault_HasItsOwnWordsThatFitATwentyCharacterLine()
    {
        var words = FaultNames.All.Select(fault => FaultWords.Of(fault.Key)).ToList();

        Assert.Equal(words.Count, words.Distinct().Count());
        Assert.DoesNotContain("unknown fault", words);
        // "! ", the words, a blank, "+9".
        Assert.All(words, word => Assert.InRange(word.Length, 1, 20 - 2 - 1 - 2));
        Assert.All(words, word => Assert.All(word, c => Assert.InRange(c, ' ', 'z')));
    }

    [Theory]
    [InlineData(Faults.StaticSilent, "no static")]
    [InlineData(Faults.TemperatureSilent, "no temperature")]
    [InlineData(Faults.BadLines, "unreadable data")]
    [InlineData(Faults.NoLimits, "no speed limits")]
    [InlineData(Faults.PortMissing, "board unplugged")]
    [InlineData(Faults.PortRefused, "port refused")]
    [InlineData(Faults.RecorderStopped, "not recording")]
    [InlineData((Faults)(1 << 30), "unknown fault")]
    [InlineData(Faults.None, "unknown fault")]
    public void Of_OneFault_SaysIt(Faults fault, string words) => Assert.Equal(words, FaultWords.Of(fault));

    [Fact]
    public void Gravest_SeveralFaults_IsTheOneThatBlanksMost()
    {
        Assert.Equal(Faults.AirspeedSilent, FaultWords.Gravest(Faults.BadLines | Faults.AirspeedSilent | Faults.NoLimits));
        Assert.Equal(Faults.None, FaultWords.Gravest(Faults.None));
        Assert.Equal(3, FaultWords.Count(Faults.BadLines | Faults.AirspeedSilent | Faults.NoLimits));
    }
}
