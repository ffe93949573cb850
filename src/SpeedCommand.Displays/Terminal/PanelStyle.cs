using SpeedCommand.Displays.Units;

namespace SpeedCommand.Displays.Terminal;

/// <summary>How the terminal panel is drawn.</summary>
/// <param name="Width">Columns to use, 1 or more.</param>
/// <param name="Height">Rows to use, 1 or more.</param>
/// <param name="Look">What the terminal can do.</param>
/// <param name="Units">The units shown.</param>
public sealed record PanelStyle(int Width, int Height, PanelLook Look, DisplayUnits Units)
{
    /// <summary>What the panel says for the moment, besides the picture: an answer to the pilot; empty for nothing.</summary>
    public string Notice { get; init; } = "";

    /// <summary>A page of words that stands over the panel for the moment, such as the keys; empty for none.</summary>
    public IReadOnlyList<string> Page { get; init; } = [];

    /// <summary>The fewest columns that the full panel fits in.</summary>
    public const int FullWidth = 60;

    /// <summary>The fewest rows that the full panel fits in.</summary>
    public const int FullHeight = 16;

    /// <summary>Whether the full panel fits; below that the four lines of the character display are shown.</summary>
    public bool IsFull => Width >= FullWidth && Height >= FullHeight;
}
