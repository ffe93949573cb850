using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Ports;

/// <summary>Why a port is not open.</summary>
/// <param name="Fault">What pictures name while it lasts: <see cref="Faults.PortMissing"/> or <see cref="Faults.PortRefused"/>.</param>
/// <param name="Text">Device, cause, and how to mend it, in one line.</param>
internal readonly record struct PortTrouble(Faults Fault, string Text);
