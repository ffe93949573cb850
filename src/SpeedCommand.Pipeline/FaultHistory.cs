using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline;

/// <summary>When each fault came and went during a flight, from the pictures. Nothing is allocated while it watches.</summary>
public sealed class FaultHistory
{
    private readonly FaultSpan[] _spans = new FaultSpan[FaultNames.All.Count];

    /// <summary>The faults that are there now.</summary>
    public Faults Present { get; private set; }

    /// <summary>Each fault that ever was there, in the order of <see cref="FaultNames"/>.</summary>
    public IEnumerable<FaultSpan> Spans => _spans.Where(span => span.Count > 0);

    /// <summary>Takes the faults of one picture.</summary>
    /// <param name="timeUs">The picture's time, microseconds.</param>
    /// <param name="faults">Its faults.</param>
    public void Take(long timeUs, Faults faults)
    {
        for (var i = 0; faults != Faults.None && i < _spans.Length; i++)
        {
            var fault = FaultNames.All[i].Key;
            if ((faults & fault) == 0)
            {
                continue;
            }

            ref var span = ref _spans[i];
            var isNew = (Present & fault) == 0;
            span = new FaultSpan(FaultNames.All[i].Value, span.Count == 0 ? timeUs : span.FirstUs, timeUs,
                span.Count + (isNew ? 1 : 0), span.LastedUs + PipelineBounds.PicturePeriodUs);
        }

        Present = faults;
    }
}
