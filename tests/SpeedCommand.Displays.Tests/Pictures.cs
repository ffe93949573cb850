using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests;

/// <summary>Hand-made pictures of an invented flight; round numbers, so that a reader can check the display by eye.</summary>
internal static class Pictures
{
    /// <summary>A fast glide through sinking air, 12 km/h too slow.</summary>
    public static CockpitPicture GlidingTooSlow => new()
    {
        TimeUs = 754_000_000,
        Phase = FlightPhase.Gliding,
        PressureAltitudeM = new Gauge(1320, 2, 0.05),
        DensityAltitudeM = new Gauge(1480, 8, 0.05),
        TemperatureK = new Gauge(281.15, 0.3, 0.4),
        TemperatureSource = TemperatureSource.Measured,
        IndicatedAirspeedMps = new Gauge(108 / 3.6, 0.2, 0.05),
        TrueAirspeedMps = new Gauge(116 / 3.6, 0.2, 0.05),
        ClimbMps = new Gauge(-1.8, 0.15, 0.05),
        AverageClimbMps = new Gauge(-1.1, 0.05, 0.05),
        ThermalAverageMps = Gauge.Blank,
        NettoMps = new Gauge(-0.64, 0.21, 0.05),
        RelativeNettoMps = new Gauge(-1.68, 0.22, 0.05),
        MinSinkIndicatedMps = new Gauge(82 / 3.6, 0.1, 0.05),
        BestGlideIndicatedMps = new Gauge(95 / 3.6, 0.1, 0.05),
        SpeedToFlyIndicatedMps = new Gauge(120 / 3.6, 0.25, 0.05),
        HoldIndicatedMps = new Gauge(120 / 3.6, 0.25, 0.05),
        ExpectedClimbMps = 2,
        EnduranceS = new Gauge(22 * 60, 30, 0.05),
        RangeM = new Gauge(34_000, 400, 0.05),
    };

    /// <summary>The pilot has just set the expected climb.</summary>
    public static CockpitPicture Changed(CockpitPicture picture) => picture with
    {
        Controls = picture.Controls with { ExpectedClimbMps = 1.5, LastChanged = ControlId.ExpectedClimb, LastChangedUs = picture.TimeUs },
    };

    /// <summary>Working a thermal, 8 km/h too fast.</summary>
    public static CockpitPicture ClimbingTooFast => GlidingTooSlow with
    {
        Phase = FlightPhase.Climbing,
        IndicatedAirspeedMps = new Gauge(96 / 3.6, 0.2, 0.05),
        ClimbMps = new Gauge(2.4, 0.2, 0.05),
        AverageClimbMps = new Gauge(1.9, 0.1, 0.05),
        ThermalAverageMps = new Gauge(1.62, 0.05, 0.05),
        NettoMps = new Gauge(3.2, 0.3, 0.05),
        RelativeNettoMps = new Gauge(2.2, 0.3, 0.05),
        MinSinkIndicatedMps = new Gauge(88 / 3.6, 0.1, 0.05),
        SpeedToFlyIndicatedMps = new Gauge(74 / 3.6, 0.5, 0.05),
        HoldIndicatedMps = new Gauge(88 / 3.6, 0.1, 0.05),
    };

    /// <summary>As fast as the rough-air limit allows, on speed.</summary>
    public static CockpitPicture AtRoughAirLimit => GlidingTooSlow with
    {
        IndicatedAirspeedMps = new Gauge(179 / 3.6, 0.2, 0.05),
        SpeedToFlyIndicatedMps = new Gauge(180 / 3.6, 0.25, 0.05),
        HoldIndicatedMps = new Gauge(180 / 3.6, 0.25, 0.05),
        LimitedBy = LimitedBy.RoughAir,
        TemperatureSource = TemperatureSource.Standard,
        Faults = Faults.TemperatureSilent,
    };

    /// <summary>The estimators have little to go on: the hold speed and the vertical speeds are doubtful.</summary>
    public static CockpitPicture Doubtful => GlidingTooSlow with
    {
        SpeedToFlyIndicatedMps = new Gauge(123 / 3.6, 8 / 3.6, 0.05),
        HoldIndicatedMps = new Gauge(123 / 3.6, 8 / 3.6, 0.05),
        ClimbMps = new Gauge(-1.83, 0.6, 0.05),
        NettoMps = new Gauge(-0.64, 0.7, 0.05),
        RelativeNettoMps = new Gauge(-1.68, 0.7, 0.05),
    };

    /// <summary>Just out of the thermal: nothing is broken, but the speed to hold is worth nothing yet.</summary>
    public static CockpitPicture TooUncertain => GlidingTooSlow with
    {
        SpeedToFlyIndicatedMps = new Gauge(123 / 3.6, 5.1, 0.05),
        HoldIndicatedMps = new Gauge(123 / 3.6, 5.1, 0.05),
    };

    /// <summary>No airspeed: everything that rests on it is blank.</summary>
    public static CockpitPicture NoAirspeed => GlidingTooSlow with
    {
        IndicatedAirspeedMps = Gauge.Blank,
        TrueAirspeedMps = Gauge.Blank,
        ClimbMps = Gauge.Blank,
        AverageClimbMps = Gauge.Blank,
        NettoMps = Gauge.Blank,
        RelativeNettoMps = Gauge.Blank,
        MinSinkIndicatedMps = Gauge.Blank,
        BestGlideIndicatedMps = Gauge.Blank,
        SpeedToFlyIndicatedMps = Gauge.Blank,
        HoldIndicatedMps = Gauge.Blank,
        Faults = Faults.AirspeedSilent | Faults.BadLines,
    };

    /// <summary>Nothing works: every gauge is blank and every fault is there.</summary>
    public static CockpitPicture Nothing => CockpitPicture.Blank(0, FaultNames.All.Aggregate(Faults.None, (all, fault) => all | fault.Key)) with
    {
        ExpectedClimbMps = double.NaN,
    };

    public static CockpitPicture Named(string name) => name switch
    {
        "gliding-too-slow" => GlidingTooSlow,
        "climbing-too-fast" => ClimbingTooFast,
        "rough-air-limit" => AtRoughAirLimit,
        "doubtful" => Doubtful,
        "no-airspeed" => NoAirspeed,
        _ => Nothing,
    };

    public static IReadOnlyList<string> Names { get; } =
        ["gliding-too-slow", "climbing-too-fast", "rough-air-limit", "doubtful", "no-airspeed", "nothing"];
}
