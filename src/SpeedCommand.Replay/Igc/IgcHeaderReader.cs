using System.Text;
using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Igc;

/// <summary>Takes the records before the first fix: A, H and I.</summary>
internal sealed class IgcHeaderReader(Action<string> report)
{
    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    private readonly List<IgcExtension> _extensions = [];

    public IgcHeader Header { get; private set; } = new("", null, "", "", "", []);

    /// <summary>The list itself, for a look without allocation.</summary>
    public List<IgcExtension> Extensions => _extensions;

    public void Take(ReadOnlySpan<byte> line)
    {
        if (line.StartsWith("A"u8))
        {
            Header = Header with { Recorder = Text(line[1..]) };
        }
        else if (line.StartsWith("I"u8))
        {
            ReadExtensions(line);
        }
        else if (line.Length > 5 && line[0] == 'H')
        {
            ReadHeaderRecord(line[2..5], line[5..]);
        }
        else
        {
            Skip(line);
        }
    }

    /// <summary>Both the short form, HFDTE140626, and the long one, HFDTEDATE:140626,01.</summary>
    private void ReadHeaderRecord(ReadOnlySpan<byte> code, ReadOnlySpan<byte> content)
    {
        var colon = content.IndexOf((byte)':');
        var value = content[(colon + 1)..].Trim((byte)' ');
        if (code.SequenceEqual("DTE"u8))
        {
            if (IgcField.TryDate(value, out var date))
            {
                Header = Header with { Date = date };
            }
            else
            {
                report($"expected a date like 140626, found '{FlightLogFormat.Show(value)}'");
            }
        }
        else if (code.SequenceEqual("PLT"u8))
        {
            Header = Header with { Pilot = Text(value) };
        }
        else if (code.SequenceEqual("GTY"u8))
        {
            Header = Header with { GliderType = Text(value) };
        }
        else if (code.SequenceEqual("GID"u8))
        {
            Header = Header with { GliderId = Text(value) };
        }
    }

    private void ReadExtensions(ReadOnlySpan<byte> line)
    {
        _extensions.Clear();
        var isSound = line.Length >= 3 && IgcField.TryDigits(line[1..3], out var count) && line.Length >= 3 + 7 * count && AddExtensions(line[3..], count);
        if (!isSound)
        {
            _extensions.Clear();
            report($"expected an I record like I023638FXA3940SIU, found '{FlightLogFormat.Show(line)}'; the extra fields are not read");
        }

        Header = Header with { Extensions = [.. _extensions] };
    }

    private bool AddExtensions(ReadOnlySpan<byte> fields, int count)
    {
        for (var i = 0; i < count; i++)
        {
            var field = fields.Slice(7 * i, 7);
            if (!IgcField.TryDigits(field[..2], out var first) || !IgcField.TryDigits(field[2..4], out var last)
                || first <= IgcExtension.BaseLength || last < first)
            {
                return false;
            }

            _extensions.Add(new IgcExtension(Encoding.ASCII.GetString(field[4..]), first, last));
        }

        return true;
    }

    /// <summary>Records that a replay has no use for are no fault; what is no record at all is.</summary>
    public void Skip(ReadOnlySpan<byte> line)
    {
        if (line.Length > 0 && line[0] is not (>= (byte)'A' and <= (byte)'Z'))
        {
            report($"expected an IGC record, found '{FlightLogFormat.Show(line)}'");
        }
    }

    /// <summary>Names are UTF-8 in new recorders and Latin-1 in old ones; hardly any Latin-1 name is valid UTF-8.</summary>
    private static string Text(ReadOnlySpan<byte> bytes)
    {
        try
        {
            return StrictUtf8.GetString(bytes).Trim();
        }
        catch (DecoderFallbackException)
        {
            return Encoding.Latin1.GetString(bytes).Trim();
        }
    }
}
