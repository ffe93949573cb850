using System.Text;

namespace SpeedCommand.Replay.Logs;

/// <summary>The marks and bounds of the flight log, version 1; docs/log-format.md describes it.</summary>
internal static class FlightLogFormat
{
    public const int Version = 1;

    /// <summary>A stream's name: short enough to read, long enough to say what it is.</summary>
    public const int MaxStreamNameLength = 32;

    /// <summary>Longest line content kept from a stream; the line framer discards what lies beyond.</summary>
    public const int MaxContentLength = 512;

    /// <summary>Every content byte escaped as \xHH, the stamp, the name and some room.</summary>
    public const int MaxRecordLength = 4 * MaxContentLength + MaxStreamNameLength + 64;

    /// <summary>A truth record carries JSON and may be longer than any sentence; headers and truth share this bound.</summary>
    public const int MaxLineLength = 8192;

    /// <summary>Longer than any silence of a cockpit that is switched on; a stamp beyond it is a spoilt digit.</summary>
    public const long MaxSilenceUs = 6L * 3600 * 1_000_000;

    public static ReadOnlySpan<byte> Magic => "#speedcommand-log "u8;

    public static ReadOnlySpan<byte> Start => "#start "u8;

    public static ReadOnlySpan<byte> Glider => "#glider "u8;

    public static ReadOnlySpan<byte> Note => "#note "u8;

    public static ReadOnlySpan<byte> Program => "#program "u8;

    public static ReadOnlySpan<byte> From => "#from "u8;

    public static ReadOnlySpan<byte> Setting => "#setting "u8;

    public static ReadOnlySpan<byte> GliderLine => "#glider-line "u8;

    /// <summary>
    /// A change of a control: in a header, and as a record in a stream's place. No stream's name begins so, and older programs, which
    /// know none of this, report such a record and replay the rest.
    /// </summary>
    public static ReadOnlySpan<byte> Control => "#control "u8;

    public static ReadOnlySpan<byte> End => "#end "u8;

    public static ReadOnlySpan<byte> Truth => "truth"u8;

    public const string StartTimeFormat = "yyyy-MM-dd'T'HH:mm:ss.fff'Z'";

    /// <summary>A stream's name is printable ASCII without spaces; 'truth' is the simulator's own.</summary>
    public static bool IsStreamName(ReadOnlySpan<byte> name) =>
        name.Length is > 0 and <= MaxStreamNameLength && name.IndexOfAnyExceptInRange((byte)'!', (byte)'~') < 0 && name[0] != '#';

    public static string Show(ReadOnlySpan<byte> bytes) =>
        Encoding.ASCII.GetString(bytes.Length > 40 ? bytes[..40] : bytes) + (bytes.Length > 40 ? "..." : "");
}
