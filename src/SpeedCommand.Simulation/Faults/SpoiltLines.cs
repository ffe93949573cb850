using SpeedCommand.Simulation.Randomness;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Faults;

/// <summary>What a board does wrong with whole lines: none, twice, too often, in the wrong order.</summary>
internal sealed class SpoiltLines
{
    /// <summary>A flood fills the time since the last line, but no more than this: a slow board's flood is still one.</summary>
    private const long LongestGapUs = 100_000;

    private readonly byte[] _stream;
    private readonly List<(FaultSpec Spec, FaultTimes Times)> _faults;
    private byte[]? _held;
    private long _lastUs;

    public SpoiltLines(byte[] stream, IEnumerable<(FaultSpec Spec, SeededNoise Random)> faults)
    {
        _stream = stream;
        _faults = [.. faults.Where(fault => fault.Spec.Kind is FaultKind.Silent or FaultKind.Duplicated or FaultKind.Reordered or FaultKind.Flood)
            .Select(fault => (fault.Spec, new FaultTimes(fault.Spec, fault.Random)))];
    }

    /// <summary>Puts what becomes of a line among the lines to come.</summary>
    public void Take(long timeUs, ReadOnlySpan<byte> line, LinesInOrder pending)
    {
        var gapUs = Math.Min(timeUs - _lastUs, LongestGapUs);
        _lastUs = timeUs;
        var (isSilent, isHeld, copies, times) = (false, false, 1, 1);
        foreach (var (spec, fault) in _faults)
        {
            switch (spec.Kind)
            {
                case FaultKind.Silent:
                    isSilent |= fault.At(timeUs) is FaultMoment.Begins or FaultMoment.Lasts;
                    break;
                case FaultKind.Duplicated:
                    copies += fault.Hits(timeUs) ? 1 : 0;
                    break;
                case FaultKind.Reordered:
                    isHeld |= fault.Hits(timeUs);
                    break;
                default:
                    times = fault.At(timeUs) is FaultMoment.Begins or FaultMoment.Lasts ? spec.Times : times;
                    break;
            }
        }

        if (isSilent)
        {
            return;
        }

        if (isHeld && _held is null)
        {
            _held = line.ToArray();
            return;
        }

        for (var i = 0; i < copies * times; i++)
        {
            pending.Add(timeUs + gapUs * (i / copies) / times, _stream, line);
        }

        Release(timeUs, pending);
    }

    /// <summary>The line that waits for the next one goes, if there is one.</summary>
    public void Release(long timeUs, LinesInOrder pending)
    {
        if (_held is { } held)
        {
            pending.Add(timeUs, _stream, held);
            _held = null;
        }
    }
}
