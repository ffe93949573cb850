using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Pictures;

/// <summary>
/// Writes pictures as comma-separated values, one row each under a row of names. A blank is an empty field; the names of several
/// faults have spaces between them. No allocation a picture.
/// </summary>
public sealed class PictureTable : IPictureSink
{
    /// <summary>The longest numbers and every fault together stay below this.</summary>
    private readonly byte[] _row = new byte[2048];
    private readonly PictureColumn[] _columns = [.. PictureColumns.All];
    private readonly Stream _stream;

    /// <summary>Writes the row of names at once.</summary>
    /// <param name="stream">Where the table goes; not closed.</param>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public PictureTable(Stream stream)
    {
        ArgumentNullException.ThrowIfNull(stream);
        _stream = stream;
        var row = new LineText(_row);
        row.Add(string.Join(',', _columns.Select(column => column.Name)));
        Write(ref row);
    }

    /// <inheritdoc/>
    /// <exception cref="IOException">The stream cannot be written.</exception>
    public void OnPicture(in CockpitPicture picture)
    {
        var row = new LineText(_row);
        var isFirst = true;
        foreach (var column in _columns)
        {
            if (!isFirst)
            {
                row.Add((byte)',');
            }

            isFirst = false;
            switch (column.Kind)
            {
                case PictureColumnKind.Number when column.Number(picture) is var value && double.IsFinite(value):
                    row.Add(value, column.Decimals);
                    break;
                case PictureColumnKind.Word when column.Word(picture) is { } word:
                    row.Add(word);
                    break;
                case PictureColumnKind.Faults:
                    AddFaults(ref row, picture.Faults);
                    break;
            }
        }

        Write(ref row);
    }

    private static void AddFaults(ref LineText row, Faults faults)
    {
        var isFirst = true;
        for (var i = 0; faults != Faults.None && i < FaultNames.All.Count; i++)
        {
            if ((faults & FaultNames.All[i].Key) == 0)
            {
                continue;
            }

            if (!isFirst)
            {
                row.Add((byte)' ');
            }

            row.Add(FaultNames.All[i].Value);
            isFirst = false;
        }
    }

    private void Write(ref LineText row)
    {
        row.Add((byte)'\n');
        _stream.Write(_row, 0, row.Length);
    }
}
