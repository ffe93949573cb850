namespace SpeedCommand.Desk.Commands;

/// <summary>Exit statuses, after the sysexits convention.</summary>
internal enum ExitStatus
{
    Done = 0,

    /// <summary>Compared things differ, as diff and cmp have it.</summary>
    Different = 1,

    Usage = 2,
    BadData = 65,
    NoInput = 66,
    InputOutput = 74,
    BadSettings = 78,
}
