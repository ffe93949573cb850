using SpeedCommand.Sentences;

namespace SpeedCommand.Ports.Listening;

/// <summary>What was counted while listening to a port.</summary>
internal sealed class PortCounts
{
    public double Seconds { get; set; }

    public long Bytes { get; set; }

    /// <summary>Bytes that are neither printable ASCII nor a line end.</summary>
    public long UnprintableBytes { get; set; }

    public long Lines { get; private set; }

    public long Sentences { get; private set; }

    public long Readings { get; private set; }

    /// <summary>Readings outside their range.</summary>
    public long Impossible { get; private set; }

    /// <summary>Measurements of ours that could not be read.</summary>
    public long Malformed { get; private set; }

    /// <summary>Valid sentences that this program has no use for.</summary>
    public long Unknown { get; private set; }

    public long WrongChecksums { get; private set; }

    public long WithoutChecksum { get; private set; }

    /// <summary>Lines that would be sentences if a missing checksum were allowed.</summary>
    public long ValidButForChecksum { get; set; }

    /// <summary>Times the device went away while it was listened to.</summary>
    public int DropOuts { get; set; }

    public void Add(LineMeaning meaning)
    {
        Lines++;
        Sentences += meaning.Fault == SentenceFault.None ? 1 : 0;
        WrongChecksums += meaning.Fault == SentenceFault.WrongChecksum ? 1 : 0;
        WithoutChecksum += meaning.Fault == SentenceFault.MissingChecksum ? 1 : 0;
        Unknown += meaning.IsUnknown ? 1 : 0;
        Readings += meaning.Readings.Count;
        Impossible += meaning.Impossible;
        Malformed += meaning.Malformed;
    }
}
