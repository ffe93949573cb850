using System.Globalization;
using System.Text;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Gliding;
using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Sensors;

/// <summary>
/// A satellite receiver at work: RMC, GGA and VTG for every fix. Position is the way through the air plus the wind's drift, on a sphere that
/// is flat about the start, good to a metre in a hundred kilometres squared over the earth's radius. Heights are above mean sea
/// level, taken as the geopotential height.
/// </summary>
public sealed class GnssReceiver
{
    private const double EarthRadiusM = 6_371_000;
    private const double Degree = Math.PI / 180;
    private const double Knot = 1852.0 / 3600;

    private readonly GnssSpec _spec;
    private readonly DateTimeOffset _startUtc;
    private readonly SeededNoise _random;
    private readonly GaussMarkov _eastErrorM;
    private readonly GaussMarkov _northErrorM;
    private readonly GaussMarkov _heightErrorM;
    private readonly byte[] _stream;
    private readonly byte[] _sentence = new byte[128];
    private double _driftEastM;
    private double _driftNorthM;
    private long _nextUs;

    /// <summary>Switches the receiver on.</summary>
    /// <param name="spec">The receiver.</param>
    /// <param name="startUtc">Time of day at the start.</param>
    /// <param name="seed">The seed of the run.</param>
    public GnssReceiver(GnssSpec spec, DateTimeOffset startUtc, long seed)
    {
        ArgumentNullException.ThrowIfNull(spec);
        _spec = spec;
        _startUtc = startUtc;
        _random = new SeededNoise(seed, $"gnss {spec.Stream}");
        _eastErrorM = new GaussMarkov(_random, spec.PositionNoiseM, GnssSpec.WanderTimeS);
        _northErrorM = new GaussMarkov(_random, spec.PositionNoiseM, GnssSpec.WanderTimeS);
        _heightErrorM = new GaussMarkov(_random, spec.HeightNoiseM, GnssSpec.WanderTimeS);
        _stream = Encoding.ASCII.GetBytes(spec.Stream);
    }

    /// <summary>Goes on by one step of the flight.</summary>
    /// <param name="timeUs">End of the step, microseconds.</param>
    /// <param name="stepS">The step, s.</param>
    /// <param name="state">The glider at its end.</param>
    /// <param name="wind">Where the wind there blows to, m/s.</param>
    /// <param name="lines">Where sentences go.</param>
    public void Advance(long timeUs, double stepS, in GliderState state, (double EastMps, double NorthMps) wind, LinesInOrder lines)
    {
        ArgumentNullException.ThrowIfNull(lines);
        _driftEastM += wind.EastMps * stepS;
        _driftNorthM += wind.NorthMps * stepS;
        if (timeUs < _nextUs)
        {
            return;
        }

        _nextUs = timeUs + (long)Math.Round(_spec.EveryS * 1e6);
        _eastErrorM.Step(_spec.EveryS);
        _northErrorM.Step(_spec.EveryS);
        _heightErrorM.Step(_spec.EveryS);
        var (sin, cos) = Math.SinCos(_spec.TrackRad);
        var eastM = state.AlongM * sin + state.AcrossM * cos + _driftEastM + _eastErrorM.Value;
        var northM = state.AlongM * cos - state.AcrossM * sin + _driftNorthM + _northErrorM.Value;
        var headingRad = _spec.TrackRad + state.HeadingRad;
        var eastMps = state.AirspeedMps * Math.Sin(headingRad) + wind.EastMps + _spec.SpeedNoiseMps * _random.NextNormal();
        var northMps = state.AirspeedMps * Math.Cos(headingRad) + wind.NorthMps + _spec.SpeedNoiseMps * _random.NextNormal();
        Send(timeUs, eastM, northM, state.HeightM + _heightErrorM.Value, eastMps, northMps, lines);
    }

    private void Send(long timeUs, double eastM, double northM, double heightM, double eastMps, double northMps, LinesInOrder lines)
    {
        var utc = _startUtc.AddMicroseconds(timeUs);
        var time = utc.ToString("HHmmss.ff", CultureInfo.InvariantCulture);
        var date = utc.ToString("ddMMyy", CultureInfo.InvariantCulture);
        var place = Place(_spec.LatitudeRad + northM / EarthRadiusM, 2, 'N', 'S') + ","
            + Place(_spec.LongitudeRad + eastM / (EarthRadiusM * Math.Cos(_spec.LatitudeRad)), 3, 'E', 'W');
        var speed = Math.Sqrt(eastMps * eastMps + northMps * northMps);
        var track = Number(Math.IEEERemainder(Math.Atan2(eastMps, northMps) / Degree - 180, 360) + 180, 1);
        var stampUs = timeUs + (long)Math.Round(_spec.LatencyS * 1e6);
        Write(stampUs, $"GNRMC,{time},A,{place},{Number(speed / Knot, 2)},{track},{date},,,A", lines);
        Write(stampUs, $"GNGGA,{time},{place},1,12,0.9,{Number(heightM, 1)},M,46.0,M,,", lines);
        Write(stampUs, $"GNVTG,{track},T,,M,{Number(speed / Knot, 2)},N,{Number(speed * 3.6, 2)},K,A", lines);
    }

    private void Write(long stampUs, string content, LinesInOrder lines)
    {
        if (!SentenceWriter.TryWrite(_sentence, Encoding.ASCII.GetBytes(content), out var length))
        {
            throw new InvalidOperationException($"does not fit into a sentence: {content}");
        }

        lines.Add(stampUs, _stream, _sentence.AsSpan(0, length - 2));
    }

    /// <summary>Degrees and minutes to 0.0001', 0.2 m, as receivers write them.</summary>
    private static string Place(double rad, int degreeDigits, char positive, char negative)
    {
        // Rounded first, so that no place has sixty minutes.
        var units = (long)Math.Round(Math.Abs(rad) / Degree * 600_000);
        var degrees = (units / 600_000).ToString(CultureInfo.InvariantCulture).PadLeft(degreeDigits, '0');
        var minutes = (units % 600_000 / 10_000.0).ToString("00.0000", CultureInfo.InvariantCulture);
        return $"{degrees}{minutes},{(rad < 0 ? negative : positive)}";
    }

    private static string Number(double value, int decimals) => value.ToString($"F{decimals}", CultureInfo.InvariantCulture);
}
