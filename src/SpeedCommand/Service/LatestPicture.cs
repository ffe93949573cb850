using SpeedCommand.Pipeline.Health;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;

namespace SpeedCommand.Service;

/// <summary>
/// The newest picture, with the faults that only the service knows of: closed ports, a stopped recorder. A slow display misses
/// pictures, it never delays them.
/// </summary>
internal sealed class LatestPicture(IReadOnlyList<PortState> ports) : IPictureSink
{
    private readonly Lock _gate = new();
    private readonly List<SemaphoreSlim> _bells = [];
    private CockpitPicture _picture;
    private long _count;
    private Faults _recorderFault;
    private Faults _faultsSeen;
    private StartupSilence _startup;

    /// <summary>Every fault that any picture of this flight has named; the silence of a sensor that had yet to speak up at the start is none.</summary>
    public Faults FaultsSeen => _startup.HasData ? _faultsSeen : _faultsSeen | _picture.Faults;

    /// <summary>From now on every picture names the recorder's fault, or no longer; the pipeline knows nothing of recorders.</summary>
    public void SetRecorder(bool isStopped)
    {
        lock (_gate)
        {
            _recorderFault = isStopped ? Faults.RecorderStopped : Faults.None;
        }
    }

    /// <summary>A bell for one display, rung with each new picture; several rings without a listener count as one.</summary>
    public SemaphoreSlim AddBell()
    {
        lock (_gate)
        {
            var bell = new SemaphoreSlim(0, 1);
            _bells.Add(bell);
            return bell;
        }
    }

    public void OnPicture(in CockpitPicture picture)
    {
        var faults = picture.Faults;
        for (var i = 0; i < ports.Count; i++)
        {
            faults |= ports[i].Fault;
        }

        lock (_gate)
        {
            _picture = picture with { Faults = faults | _recorderFault };
            _count++;
            _faultsSeen |= _startup.Counted(_picture.TimeUs, _picture.Faults);
            foreach (var bell in _bells)
            {
                if (bell.CurrentCount == 0)
                {
                    bell.Release();
                }
            }
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
