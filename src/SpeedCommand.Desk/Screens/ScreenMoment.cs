using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Screens;

/// <summary>One moment of a flight that a screen is drawn at.</summary>
/// <param name="Name">A name for files, lower case with hyphens.</param>
/// <param name="IsFault">Whether it was chosen for its fault, not for its phase.</param>
/// <param name="Picture">What was known.</param>
internal sealed record ScreenMoment(string Name, bool IsFault, CockpitPicture Picture);
