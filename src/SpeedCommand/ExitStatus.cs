namespace SpeedCommand;

/// <summary>Exit statuses of the commands; the numbers above 2 are those of sysexits.h, so that scripts can tell faults apart.</summary>
internal static class ExitStatus
{
    public const int Done = 0;
    public const int Usage = 2;
    public const int BadData = 65;
    public const int NoInput = 66;
    public const int InternalFault = 70;
    public const int InputOutput = 74;
    public const int BadSettings = 78;
}
