namespace SpeedCommand.Desk.Fitting;

/// <summary>A number of the polar with its 95 % credible interval.</summary>
/// <param name="Middle">Median.</param>
/// <param name="Low">Lower end: one in forty is below.</param>
/// <param name="High">Upper end: one in forty is above.</param>
internal readonly record struct Credible(double Middle, double Low, double High)
{
    private const double Tail = 0.025;

    /// <summary>An interval that keeps more than this share of its width before the flights was hardly learnt from them.</summary>
    private const double HardlyLearnt = 0.8;

    /// <summary>Narrower than this, a number was never in doubt.</summary>
    private const double GivenWidth = 1e-6;

    public double Width => High - Low;

    /// <summary>Whether the number is taken as given, such as the shape when bugs alone are fitted: nothing to be learnt.</summary>
    public bool IsGiven => Width < GivenWidth;

    /// <summary>Whether flights told next to nothing of a number.</summary>
    public static bool IsHardlyTold(Credible before, Credible after) => !before.IsGiven && !(after.Width <= HardlyLearnt * before.Width);

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
