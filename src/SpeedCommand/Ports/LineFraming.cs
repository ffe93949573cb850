namespace SpeedCommand.Ports;

/// <summary>Parity bit of a serial line.</summary>
internal enum LineParity
{
    None,
    Even,
    Odd,
}

/// <summary>How a serial line stops its sender.</summary>
internal enum LineFlow
{
    None,
    RtsCts,
    XonXoff,
}

/// <summary>
/// How bytes travel on a serial line, written as usual: data bits, parity, stop bits, and flow control if there is any:
/// "8N1", "7E1", "8N1 rts/cts".
/// </summary>
/// <param name="DataBits">7 or 8: sentences are ASCII.</param>
/// <param name="Parity">The parity bit.</param>
/// <param name="StopBits">1 or 2.</param>
/// <param name="Flow">Flow control.</param>
internal sealed record LineFraming(int DataBits, LineParity Parity, int StopBits, LineFlow Flow)
{
    /// <summary>What nearly every board uses.</summary>
    public static LineFraming Standard { get; } = new(8, LineParity.None, 1, LineFlow.None);

    private const string ParityLetters = "NEO";
    private static readonly string[] FlowWords = ["", " rts/cts", " xon/xoff"];

    /// <summary>Bits that one byte takes on the line, start bit included.</summary>
    public int BitsPerByte => 1 + DataBits + (Parity == LineParity.None ? 0 : 1) + StopBits;

    /// <summary>Reads the usual notation; false with what was expected.</summary>
    public static bool TryParse(string text, out LineFraming framing, out string problem)
    {
        framing = Standard;
        problem = $"expected 7 or 8, N, E or O, 1 or 2, and perhaps 'rts/cts' or 'xon/xoff', such as '8N1', found '{text}'";
        if (text.Length < 3 || text[0] is not ('7' or '8') || !ParityLetters.Contains(text[1], StringComparison.Ordinal) || text[2] is not ('1' or '2'))
        {
            return false;
        }

        var flow = Array.IndexOf(FlowWords, text[3..]);
        if (flow < 0)
        {
            return false;
        }

        framing = new LineFraming(text[0] - '0', (LineParity)ParityLetters.IndexOf(text[1], StringComparison.Ordinal), text[2] - '0', (LineFlow)flow);
        return true;
    }

    public override string ToString() => $"{DataBits}{ParityLetters[(int)Parity]}{StopBits}{FlowWords[(int)Flow]}";
}
