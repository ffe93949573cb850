using System.Text;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Settings;

/// <summary>Reads what the pipeline must know from the settings and the glider file they name.</summary>
public static class FlightSettingsReader
{
    private static readonly string[] PhaseWords = ["automatic", "climbing", "gliding"];

    /// <summary>Reads the flight's part of the settings; faults go to the source.</summary>
    /// <param name="source">The settings.</param>
    /// <param name="gliderOption">A glider file that beats the settings; null for none.</param>
    /// <param name="gliderFallback">A glider file for when the settings name none, as from a log's header; null for none.</param>
    /// <returns>The settings, or null when there is no usable glider.</returns>
    public static FlightSettings? Read(SettingsSource source, string? gliderOption, string? gliderFallback)
    {
        ArgumentNullException.ThrowIfNull(source);
        var glider = ReadGlider(source, gliderOption, gliderFallback);
        var reference = glider?.ReferenceMassKg ?? 300;
        var maxKg = glider is { MaxMassKg: > 0 } ? glider.MaxMassKg : 1500;
        var minKg = glider is { EmptyMassKg: > 0 } ? glider.EmptyMassKg : 50;
        var massKg = source.Quantity("mass", QuantityKind.Mass, reference, minKg, maxKg);
        var ballastKg = source.Quantity("ballast", QuantityKind.Mass, 0, 0, 600);
        if (glider?.TryFlyingMass(massKg, ballastKg, out _, out var reason) == false && reason == MassInvalid.AboveMax
            && source.Find("ballast") is { } ballast)
        {
            source.Report(ballast, FormattableString.Invariant(
                $"expected mass and ballast together at most {maxKg:G6} kg, found {massKg + ballastKg:G6} kg"));
        }

        var bugs = source.Quantity("bugs", QuantityKind.Fraction, 0, 0, 1);
        var expectedClimb = source.Quantity("expectedClimb", QuantityKind.Speed, 0, 0, 15);
        var stallMargin = source.Quantity("stallMargin", QuantityKind.Fraction, 0.05, 0, 1);
        var offset = source.Quantity("temperatureOffset", QuantityKind.TemperatureDifference, 0, -50, 50);
        var recovery = source.Quantity("thermometerRecovery", QuantityKind.Fraction, 0, 0, 1);
        var staticLag = source.Quantity("staticLag", QuantityKind.Duration, 0, 0, 2);
        var impactLag = source.Quantity("impactLag", QuantityKind.Duration, 0, 0, 2);
        var probeLag = source.Quantity("probeLag", QuantityKind.Duration, 0, 0, 2);
        var phase = source.Word("phase", PhaseWords, PhaseWords[0]);
        var safetyHeight = source.Quantity("safetyHeight", QuantityKind.Length, 300, -500, 9000);
        return glider is null ? null : new FlightSettings(glider)
        {
            MassKg = massKg + ballastKg,
            BallastKg = ballastKg,
            BugsFraction = bugs,
            ExpectedClimbMps = expectedClimb,
            StallMargin = stallMargin,
            TemperatureOffsetK = offset,
            ThermometerRecovery = recovery,
            StaticLagS = staticLag,
            ImpactLagS = impactLag,
            ProbeLagS = probeLag,
            ForcedPhase = phase switch
            {
                "climbing" => FlightPhase.Climbing,
                "gliding" => FlightPhase.Gliding,
                _ => null,
            },
            SafetyHeightM = safetyHeight,
        };
    }

    private static Glider? ReadGlider(SettingsSource source, string? gliderOption, string? gliderFallback)
    {
        var setting = source.Text("glider");
        if (gliderOption is null && setting is null && source.Recorded.GliderText is { Length: > 0 } text)
        {
            var recorded = GliderFile.Read(Encoding.UTF8.GetBytes(text), $"glider in the log's header ({gliderFallback})");
            source.Report(recorded.Problems);
            return recorded.Glider;
        }

        var name = gliderOption ?? setting?.Text ?? gliderFallback;
        if (string.IsNullOrEmpty(name))
        {
            source.Report([new JsonProblem(source.File.Length > 0 ? source.File : "settings", 0, "glider",
                $"expected a glider file; these lie beside the program: {string.Join(", ", GliderFiles.Bundled())}")]);
            return null;
        }

        var result = GliderFiles.Read(name, source.File);
        if (result.Glider is null && gliderOption is null && setting is not null && !GliderFiles.Exists(name, source.File))
        {
            source.Report(setting, result.Problems[0].Message + $"; '{name}' is none");
            return null;
        }

        source.Report(result.Problems);
        return result.Glider;
    }
}
