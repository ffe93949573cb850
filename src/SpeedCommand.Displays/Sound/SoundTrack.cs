using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Sound;

/// <summary>The sound of a replay: what would have been heard from each picture until the next. The same flight gives the same samples.</summary>
public sealed class SoundTrack : IPictureSink, IDisposable
{
    private const long MicrosecondsPerSecond = 1_000_000;
    private const int PictureSamples = (int)(PipelineBounds.PicturePeriodUs * Synthesizer.SampleRateHz / MicrosecondsPerSecond);

    private readonly SoundGuide _guide;
    private readonly double _gain;
    private readonly WavFile _file;
    private readonly Synthesizer _synthesizer = new();
    private readonly short[] _samples = new short[PictureSamples];

    /// <summary>Begins a track.</summary>
    /// <param name="style">What is to be heard.</param>
    /// <param name="gain">Loudness as an amplitude, 0 to 1.</param>
    /// <param name="stream">Where the WAV file goes; it must be able to go back to its begin, and is closed with this.</param>
    public SoundTrack(SoundStyle style, double gain, Stream stream)
    {
        _guide = new SoundGuide(style);
        _gain = gain;
        _file = new WavFile(stream);
    }

    /// <summary>Whether the file has room for no more: a WAV file ends after a day.</summary>
    public bool IsFull => _file.SampleCount >= WavFile.MaxSamples;

    /// <inheritdoc/>
    public void OnPicture(in CockpitPicture picture)
    {
        _synthesizer.Render(_guide.Next(picture), _gain, _samples);
        _file.Write(_samples);
    }

    /// <inheritdoc/>
    public void Dispose() => _file.Dispose();
}
