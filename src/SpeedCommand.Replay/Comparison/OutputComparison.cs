using System.Text.Json;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Replay.Comparison;

/// <summary>
/// Compares two replay outputs picture by picture and column by column. Pictures belong together by their time. Exponentials and
/// powers may differ in their last bits between machines, which can tip the last printed decimal over: one and a half units of it
/// are no difference, unless everything counts. Memory does not grow with the flight.
/// </summary>
public sealed class OutputComparison
{
    private const double TolerancePerDecimal = 1.5;

    private static readonly Dictionary<string, PictureColumn> Known = PictureColumns.All.ToDictionary(column => column.Name, StringComparer.Ordinal);

    private readonly List<ColumnDifferences> _columns = [];
    private readonly bool _isExact;
    private readonly Action<OutputDifference>? _onDifference;
    private readonly Action<OutputNumbers>? _onNumbers;

    private OutputComparison(bool isExact, Action<OutputDifference>? onDifference, Action<OutputNumbers>? onNumbers) =>
        (_isExact, _onDifference, _onNumbers) = (isExact, onDifference, onNumbers);

    /// <summary>Every column that occurred, in the order of the outputs.</summary>
    public IReadOnlyList<ColumnDifferences> Columns => _columns;

    /// <summary>Pictures that both outputs have.</summary>
    public long PairCount { get; private set; }

    /// <summary>Pictures that only the expected output has.</summary>
    public long MissingCount { get; private set; }

    /// <summary>Pictures that only the output found has.</summary>
    public long ExtraCount { get; private set; }

    /// <summary>Whether nothing differs.</summary>
    public bool AreEqual => MissingCount == 0 && ExtraCount == 0 && _columns.TrueForAll(column => column.Count == 0);

    /// <summary>Compares.</summary>
    /// <param name="expected">Lines of the one output, in order of time.</param>
    /// <param name="found">Lines of the other.</param>
    /// <param name="isExact">Whether a difference in the last printed decimal counts.</param>
    /// <param name="onDifference">Told of each difference as it is found; null for none.</param>
    /// <param name="onNumbers">Told of each pair in a column of numbers, equal or not, blank or not, to draw them; null for none.</param>
    /// <returns>What differs.</returns>
    /// <exception cref="FormatException">A line is no picture.</exception>
    public static OutputComparison Of(IEnumerable<string> expected, IEnumerable<string> found, bool isExact = false,
        Action<OutputDifference>? onDifference = null, Action<OutputNumbers>? onNumbers = null)
    {
        ArgumentNullException.ThrowIfNull(expected);
        ArgumentNullException.ThrowIfNull(found);
        var comparison = new OutputComparison(isExact, onDifference, onNumbers);
        using var ones = expected.GetEnumerator();
        using var others = found.GetEnumerator();
        comparison.Run(ones, others);
        return comparison;
    }

    private void Run(IEnumerator<string> expected, IEnumerator<string> found)
    {
        var (expectedLine, foundLine) = (0L, 0L);
        var one = OutputPicture.Next(expected, ref expectedLine);
        var other = OutputPicture.Next(found, ref foundLine);
        while (one is not null || other is not null)
        {
            var order = one is null ? 1 : other is null ? -1 : one.TimeS.CompareTo(other.TimeS);
            if (order == 0)
            {
                Pair(one!, other!);
            }
            else
            {
                Lonely(order < 0 ? one : null, order < 0 ? null : other);
            }

            if (order <= 0)
            {
                one!.Dispose();
                one = OutputPicture.Next(expected, ref expectedLine);
            }

            if (order >= 0)
            {
                other!.Dispose();
                other = OutputPicture.Next(found, ref foundLine);
            }
        }
    }

    private void Lonely(OutputPicture? expected, OutputPicture? found)
    {
        MissingCount += expected is null ? 0 : 1;
        ExtraCount += found is null ? 0 : 1;
        _onDifference?.Invoke(new OutputDifference(OutputDifference.WholePicture, (expected ?? found)!.TimeS,
            expected?.Text ?? OutputDifference.Nothing, found?.Text ?? OutputDifference.Nothing));
    }

    private void Pair(OutputPicture expected, OutputPicture found)
    {
        PairCount++;
        foreach (var column in expected.Columns.Union(found.Columns))
        {
            var (one, other) = (expected.Value(column), found.Value(column));
            if (!Agree(ColumnOf(column), expected.TimeS, one, other))
            {
                _onDifference?.Invoke(new OutputDifference(column, expected.TimeS, Show(one), Show(other)));
            }

            if (_onNumbers is not null && Known.GetValueOrDefault(column)?.Kind == PictureColumnKind.Number)
            {
                _onNumbers(new OutputNumbers(column, expected.TimeS, NumberOf(one), NumberOf(other)));
            }
        }
    }

    private bool Agree(ColumnDifferences column, double timeS, JsonElement? expected, JsonElement? found)
    {
        var known = Known.GetValueOrDefault(column.Name);
        if (known?.Kind == PictureColumnKind.Number && IsNumber(expected) && IsNumber(found))
        {
            var difference = found!.Value.GetDouble() - expected!.Value.GetDouble();
            var tolerance = _isExact ? 0 : TolerancePerDecimal * Math.Pow(10, -known.Decimals);
            var agrees = Math.Abs(difference) <= tolerance;
            column.AddNumbers(timeS, difference, isTold: !agrees);
            return agrees;
        }

        if (known is not null && expected is { } one && found is { } other && one.GetRawText() == other.GetRawText())
        {
            return true;
        }

        column.AddOther(timeS, IsBlank(expected) != IsBlank(found));
        return false;
    }

    private ColumnDifferences ColumnOf(string name)
    {
        var column = _columns.Find(column => column.Name == name);
        if (column is null)
        {
            column = new ColumnDifferences(name);
            _columns.Add(column);
        }

        return column;
    }

    private static bool IsNumber(JsonElement? value) => value?.ValueKind == JsonValueKind.Number;

    private static double NumberOf(JsonElement? value) => IsNumber(value) ? value!.Value.GetDouble() : double.NaN;

    private static bool IsBlank(JsonElement? value) => value is null or { ValueKind: JsonValueKind.Null };

    private static string Show(JsonElement? value) => value?.GetRawText() ?? OutputDifference.Nothing;
}
