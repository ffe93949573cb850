using System.Text;

namespace SpeedCommand.Sentences.Columns;

/// <summary>
/// Lines of plain numbers in columns. Without a checksum only strictness protects: a line with another number of columns, or with
/// anything but a number where one is expected, is a bad line as a whole. An empty column and "nan" have nothing to say.
/// </summary>
public sealed class ColumnFormat : LineFormat
{
    /// <summary>Most columns of a line.</summary>
    public const int MaxColumns = 32;

    /// <summary>Longest line, in bytes; below what the framer cuts, so that no cut line is taken for a whole one.</summary>
    public const int MaxLength = 400;

    private readonly Column[] _columns;
    private readonly byte _separator;
    private readonly byte[] _prefix;

    /// <summary>Describes the lines of a board.</summary>
    /// <param name="columns">The columns from left to right, without the prefix; 1 to <see cref="MaxColumns"/>.</param>
    /// <param name="separator">What stands between two columns; of spaces, several count as one.</param>
    /// <param name="prefix">The word every line begins with, as a column of its own; empty for none.</param>
    /// <exception cref="ArgumentException">There are no columns, or too many.</exception>
    public ColumnFormat(IReadOnlyList<Column> columns, char separator = ',', string prefix = "")
    {
        ArgumentNullException.ThrowIfNull(columns);
        if (columns.Count is 0 or > MaxColumns)
        {
            throw new ArgumentException($"expected 1 to {MaxColumns} columns, found {columns.Count}", nameof(columns));
        }

        _columns = [.. columns];
        _separator = (byte)separator;
        _prefix = Encoding.ASCII.GetBytes(prefix);
        var mark = Array.Find(_columns, column => column.Use is ColumnUse.Counter or ColumnUse.Time);
        Mark = mark.Use switch
        {
            ColumnUse.Counter => new SampleMark(SampleMarkKind.Counter, mark.TurnsOverAt),
            ColumnUse.Time => new SampleMark(SampleMarkKind.Time, mark.ValueOf(mark.TurnsOverAt)),
            _ => SampleMark.None,
        };
    }

    /// <inheritdoc/>
    public override SampleMark Mark { get; }

    /// <inheritdoc/>
    public override LineContent Read(ReadOnlySpan<byte> line, Span<Reading> readings)
    {
        var fields = new ColumnFields(line, _separator);
        if (_prefix.Length > 0 && !(fields.MoveNext() && fields.Current.SequenceEqual(_prefix)))
        {
            return IsWord(fields.Current) ? LineContent.Foreign : LineContent.Bad;
        }

        var count = 0;
        var mark = double.NaN;
        foreach (ref readonly var column in _columns.AsSpan())
        {
            if (!fields.MoveNext() || !TryRead(column, fields.Current, out var value))
            {
                return LineContent.Bad;
            }

            if (column.Use == ColumnUse.Reading && double.IsFinite(value))
            {
                readings[count] = new Reading(column.Kind, value);
                count++;
            }

            mark = column.Use is ColumnUse.Counter or ColumnUse.Time ? value : mark;
        }

        return fields.MoveNext() || line.Length > MaxLength ? LineContent.Bad : new LineContent(IsSound: true, count, 0, mark);
    }

    /// <summary>NaN for a column with nothing to say; false for one that is no number though it should be.</summary>
    private static bool TryRead(in Column column, ReadOnlySpan<byte> field, out double value)
    {
        value = double.NaN;
        if (column.Use == ColumnUse.Skip || field.IsEmpty || Ascii.EqualsIgnoreCase(field, "nan"u8))
        {
            return true;
        }

        var isNumber = SentenceNumber.TryRead(field, out var number);
        value = column.ValueOf(number);
        return isNumber;
    }

    /// <summary>A line that begins with another word is another kind of line, not a broken one of ours.</summary>
    private static bool IsWord(ReadOnlySpan<byte> field)
    {
        foreach (var character in field)
        {
            if (!char.IsAsciiLetterOrDigit((char)character) && character != '_')
            {
                return false;
            }
        }

        return field.Length > 0 && char.IsAsciiLetter((char)field[0]);
    }
}
