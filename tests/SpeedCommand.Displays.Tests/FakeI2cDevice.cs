using System.Device.I2c;

namespace SpeedCommand.Displays.Tests;

/// <summary>A chip on a bus that only ever listens; it counts the bytes, and can be unplugged.</summary>
internal abstract class FakeI2cDevice : I2cDevice
{
    public override I2cConnectionSettings ConnectionSettings { get; } = new(1, 0x3C);

    /// <summary>Bytes sent so far, without the address.</summary>
    public int Bytes { get; private set; }

    /// <summary>Messages until the plug is pulled; none by default.</summary>
    public int MessagesLeft { get; set; } = int.MaxValue;

    public override void Write(ReadOnlySpan<byte> buffer)
    {
        if (MessagesLeft-- <= 0)
        {
            throw new IOException("Error 121 performing I2C data transfer.");
        }

        Bytes += buffer.Length;
        Receive(buffer);
    }

    public override void WriteByte(byte value) => Write([value]);

    public override void Read(Span<byte> buffer) => throw new NotSupportedException();

    public override byte ReadByte() => throw new NotSupportedException();

    public override void WriteRead(ReadOnlySpan<byte> writeBuffer, Span<byte> readBuffer) => throw new NotSupportedException();

    protected abstract void Receive(ReadOnlySpan<byte> message);
}
