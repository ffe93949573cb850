using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>A port to read and who listens to it.</summary>
/// <param name="Settings">Device and line.</param>
/// <param name="Listener">Told everything that happens on it.</param>
internal sealed record PortLine(PortSettings Settings, IPortListener Listener);

/// <summary>Reads serial ports, and opens each again with <see cref="ReopenDelay"/> when it is missing or was pulled out.</summary>
internal interface IPortReader
{
    /// <summary>Reads until told to stop. What the world does goes to the listeners; what a listener throws comes out of here.</summary>
    Task RunAsync(IReadOnlyList<PortLine> ports, CancellationToken stop);
}
