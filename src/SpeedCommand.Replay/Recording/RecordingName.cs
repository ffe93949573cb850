using System.Globalization;

namespace SpeedCommand.Replay.Recording;

/// <summary>
/// Name of one of our recordings: when it begins, the process that wrote it, and which file of that moment it is.
/// </summary>
/// <param name="BeginUtc">Time of day at which the file begins, whole seconds.</param>
/// <param name="ProcessId">The process.</param>
/// <param name="Number">1, unless there was such a file already, as after a clock that was set back.</param>
/// <param name="IsPacked">Whether it is packed with gzip.</param>
public readonly record struct RecordingName(DateTimeOffset BeginUtc, int ProcessId, int Number, bool IsPacked)
{
    private const string TimeFormat = "yyyy-MM-dd'T'HHmmss'Z'";
    private const string Ending = ".log", PackedEnding = ".log.gz";
    private const int TimeLength = 18;

    /// <summary>Reads a file's name.</summary>
    /// <param name="fileName">The name without a folder.</param>
    /// <param name="name">What it says.</param>
    /// <returns>False for a file that is none of our recordings.</returns>
    public static bool TryParse(string fileName, out RecordingName name)
    {
        ArgumentNullException.ThrowIfNull(fileName);
        name = default;
        var isPacked = fileName.EndsWith(PackedEnding, StringComparison.Ordinal);
        var ending = isPacked ? PackedEnding : Ending;
        if (!fileName.EndsWith(ending, StringComparison.Ordinal) || fileName.Length < TimeLength + ending.Length
            || !DateTimeOffset.TryParseExact(fileName.AsSpan(0, TimeLength), TimeFormat, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out var begin))
        {
            return false;
        }

        var numbers = fileName[TimeLength..^ending.Length].Split('-');
        var number = 1;
        if (numbers.Length is not (2 or 3) || numbers[0].Length > 0 || !TryRead(numbers[1], out var processId)
            || (numbers.Length == 3 && !(TryRead(numbers[2], out number) && number > 1)))
        {
            return false;
        }

        name = new RecordingName(begin, processId, number, isPacked);
        return true;
    }

    /// <summary>The file's name.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture,
        $"{BeginUtc.UtcDateTime.ToString(TimeFormat, CultureInfo.InvariantCulture)}-{ProcessId}{(Number > 1 ? $"-{Number}" : "")}{(IsPacked ? PackedEnding : Ending)}");

    private static bool TryRead(string digits, out int number) =>
        int.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out number);
}
