using System.Text;

namespace SpeedCommand.Controls;

/// <summary>
/// The line protocol of the serial port and the socket: bytes in any chunks, a line at a time, one answer a line. Empty lines, lines
/// with bytes that are no printable ASCII, and answers that come back as an echo are passed over in silence.
/// </summary>
/// <param name="desk">Who answers.</param>
/// <param name="source">Whose lines these are.</param>
internal sealed class ControlLines(ControlDesk desk, ControlSource source)
{
    /// <summary>Longer than any line that means something.</summary>
    public const int MaxLength = 96;

    /// <summary>How an answer begins.</summary>
    public const string Done = "ok ", Refused = "error ";

    private readonly char[] _line = new char[MaxLength];
    private int _length;
    private bool _isJunk;
    private bool _isTooLong;

    /// <summary>Takes bytes.</summary>
    /// <param name="bytes">The bytes.</param>
    /// <param name="answer">Takes each answer, without a line end.</param>
    public void Push(ReadOnlySpan<byte> bytes, Action<string> answer)
    {
        foreach (var value in bytes)
        {
            if (value is (byte)'\n' or (byte)'\r')
            {
                if (Answer() is { } text)
                {
                    answer(text);
                }

                Reset();
            }
            else if (value is < 0x20 or > 0x7E)
            {
                _isJunk = true;
            }
            else if (_length < MaxLength)
            {
                _line[_length++] = (char)value;
            }
            else
            {
                _isTooLong = true;
            }
        }
    }

    /// <summary>Forgets half a line, as when the port was opened anew.</summary>
    public void Reset() => (_length, _isJunk, _isTooLong) = (0, false, false);

    /// <summary>An answer as it goes out.</summary>
    public static byte[] Encode(string answer) => Encoding.ASCII.GetBytes(answer + "\r\n");

    private string? Answer()
    {
        var line = _line.AsSpan(0, _length).Trim(' ');
        if (_isJunk || line.IsEmpty || line.StartsWith(Done, StringComparison.Ordinal) || line.StartsWith(Refused, StringComparison.Ordinal))
        {
            return null;
        }

        if (_isTooLong)
        {
            return $"{Refused}expected at most {MaxLength} characters in a line, found more";
        }

        return desk.TryAnswer(line, source, out var message) ? Done + message : Refused + message;
    }
}
