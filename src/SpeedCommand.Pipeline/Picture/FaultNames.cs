namespace SpeedCommand.Pipeline.Picture;

/// <summary>The names of the faults in replay output, settings and documents.</summary>
public static class FaultNames
{
    /// <summary>Every fault with its name, in the order they are listed in output.</summary>
    public static IReadOnlyList<KeyValuePair<Faults, string>> All { get; } =
    [
        new(Faults.StaticSilent, "static-silent"),
        new(Faults.AirspeedSilent, "airspeed-silent"),
        new(Faults.TemperatureSilent, "temperature-silent"),
        new(Faults.StaticRange, "static-range"),
        new(Faults.AirspeedRange, "airspeed-range"),
        new(Faults.TemperatureRange, "temperature-range"),
        new(Faults.LoadRange, "load-range"),
        new(Faults.BadLines, "bad-lines"),
        new(Faults.OutsidePolar, "outside-polar"),
        new(Faults.NoLimits, "no-limits"),
        new(Faults.PortMissing, "port-missing"),
        new(Faults.PortRefused, "port-refused"),
        new(Faults.RecorderStopped, "recorder-stopped"),
    ];
}
