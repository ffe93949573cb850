using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>
/// Holds the pictures of a faulty flight against those of the same flight without fault. A target may be anything between the least and
/// the greatest that the good flight showed within the age a number may have, and four of its own sigmas beyond; where the
/// fault reaches, see <see cref="FaultReach"/>, it may be anything.
/// </summary>
public static class WrongNumberJudge
{
    private const double Sigmas = 4;
    private const double PictureS = PipelineBounds.PicturePeriodUs * 1e-6;

    /// <summary>
    /// The speed of least sink goes with the square root of the load factor, of which one sample of a common accelerometer is
    /// uncertain by 0.02 g (docs/simulator.md): after a gap it rests on one sample.
    /// </summary>
    private const double MinSinkDoubt = 0.5 * 0.02;

    /// <summary>
    /// As indicated airspeed, best glide depends on the air only by its compressibility, less than 1 % of the speed in a glider's
    /// range; a density that is wrong by 1 % (3 K) moves it by a ten-thousandth.
    /// </summary>
    private const double BestGlideDoubt = 1e-4;

    private static readonly (string Name, Func<CockpitPicture, Gauge> Of, double Doubt)[] Targets =
    [
        ("minimum sink", picture => picture.MinSinkIndicatedMps, MinSinkDoubt),
        ("best glide", picture => picture.BestGlideIndicatedMps, BestGlideDoubt),
        ("speed to fly", picture => picture.SpeedToFlyIndicatedMps, 0),
    ];

    /// <summary>Lists the wrong numbers.</summary>
    /// <param name="good">The pictures without the fault.</param>
    /// <param name="faulty">The pictures with it.</param>
    /// <param name="fault">The fault, at an exact time.</param>
    /// <param name="seed">The trial's seed, for the list.</param>
    /// <returns>Every target that is wrong, picture by picture.</returns>
    public static IEnumerable<WrongNumber> Judge(
        IReadOnlyList<CockpitPicture> good, IReadOnlyList<CockpitPicture> faulty, FaultSpec fault, long seed)
    {
        ArgumentNullException.ThrowIfNull(good);
        ArgumentNullException.ThrowIfNull(faulty);
        ArgumentNullException.ThrowIfNull(fault);
        var reach = FaultReach.Of(fault.Kind);
        foreach (var picture in faulty.Where(picture => !IsReached(picture.TimeS, fault, reach)))
        {
            var trueS = TrueTimeOf(picture.TimeS, fault);
            foreach (var (name, of, doubt) in Targets)
            {
                var shown = of(picture);
                if (shown.IsKnown && Check(good, trueS, of, shown, doubt) is var (least, most) && !(shown.Value >= least && shown.Value <= most))
                {
                    yield return new WrongNumber(seed, fault, picture.TimeS, name, shown.Value, least, most);
                }
            }

            if (HoldIsNeither(picture))
            {
                yield return new WrongNumber(seed, fault, picture.TimeS, "hold", picture.HoldIndicatedMps.Value, double.NaN, double.NaN);
            }
        }
    }

    private static bool IsReached(double timeS, FaultSpec fault, FaultReach reach) =>
        timeS > fault.AtS && timeS <= (reach.IsNoticed ? fault.AtS : fault.AtS + fault.ForS) + reach.AfterS;

    /// <summary>After the clock was stepped, a picture shows the flight as it was that much earlier or later.</summary>
    private static double TrueTimeOf(double timeS, FaultSpec fault) =>
        fault.Kind == FaultKind.ClockStep && timeS > fault.AtS ? Math.Max(fault.AtS, timeS - fault.ByS) : timeS;

    private static (double Least, double Most) Check(
        IReadOnlyList<CockpitPicture> good, double trueS, Func<CockpitPicture, Gauge> of, in Gauge shown, double doubt)
    {
        var (least, most) = (double.PositiveInfinity, double.NegativeInfinity);
        var last = (int)Math.Round(trueS / PictureS) - 1;
        for (var i = Math.Max(0, last - (int)Math.Round(FaultReach.OldestS / PictureS)); i <= Math.Min(last, good.Count - 1); i++)
        {
            var value = of(good[i]).Value;
            least = value < least ? value : least;
            most = value > most ? value : most;
        }

        var room = Sigmas * ((double.IsNaN(shown.Sigma) ? 0 : shown.Sigma) + doubt * shown.Value);
        return (least - room, most + room);
    }

    /// <summary>
    /// The speed to hold is one of two targets, which are judged themselves; which one, the phase says, and that may be noticed
    /// later than without the fault.
    /// </summary>
    private static bool HoldIsNeither(in CockpitPicture picture) => picture.HoldIndicatedMps.IsKnown && picture.HoldIndicatedMps
        != (picture.Phase == FlightPhase.Climbing ? picture.MinSinkIndicatedMps : picture.SpeedToFlyIndicatedMps);
}
