using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline;

/// <summary>What the pipeline must know of one stream.</summary>
/// <param name="Format">How its lines are to be read.</param>
/// <param name="Baud">
/// Bits a second of the line, to take the time of transmission out of its stamps; 0 when not known, and then nothing is taken out.
/// </param>
public sealed record StreamSettings(LineFormat Format, int Baud = 0)
{
    /// <summary>Whether a line is stamped at the moment of its sample, so that there is no delay to take out; default false.</summary>
    public bool IsArrivalExact { get; init; }

    /// <summary>Sentences on a line of unknown speed.</summary>
    /// <param name="rule">Whether they may lack a checksum.</param>
    /// <returns>The settings.</returns>
    public static StreamSettings Sentences(ChecksumRule rule) => new(new SentenceFormat(rule));
}
