using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>The kinds of picture that a pilot must tell from one another.</summary>
internal static class PixelStates
{
    public static IReadOnlyList<string> Names { get; } =
    [
        "gliding-too-slow", "gliding-too-fast", "gliding-on-speed", "far-too-slow", "climbing-too-fast", "climbing-too-slow", "rough-air-limit",
        "doubtful", "no-airspeed", "fault-numbers-stay", "nothing",
    ];

    public static CockpitPicture Named(string name) => name switch
    {
        "gliding-too-fast" => Flying(129),
        "gliding-on-speed" => Flying(121),
        "far-too-slow" => Flying(75),
        "climbing-too-slow" => Pictures.ClimbingTooFast with { IndicatedAirspeedMps = new Gauge(81 / 3.6, 0.2, 0.05) },
        "fault-numbers-stay" => Pictures.GlidingTooSlow with { Faults = Faults.TemperatureSilent },
        _ => Pictures.Named(name),
    };

    private static CockpitPicture Flying(double kmh) => Pictures.GlidingTooSlow with { IndicatedAirspeedMps = new Gauge(kmh / 3.6, 0.2, 0.05) };
}
