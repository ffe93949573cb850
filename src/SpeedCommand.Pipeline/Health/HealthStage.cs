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
    /// <returns>Whether it may be used.</returns>
    public bool Accepts(long timeUs, in Reading reading)
    {
        switch (reading.Kind)
        {
            case ReadingKind.StaticPressurePa:
                return Passes(_static, timeUs, reading.Value, out var sinceUs) ? PassesLines(timeUs, reading) : TakeBackStatic(sinceUs);
            case ReadingKind.ImpactPressurePa:
                return Passes(_impact, timeUs, reading.Value, out sinceUs) ? PassesLines(timeUs, reading) : TakeBackImpact(sinceUs);
            case ReadingKind.IndicatedAirspeedMps:
                return Passes(_indicated, timeUs, reading.Value, out sinceUs) ? PassesLines(timeUs, reading) : TakeBackImpact(sinceUs);
            case ReadingKind.TotalEnergyProbePa:
                return Passes(_probe, timeUs, reading.Value, out _);
            case ReadingKind.OutsideAirTemperatureK:
                return Passes(_temperature, timeUs, reading.Value, out _);
            case ReadingKind.LoadFactor:
                return Passes(_load, timeUs, reading.Value, out _);
            default:
                return true;
        }
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

    private bool Passes(SensorWatch watch, long timeUs, double value, out long sinceUs)
    {
        var fault = watch.Judge(timeUs, value, airData.IsFlying(timeUs), out sinceUs);
        if (fault == Faults.None)
        {
            return true;
        }

        events.Note(fault, timeUs);
        var isStuck = (fault & (Faults.StaticStuck | Faults.AirspeedStuck)) != 0;
        sinceUs = isStuck ? sinceUs : long.MaxValue;
        return false;
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
        return reading.Kind == ReadingKind.StaticPressurePa
            ? !_lines.IsStaticBlocked || TakeBackStatic(long.MinValue / 2)
            : !_lines.IsPitotBlocked || TakeBackImpact(long.MinValue / 2);
    }

    private bool TakeBackStatic(long sinceUs)
    {
        airData.TakeBackStatic(sinceUs);
        return false;
    }

    private bool TakeBackImpact(long sinceUs)
    {
        airData.TakeBackImpact(sinceUs);
        return false;
    }

    private void NoteIf(bool happens, Faults fault, long timeUs)
    {
        if (happens)
        {
            events.Note(fault, timeUs);
        }
    }
}
