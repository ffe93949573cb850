using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;

namespace SpeedCommand.Tests.Live;

/// <summary>Keeps every picture as the displays get it, with the faults that the service adds.</summary>
internal sealed class PictureLog : IPictureSink
{
    private readonly List<CockpitPicture> _all = [];

    /// <summary>Set before the service starts.</summary>
    public LatestPicture? Latest { get; set; }

    public CockpitPicture[] All
    {
        get
        {
            lock (_all)
            {
                return [.. _all];
            }
        }
    }

    public void OnPicture(in CockpitPicture picture)
    {
        var asShown = picture;
        Latest?.TryGet(out asShown, out _);
        lock (_all)
        {
            _all.Add(asShown);
        }
    }

    /// <summary>The first picture after a moment of data time that is as wanted; waits for it.</summary>
    public async Task<CockpitPicture> WaitForAsync(Func<CockpitPicture, bool> isWanted, double afterS = 0)
    {
        for (var i = 0; i < 4000; i++)
        {
            foreach (var picture in All.Where(picture => picture.TimeS > afterS && isWanted(picture)))
            {
                return picture;
            }

            await Task.Delay(5);
        }

        throw new TimeoutException("no such picture came in twenty seconds");
    }
}
