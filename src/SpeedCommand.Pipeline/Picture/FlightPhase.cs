namespace SpeedCommand.Pipeline.Picture;

/// <summary>What the pilot is doing with the glider, as far as the air data tell.</summary>
public enum FlightPhase
{
    /// <summary>Going somewhere: the speed to hold is the speed to fly.</summary>
    Gliding,

    /// <summary>Working lift: the speed to hold is the minimum-sink speed at the present load.</summary>
    Climbing,
}
