namespace SpeedCommand.Ports;

/// <summary>What a reader tells of one port, one call at a time, in order. Nothing here may wait.</summary>
internal interface IPortListener
{
    /// <summary>The port is open.</summary>
    /// <param name="path">The path that the device's name led to this time.</param>
    void OnOpen(string path);

    /// <summary>Bytes came in.</summary>
    /// <param name="bytes">Valid during the call only.</param>
    void OnBytes(ReadOnlySpan<byte> bytes);

    /// <summary>The open port is gone; it will be opened again.</summary>
    /// <param name="cause">What the system says.</param>
    void OnGone(string cause);

    /// <summary>The port did not open; told at each attempt.</summary>
    /// <param name="trouble">Why.</param>
    void OnTrouble(PortTrouble trouble);
}
