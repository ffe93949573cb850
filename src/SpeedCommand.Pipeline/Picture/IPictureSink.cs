namespace SpeedCommand.Pipeline.Picture;

/// <summary>Takes each picture as the pipeline makes it, on the pipeline's thread: copy what you need and return at once.</summary>
public interface IPictureSink
{
    /// <summary>Takes one picture.</summary>
    /// <param name="picture">The picture; valid as a value, keep a copy.</param>
    void OnPicture(in CockpitPicture picture);
}
