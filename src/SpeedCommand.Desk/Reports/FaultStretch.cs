using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>One unbroken presence of a fault.</summary>
/// <param name="Fault">The fault.</param>
/// <param name="StartS">First picture that had it, s since the start.</param>
/// <param name="EndS">Last picture that had it, s.</param>
internal readonly record struct FaultStretch(Faults Fault, double StartS, double EndS);
