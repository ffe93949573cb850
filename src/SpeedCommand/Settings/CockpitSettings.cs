using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Sentences;

namespace SpeedCommand.Settings;

/// <summary>Everything the service must know.</summary>
/// <param name="Flight">The glider and the pilot's choices.</param>
/// <param name="GliderName">File name of the glider, for the log's header.</param>
/// <param name="Ports">The sensors' ports.</param>
/// <param name="Units">What the pilot reads numbers in.</param>
/// <param name="IsTerminalOn">Whether the terminal shows the panel.</param>
/// <param name="SerialText">Port of a character display; null for none.</param>
/// <param name="Recorder">Where flights are recorded; null for not at all.</param>
/// <param name="LogFile">Where the service's own log goes; empty for standard error.</param>
internal sealed record CockpitSettings(
    FlightSettings Flight,
    string GliderName,
    IReadOnlyList<PortSettings> Ports,
    DisplayUnits Units,
    bool IsTerminalOn,
    SerialTextSettings? SerialText,
    RecorderOptions? Recorder,
    string LogFile)
{
    /// <summary>How serial lines are found and read.</summary>
    public SerialSettings Serial { get; init; } = SerialSettings.Standard;

    /// <summary>How the pilot's controls are reached; default not at all.</summary>
    public ControlSettings Controls { get; init; } = ControlSettings.None;

    /// <summary>Displays beyond the terminal and the character display on a serial line; default none.</summary>
    public DisplaySettings Displays { get; init; } = DisplaySettings.None;

    /// <summary>Sensors that the kernel reads; default none.</summary>
    public IReadOnlyList<IioSettings> IioDevices { get; init; } = [];

    /// <summary>What is heard.</summary>
    public SoundSettings Sound { get; init; } = SoundSettings.Standard;

    /// <summary>Where the web page is served.</summary>
    public WebSettings Web { get; init; } = WebSettings.Standard;

    /// <summary>What the pipeline's numbers depend on, for the header of what is recorded.</summary>
    public FlownSettings Flown { get; init; } = FlownSettings.None;

    /// <summary>Streams that only the header of the log to be replayed describes.</summary>
    public IReadOnlyDictionary<string, StreamSettings> FlownStreams { get; init; } = new Dictionary<string, StreamSettings>();

    /// <summary>What the pipeline must know of a stream of the flight, live and in a replay.</summary>
    /// <param name="name">The stream's name.</param>
    /// <returns>Its settings; those of a board that speaks sentences, when it is none of the settings' streams.</returns>
    public StreamSettings StreamOf(string name) =>
        Ports.FirstOrDefault(port => port.Name == name)?.Stream
        ?? (IioDevices.Any(device => device.Name == name) ? IioReader.Stream : FlownStreams.GetValueOrDefault(name))
        ?? StreamSettings.Sentences(ChecksumRule.Required);
}
