using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Faults;

/// <summary>
/// Sensors that err while their sentences stay valid. A blocked tube couples both pressures: the impact sensor measures the
/// difference of what is in the two tubes, whatever that is.
/// </summary>
internal sealed class SpoiltSensors
{
    private readonly List<SensorFault> _faults;
    private double _staticPa = double.NaN;

    public SpoiltSensors(IEnumerable<(FaultSpec Spec, SeededNoise Random)> faults) =>
        _faults = [.. faults.Where(fault => fault.Spec.Kind is FaultKind.Frozen or FaultKind.Spike or FaultKind.PitotBlocked or FaultKind.StaticBlocked)
            .Select(fault => new SensorFault(fault.Spec, fault.Random))];

    /// <summary>What the sensors send instead of a line.</summary>
    public ReadOnlySpan<byte> Change(long timeUs, string stream, ReadOnlySpan<byte> line) => _faults.Count == 0
        ? line
        : SensedValues.Change(line, (kind, value) => Change(timeUs, stream, kind, value));

    private double Change(long timeUs, string stream, ReadingKind kind, double value)
    {
        if (kind == ReadingKind.StaticPressurePa)
        {
            _staticPa = value;
        }

        var changed = value;
        foreach (var fault in _faults.Where(fault => fault.Spec.Concerns(stream) && fault.Concerns(kind)))
        {
            changed = fault.Change(timeUs, kind, changed, _staticPa);
        }

        return changed;
    }

    private sealed class SensorFault(FaultSpec spec, SeededNoise random)
    {
        private readonly FaultTimes _times = new(spec, random);
        private long _beganUs;
        private double _heldStaticPa;
        private double _held = double.NaN;

        public FaultSpec Spec => spec;

        public bool Concerns(ReadingKind kind) => spec.Kind switch
        {
            FaultKind.PitotBlocked => kind == ReadingKind.ImpactPressurePa,
            FaultKind.StaticBlocked => kind is ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa,
            _ => kind == spec.Measures,
        };

        public double Change(long timeUs, ReadingKind kind, double value, double staticPa)
        {
            if (spec.Kind == FaultKind.Spike)
            {
                return _times.Hits(timeUs) ? value + (random.NextUniform() < 0.5 ? -spec.Size : spec.Size) : value;
            }

            switch (_times.At(timeUs))
            {
                case FaultMoment.Begins:
                    (_beganUs, _held, _heldStaticPa) = (timeUs, value, staticPa);
                    break;
                case not FaultMoment.Lasts:
                    return value;
            }

            return spec.Kind == FaultKind.Frozen ? _held : Blocked(timeUs, kind, value, staticPa);
        }

        private double Blocked(long timeUs, ReadingKind kind, double value, double staticPa)
        {
            if (double.IsNaN(_heldStaticPa))
            {
                // Not one static pressure came before the tube was blocked: nothing is known that it could hold.
                return value;
            }

            var noisePa = spec.NoisePa * random.NextNormal();
            return spec.Kind switch
            {
                FaultKind.StaticBlocked when kind == ReadingKind.StaticPressurePa => _heldStaticPa + noisePa,
                FaultKind.StaticBlocked => value + staticPa - _heldStaticPa,
                _ when spec.IsDrainBlocked => _held + _heldStaticPa - staticPa + noisePa,
                _ => _held * Math.Exp(-(timeUs - _beganUs) * 1e-6 / spec.DrainS) + noisePa,
            };
        }
    }
}
