namespace SpeedCommand.Replay.Igc;

/// <summary>The fixed-width fields of IGC records.</summary>
internal static class IgcField
{
    private const double KelvinAtIcePoint = 273.15;

    /// <summary>HHMMSS as seconds of the day.</summary>
    public static bool TryTimeOfDay(ReadOnlySpan<byte> field, out int seconds)
    {
        seconds = 0;
        if (!TryDigits(field[..2], out var hours) || !TryDigits(field[2..4], out var minutes) || !TryDigits(field[4..6], out var rest)
            || hours > 23 || minutes > 59 || rest > 59)
        {
            return false;
        }

        seconds = hours * 3600 + minutes * 60 + rest;
        return true;
    }

    /// <summary>DDMMmmm or DDDMMmmm and a letter, as radians.</summary>
    public static bool TryAngle(ReadOnlySpan<byte> field, int degreeDigits, char positive, char negative, out double angleRad)
    {
        angleRad = 0;
        var letter = (char)field[^1];
        if (!TryDigits(field[..degreeDigits], out var degrees) || !TryDigits(field[degreeDigits..^1], out var thousandths)
            || thousandths >= 60_000 || (letter != positive && letter != negative))
        {
            return false;
        }

        var deg = degrees + thousandths / 60_000.0;
        angleRad = double.DegreesToRadians(letter == negative ? -deg : deg);
        return deg <= (degreeDigits == 2 ? 90 : 180);
    }

    /// <summary>Digits, the first of which may be a minus sign.</summary>
    public static bool TrySigned(ReadOnlySpan<byte> field, out int value)
    {
        var isNegative = field.Length > 1 && field[0] == '-';
        var isNumber = TryDigits(isNegative ? field[1..] : field, out var magnitude);
        value = isNegative ? -magnitude : magnitude;
        return isNumber;
    }

    /// <summary>ddmmyy; the century as in NMEA sentences, 1980 to 2079.</summary>
    public static bool TryDate(ReadOnlySpan<byte> field, out DateOnly date)
    {
        date = default;
        if (field.Length < 6 || !TryDigits(field[..2], out var day) || !TryDigits(field[2..4], out var month) || !TryDigits(field[4..6], out var two))
        {
            return false;
        }

        var year = two < 80 ? 2000 + two : 1900 + two;
        if (month is < 1 or > 12 || day < 1 || day > DateTime.DaysInMonth(year, month))
        {
            return false;
        }

        date = new DateOnly(year, month, day);
        return true;
    }

    /// <summary>Airspeed in km/h: three digits are whole, each further one is a decimal.</summary>
    public static double Airspeed(ReadOnlySpan<byte> field) =>
        TryDigits(field, out var value) ? value / Power(field.Length - 3) / 3.6 : double.NaN;

    /// <summary>Temperature in °C: three characters are whole degrees, each further one is a decimal.</summary>
    public static double Temperature(ReadOnlySpan<byte> field) =>
        TrySigned(field, out var value) ? value / Power(field.Length - 3) + KelvinAtIcePoint : double.NaN;

    /// <summary>Vertical speed in m/s: three characters are tenths, wider fields hundredths.</summary>
    public static double VerticalSpeed(ReadOnlySpan<byte> field) =>
        TrySigned(field, out var value) ? value / (field.Length > 3 ? 100.0 : 10.0) : double.NaN;

    /// <summary>Three digits of a scale that ends at 999.</summary>
    public static double EngineNoise(ReadOnlySpan<byte> field) =>
        field.Length == 3 && TryDigits(field, out var value) ? value / 999.0 : double.NaN;

    public static bool TryDigits(ReadOnlySpan<byte> field, out int value)
    {
        value = 0;
        if (field.Length is 0 or > 9)
        {
            return false;
        }

        foreach (var character in field)
        {
            if (character is < (byte)'0' or > (byte)'9')
            {
                return false;
            }

            value = value * 10 + character - '0';
        }

        return true;
    }

    private static double Power(int decimals) => decimals switch
    {
        <= 0 => 1,
        1 => 10,
        2 => 100,
        _ => 1000,
    };
}
