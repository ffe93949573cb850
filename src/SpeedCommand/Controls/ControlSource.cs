namespace SpeedCommand.Controls;

/// <summary>Where a change of a control came from, for the service's log.</summary>
internal enum ControlSource
{
    /// <summary>A key on the terminal panel.</summary>
    Key,

    /// <summary>Knobs and buttons on a serial port.</summary>
    SerialPort,

    /// <summary>The local socket, as from "speedcommand set".</summary>
    Socket,

    /// <summary>The web page.</summary>
    WebPage,
}
