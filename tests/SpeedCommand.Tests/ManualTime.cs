namespace SpeedCommand.Tests;

/// <summary>A clock that stands until it is moved.</summary>
internal sealed class ManualTime : TimeProvider
{
    public long NowUs { get; set; }

    public override long TimestampFrequency => 1_000_000;

    public override long GetTimestamp() => NowUs;

    public override DateTimeOffset GetUtcNow() => DateTimeOffset.UnixEpoch;
}
