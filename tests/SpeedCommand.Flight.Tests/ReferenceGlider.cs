using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.Tests;

/// <summary>
/// An invented glider (340 kg, 11.2 m², CD0 0.0115, K1 -0.002, K2 0.0215) for which the expected values beside the checks were
/// worked out independently, with scipy, from the textbook formulas; the formulas are stated where they are used.
/// </summary>
internal static class ReferenceGlider
{
    public static readonly Loading Straight = new(340, 1, 0);

    public static DragPolar Polar { get; } = new(11.2, 340, 0.0115, -0.002, 0.0215);

    public static GliderLimits WideLimits { get; } = new(10, double.NaN, [new(32_000, 140)]);

    public static SpeedTargets Unlimited { get; } = new(new Glider { Name = "reference", Polar = Polar, Limits = WideLimits });

    public static Air StandardAirAt(double altitudeM)
    {
        Assert.True(StandardAtmosphere.TryAt(altitudeM, out var state));
        Assert.True(Air.TryStandard(state.PressurePa, 0, out var air, out _));
        return air;
    }
}
