namespace SpeedCommand.Displays.Sound;

/// <summary>A sine by table: 1024 steps with straight lines between them miss it by 5e-6, less than half a step of a 16-bit sample.</summary>
internal static class SineTable
{
    private const int Steps = 1024;
    private static readonly double[] Values = [.. Enumerable.Range(0, Steps + 1).Select(step => Math.Sin(2 * Math.PI * step / Steps))];

    /// <summary>The sine.</summary>
    /// <param name="turns">The angle in turns, 0 or more.</param>
    public static double At(double turns)
    {
        var place = (turns - Math.Floor(turns)) * Steps;
        var step = (int)place;
        return Values[step] + (place - step) * (Values[step + 1] - Values[step]);
    }
}
