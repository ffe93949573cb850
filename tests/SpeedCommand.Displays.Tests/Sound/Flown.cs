using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Sound;

/// <summary>Pictures one after the other, as a flight makes them.</summary>
internal static class Flown
{
    /// <summary>A climb with its uncertainty, on speed.</summary>
    public static CockpitPicture Climb(double climbMps, double sigmaMps = 0.2) => CockpitPicture.Blank(0, Faults.None) with
    {
        Phase = FlightPhase.Climbing,
        ClimbMps = new Gauge(climbMps, sigmaMps, 0.05),
        NettoMps = new Gauge(-climbMps, sigmaMps, 0.05),
    };

    /// <summary>A speed to hold and a speed flown; no climb is known, so nothing else is to be heard.</summary>
    public static CockpitPicture Speed(double holdMps, double flownMps, double sigmaMps = 0.2) => CockpitPicture.Blank(0, Faults.None) with
    {
        HoldIndicatedMps = new Gauge(holdMps, sigmaMps, 0.05),
        SmoothIndicatedAirspeedMps = new Gauge(flownMps, double.NaN, 0.05),
    };

    /// <summary>The same picture for some seconds, ten a second, from a moment on.</summary>
    public static IEnumerable<CockpitPicture> For(this CockpitPicture picture, double seconds, double fromS = 0) =>
        Enumerable.Range(0, (int)Math.Round(seconds * 10)).Select(i => picture with { TimeUs = (long)(fromS * 1e6) + 100_000 * (i + 1) });
}
