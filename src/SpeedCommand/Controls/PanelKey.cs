namespace SpeedCommand.Controls;

/// <summary>What one key of the terminal panel asks for.</summary>
/// <param name="Key">The key.</param>
/// <param name="Request">The line it stands for; empty for the panel's own keys.</param>
/// <param name="Meaning">What the pilot reads about it.</param>
internal sealed record PanelKey(char Key, string Request, string Meaning);
