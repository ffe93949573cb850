namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Lets pass what a sensor can read next, and holds back a value that jumps farther than air and glider can move it. A jump that
/// lasts is the new truth: after three values that agree with each other, spread over a tenth of a second, it is believed.
/// Nothing that passes is delayed.
/// </summary>
/// <param name="floor">A step of this size is never a jump, in the reading's unit.</param>
/// <param name="ratePerS">The fastest the value may honestly move, unit per second.</param>
internal sealed class JumpGate(double floor, double ratePerS)
{
    /// <summary>Steps of white noise reach five times their mean size once in ten thousand; ten leaves the rest to turbulence.</summary>
    private const double UsualSteps = 10;

    private const int Confirmations = 3;
    private const long ConfirmationUs = 100_000;
    private const double MemoryS = 5;

    private double _value;
    private double _usualStep;
    private long _timeUs = long.MinValue / 2;
    private double _suspect;
    private long _suspectUs;
    private long _firstSuspectUs;
    private int _agreeing;

    /// <summary>Judges one value.</summary>
    public Verdict Judge(long timeUs, double value)
    {
        var dt = Math.Max(0, timeUs - _timeUs) * 1e-6;
        var step = Math.Abs(value - _value);
        if (timeUs - _timeUs > PipelineBounds.FreshnessUs)
        {
            Believe(timeUs, value);
            return step <= Widest(dt) ? Verdict.Good : Verdict.NewTruth;
        }

        if (step <= Widest(dt))
        {
            // A step at the edge of the gate widens it only a little.
            _usualStep += (Math.Min(step, 3 * _usualStep + floor) - _usualStep) * Math.Min(1, dt / MemoryS);
            Believe(timeUs, value);
            return Verdict.Good;
        }

        if (_agreeing == 0 || Math.Abs(value - _suspect) > Widest(Math.Max(0, timeUs - _suspectUs) * 1e-6))
        {
            _agreeing = 0;
            _firstSuspectUs = timeUs;
        }

        _agreeing++;
        (_suspect, _suspectUs) = (value, timeUs);
        if (_agreeing < Confirmations || timeUs - _firstSuspectUs < ConfirmationUs)
        {
            return Verdict.Refused;
        }

        Believe(timeUs, value);
        return Verdict.NewTruth;
    }

    private double Widest(double dt) => floor + ratePerS * dt + UsualSteps * _usualStep;

    private void Believe(long timeUs, double value)
    {
        (_value, _timeUs) = (value, timeUs);
        _agreeing = 0;
    }
}
