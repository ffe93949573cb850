using System.Globalization;
using System.Text;

namespace SpeedCommand.Replay.Igc;

/// <summary>
/// Writes an IGC file with indicated airspeed and outside air temperature as extra fields. It has no signature, and says so: it is no
/// proof of a flight.
/// </summary>
public sealed class IgcWriter : IDisposable
{
    private const double SecondsPerDay = 86_400;

    /// <summary>Stands where a value is not known; no reader takes it for a number.</summary>
    private const string Unknown = "---";

    private readonly StreamWriter _text;

    /// <summary>Writes the header at once.</summary>
    /// <param name="stream">Where the file goes; closed with the writer.</param>
    /// <param name="date">UTC date of the first fix.</param>
    /// <param name="gliderType">The glider's type; empty when not known.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public IgcWriter(Stream stream, DateOnly date, string gliderType)
    {
        ArgumentNullException.ThrowIfNull(gliderType);
        _text = new StreamWriter(stream, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false)) { NewLine = "\r\n" };
        // XXX is the code of a recorder that nobody has approved.
        _text.WriteLine("AXXXSPC");
        _text.WriteLine(string.Create(CultureInfo.InvariantCulture, $"HFDTE{date:ddMMyy}"));
        _text.WriteLine($"HFGTYGLIDERTYPE:{gliderType.ReplaceLineEndings(" ")}");
        _text.WriteLine("HFDTM100GPSDATUM:WGS-1984");
        _text.WriteLine("HFFTYFRTYPE:SpeedCommand,flight log");
        _text.WriteLine("HFALPALTPRESSURE:ISA");
        _text.WriteLine("HFALGALTGPS:GEO");
        _text.WriteLine("I023638IAS3941OAT");
        _text.WriteLine("LXXXUNSIGNED: made from a flight log, without a G record; no proof of a flight");
    }

    /// <summary>Fixes written so far.</summary>
    public long Count { get; private set; }

    /// <summary>Writes a fix.</summary>
    /// <param name="fix">
    /// The fix, position known; what is NaN is written as not known. A pressure altitude that is not known is written as 0, as the
    /// format asks.
    /// </param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void Write(in IgcFix fix)
    {
        var time = TimeSpan.FromSeconds(Math.Floor(fix.TimeOfDayS % SecondsPerDay));
        _text.WriteLine(string.Create(CultureInfo.InvariantCulture,
            $"B{time:hhmmss}{Angle(fix.LatitudeRad, 2, 'N', 'S')}{Angle(fix.LongitudeRad, 3, 'E', 'W')}{(fix.IsThreeDimensional ? 'A' : 'V')}{Altitude(fix.PressureAltitudeM)}{Altitude(fix.GnssAltitudeM)}{Digits(fix.IndicatedMps * 3.6)}{Digits(fix.OutsideTemperatureK - 273.15)}"));
        Count++;
    }

    /// <inheritdoc/>
    public void Dispose() => _text.Dispose();

    private static string Angle(double angleRad, int degreeDigits, char positive, char negative)
    {
        // Rounded as a whole: 59.9999 minutes are the next degree, not sixty minutes.
        var thousandths = (long)Math.Round(Math.Abs(double.RadiansToDegrees(angleRad)) * 60_000);
        var degrees = (thousandths / 60_000).ToString("D" + degreeDigits, CultureInfo.InvariantCulture);
        return string.Create(CultureInfo.InvariantCulture, $"{degrees}{thousandths % 60_000:00000}{(angleRad < 0 ? negative : positive)}");
    }

    private static string Altitude(double metres)
    {
        var whole = double.IsFinite(metres) ? (int)Math.Clamp(Math.Round(metres), -9999, 99_999) : 0;
        return whole.ToString(whole < 0 ? "0000" : "00000", CultureInfo.InvariantCulture);
    }

    private static string Digits(double value)
    {
        var whole = Math.Round(value);
        return whole is >= -99 and <= 999 ? ((int)whole).ToString(whole < 0 ? "00" : "000", CultureInfo.InvariantCulture) : Unknown;
    }
}
