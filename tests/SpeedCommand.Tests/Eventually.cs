namespace SpeedCommand.Tests;

/// <summary>Waits for what must happen, with a bound that only a hang reaches.</summary>
internal static class Eventually
{
    public static async Task HoldsAsync(Func<bool> condition, string what)
    {
        for (var i = 0; i < 4000; i++)
        {
            if (condition())
            {
                return;
            }

            await Task.Delay(5);
        }

        throw new TimeoutException($"twenty seconds went by and still not: {what}");
    }
}
