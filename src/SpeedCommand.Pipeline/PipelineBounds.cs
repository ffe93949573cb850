using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Pipeline;

/// <summary>Every bound of the pipeline, with its reason.</summary>
public static class PipelineBounds
{
    /// <summary>Time between two pictures: ten a second is faster than an eye reads numbers.</summary>
    public const long PicturePeriodUs = 100_000;

    /// <summary>
    /// A pressure or airspeed older than this is silent. One picture period short of the promised second, so that no picture
    /// on a display rests on anything older than 1.0 s.
    /// </summary>
    public const long FreshnessUs = 1_000_000 - PicturePeriodUs;

    /// <summary>
    /// A load factor or bank older than this is silent, and an assumed one stands in. Boards send it as seldom as three times a second:
    /// it must outlast the pressures by that much, lest a line that falls silent moves the targets before it blanks them.
    /// </summary>
    public const long LoadFreshnessUs = FreshnessUs + 350_000;

    /// <summary>
    /// After a silence the climb begins anew from a few readings, and the smoothed speed to fly would keep for seconds what it began
    /// with: it waits so long. A quarter of the two seconds promised for its return.
    /// </summary>
    public const long SettlingUs = 500_000;

    /// <summary>Air temperature changes slowly, and thermometers are slow: after this the standard atmosphere stands in.</summary>
    public const long TemperatureFreshnessUs = 10_000_000;

    /// <summary>How long a fault that is an event (a bad line, a value out of range) stays on the display after the last one.</summary>
    public const long EventFaultUs = 5_000_000;

    /// <summary>Static pressures from 32 km up to 2 km below sea level, Pa: the standard atmosphere's range here.</summary>
    public const double MinStaticPa = 868.1, MaxStaticPa = 127_773;

    /// <summary>Impact pressures, Pa: from sensor noise at rest to 400 km/h at sea level, more than any glider may fly.</summary>
    public const double MinImpactPa = -500, MaxImpactPa = 8_000;

    /// <summary>Impact pressure of 40 km/h, Pa: no glider flies slower; a parked one in the wind may read less.</summary>
    public const double FlyingImpactPa = 75;

    /// <summary>Indicated airspeeds sent by a board, m/s; the same range as impact pressure.</summary>
    public const double MaxIndicatedMps = 111;

    /// <summary>Sensed air temperatures, K: -90 °C to +58 °C, the range the air's own formulas are stated for.</summary>
    public const double MinTemperatureK = Air.LowestTemperatureK, MaxTemperatureK = Air.HighestTemperatureK;

    /// <summary>Load factors, g: beyond any glider's structure.</summary>
    public const double MaxLoadFactor = 10;

    /// <summary>Bank angles that still have a meaning for a level turn, rad (75 degrees, load factor 3.9).</summary>
    public const double MaxBankRad = 75 * Math.PI / 180;

    /// <summary>Streams a flight may have: boards and receivers of one cockpit.</summary>
    public const int MaxStreams = 32;
}
