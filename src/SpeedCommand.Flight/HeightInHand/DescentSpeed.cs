namespace SpeedCommand.Flight.HeightInHand;

/// <summary>How a descent is flown.</summary>
public enum DescentSpeed
{
    /// <summary>At the speed of least sink.</summary>
    MinSink,

    /// <summary>At the speed of the flattest glide over the ground, in each layer's wind.</summary>
    BestGlide,

    /// <summary>At the speed to fly.</summary>
    SpeedToFly,
}
