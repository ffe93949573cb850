using System.Globalization;

namespace SpeedCommand.Commands;

/// <summary>Makes a replay wait so that it runs a given number of times faster than life.</summary>
internal sealed class Pacer(TimeProvider time, double pace, CancellationToken cancel)
{
    /// <summary>Far below what a wait may last at most, whatever the log says.</summary>
    private static readonly TimeSpan LongestWait = TimeSpan.FromMinutes(1);

    private readonly long _start = time.GetTimestamp();
    private long _firstUs = -1;

    public bool IsPaced => double.IsFinite(pace);

    /// <summary>"max" is infinity; nothing said is the standard.</summary>
    public static bool TryParse(string? text, bool isShown, out double pace)
    {
        pace = isShown ? 1 : double.PositiveInfinity;
        if (text is null)
        {
            return true;
        }

        if (text == "max")
        {
            pace = double.PositiveInfinity;
            return true;
        }

        return double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out pace) && pace is >= 0.1 and <= 1000;
    }

    /// <summary>Waits for a record; the first is at once, wherever the recording begins.</summary>
    public void WaitUntil(long timeUs)
    {
        _firstUs = _firstUs < 0 ? timeUs : _firstUs;
        while (!cancel.IsCancellationRequested
            && TimeSpan.FromMicroseconds((timeUs - _firstUs) / pace) - time.GetElapsedTime(_start) is var ahead && ahead > TimeSpan.Zero)
        {
            cancel.WaitHandle.WaitOne(ahead < LongestWait ? ahead : LongestWait);
        }
    }
}
