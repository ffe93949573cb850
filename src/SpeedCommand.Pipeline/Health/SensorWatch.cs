using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Health;

/// <summary>Watches the readings of one sensor on their own: jumps, and values that repeat when they should not.</summary>
/// <param name="gate">What a jump is.</param>
/// <param name="jumps">The fault to name for one.</param>
/// <param name="stuck">The fault to name for a stuck value; none for a sensor that may honestly repeat its value.</param>
internal sealed class SensorWatch(JumpGate gate, Faults jumps, Faults stuck)
{
    private readonly RepeatWatch _repeats = new();

    /// <summary>Judges one reading.</summary>
    /// <param name="timeUs">Its stamp.</param>
    /// <param name="value">Its value.</param>
    /// <param name="isFlying">Whether the glider flies.</param>
    /// <param name="sinceUs">When a stuck value first came; nothing later is known of what the sensor should read.</param>
    /// <param name="fault">What is wrong with it; none when it may be used.</param>
    /// <returns>What to do with it.</returns>
    public Verdict Judge(long timeUs, double value, bool isFlying, out long sinceUs, out Faults fault)
    {
        var isStuck = stuck != Faults.None && _repeats.IsStuckAt(timeUs, value, isFlying);
        sinceUs = _repeats.SinceUs;
        var verdict = isStuck ? Verdict.Refused : gate.Judge(timeUs, value);
        fault = isStuck ? stuck : verdict == Verdict.Refused ? jumps : Faults.None;
        return verdict;
    }
}
