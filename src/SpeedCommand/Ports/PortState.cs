using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Ports;

/// <summary>Whether a port is open now, and if not why, for displays, the bench and the log.</summary>
internal sealed class PortState(string name)
{
    private volatile bool _isOpen;
    private volatile Faults _fault;

    public string Name => name;

    public bool IsOpen => _isOpen;

    /// <summary>What pictures name; none while the port is open, or before the first attempt.</summary>
    public Faults Fault => _fault;

    public void Open()
    {
        _fault = Faults.None;
        _isOpen = true;
    }

    public void Close(Faults fault)
    {
        _isOpen = false;
        _fault = fault;
    }
}
