using SpeedCommand.Flight.LocatedJson;

namespace SpeedCommand.Flight.Gliders;

/// <summary>What came of reading a glider file.</summary>
/// <param name="Glider">The glider; null when there is a fault.</param>
/// <param name="Problems">All faults at once, in the file's order of subjects; warnings leave the glider usable.</param>
public sealed record GliderFileResult(Glider? Glider, IReadOnlyList<JsonProblem> Problems);
