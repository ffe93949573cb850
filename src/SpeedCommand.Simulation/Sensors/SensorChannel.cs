using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>One sensor at work: lag, sampling by its own clock, errors, and the sentence it sends.</summary>
public sealed class SensorChannel
{
    private readonly SensorSpec _spec;
    private readonly SeededNoise _random;
    private readonly GaussMarkov _drift;
    private readonly int _decimals;
    private readonly byte[] _stream;
    private readonly byte[] _sentence = new byte[128];
    private double _lagged = double.NaN;
    private double _nextS;
    private double _lastSampleS;
    private double _lastSent = double.NaN;
    private long _lastStampUs;

    /// <summary>Switches the sensor on.</summary>
    /// <param name="spec">The sensor.</param>
    /// <param name="seed">The seed of the run.</param>
    public SensorChannel(SensorSpec spec, long seed)
    {
        ArgumentNullException.ThrowIfNull(spec);
        _spec = spec;
        _random = new SeededNoise(seed, $"sensor {spec.Kind} {spec.Stream}");
        _drift = new GaussMarkov(_random, spec.Drift, SensorSpec.DriftTimeS);
        _decimals = DecimalsFor(spec);
        _stream = Encoding.ASCII.GetBytes(spec.Stream);
        // Boards are not switched on in step.
        _nextS = spec.EveryS * _random.NextUniform();
    }

    /// <summary>The sensor's stream.</summary>
    public ReadOnlySpan<byte> Stream => _stream;

    /// <summary>Goes on by one step, in which the quantity measured moves along a straight line.</summary>
    /// <param name="fromS">Begin of the step, s.</param>
    /// <param name="toS">End of the step, s; samples exactly there belong to the next step.</param>
    /// <param name="before">The quantity at the begin.</param>
    /// <param name="after">The quantity at the end.</param>
    /// <param name="lines">Where sentences go.</param>
    public void Advance(double fromS, double toS, double before, double after, LinesInOrder lines)
    {
        ArgumentNullException.ThrowIfNull(lines);
        if (double.IsNaN(_lagged))
        {
            _lagged = before;
        }

        var slope = (after - before) / (toS - fromS);
        while (_nextS < toS)
        {
            Sample(_nextS, Lagged(_nextS - fromS, before, slope), lines);
            _nextS += _spec.EveryS * (1 + _spec.ClockError);
        }

        _lagged = Lagged(toS - fromS, before, slope);
    }

    /// <summary>Exact first-order response to a straight line.</summary>
    private double Lagged(double elapsedS, double before, double slope)
    {
        if (_spec.LagS <= 0)
        {
            return before + slope * elapsedS;
        }

        var behind = slope * _spec.LagS;
        return before + slope * elapsedS - behind + (_lagged - before + behind) * Math.Exp(-elapsedS / _spec.LagS);
    }

    private void Sample(double timeS, double value, LinesInOrder lines)
    {
        _drift.Step(timeS - _lastSampleS);
        _lastSampleS = timeS;
        var sensed = value + _spec.Bias + _drift.Value + _spec.Noise * _random.NextNormal();
        // Drawn even when nothing is sent, so that a trouble changes nothing after it.
        var delayS = _spec.JitterS * Math.Abs(_random.NextNormal());
        var garbledAt = _random.NextUniform();
        if (_spec.Quantum > 0)
        {
            sensed = Math.Round(sensed / _spec.Quantum) * _spec.Quantum;
        }

        var trouble = _spec.TroubleAt(timeS)?.Kind;
        if (trouble == SensorTroubleKind.Stuck && double.IsFinite(_lastSent))
        {
            sensed = _lastSent;
        }

        _lastSent = sensed;
        if (trouble != SensorTroubleKind.Silent)
        {
            Send(timeS + delayS, sensed, trouble == SensorTroubleKind.Garbled ? garbledAt : double.NaN, lines);
        }
    }

    private void Send(double stampS, double value, double garbledAt, LinesInOrder lines)
    {
        ReadOnlySpan<XdrMeasurement> measurement = [new XdrMeasurement(_spec.Kind, value, _decimals)];
        if (!SentenceWriter.TryWriteXdr(_sentence, "YX"u8, measurement, out var length))
        {
            throw new InvalidOperationException($"a {_spec.Kind} of {value} does not fit into a sentence");
        }

        var line = _sentence.AsSpan(0, length - 2);
        if (double.IsFinite(garbledAt))
        {
            line[(int)(garbledAt * line.Length)] ^= 0x15;
        }

        _lastStampUs = Math.Max(_lastStampUs, (long)Math.Round(stampS * 1e6));
        lines.Add(_lastStampUs, _stream, line);
    }

    /// <summary>As many decimals as the quantum needs in the unit that is sent, at least one.</summary>
    private static int DecimalsFor(SensorSpec spec)
    {
        var quantum = spec.Kind switch
        {
            ReadingKind.BankRad => spec.Quantum * 180 / Math.PI,
            ReadingKind.RelativeHumidity => spec.Quantum * 100,
            _ => spec.Quantum,
        };
        return quantum <= 0 ? 4 : Math.Clamp((int)Math.Ceiling(-Math.Log10(quantum) - 1e-9) + (IsWhole(quantum) ? 0 : 1), 1, 6);
    }

    /// <summary>Whether the quantum is a power of ten, which its own decimals show exactly.</summary>
    private static bool IsWhole(double quantum) => Math.Abs(Math.Log10(quantum) - Math.Round(Math.Log10(quantum))) < 1e-9;
}
