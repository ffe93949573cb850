using System.Diagnostics;
using SpeedCommand.Sentences;
using SpeedCommand.Sentences.Columns;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports.Listening;

/// <summary>Listens to one port for some seconds and says what it heard and, if that is nothing good, what to mend.</summary>
internal sealed class PortListening(PortSettings settings, LinePrinter? printer = null) : IPortListener, ILineSink
{
    /// <summary>Kinds of line told apart; garbage must not fill the memory with more.</summary>
    internal const int MostKinds = 40;

    private const string OtherKinds = "others";

    private readonly LineFramer _framer = new();
    private readonly SevenBitHint _sevenBits = new();
    private readonly Dictionary<string, KindTally> _kinds = new(StringComparer.Ordinal);
    private readonly Stopwatch _watch = new();
    private CancellationTokenSource? _limit;
    private double _arrivalS;

    /// <summary>The verdict in one line.</summary>
    public string Verdict { get; private set; } = "";

    /// <summary>The kinds of reading that came, as far as their values were possible.</summary>
    public HashSet<ReadingKind> Kinds { get; } = [];

    public PortSettings Settings => settings;

    /// <summary>What was counted.</summary>
    public PortCounts Counts { get; } = new();

    /// <summary>Lines of each kind, the most frequent first.</summary>
    public IEnumerable<KeyValuePair<string, KindTally>> Tallies =>
        _kinds.OrderByDescending(pair => pair.Value.Count).ThenBy(pair => pair.Key, StringComparer.Ordinal);

    /// <summary>The framing that the board seems to use instead of ours; null when ours seems right.</summary>
    public string? BetterFraming => _sevenBits.Framing;

    /// <summary>Listens; true when the port gives readings.</summary>
    public async Task<bool> ListenAsync(IPortReader reader, TimeSpan length, CancellationToken cancel)
    {
        using var limit = _limit = CancellationTokenSource.CreateLinkedTokenSource(cancel);
        limit.CancelAfter(length);
        await reader.RunAsync([new PortLine(settings, this)], limit.Token).ConfigureAwait(false);
        Counts.Seconds = _watch.Elapsed.TotalSeconds;
        if (_watch.IsRunning)
        {
            Verdict = $"{settings.Name}: {settings.Device}: {PortVerdict.Judge(this)}";
        }

        return Counts.Readings > 0;
    }

    public void OnOpen(string path)
    {
        _framer.Reset();
        _watch.Start();
    }

    public void OnBytes(ReadOnlySpan<byte> bytes)
    {
        _arrivalS = _watch.Elapsed.TotalSeconds;
        Counts.Bytes += bytes.Length;
        foreach (var one in bytes)
        {
            Counts.UnprintableBytes += one is (byte)'\r' or (byte)'\n' or (byte)'\t' or (>= (byte)' ' and <= (byte)'~') ? 0 : 1;
        }

        _sevenBits.Take(bytes);
        _framer.Push(bytes, this);
    }

    public void OnGone(string cause) => Counts.DropOuts++;

    public void OnTrouble(PortTrouble trouble)
    {
        // One that never opened is judged at once; one that dropped out may come back.
        if (!_watch.IsRunning)
        {
            Verdict = $"{settings.Name}: {trouble.Text}";
            _limit?.Cancel();
        }
    }

    void ILineSink.OnLine(ReadOnlySpan<byte> line)
    {
        var isColumns = settings.Stream.Format is ColumnFormat;
        var meaning = isColumns ? LineMeaning.OfColumns(line, settings.Stream.Format) : LineMeaning.Of(line, settings.Checksum);
        Counts.Add(meaning);
        if (!isColumns && meaning.Fault == SentenceFault.MissingChecksum && SentenceReader.TryRead(line, ChecksumRule.Optional, out _) == SentenceFault.None)
        {
            Counts.ValidButForChecksum++;
        }

        Kinds.UnionWith(meaning.Readings);
        var kind = _kinds.Count < MostKinds || _kinds.ContainsKey(meaning.Kind) ? meaning.Kind : OtherKinds;
        if (!_kinds.TryGetValue(kind, out var tally))
        {
            _kinds[kind] = tally = new KindTally();
        }

        tally.Add(_arrivalS);
        printer?.Print(_arrivalS, line, meaning);
    }
}
