using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Pipeline.Picture;

/// <summary>
/// Everything a display may show at one moment of data time, made ten times a second. SI units; vertical speeds positive up;
/// every speed named "indicated" is what the pilot's airspeed indicator would read.
/// </summary>
public readonly record struct CockpitPicture
{
    /// <summary>A picture in which nothing is known.</summary>
    /// <param name="timeUs">Microseconds of data time since the start of the flight.</param>
    /// <param name="faults">Why nothing is known.</param>
    /// <returns>The picture; every gauge is blank.</returns>
    public static CockpitPicture Blank(long timeUs, Faults faults) => new()
    {
        TimeUs = timeUs,
        Controls = ControlValues.Standard,
        PressureAltitudeM = Gauge.Blank,
        AltitudeM = Gauge.Blank,
        DensityAltitudeM = Gauge.Blank,
        TemperatureK = Gauge.Blank,
        IndicatedAirspeedMps = Gauge.Blank,
        TrueAirspeedMps = Gauge.Blank,
        SmoothIndicatedAirspeedMps = Gauge.Blank,
        ClimbMps = Gauge.Blank,
        AverageClimbMps = Gauge.Blank,
        ThermalAverageMps = Gauge.Blank,
        NettoMps = Gauge.Blank,
        RelativeNettoMps = Gauge.Blank,
        MinSinkIndicatedMps = Gauge.Blank,
        BestGlideIndicatedMps = Gauge.Blank,
        SpeedToFlyIndicatedMps = Gauge.Blank,
        HoldIndicatedMps = Gauge.Blank,
        EnduranceS = Gauge.Blank,
        RangeM = Gauge.Blank,
        Faults = faults,
    };

    /// <summary>Microseconds of data time since the start of the flight.</summary>
    public long TimeUs { get; init; }

    /// <summary>Seconds of data time since the start of the flight.</summary>
    public double TimeS => TimeUs / 1e6;

    /// <summary>Climbing or gliding.</summary>
    public FlightPhase Phase { get; init; }

    /// <summary>Pressure altitude, m.</summary>
    public Gauge PressureAltitudeM { get; init; }

    /// <summary>What an altimeter set to <see cref="ControlValues.QnhPa"/> shows, m; limits and the safety height do not follow it.</summary>
    public Gauge AltitudeM { get; init; }

    /// <summary>Density altitude, m.</summary>
    public Gauge DensityAltitudeM { get; init; }

    /// <summary>Static air temperature, K.</summary>
    public Gauge TemperatureK { get; init; }

    /// <summary>Whether the temperature was measured or is the standard atmosphere's plus an offset.</summary>
    public TemperatureSource TemperatureSource { get; init; }

    /// <summary>Indicated airspeed, m/s.</summary>
    public Gauge IndicatedAirspeedMps { get; init; }

    /// <summary>True airspeed, m/s.</summary>
    public Gauge TrueAirspeedMps { get; init; }

    /// <summary>Indicated airspeed with gusts taken out, m/s: what a speed to fly is to be compared with.</summary>
    public Gauge SmoothIndicatedAirspeedMps { get; init; }

    /// <summary>Total-energy climb, m/s.</summary>
    public Gauge ClimbMps { get; init; }

    /// <summary>Total-energy climb averaged over the last 30 s, m/s.</summary>
    public Gauge AverageClimbMps { get; init; }

    /// <summary>Total-energy climb averaged since circling began, m/s; blank when gliding.</summary>
    public Gauge ThermalAverageMps { get; init; }

    /// <summary>Vertical motion of the air, m/s.</summary>
    public Gauge NettoMps { get; init; }

    /// <summary>What the climb would be in this air, circling at minimum sink with the bank usual in thermals, m/s.</summary>
    public Gauge RelativeNettoMps { get; init; }

    /// <summary>Indicated airspeed of least sink at the present weight and load, m/s.</summary>
    public Gauge MinSinkIndicatedMps { get; init; }

    /// <summary>Indicated airspeed of best glide in still air, m/s.</summary>
    public Gauge BestGlideIndicatedMps { get; init; }

    /// <summary>Indicated MacCready speed to fly in the present air, m/s.</summary>
    public Gauge SpeedToFlyIndicatedMps { get; init; }

    /// <summary>Indicated airspeed to hold now: minimum sink when climbing, speed to fly when gliding, m/s.</summary>
    public Gauge HoldIndicatedMps { get; init; }

    /// <summary>Which limit of the glider stopped the speed to fly, if one did.</summary>
    public LimitedBy LimitedBy { get; init; }

    /// <summary>The climb expected in the next thermal (MacCready setting), m/s.</summary>
    public double ExpectedClimbMps
    {
        get => Controls.ExpectedClimbMps;
        init => Controls = Controls with { ExpectedClimbMps = value };
    }

    /// <summary>How every control of the pilot's stands.</summary>
    public ControlValues Controls { get; init; }

    /// <summary>Time to the safety height at minimum sink in still air, s.</summary>
    public Gauge EnduranceS { get; init; }

    /// <summary>Distance to the safety height at best glide in still air, m.</summary>
    public Gauge RangeM { get; init; }

    /// <summary>What is wrong now.</summary>
    public Faults Faults { get; init; }
}
