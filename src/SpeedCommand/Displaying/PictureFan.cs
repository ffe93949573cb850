using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displaying;

/// <summary>Hands each picture to several sinks, in order.</summary>
internal sealed class PictureFan(IPictureSink[] sinks) : IPictureSink
{
    public void OnPicture(in CockpitPicture picture)
    {
        foreach (var sink in sinks)
        {
            sink.OnPicture(picture);
        }
    }
}
