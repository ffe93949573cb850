using System.Buffers.Text;

namespace SpeedCommand.Replay.Logs;

/// <summary>Undoes the log's escapes: \xHH for a byte outside printable ASCII, \\ for a backslash.</summary>
internal static class LogEscapes
{
    public static bool TryUnescape(ReadOnlySpan<byte> content, Span<byte> destination, out int length)
    {
        length = 0;
        while (content.Length > 0)
        {
            var plain = content.IndexOf((byte)'\\');
            if (plain < 0)
            {
                plain = content.Length;
            }

            content[..plain].CopyTo(destination[length..]);
            length += plain;
            content = content[plain..];
            if (content.Length == 0)
            {
                break;
            }

            if (content.Length >= 2 && content[1] == '\\')
            {
                destination[length++] = (byte)'\\';
                content = content[2..];
            }
            else if (content.Length >= 4 && content[1] == 'x'
                && Utf8Parser.TryParse(content.Slice(2, 2), out byte value, out var used, 'X') && used == 2)
            {
                destination[length++] = value;
                content = content[4..];
            }
            else
            {
                return false;
            }
        }

        return true;
    }
}
