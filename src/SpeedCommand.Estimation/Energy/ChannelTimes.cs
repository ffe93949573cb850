namespace SpeedCommand.Estimation.Energy;

/// <summary>When each channel was heard last.</summary>
internal sealed class ChannelTimes
{
    private const long Never = long.MinValue / 2;

    private readonly long[] _newestUs = [Never, Never, Never];

    /// <summary>When enough was heard last to know the climb: height and kinetic height, or a probe.</summary>
    public long CompleteUs => Math.Max(Math.Min(_newestUs[0], _newestUs[1]), _newestUs[2]);

    public long Of(EnergyChannel channel) => _newestUs[(int)channel];

    public void Note(EnergyChannel channel, long timeUs) => _newestUs[(int)channel] = Math.Max(_newestUs[(int)channel], timeUs);

    public void Clear() => Array.Fill(_newestUs, Never);
}
