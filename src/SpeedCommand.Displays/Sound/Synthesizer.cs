namespace SpeedCommand.Displays.Sound;

/// <summary>
/// Makes samples of what is to be heard. The phase runs on through every change of pitch, and loudness moves in short ramps,
/// so nothing clicks. One for each loudspeaker; not for several threads at once; allocates nothing; the same orders give the same samples.
/// </summary>
public sealed class Synthesizer
{
    /// <summary>Samples a second: twelve times the highest tone, and the highest overtone stays below a third of it.</summary>
    public const int SampleRateHz = 24_000;

    // A pitch that jumps ten times a second sounds like a scale; in 30 ms it glides, and is there before the next picture.
    private const double GlideS = 0.03;

    // The second harmonic lets a small loudspeaker tell the low tones of sink; the signals have the third, which sounds hollow.
    private const double TonePartial = 0.25, CuePartial = 0.3;

    // A flutter of 25 Hz is heard as roughness, not as pulses.
    private const double HoarseHz = 25, HoarseDepth = 0.7;

    private const double Smoothing = 1 / (GlideS * SampleRateHz);

    private SoundOrder _order;
    private Envelope _toneEnvelope;
    private double _frequencyHz, _phase, _pulse, _gain, _hoarseness, _flutter;
    private SoundCue _waiting;
    private CueShape _cue;
    private int _cueSample;

    /// <summary>Makes the next samples.</summary>
    /// <param name="order">What is to be heard; its signal begins once, with the first of these samples.</param>
    /// <param name="gain">Loudness as an amplitude, 0 to 1; it is reached smoothly.</param>
    /// <param name="samples">Where the samples go.</param>
    public void Render(in SoundOrder order, double gain, Span<short> samples)
    {
        _order = order;
        // A signal is never cut short by another: what matters now comes right after.
        _waiting = order.Cue != SoundCue.None ? order.Cue : _waiting;
        foreach (ref var sample in samples)
        {
            _gain += (gain - _gain) * Smoothing;
            sample = (short)Math.Round(short.MaxValue * _gain * Next());
        }
    }

    private double Next()
    {
        if (_cue.Count > 0)
        {
            return NextOfCue();
        }

        var isCueDue = _waiting != SoundCue.None;
        if (isCueDue && _toneEnvelope.IsSilent)
        {
            (_cue, _cueSample, _waiting) = (CueShape.Of(_waiting), 0, SoundCue.None);
            return NextOfCue();
        }

        return NextOfTone(_order.FrequencyHz > 0 && !isCueDue);
    }

    private double NextOfTone(bool isWanted)
    {
        if (_toneEnvelope.IsSilent && !isWanted)
        {
            // The next tone begins with a pulse and at its own pitch.
            (_pulse, _frequencyHz) = (0, 0);
            return 0;
        }

        if (_order.FrequencyHz > 0)
        {
            _frequencyHz = _frequencyHz == 0 ? _order.FrequencyHz : _frequencyHz + (_order.FrequencyHz - _frequencyHz) * Smoothing;
        }

        var loudness = _toneEnvelope.Next(isWanted && _pulse < 0.5);
        _pulse = Advance(_order.CadenceHz == 0 ? 0 : _pulse, _order.CadenceHz);
        _phase = Advance(_phase, _frequencyHz);
        _flutter = Advance(_flutter, HoarseHz);
        _hoarseness += ((_order.IsHoarse ? HoarseDepth : 0) - _hoarseness) * Smoothing;
        return loudness * (1 - _hoarseness * (0.5 + 0.5 * SineTable.At(_flutter))) * Wave(2, TonePartial);
    }

    private double NextOfCue()
    {
        var inChirp = _cueSample % _cue.PeriodSamples;
        var value = 0.0;
        if (inChirp < _cue.LengthSamples)
        {
            _phase = Advance(_phase, _cue.FrequencyHz(inChirp));
            value = Envelope.Within(inChirp, _cue.LengthSamples) * Wave(3, CuePartial);
        }

        if (++_cueSample >= _cue.TotalSamples)
        {
            _cue = default;
        }

        return value;
    }

    private double Wave(int partial, double strength) =>
        (SineTable.At(_phase) + strength * SineTable.At(partial * _phase)) / (1 + strength);

    private static double Advance(double turns, double frequencyHz)
    {
        var next = turns + frequencyHz / SampleRateHz;
        return next - Math.Floor(next);
    }
}
