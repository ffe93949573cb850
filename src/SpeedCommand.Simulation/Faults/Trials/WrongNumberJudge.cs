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

    private static readonly Target[] Targets =
    [
        new("minimum sink", picture => picture.MinSinkIndicatedMps, MinSinkDoubt),
        new("best glide", picture => picture.BestGlideIndicatedMps, BestGlideDoubt),
        new("speed to fly", picture => picture.SpeedToFlyIndicatedMps, 0, IsSmoothed: true),
    ];

    /// <summary>Lists the wrong numbers.</summary>
    /// <param name="good">The flight without the fault.</param>
    /// <param name="faulty">Its pictures with it.</param>
    /// <param name="fault">The fault, at an exact time.</param>
    /// <param name="reach">How far it may reach.</param>
    /// <param name="seed">The trial's seed, for the list.</param>
    /// <returns>Every target that is wrong, picture by picture.</returns>
    public static IEnumerable<WrongNumber> Judge(
        TrialFlight good, IReadOnlyList<CockpitPicture> faulty, FaultSpec fault, FaultReach reach, long seed)
    {
        ArgumentNullException.ThrowIfNull(good);
        ArgumentNullException.ThrowIfNull(faulty);
        ArgumentNullException.ThrowIfNull(fault);
        ArgumentNullException.ThrowIfNull(reach);
        foreach (var picture in faulty.Where(picture => reach.IsNoticed || !IsWithin(picture, fault, reach.AfterS)))
        {
            foreach (var target in Targets)
            {
                var shown = target.Of(picture);
                if (shown.IsKnown && RangeOf(good, target, picture, fault) is var (least, most) && !(shown.Value >= least && shown.Value <= most))
                {
                    yield return new WrongNumber(seed, fault, picture.TimeS, target.Name, shown.Value, least, most);
                }
            }

            if (HoldIsNeither(picture))
            {
                yield return new WrongNumber(seed, fault, picture.TimeS, "hold", picture.HoldIndicatedMps.Value, double.NaN, double.NaN);
            }
        }
    }

    /// <summary>Whether a picture lies within a fault, or not longer than that after it. A clock set forth leaves a gap as long as its step.</summary>
    private static bool IsWithin(in CockpitPicture picture, FaultSpec fault, double afterS) => picture.TimeS >= fault.AtS
        && picture.TimeS <= fault.AtS + (fault.Kind == FaultKind.ClockStep ? Math.Max(0, fault.ByS) : fault.ForS) + afterS;

    /// <summary>After the clock was stepped, a picture shows the flight as it was that much earlier or later.</summary>
    private static double TrueTimeOf(double timeS, FaultSpec fault) =>
        fault.Kind == FaultKind.ClockStep && timeS >= fault.AtS ? Math.Max(fault.AtS, timeS - fault.ByS) : timeS;

    private static (double Least, double Most) RangeOf(TrialFlight good, Target target, in CockpitPicture picture, FaultSpec fault)
    {
        var shown = target.Of(picture);
        var countsUnsmoothed = target.IsSmoothed && IsWithin(picture, fault, FaultReach.SmoothingS);
        var (least, most, sigma) = (double.PositiveInfinity, double.NegativeInfinity, 0.0);
        void Count(double value) => (least, most) = (value < least ? value : least, value > most ? value : most);
        var last = (int)Math.Round(TrueTimeOf(picture.TimeS, fault) / PictureS) - 1;
        for (var i = Math.Max(0, last - (int)Math.Round(FaultReach.OldestS / PictureS)); i <= Math.Min(last, good.Pictures.Count - 1); i++)
        {
            var expected = target.Of(good.Pictures[i]);
            Count(expected.Value);
            Count(countsUnsmoothed ? good.UnsmoothedMps[i] : double.NaN);
            sigma = expected.Sigma > sigma ? expected.Sigma : sigma;
        }

        // A speed to fly that stands on the least-sink speed has that speed's doubt, and the good flight's sigma if it has none of its own.
        var isHeldUp = shown.Value <= picture.MinSinkIndicatedMps.Value;
        var own = isHeldUp ? Math.Max(sigma, shown.Sigma) : shown.Sigma;
        var load = IsWithin(picture, fault, FaultReach.LoadS) ? FaultReach.LoadShare : 0;
        var doubt = isHeldUp ? Sigmas * MinSinkDoubt + load : Sigmas * target.Doubt;
        var room = Sigmas * (double.IsNaN(own) ? 0 : own) + doubt * shown.Value;
        return (least - room, most + room);
    }

    /// <summary>
    /// The speed to hold is one of two targets, which are judged themselves; which one, the phase says, and that may be noticed
    /// later than without the fault.
    /// </summary>
    private static bool HoldIsNeither(in CockpitPicture picture) => picture.HoldIndicatedMps.IsKnown && picture.HoldIndicatedMps
        != (picture.Phase == FlightPhase.Climbing ? picture.MinSinkIndicatedMps : picture.SpeedToFlyIndicatedMps);

    private sealed record Target(string Name, Func<CockpitPicture, Gauge> Of, double Doubt, bool IsSmoothed = false);
}
