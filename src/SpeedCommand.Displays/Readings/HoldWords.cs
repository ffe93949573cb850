using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Readings;

/// <summary>Words beside the speed to hold, for every display the same.</summary>
public static class HoldWords
{
    /// <summary>Why there is no speed to hold although nothing is broken.</summary>
    public const string TooUncertain = "too uncertain";

    /// <summary>Whether the speed to hold is known, but blank because it is worth nothing: no fault says why then.</summary>
    /// <param name="picture">The picture.</param>
    /// <returns>True when the displays are to say so.</returns>
    public static bool IsTooUncertain(in CockpitPicture picture) =>
        picture.HoldIndicatedMps.IsKnown && picture.HoldIndicatedMps.Sigma > Trust.Airspeed.BlankSigma;

    /// <summary>Where the speed to hold comes from, or why it is blank.</summary>
    /// <param name="picture">The picture.</param>
    /// <returns>For example "minimum sink".</returns>
    public static string Source(in CockpitPicture picture) =>
        IsTooUncertain(picture) ? TooUncertain
        : !picture.HoldIndicatedMps.IsKnown && picture.Faults == Faults.None ? "not known yet"
        : picture.Phase == FlightPhase.Climbing ? "minimum sink"
        : "speed to fly";
}
