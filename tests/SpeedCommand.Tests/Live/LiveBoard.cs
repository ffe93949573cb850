using SpeedCommand.Bench;

namespace SpeedCommand.Tests.Live;

/// <summary>A sensor board on a pseudo-terminal behind a link, as udev makes one, that can be pulled out and put back.</summary>
internal sealed class LiveBoard(string name, string folder, Func<int, byte[]> sentence) : IDisposable
{
    private readonly Lock _gate = new();
    private PseudoTerminal? _line;
    private int _count;

    public string Name => name;

    /// <summary>The link.</summary>
    public string Path { get; } = System.IO.Path.Combine(folder, name);

    /// <summary>Whole sentences that the line has taken.</summary>
    public long Sent { get; private set; }

    /// <summary>What the link leads to now; null when the board is out.</summary>
    public PseudoTerminal? Line => _line;

    public LiveBoard PlugIn()
    {
        lock (_gate)
        {
            _line = new PseudoTerminal();
            LinkTo(_line.DevicePath);
            return this;
        }
    }

    public void LinkTo(string target)
    {
        File.Delete(Path);
        File.CreateSymbolicLink(Path, target);
    }

    /// <summary>Pulls the plug in the middle of a sentence.</summary>
    public void PullOut()
    {
        lock (_gate)
        {
            var half = sentence(_count);
            _line!.Write(half.AsSpan(0, half.Length / 2));
            _line.Dispose();
            _line = null;
            File.Delete(Path);
        }
    }

    /// <summary>Sends some sentences; a line that takes no more is left for the next time, like a board's own buffer.</summary>
    public void Send(int count)
    {
        lock (_gate)
        {
            for (var i = 0; i < count && _line is not null; i++)
            {
                byte[] whole = [.. sentence(_count), (byte)'\r', (byte)'\n'];
                for (var sent = 0; sent < whole.Length;)
                {
                    sent += _line.Write(whole.AsSpan(sent));
                }

                _count++;
                Sent++;
            }
        }
    }

    public void Dispose() => _line?.Dispose();
}
