using System.Globalization;
using System.Text;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Displays.SentencesOut;

/// <summary>
/// The picture as NMEA 0183 sentences for another instrument: XDR with ids of our own, in a fixed order, SI units, and an empty field for what is
/// not to be trusted; docs/sentences.md lists them. A last sentence names the gravest fault. Nothing is allocated.
/// </summary>
public static class PictureSentences
{
    /// <summary>Most bytes of one picture: five sentences of at most 82.</summary>
    public const int MaxLength = 5 * 82;

    private const double IcePointK = 273.15;

    // An array: going through a list by its interface would allocate.
    private static readonly KeyValuePair<Faults, string>[] Names = [.. FaultNames.All];

    /// <summary>Writes the sentences of one picture.</summary>
    /// <param name="picture">What to tell.</param>
    /// <param name="destination">Where to write; at least <see cref="MaxLength"/> bytes.</param>
    /// <returns>The bytes written; 0 when the destination is too short.</returns>
    public static int Render(in CockpitPicture picture, Span<byte> destination)
    {
        if (destination.Length < MaxLength)
        {
            return 0;
        }

        var content = new XdrContent(stackalloc byte[82]);
        content.Add("G"u8, picture.HoldIndicatedMps, Trust.Airspeed, 2, ""u8, "HOLD"u8);
        content.Add("G"u8, picture.SpeedToFlyIndicatedMps, Trust.Airspeed, 2, ""u8, "FLY"u8);
        content.Add("G"u8, picture.MinSinkIndicatedMps, Trust.Airspeed, 2, ""u8, "MINSINK"u8);
        content.Add("G"u8, picture.BestGlideIndicatedMps, Trust.Airspeed, 2, ""u8, "GLIDE"u8);
        var length = content.End(destination);

        content.Add("G"u8, picture.ClimbMps, Trust.Vertical, 2, ""u8, "CLIMB"u8);
        content.Add("G"u8, picture.AverageClimbMps, Trust.Vertical, 2, ""u8, "AVERAGE"u8);
        content.Add("G"u8, picture.NettoMps, Trust.Vertical, 2, ""u8, "NETTO"u8);
        content.Add("G"u8, new Gauge(picture.ExpectedClimbMps, double.NaN, 0), Trust.Vertical, 2, ""u8, "EXPECT"u8);
        length += content.End(destination[length..]);

        content.Add("D"u8, picture.PressureAltitudeM, Trust.Height, 1, "M"u8, "PALT"u8);
        content.Add("D"u8, picture.DensityAltitudeM, Trust.Height, 1, "M"u8, "DALT"u8);
        content.Add("C"u8, picture.TemperatureK with { Value = picture.TemperatureK.Value - IcePointK }, Trust.Temperature, 1, "C"u8, "AIRTEMP"u8);
        length += content.End(destination[length..]);

        content.Add("S"u8, picture.Phase == FlightPhase.Climbing, "PHASE"u8);
        content.Add("S"u8, picture.LimitedBy != LimitedBy.None, "LIMIT"u8);
        content.Add("G"u8, picture.EnduranceS, Trust.ShareOf(picture.EnduranceS.Value), 0, ""u8, "TIME"u8);
        content.Add("G"u8, picture.RangeM, Trust.ShareOf(picture.RangeM.Value), 0, ""u8, "RANGE"u8);
        length += content.End(destination[length..]);
        return length + Text(picture.Faults == Faults.None ? "" : FaultName(FaultWords.Gravest(picture.Faults)), destination[length..]);
    }

    /// <summary>Writes the caution, for whoever looks at the line.</summary>
    /// <param name="destination">Where to write; at least 82 bytes.</param>
    /// <returns>The bytes written.</returns>
    public static int RenderCaution(Span<byte> destination) => Text("advisory only, not a flight instrument", destination);

    private static string FaultName(Faults fault)
    {
        foreach (var (one, name) in Names)
        {
            if (one == fault)
            {
                return name;
            }
        }

        return "unknown";
    }

    /// <summary>TXT: one sentence of one, of our own kind 01, and the text.</summary>
    private static int Text(string text, Span<byte> destination)
    {
        Span<byte> content = stackalloc byte[82];
        "YXTXT,01,01,01,"u8.CopyTo(content);
        var length = 15 + Encoding.ASCII.GetBytes(text, content[15..]);
        return SentenceWriter.TryWrite(destination, content[..length], out var written) ? written : 0;
    }

    private ref struct XdrContent(Span<byte> buffer)
    {
        private static ReadOnlySpan<byte> Address => "YXXDR"u8;

        private readonly Span<byte> _buffer = buffer;
        private int _length;

        public void Add(ReadOnlySpan<byte> type, Gauge gauge, Trust trust, int decimals, ReadOnlySpan<byte> unit, ReadOnlySpan<byte> id)
        {
            Begin(type);
            // A number that a display would blank is not sent either. No flight has one beyond the limit; it would make the sentence too long.
            var limit = decimals switch { 0 => 1e6, 1 => 1e5, _ => 1e3 };
            if (gauge.IsKnown && !(gauge.Sigma > trust.BlankSigma) && Math.Abs(gauge.Value) < limit)
            {
                ReadOnlySpan<char> format = ['F', (char)('0' + decimals)];
                _ = gauge.Value.TryFormat(_buffer[_length..], out var written, format, CultureInfo.InvariantCulture);
                _length += written;
            }

            End(unit, id);
        }

        public void Add(ReadOnlySpan<byte> type, bool isSo, ReadOnlySpan<byte> id)
        {
            Begin(type);
            Put(isSo ? "1"u8 : "0"u8);
            End(""u8, id);
        }

        /// <summary>Writes the sentence and begins the next.</summary>
        public int End(Span<byte> destination)
        {
            _ = SentenceWriter.TryWrite(destination, _buffer[.._length], out var written);
            _length = 0;
            return written;
        }

        private void Begin(ReadOnlySpan<byte> type)
        {
            Put(_length == 0 ? Address : ""u8);
            Put(","u8);
            Put(type);
            Put(","u8);
        }

        private void End(ReadOnlySpan<byte> unit, ReadOnlySpan<byte> id)
        {
            Put(","u8);
            Put(unit);
            Put(","u8);
            Put(id);
        }

        private void Put(ReadOnlySpan<byte> text)
        {
            text.CopyTo(_buffer[_length..]);
            _length += text.Length;
        }
    }
}
