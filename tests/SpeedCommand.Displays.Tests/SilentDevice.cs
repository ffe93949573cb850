namespace SpeedCommand.Displays.Tests;

/// <summary>A chip that takes everything, for counting what a driver allocates.</summary>
internal sealed class SilentDevice : FakeI2cDevice
{
    protected override void Receive(ReadOnlySpan<byte> message)
    {
    }
}
