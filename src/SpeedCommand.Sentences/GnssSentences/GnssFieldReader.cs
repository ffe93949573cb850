namespace SpeedCommand.Sentences.GnssSentences;

/// <summary>
/// Reads the fields of a receiver's sentence one after the other. An empty field is a value not known: NaN or null. A field
/// that is missing or malformed makes the whole unsound, which is asked once at the end.
/// </summary>
internal ref struct GnssFieldReader(SentenceFields fields)
{
    private const int SecondsPerMinute = 60;
    private const int SecondsPerHour = 3600;
    private SentenceFields _fields = fields;

    /// <summary>Whether all fields so far were there and well-formed.</summary>
    public bool IsSound { get; private set; } = true;

    public void Skip() => Next();

    /// <summary>A number; NaN when empty.</summary>
    public double Number() => NumberOf(Next());

    /// <summary>A number followed by a field with its unit, which may be left out with the number.</summary>
    public double Number(byte unit)
    {
        var field = Next();
        var letter = Next();
        Require(letter is [var only] ? only == unit : letter.IsEmpty && field.IsEmpty);
        return NumberOf(field);
    }

    /// <summary>A number of things; null when empty.</summary>
    public int? Count()
    {
        var field = Next();
        // More than four digits are no count of satellites and no quality.
        return field.IsEmpty || !Require(AreDigits(field) && field.Length <= 4) ? null : Digits(field);
    }

    /// <summary>One of the letters, which may not be empty; 0 when unsound.</summary>
    public byte Letter(ReadOnlySpan<byte> allowed)
    {
        var field = Next();
        return Require(field.Length == 1 && allowed.Contains(field[0])) ? field[0] : (byte)0;
    }

    /// <summary>hhmmss with any decimals as seconds; 60 seconds only where a leap second can be, before midnight.</summary>
    public double TimeOfDayS()
    {
        var field = Next();
        if (field.IsEmpty || !Require(field.Length >= 6 && AreDigits(field[..6])))
        {
            return double.NaN;
        }

        var hours = Digits(field[..2]);
        var minutes = Digits(field[2..4]);
        var seconds = NumberOf(field[4..]);
        var secondsLimit = hours == 23 && minutes == 59 ? 61 : 60;
        Require(hours < 24 && minutes < 60 && seconds < secondsLimit);
        return (hours * SecondsPerHour) + (minutes * SecondsPerMinute) + seconds;
    }

    /// <summary>ddmmyy; null when empty. The two digits of the year are taken from 1980, the epoch of GPS, to 2079.</summary>
    public DateOnly? Date()
    {
        var field = Next();
        if (field.IsEmpty || !Require(field.Length == 6 && AreDigits(field)))
        {
            return null;
        }

        var day = Digits(field[..2]);
        var month = Digits(field[2..4]);
        var year = Digits(field[4..]) is var two && two < 80 ? 2000 + two : 1900 + two;
        return Require(month is >= 1 and <= 12 && day >= 1 && day <= DateTime.DaysInMonth(year, month))
            ? new DateOnly(year, month, day)
            : null;
    }

    /// <summary>ddmm.mmm and N or S, as radians.</summary>
    public double LatitudeRad() => CoordinateRad(degreeDigits: 2, limitDeg: 90, (byte)'N', (byte)'S');

    /// <summary>dddmm.mmm and E or W, as radians.</summary>
    public double LongitudeRad() => CoordinateRad(degreeDigits: 3, limitDeg: 180, (byte)'E', (byte)'W');

    /// <summary>
    /// The mode that NMEA 0183 added in version 2.3, absent before: autonomous, differential, real-time kinematic (float and
    /// fixed) and precise are measured; estimated, manual, simulated, not valid and any letter to come are not.
    /// </summary>
    /// <returns>Whether the values are measured; true when the field is absent or empty.</returns>
    public bool IsMeasuredByOptionalMode() =>
        !_fields.MoveNext() || _fields.Current.IsEmpty
        || (Require(_fields.Current.Length == 1) && "ADFRP"u8.Contains(_fields.Current[0]));

    private double CoordinateRad(int degreeDigits, double limitDeg, byte positive, byte negative)
    {
        var field = Next();
        var hemisphere = Next();
        if (field.IsEmpty)
        {
            // Receivers without a fix leave the letter standing or not.
            return double.NaN;
        }

        var point = field.IndexOf((byte)'.');
        var whole = point < 0 ? field : field[..point];
        if (!Require(whole.Length == degreeDigits + 2 && AreDigits(whole)
                && hemisphere is [var letter] && (letter == positive || letter == negative)))
        {
            return double.NaN;
        }

        var minutes = NumberOf(field[degreeDigits..]);
        var deg = Digits(field[..degreeDigits]) + (minutes / 60);
        Require(minutes < 60 && deg <= limitDeg);
        return double.DegreesToRadians(hemisphere[0] == negative ? -deg : deg);
    }

    private ReadOnlySpan<byte> Next()
    {
        Require(_fields.MoveNext());
        return _fields.Current;
    }

    private double NumberOf(ReadOnlySpan<byte> field)
    {
        Require(SentenceNumber.TryRead(field, out var value) || field.IsEmpty);
        return value;
    }

    private bool Require(bool isMet)
    {
        IsSound &= isMet;
        return isMet;
    }

    private static bool AreDigits(ReadOnlySpan<byte> field) => !field.ContainsAnyExceptInRange((byte)'0', (byte)'9');

    private static int Digits(ReadOnlySpan<byte> digits)
    {
        var value = 0;
        foreach (var digit in digits)
        {
            value = (10 * value) + digit - '0';
        }

        return value;
    }
}
