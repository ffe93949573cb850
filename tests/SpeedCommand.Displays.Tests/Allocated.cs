namespace SpeedCommand.Displays.Tests;

/// <summary>Counts what a repeated action allocates; the least of several rounds, since the runtime itself allocates now and then.</summary>
internal static class Allocated
{
    public static long Least(Action<int> action)
    {
        var least = long.MaxValue;
        for (var round = 0; round < 5; round++)
        {
            var before = GC.GetAllocatedBytesForCurrentThread();
            for (var i = 0; i < 100; i++)
            {
                action(i);
            }

            least = Math.Min(least, GC.GetAllocatedBytesForCurrentThread() - before);
        }

        return least;
    }
}
