namespace SpeedCommand.Desk.Commands;

/// <summary>Something the user can mend: one line that says what, and the exit status.</summary>
internal sealed class DeskFailure(ExitStatus status, string message) : Exception(message)
{
    public ExitStatus Status { get; } = status;
}
