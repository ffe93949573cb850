namespace SpeedCommand.Pipeline.Picture;

/// <summary>The names of the faults in replay output, settings and documents.</summary>
public static class FaultNames
{
    /// <summary>Every fault with its name, in the order they are listed in output.</summary>
    public static IReadOnlyList<KeyValuePair<Faults, string>> All { get; } =
    [
        new(Faults.StaticSilent, "static-silent"),
        new(Faults.AirspeedSilent, "airspeed-silent"),
        new(Faults.StaticBlocked, "static-blocked"),
        new(Faults.PitotBlocked, "pitot-blocked"),
        new(Faults.StaticStuck, "static-stuck"),
        new(Faults.AirspeedStuck, "airspeed-stuck"),
        new(Faults.StaticDisagrees, "static-disagrees"),
        new(Faults.AirspeedDisagrees, "airspeed-disagrees"),
        new(Faults.TemperatureSilent, "temperature-silent"),
        new(Faults.ThermometerDoubtful, "thermometer-doubtful"),
        new(Faults.IcingPossible, "icing-possible"),
        new(Faults.StaticRange, "static-range"),
        new(Faults.AirspeedRange, "airspeed-range"),
        new(Faults.TemperatureRange, "temperature-range"),
        new(Faults.LoadRange, "load-range"),
        new(Faults.StaticJumps, "static-jumps"),
        new(Faults.AirspeedJumps, "airspeed-jumps"),
        new(Faults.TemperatureJumps, "temperature-jumps"),
        new(Faults.LoadJumps, "load-jumps"),
        new(Faults.ProbeDoubtful, "probe-doubtful"),
        new(Faults.BadLines, "bad-lines"),
        new(Faults.OutsidePolar, "outside-polar"),
        new(Faults.NoLimits, "no-limits"),
        new(Faults.PortMissing, "port-missing"),
        new(Faults.PortRefused, "port-refused"),
        new(Faults.RecorderStopped, "recorder-stopped"),
    ];
}
