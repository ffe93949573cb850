namespace SpeedCommand.Displays.Terminal;

/// <summary>What the terminal can do.</summary>
public enum PanelLook
{
    /// <summary>Cursor control and the sixteen colours (ECMA-48).</summary>
    Colour,

    /// <summary>Cursor control, bold, faint and reverse, no colour.</summary>
    Monochrome,

    /// <summary>No control sequences at all: bare lines, for files and documents.</summary>
    Text,
}
