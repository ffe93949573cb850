namespace SpeedCommand.Shared.Tests;

/// <summary>What code allocates on the heap each time it runs.</summary>
internal static class Allocation
{
    private const int Rounds = 5;

    /// <summary>The same of a hundred runs, each told its number.</summary>
    public static long Of(Action<int> run) => Of(() =>
    {
        for (var i = 0; i < 100; i++)
        {
            run(i);
        }
    });

    /// <summary>
    /// The bytes that <paramref name="round"/> allocates on this thread: the least of five runs. Code that allocates does so in every
    /// run; what the runtime itself allocates on the thread while it compiles a method anew comes once.
    /// </summary>
    public static long Of(Action round)
    {
        var least = long.MaxValue;
        for (var i = 0; i < Rounds; i++)
        {
            var before = GC.GetAllocatedBytesForCurrentThread();
            round();
            least = Math.Min(least, GC.GetAllocatedBytesForCurrentThread() - before);
        }

        return least;
    }
}
