namespace SpeedCommand.Replay.Igc;

/// <summary>What an IGC file says before its first fix.</summary>
/// <param name="Recorder">The A record: maker and serial number of the recorder.</param>
/// <param name="Date">UTC date of the first fix; null when not told.</param>
/// <param name="Pilot">The pilot, as written; empty when not told.</param>
/// <param name="GliderType">The glider's type, as written; empty when not told.</param>
/// <param name="GliderId">The glider's registration, as written; empty when not told.</param>
/// <param name="Extensions">The extra fields of every fix.</param>
public sealed record IgcHeader(
    string Recorder, DateOnly? Date, string Pilot, string GliderType, string GliderId, IReadOnlyList<IgcExtension> Extensions);
