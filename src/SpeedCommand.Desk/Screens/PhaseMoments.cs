using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>Takes from a replay the first moment of each state that a pilot must tell from the others.</summary>
internal sealed class PhaseMoments(DisplayUnits units) : IPictureSink
{
    /// <summary>A state counts when it has lasted half a second: the moment it begins may show what it came from.</summary>
    private const int PicturesToLast = 5;

    /// <summary>Off enough to see it on every screen, m/s.</summary>
    private const double PlainlyOffMps = 2.5;

    private static readonly (string Name, Func<CockpitPicture, SpeedCorrection, double, bool> IsSo)[] States =
    [
        ("gliding-too-slow", (picture, _, off) => IsPlain(picture, FlightPhase.Gliding) && off > PlainlyOffMps),
        ("gliding-on-speed", (picture, correction, _) => IsPlain(picture, FlightPhase.Gliding) && correction.Direction == CorrectionDirection.OnSpeed),
        ("gliding-too-fast", (picture, _, off) => IsPlain(picture, FlightPhase.Gliding) && off < -PlainlyOffMps),
        ("climbing-too-slow", (picture, _, off) => IsPlain(picture, FlightPhase.Climbing) && off > 0),
        ("climbing-on-speed", (picture, correction, _) => IsPlain(picture, FlightPhase.Climbing) && correction.Direction == CorrectionDirection.OnSpeed),
        ("climbing-too-fast", (picture, _, off) => IsPlain(picture, FlightPhase.Climbing) && off < 0),
        ("at-a-limit", (picture, _, _) => picture.LimitedBy is LimitedBy.RoughAir or LimitedBy.NeverExceed && picture.Faults == Faults.None),
        ("doubtful", (_, correction, _) => correction.IsDoubtful),
        ("no-speed-known", (picture, correction, _) => !picture.HoldIndicatedMps.IsKnown && correction.Direction == CorrectionDirection.Unknown),
    ];

    private readonly SpeedSteadier _steadier = new(units.Speed);
    private readonly int[] _lasted = new int[States.Length];
    private readonly ScreenMoment?[] _found = new ScreenMoment?[States.Length];

    /// <summary>The states there are.</summary>
    public static IEnumerable<string> Names => States.Select(state => state.Name);

    /// <summary>What was found, in the order of <see cref="Names"/>.</summary>
    public IEnumerable<ScreenMoment> Found => _found.OfType<ScreenMoment>();

    /// <summary>Whether the speeds of a moment are doubtful: another moment shows the state better.</summary>
    public bool IsDoubtful(ScreenMoment moment) => SpeedCorrection.Of(moment.Picture, units).IsDoubtful;

    public void OnPicture(in CockpitPicture picture)
    {
        var steady = _steadier.Next(picture);
        var correction = SpeedCorrection.Of(steady, units);
        var side = correction.Direction switch { CorrectionDirection.SpeedUp => 1, CorrectionDirection.SlowDown => -1, _ => 0 };
        var off = side * units.Speed.DifferenceToSi(correction.Amount);
        for (var i = 0; i < States.Length; i++)
        {
            _lasted[i] = States[i].IsSo(steady, correction, off) ? _lasted[i] + 1 : 0;
            if (_lasted[i] == PicturesToLast && (_found[i] is not { } found || (IsDoubtful(found) && !correction.IsDoubtful)))
            {
                _found[i] = new ScreenMoment(States[i].Name, false, steady);
            }
        }
    }

    private static bool IsPlain(in CockpitPicture picture, FlightPhase phase) =>
        picture.Phase == phase && picture.Faults == Faults.None && picture.LimitedBy == LimitedBy.None && picture.AverageClimbMps.IsKnown;
}
