using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>Takes from a replay the moment at which its gravest fault shows.</summary>
internal sealed class FaultMoment(string name, DisplayUnits units) : IPictureSink
{
    /// <summary>Until the first readings are in, every flight has faults.</summary>
    private const double WarmUpS = 3;

    /// <summary>Half a second after it came, so that its consequences show too.</summary>
    private const int PicturesToLast = 5;

    private readonly SpeedSteadier _steadier = new(units.Speed);
    private Faults _gravest = Faults.None;
    private int _lasted;

    /// <summary>The moment; null when nothing was ever wrong.</summary>
    public ScreenMoment? Found { get; private set; }

    public void OnPicture(in CockpitPicture picture)
    {
        var steady = _steadier.Next(picture);
        var gravest = FaultWords.Gravest(steady.Faults);
        if (steady.TimeS < WarmUpS || gravest == Faults.None || (_gravest != Faults.None && gravest > _gravest))
        {
            return;
        }

        _lasted = gravest == _gravest ? _lasted + 1 : 1;
        _gravest = gravest;
        if (_lasted <= PicturesToLast)
        {
            Found = new ScreenMoment(name, true, steady);
        }
    }
}
