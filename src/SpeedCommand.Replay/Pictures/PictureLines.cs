using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Pictures;

/// <summary>Writes each picture as one JSON object on one line; docs/log-format.md lists the keys. No allocation a picture.</summary>
public sealed class PictureLines(Stream stream) : IPictureSink
{
    /// <summary>All keys, the longest numbers and every fault together stay below this.</summary>
    private readonly byte[] _line = new byte[2048];
    private readonly PictureColumn[] _columns = [.. PictureColumns.All];

    /// <summary>Pictures written so far.</summary>
    public long Count { get; private set; }

    /// <inheritdoc/>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void OnPicture(in CockpitPicture picture)
    {
        var line = new LineText(_line);
        var separator = (byte)'{';
        foreach (var column in _columns)
        {
            line.Add(separator);
            line.Add(column.JsonKey);
            AddValue(ref line, column, picture);
            separator = (byte)',';
        }

        line.Add("}\n"u8);
        stream.Write(_line, 0, line.Length);
        Count++;
    }

    private static void AddValue(ref LineText line, PictureColumn column, in CockpitPicture picture)
    {
        switch (column.Kind)
        {
            case PictureColumnKind.Number when column.Number(picture) is var value && double.IsFinite(value):
                line.Add(value, column.Decimals);
                break;
            case PictureColumnKind.Word when column.Word(picture) is { } word:
                AddQuoted(ref line, word);
                break;
            case PictureColumnKind.Faults:
                AddFaults(ref line, picture.Faults);
                break;
            default:
                line.Add("null"u8);
                break;
        }
    }

    private static void AddFaults(ref LineText line, Faults faults)
    {
        line.Add((byte)'[');
        var isFirst = true;
        for (var i = 0; faults != Faults.None && i < FaultNames.All.Count; i++)
        {
            if ((faults & FaultNames.All[i].Key) == 0)
            {
                continue;
            }

            if (!isFirst)
            {
                line.Add((byte)',');
            }

            AddQuoted(ref line, FaultNames.All[i].Value);
            isFirst = false;
        }

        line.Add((byte)']');
    }

    private static void AddQuoted(ref LineText line, string word)
    {
        line.Add((byte)'"');
        line.Add(word);
        line.Add((byte)'"');
    }
}
