using System.Text;

namespace SpeedCommand.Ports.Listening;

/// <summary>Prints lines as they came beside what was understood, a few of each kind a second: a board sends more than an eye reads.</summary>
internal sealed class LinePrinter(TextWriter output)
{
    private const int PerSecond = 4, RawWidth = 46;

    private readonly Dictionary<string, (long Second, int Count)> _printed = new(StringComparer.Ordinal);

    /// <summary>Lines left out so far.</summary>
    public long LeftOut { get; private set; }

    public void Print(double arrivalS, ReadOnlySpan<byte> line, LineMeaning meaning)
    {
        if (_printed.Count == 0)
        {
            output.WriteLine($"{"time s",9}  {"line",-RawWidth}  understood");
        }

        var second = (long)arrivalS;
        var (lastSecond, count) = _printed.GetValueOrDefault(meaning.Kind, (second, 0));
        count = lastSecond == second ? count + 1 : 1;
        if (_printed.ContainsKey(meaning.Kind) || _printed.Count < PortListening.MostKinds)
        {
            _printed[meaning.Kind] = (second, count);
        }

        if (count > PerSecond)
        {
            LeftOut++;
            return;
        }

        output.WriteLine(FormattableString.Invariant($"{arrivalS,9:F3}  {Visible(line),-RawWidth}  {meaning.Text}"));
    }

    /// <summary>Printable as it is, the rest as \xHH, in a column's width; a longer line ends in "...".</summary>
    internal static string Visible(ReadOnlySpan<byte> line)
    {
        var text = new StringBuilder();
        foreach (var one in line)
        {
            text.Append(one is >= (byte)' ' and <= (byte)'~' ? ((char)one).ToString() : $"\\x{one:X2}");
        }

        return text.Length <= RawWidth ? text.ToString() : string.Concat(text.ToString().AsSpan(0, RawWidth - 3), "...");
    }
}
