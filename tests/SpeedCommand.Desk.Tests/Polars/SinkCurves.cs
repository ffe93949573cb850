using CsCheck;
using SpeedCommand.Desk.Polars;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Tests.Polars;

/// <summary>Sink curves of the gliders that come with the program, in any conditions a pilot may ask for.</summary>
internal static class SinkCurves
{
    public static readonly Gen<SinkCurve> Any = Gen.Select(
        Gen.Bool.Select(isLight => isLight ? "marram-15.json" : "tern-18.json"), Gen.Double[340, 450], Gen.Int[0, 5000],
        Gen.Double[0, 6], Gen.Double[-3, 1], Gen.Double[-15, 15])
        .Select((glider, mass, altitude, climb, air, headwind) => new SinkCurve(new ConditionsReader().Read(new ConditionTexts
        {
            Glider = glider,
            Mass = Text($"{(glider[0] == 'm' ? mass : mass + 100):F0} kg"),
            Altitude = Text($"{altitude} m"),
            Climb = Text($"{climb:F2} m/s"),
            Air = Text($"{air:F2} m/s"),
            Headwind = Text($"{headwind:F2} m/s"),
        })!));

    private static string Text(FormattableString text) => FormattableString.Invariant(text);
}
