namespace SpeedCommand.Replay.Recording;

/// <summary>The folder of the recordings: names new ones and keeps all of them together within their bound. One thread at a time.</summary>
internal sealed class RecordingFolder
{
    /// <summary>So many files of one process in one second; more would be a loop.</summary>
    private const int MaxNumber = 1000;

    private readonly RecorderOptions _options;
    private readonly int _processId;
    private readonly Func<string, Stream> _create;
    private long _otherBytes;

    public RecordingFolder(RecorderOptions options, int processId, Func<string, Stream>? create)
    {
        _options = options;
        _processId = processId;
        _create = create ?? (path => new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.Read, 1));
    }

    /// <summary>Finds out early whether there is a folder and whether it can be written.</summary>
    /// <exception cref="IOException">It cannot be written.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be written.</exception>
    public void Probe()
    {
        Directory.CreateDirectory(_options.Folder);
        var path = Path.Combine(_options.Folder, $".probe-{_processId}");
        File.WriteAllBytes(path, [0]);
        File.Delete(path);
    }

    /// <summary>Creates a file for a recording.</summary>
    /// <exception cref="IOException">It cannot be created, or the folder is full.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder may not be written.</exception>
    public Stream Create(DateTimeOffset beginUtc, out string path)
    {
        Directory.CreateDirectory(_options.Folder);
        var name = new RecordingName(beginUtc, _processId, 1, _options.IsPacked);
        while (File.Exists(path = Path.Combine(_options.Folder, name.ToString())) && name.Number < MaxNumber)
        {
            name = name with { Number = name.Number + 1 };
        }

        _otherBytes = Recordings().Sum(file => file.Length);
        MakeRoom(0, "");
        return _create(path);
    }

    /// <summary>Keeps the bound while a file grows.</summary>
    /// <param name="currentBytes">Size of the file being written.</param>
    /// <param name="currentPath">Its path; it is never deleted.</param>
    /// <exception cref="IOException">The folder is full.</exception>
    /// <exception cref="UnauthorizedAccessException">An old recording may not be deleted.</exception>
    public void MakeRoom(long currentBytes, string currentPath)
    {
        if (_otherBytes + currentBytes <= _options.MaxFolderBytes)
        {
            return;
        }

        if (_options.DeletesOldest)
        {
            foreach (var file in Recordings().Where(file => file.Name != Path.GetFileName(currentPath)))
            {
                if (_otherBytes + currentBytes <= _options.MaxFolderBytes)
                {
                    break;
                }

                var length = file.Length;
                file.Delete();
                _otherBytes -= length;
            }
        }

        if (_otherBytes + currentBytes > _options.MaxFolderBytes)
        {
            throw new IOException($"the recordings in {_options.Folder} reached their limit of {_options.MaxFolderBytes >> 20} MB");
        }
    }

    /// <summary>Our recordings, the oldest first; whatever else lies there is not ours to count or delete.</summary>
    private IEnumerable<FileInfo> Recordings() => new DirectoryInfo(_options.Folder).EnumerateFiles()
        .Select(file => (IsOurs: RecordingName.TryParse(file.Name, out var name), Name: name, File: file))
        .Where(one => one.IsOurs).OrderBy(one => (one.Name.BeginUtc, one.Name.Number, one.Name.ProcessId)).Select(one => one.File).ToArray();
}
