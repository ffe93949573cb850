using Parquet;
using Parquet.Schema;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Pictures;

namespace SpeedCommand.Desk.Exports;

/// <summary>
/// Collects pictures and writes them as an Apache Parquet file, in groups of rows so that memory does not grow with the flight.
/// Numbers are unrounded doubles, null where blank; the names of several faults have spaces between them.
/// </summary>
internal sealed class ParquetPictures : IPictureSink, IDisposable
{
    /// <summary>Some two and a half hours; a reader skips what it does not need by such groups.</summary>
    private const int GroupRows = 100_000;

    private readonly DataField[] _fields;
    private readonly ParquetWriter _writer;
    private readonly List<double?>[] _numbers;
    private readonly List<string?>[] _words;

    /// <summary>Starts a file on a stream, which stays open.</summary>
    public ParquetPictures(Stream stream)
    {
        _fields = [.. PictureColumns.All.Select(FieldOf)];
        _writer = Wait(ParquetWriter.CreateAsync(new ParquetSchema(_fields), stream));
        _numbers = [.. _fields.Select(_ => new List<double?>())];
        _words = [.. _fields.Select(_ => new List<string?>())];
    }

    private int Rows => _numbers[0].Count;

    public void OnPicture(in CockpitPicture picture)
    {
        for (var i = 0; i < _fields.Length; i++)
        {
            var column = PictureColumns.All[i];
            switch (column.Kind)
            {
                case PictureColumnKind.Number:
                    var value = column.Number(picture);
                    _numbers[i].Add(double.IsFinite(value) ? value : null);
                    break;
                case PictureColumnKind.Word:
                    _words[i].Add(column.Word(picture));
                    break;
                default:
                    _words[i].Add(Names(picture.Faults));
                    break;
            }
        }

        if (Rows == GroupRows)
        {
            WriteGroup();
        }
    }

    /// <summary>Writes what is left and the file's footer, without which it cannot be read.</summary>
    public void Dispose()
    {
        if (Rows > 0)
        {
            WriteGroup();
        }

        _writer.DisposeAsync().AsTask().GetAwaiter().GetResult();
    }

    private static DataField FieldOf(PictureColumn column) => column.Kind == PictureColumnKind.Number
        ? new DataField<double?>(column.Name)
        : new DataField(column.Name, typeof(string));

    private static string Names(Faults faults) =>
        string.Join(' ', FaultNames.All.Where(pair => (faults & pair.Key) != 0).Select(pair => pair.Value));

    private void WriteGroup()
    {
        using var group = _writer.CreateRowGroup();
        for (var i = 0; i < _fields.Length; i++)
        {
            if (PictureColumns.All[i].Kind == PictureColumnKind.Number)
            {
                group.WriteAsync<double>(_fields[i], _numbers[i].ToArray()).GetAwaiter().GetResult();
            }
            else
            {
                group.WriteAsync(_fields[i], _words[i]!).GetAwaiter().GetResult();
            }

            _numbers[i].Clear();
            _words[i].Clear();
        }

        group.CompleteValidate();
    }

    private static T Wait<T>(Task<T> task) => task.GetAwaiter().GetResult();
}
