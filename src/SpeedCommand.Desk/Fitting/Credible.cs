namespace SpeedCommand.Desk.Fitting;

/// <summary>A number of the polar with its 95 % credible interval.</summary>
/// <param name="Middle">Median.</param>
/// <param name="Low">Lower end: one in forty is below.</param>
/// <param name="High">Upper end: one in forty is above.</param>
internal readonly record struct Credible(double Middle, double Low, double High)
{
    private const double Tail = 0.025;

    public double Width => High - Low;

    /// <summary>The interval of draws that are equally probable.</summary>
    public static Credible Of(IEnumerable<double> draws)
    {
        var sorted = draws.Where(double.IsFinite).Order().ToArray();
        return sorted.Length == 0
            ? new(double.NaN, double.NaN, double.NaN)
            : new(At(0.5), At(Tail), At(1 - Tail));

        double At(double share) => sorted[(int)Math.Round(share * (sorted.Length - 1))];
    }

    public bool Holds(double value) => value >= Low && value <= High;
}
