using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Service;

/// <summary>The newest picture, for displays that look when they please: a slow one misses pictures, it never delays them.</summary>
internal sealed class LatestPicture : IPictureSink
{
    private readonly Lock _gate = new();
    private CockpitPicture _picture;
    private long _count;
    private Faults _hostFaults;

    /// <summary>Every fault that any picture of this flight has named.</summary>
    public Faults FaultsSeen { get; private set; }

    /// <summary>From now on every picture names the recorder's fault; the pipeline knows nothing of recorders.</summary>
    public void RecorderStopped()
    {
        lock (_gate)
        {
            _hostFaults |= Faults.RecorderStopped;
        }
    }

    public void OnPicture(in CockpitPicture picture)
    {
        lock (_gate)
        {
            _picture = picture with { Faults = picture.Faults | _hostFaults };
            _count++;
            FaultsSeen |= _picture.Faults;
        }
    }

    /// <summary>The newest picture and how many there were; false before the first.</summary>
    public bool TryGet(out CockpitPicture picture, out long count)
    {
        lock (_gate)
        {
            picture = _picture;
            count = _count;
            return count > 0;
        }
    }
}
