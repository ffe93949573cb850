namespace SpeedCommand.Ports;

/// <summary>Whether a port is open now, for displays, the bench and the log.</summary>
internal sealed class PortState(string name)
{
    private volatile bool _isOpen;

    public string Name => name;

    public bool IsOpen
    {
        get => _isOpen;
        set => _isOpen = value;
    }
}
