using System.Globalization;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.Tests.SampleTimes;

/// <summary>
/// Two boards, 50 Hz and 20 Hz, on jittery lines: how far apart do samples of the same moment come to lie? The jitter is made here,
/// not by the simulator. The numbers are those of the table in docs/sample-times.md.
/// </summary>
public sealed class AlignmentTests
{
    /// <summary>From here on a clock counts as settled, and so long each flight lasts, s.</summary>
    private const double SettledS = 10, FlightS = 130;
    private const int Flights = 20;

    private static readonly Dictionary<string, (JitteryLine Fast, JitteryLine Slow, SampleMarkKind Mark, bool IsGarbling)> Cases = new()
    {
        ["a busy machine: 0.5 ms on average"] = Case(0),
        ["the same, one board at 9600 baud"] = (new(20_000, 200e-6, 0, 500, Baud: 115_200), new(50_000, -200e-6, 0, 500, Baud: 9_600), default, false),
        ["and a timer of 16 ms on both lines"] = Case(16_000),
        ["a timer of 16 ms on one line"] = (new(20_000, 200e-6, 16_000, 500), new(50_000, -200e-6, 0, 500), default, false),
        ["a timer of 16 ms, all clocks in step"] = (new(20_000, 0, 16_000, 500), new(50_000, 0, 16_000, 500), default, false),
        ["a timer of 16 ms, every 50th line stalled by 30 ms"] = Case(16_000, stallEvery: 50),
        ["a timer of 16 ms, 1 % of lines garbled"] = Case(16_000, lostShare: 0.01, isGarbling: true),
        ["a busy machine, 1 % of lines missing"] = Case(0, lostShare: 0.01),
        ["a timer of 16 ms, 1 % of lines missing"] = Case(16_000, lostShare: 0.01),
        ["the same with sample counters"] = Case(16_000, lostShare: 0.01, mark: SampleMarkKind.Counter),
        ["the same with the boards' own clocks"] = Case(16_000, lostShare: 0.01, mark: SampleMarkKind.Time),
    };

    public static TheoryData<string, double, double, double, double> DocumentedRows()
    {
        var rows = new TheoryData<string, double, double, double, double>();
        foreach (var cells in File.ReadLines(Path.Combine(RepositoryRoot(), "docs", "sample-times.md")).Select(line => line.Split('|')))
        {
            if (cells.Length == 7 && Cases.ContainsKey(cells[1].Trim()))
            {
                var numbers = cells[2..6].Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray();
                rows.Add(cells[1].Trim(), numbers[0], numbers[1], numbers[2], numbers[3]);
            }
        }

        return rows;
    }

    [Fact]
    public void EveryCase_IsDocumented() => Assert.Equal(Cases.Keys, DocumentedRows().Select(row => (string)row[0]));

    [Theory]
    [MemberData(nameof(DocumentedRows))]
    public void TwoBoards_AreAlignedAsDocumented(string name, double rmsBefore, double mostBefore, double rmsAfter, double mostAfter)
    {
        var (fast, slow, mark, isGarbling) = Cases[name];
        List<double> before = [], after = [];
        for (var seed = 1; seed <= Flights; seed++)
        {
            var a = fast.Errors(seed, SettledS, FlightS, mark, isGarbling);
            var b = slow.Errors(seed + 1000, SettledS, FlightS, mark, isGarbling);
            before.AddRange(Differences(a.BeforeUs, b.BeforeUs));
            after.AddRange(Differences(a.AfterUs, b.AfterUs));
        }

        // Logarithms may differ in their last bits between machines, and then a line in a thousand falls otherwise.
        var isAsDocumented = Math.Abs(RmsMs(before) - rmsBefore) < 0.1 && Math.Abs(MostMs(before) - mostBefore) < 1
            && Math.Abs(RmsMs(after) - rmsAfter) < 0.1 && Math.Abs(MostMs(after) - mostAfter) < 1;
        Assert.True(isAsDocumented, string.Create(CultureInfo.InvariantCulture,
            $"| {name} | {RmsMs(before):F1} | {MostMs(before):F0} | {RmsMs(after):F2} | {MostMs(after):F1} |"));
    }

    private static (JitteryLine, JitteryLine, SampleMarkKind, bool) Case(
        double timerUs, int stallEvery = 0, double lostShare = 0, SampleMarkKind mark = SampleMarkKind.None, bool isGarbling = false) =>
        (new(20_000, 200e-6, timerUs, 500, stallEvery, lostShare), new(50_000, -200e-6, timerUs, 500, stallEvery, lostShare), mark, isGarbling);

    private static double RmsMs(List<double> us) => Math.Sqrt(us.Average(one => one * one)) / 1000;

    private static double MostMs(List<double> us) => us.Max(Math.Abs) / 1000;

    /// <summary>Each line of the one board against the line of the other at the same share of the flight.</summary>
    private static IEnumerable<double> Differences(List<double> a, List<double> b) =>
        a.Select((error, i) => error - b[(int)((long)i * b.Count / a.Count)]);

    private static string RepositoryRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(Path.Combine(folder, "SpeedCommand.sln")))
        {
            folder = Path.GetDirectoryName(folder) ?? throw new InvalidOperationException("the solution is not above the tests");
        }

        return folder;
    }
}
