using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Pipeline.Stages;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.GnssSentences;

namespace SpeedCommand.Pipeline.Health;

/// <summary>
/// Stands between readings in range and their use: holds back what cannot be true, takes back what turned out not to be, and
/// names it. docs/failures.md has a row for each fault.
/// </summary>
internal sealed class HealthStage(AirDataStage airData, EventFaults events)
{
    // 20 Pa is 1.7 m near the ground; 600 Pa/s is 50 m/s of climb or sink.
    private readonly SensorWatch _static = new(new JumpGate(20, 600), Faults.StaticJumps, Faults.StaticStuck);
    private readonly SensorWatch _probe = new(new JumpGate(20, 3000), Faults.ProbeDoubtful, Faults.ProbeDoubtful);

    // At 30 m/s, 3000 Pa/s is 80 m/s²: gusts come within tenths of a second.
    private readonly SensorWatch _impact = new(new JumpGate(40, 3000), Faults.AirspeedJumps, Faults.AirspeedStuck);
    private readonly SensorWatch _indicated = new(new JumpGate(2, 80), Faults.AirspeedJumps, Faults.AirspeedStuck);

    // A thermometer is slow; a load factor may turn round within a tenth of a second in rough air.
    private readonly SensorWatch _temperature = new(new JumpGate(2, 1), Faults.TemperatureJumps, Faults.None);
    private readonly SensorWatch _load = new(new JumpGate(1, 20), Faults.LoadJumps, Faults.None);

    private readonly LineWatch _lines = new();
    private readonly ThermometerWatch _thermometer = new();
    private readonly GnssWatch _gnss = new();

    /// <summary>Judges a reading that is in range.</summary>
    /// <param name="timeUs">The moment, microseconds.</param>
    /// <param name="reading">The reading.</param>
    /// <returns>What to do with it.</returns>
    public Verdict Judge(long timeUs, in Reading reading)
    {
        var watch = reading.Kind switch
        {
            ReadingKind.StaticPressurePa => _static,
            ReadingKind.ImpactPressurePa => _impact,
            ReadingKind.IndicatedAirspeedMps => _indicated,
            ReadingKind.TotalEnergyProbePa => _probe,
            ReadingKind.OutsideAirTemperatureK => _temperature,
            ReadingKind.LoadFactor => _load,
            _ => null,
        };
        if (watch is null)
        {
            return Verdict.Good;
        }

        var verdict = watch.Judge(timeUs, reading.Value, airData.IsFlying(timeUs), out var sinceUs, out var fault);
        NoteIf(fault != Faults.None, fault, timeUs);
        if (reading.Kind is ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa or ReadingKind.IndicatedAirspeedMps)
        {
            return verdict == Verdict.Refused ? TakeBack(fault, sinceUs) : PassesLines(timeUs, reading) ? verdict : Verdict.Refused;
        }

        // A new temperature or load is no reason to doubt the climb.
        return verdict == Verdict.NewTruth && reading.Kind != ReadingKind.TotalEnergyProbePa ? Verdict.Good : verdict;
    }

    /// <summary>Looks at a temperature that is in use, and at the humidity with it.</summary>
    public void WatchTemperature(long timeUs, double sensedK, double heightM)
    {
        if (double.IsFinite(heightM))
        {
            _thermometer.Take(timeUs, sensedK, heightM);
        }

        if (_thermometer.IsDoubtful)
        {
            events.Note(Faults.ThermometerDoubtful, timeUs);
        }

        if (airData.IsStaticFresh(timeUs) && ThermometerWatch.IsIcing(airData.Air.TemperatureK, airData.Humidity(timeUs)))
        {
            events.Note(Faults.IcingPossible, timeUs);
        }
    }

    /// <summary>Compares a receiver's sentence with the pressures.</summary>
    /// <param name="timeUs">The moment, microseconds.</param>
    /// <param name="sentence">Any sentence; other types change nothing.</param>
    /// <param name="heightM">Hydrostatic height, m; NaN before the first static pressure.</param>
    public void WatchGnss(long timeUs, in Sentence sentence, double heightM)
    {
        if (GgaSentence.TryRead(sentence, out var gga))
        {
            _gnss.TakeHeight(timeUs, gga.AltitudeM, gga.HorizontalDilution, airData.IsStaticFresh(timeUs) ? heightM : double.NaN);
        }
        else if (RmcSentence.TryRead(sentence, out var rmc))
        {
            var trueMps = airData.TryAirspeeds(timeUs, out _, out var airspeed) ? airspeed.Mps : double.NaN;
            _gnss.TakeSpeed(timeUs, rmc.GroundSpeedMps, rmc.TrackRad, trueMps);
        }

        NoteIf(_gnss.IsHeightApart, Faults.StaticDisagrees, timeUs);
        NoteIf(_gnss.IsSpeedApart, Faults.AirspeedDisagrees, timeUs);
    }

    /// <summary>Of a stuck sensor nothing is known since its value first came; a jump says nothing of what was before it.</summary>
    private Verdict TakeBack(Faults fault, long sinceUs)
    {
        if (fault == Faults.StaticStuck)
        {
            airData.TakeBackStatic(sinceUs);
        }
        else if (fault == Faults.AirspeedStuck)
        {
            airData.TakeBackImpact(sinceUs);
        }

        return Verdict.Refused;
    }

    private bool PassesLines(long timeUs, in Reading reading)
    {
        if (reading.Kind == ReadingKind.StaticPressurePa)
        {
            _lines.TakeStatic(timeUs, reading.Value);
        }
        else if (reading.Kind == ReadingKind.ImpactPressurePa)
        {
            _lines.TakeImpact(timeUs, reading.Value);
        }
        else if (AirspeedConversion.TryImpactPressure(new CalibratedAirspeed(reading.Value), out var impactPa))
        {
            _lines.TakeImpact(timeUs, impactPa);
        }

        NoteIf(_lines.IsStaticBlocked, Faults.StaticBlocked, timeUs);
        NoteIf(_lines.IsPitotBlocked, Faults.PitotBlocked, timeUs);
        if (reading.Kind == ReadingKind.StaticPressurePa && _lines.IsStaticBlocked)
        {
            airData.TakeBackStatic(long.MinValue / 2);
            return false;
        }

        if (reading.Kind != ReadingKind.StaticPressurePa && _lines.IsPitotBlocked)
        {
            airData.TakeBackImpact(long.MinValue / 2);
            return false;
        }

        return true;
    }

    private void NoteIf(bool happens, Faults fault, long timeUs)
    {
        if (happens)
        {
            events.Note(fault, timeUs);
        }
    }
}
