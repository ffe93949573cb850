using SpeedCommand.Replay.Logs;

namespace SpeedCommand.Replay.Recording;

/// <summary>Lays records out in files: a new one where a flight begins, and where a file grew too long. One thread at a time.</summary>
internal sealed class RecordingFiles(RecorderOptions options, FlightLogHeader header, RecordingFolder folder) : IDisposable
{
    private LogPart? _part;
    private string _firstName = "";
    private int _number;

    /// <summary>The newest file; null before the first.</summary>
    public string? Path { get; private set; }

    public void Probe() => folder.Probe();

    /// <summary>Writes records and carries them to the disk itself.</summary>
    /// <exception cref="IOException">The disk cannot be written, or is full.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder may not be written.</exception>
    public void Write(PendingRecords records)
    {
        var at = 0;
        foreach (var mark in records.Marks)
        {
            _part?.Write(records.Bytes[at..mark.At]);
            at = mark.At;
            Close();
            if (mark.IsBegin)
            {
                _number = 0;
                Open(mark.TimeUs, mark.Controls);
            }
        }

        // Records without a file belong to one that failed: they are lost, as the fault said.
        if (_part is null || (at == 0 && records.Bytes.IsEmpty))
        {
            return;
        }

        _part.Write(records.Bytes[at..]);
        _part.Flush();
        folder.MakeRoom(_part.Length, _part.Path);
        if (_part.Length > options.MaxFileBytes)
        {
            GoOnInNewFile(records.LastUs, records.Controls);
        }
    }

    /// <summary>Lets go of a file that failed; what was flushed before stays readable.</summary>
    public void Abandon()
    {
        _part?.Dispose();
        _part = null;
    }

    public void Dispose() => Abandon();

    /// <summary>One file ends with the last record it holds, the next begins there: no picture is made by both.</summary>
    private void GoOnInNewFile(long timeUs, IReadOnlyList<StampedControl> controls)
    {
        _part!.WriteEnd(timeUs);
        Close();
        Open(timeUs, controls);
    }

    private void Open(long fromUs, IReadOnlyList<StampedControl> controls)
    {
        var disk = folder.Create(header.StartUtc + TimeSpan.FromMicroseconds(fromUs), out var path);
        _part = new LogPart(disk, path, options.IsPacked);
        Path = path;
        _number++;
        if (_number == 1)
        {
            _firstName = System.IO.Path.GetFileName(path);
        }

        string[] note = _number > 1 ? [$"part {_number} of the flight that begins in {_firstName}"] : [];
        _part.WriteHeader(header with { FromUs = fromUs, Controls = controls, Notes = [.. header.Notes, .. note] });
    }

    private void Close()
    {
        _part?.Flush();
        _part?.Dispose();
        _part = null;
    }
}
