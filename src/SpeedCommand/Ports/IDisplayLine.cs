namespace SpeedCommand.Ports;

/// <summary>The line to a serial display: opened when something is to be written, and again after it was lost.</summary>
internal interface IDisplayLine : IAsyncDisposable
{
    /// <summary>Longest time that a write may take: a display that takes nothing for so long is stuck.</summary>
    static TimeSpan WriteLimit => TimeSpan.FromMilliseconds(500);

    /// <summary>Writes a frame. When that fails the line is closed.</summary>
    /// <returns>Null, or what is wrong.</returns>
    ValueTask<string?> TryWriteAsync(ReadOnlyMemory<byte> frame);
}
