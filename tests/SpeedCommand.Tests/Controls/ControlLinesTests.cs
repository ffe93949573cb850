using System.Text;
using CsCheck;
using SpeedCommand.Controls;

namespace SpeedCommand.Tests.Controls;

/// <summary>The line protocol, byte by byte.</summary>
public sealed class ControlLinesTests
{
    private static List<string> Answers(string text, int chunk = 1000) => Answers(Encoding.Latin1.GetBytes(text), chunk);

    private static List<string> Answers(byte[] bytes, int chunk)
    {
        using var desk = new TestDesk(ballastKg: 80);
        var lines = new ControlLines(desk.Desk, ControlSource.SerialPort);
        var answers = new List<string>();
        for (var at = 0; at < bytes.Length; at += chunk)
        {
            lines.Push(bytes.AsSpan(at, Math.Min(chunk, bytes.Length - at)), answers.Add);
        }

        return answers;
    }

    [Theory] // any line end, and none twice
    [InlineData("bugs 5 %\n")]
    [InlineData("bugs 5 %\r")]
    [InlineData("bugs 5 %\r\n")]
    [InlineData("\n\r\n  bugs 5 %  \r\n\r\n")]
    public void LineEnds(string text) => Assert.Equal(["ok bugs 5 %"], Answers(text));

    [Fact]
    public void EveryPrefix_AnswersWholeLinesOnly_InAnyChunks()
    {
        const string Text = "expected-climb 1.5 m/s\nballast stop\r\nqnh 1 m\nmute on\n";
        string[] whole = ["ok expected-climb 1.5 m/s", "ok ballast 80 kg",
            "error qnh: expected a number with a unit (Pa, hPa, kPa, mbar, bar, inHg, mmHg), + or -, found '1 m'", "ok mute on"];
        var ends = Enumerable.Range(0, Text.Length).Where(at => Text[at] == '\n' || Text[at] == '\r').ToArray();
        for (var length = 0; length <= Text.Length; length++)
        {
            var count = ends.Where(end => end < length && Text[end - 1] != '\r').Count();
            Assert.Equal(whole.Take(count), Answers(Text[..length], 1 + length % 5));
        }
    }

    [Theory] // noise of a line, and the echo of our own answers, which would go to and fro for ever
    [InlineData("\u0000bugs 5 %\n")]
    [InlineData("bugs\u00ff5 %\n")]
    [InlineData("ok bugs 5 %\n")]
    [InlineData("error bugs: expected 0 to 100 %, found '101 %'\n")]
    [InlineData("   \n")]
    public void Junk_IsPassedOver(string text) => Assert.Equal(["ok volume 20 %"], Answers(text + "volume 20 %\n"));

    [Fact]
    public void LongLine_IsRefusedOnce_AndTheNextIsTaken() => Assert.Equal(
        ["error expected at most 96 characters in a line, found more", "ok mute on"], Answers(new string('x', 5000) + "\nmute on\n", 7));

    [Fact] // seeded junk with lines in it: nothing throws, and a good line after it is always answered
    public void SeededJunk_NeverSpoilsTheLineAfterIt() => Gen.Select(Gen.Byte.Array[0, 300], Gen.Int[1, 50]).Sample((junk, chunk) =>
    {
        var answers = Answers([.. junk, .. "\nmute on\n"u8], chunk);
        Assert.Equal("ok mute on", answers[^1]);
        Assert.All(answers, answer => Assert.DoesNotContain(answer, one => one is < ' ' or > '~'));
    }, iter: 500);

    [Fact]
    public void Answers_AreNoRequests()
    {
        var first = Answers("bugs 5 %\nbugs 500 %\nqnh\nfoo\n");
        Assert.Equal(4, first.Count);
        Assert.Empty(Answers(string.Concat(first.Select(answer => answer + "\r\n"))));
    }
}
