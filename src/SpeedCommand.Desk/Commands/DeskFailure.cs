namespace SpeedCommand.Desk.Commands;

/// <summary>Something the user can mend: one line a fault that says what, and the exit status.</summary>
internal sealed class DeskFailure(ExitStatus status, params IReadOnlyList<string> messages) : Exception(string.Join('\n', messages))
{
    public ExitStatus Status { get; } = status;

    public IReadOnlyList<string> Messages { get; } = messages;
}
