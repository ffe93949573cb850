using System.Numerics;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>Faults that happen at a moment: each is shown for a while after its last occurrence.</summary>
internal sealed class EventFaults
{
    private readonly long[] _untilUs = new long[32];

    public void Note(Faults fault, long timeUs) =>
        _untilUs[BitOperations.TrailingZeroCount((int)fault)] = timeUs + PipelineBounds.EventFaultUs;

    public Faults At(long nowUs)
    {
        var active = Faults.None;
        for (var index = 0; index < _untilUs.Length; index++)
        {
            if (nowUs < _untilUs[index])
            {
                active |= (Faults)(1 << index);
            }
        }

        return active;
    }
}
