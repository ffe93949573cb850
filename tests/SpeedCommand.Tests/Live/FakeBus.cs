using System.Device.I2c;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Live;

/// <summary>A bus with one display that takes everything, until it is unplugged or gets stuck.</summary>
internal sealed class FakeBus
{
    private volatile bool _isStuck;
    private volatile bool _isUnplugged;

    /// <summary>Messages so far; each opening of the line begins a new list.</summary>
    public List<byte[]> Messages { get; } = [];

    public int Openings { get; private set; }

    public I2cDevice Open(I2cPlace place)
    {
        Openings++;
        return new Device(this);
    }

    public int Count
    {
        get
        {
            lock (Messages)
            {
                return Messages.Count;
            }
        }
    }

    public byte[] Last
    {
        get
        {
            lock (Messages)
            {
                return Messages[^1];
            }
        }
    }

    public void Unplug() => _isUnplugged = true;

    public void PlugIn() => _isUnplugged = false;

    public void Stick() => _isStuck = true;

    public void Free() => _isStuck = false;

    private sealed class Device(FakeBus bus) : I2cDevice
    {
        public override I2cConnectionSettings ConnectionSettings { get; } = new(1, 0x3C);

        public override void Write(ReadOnlySpan<byte> buffer)
        {
            while (bus._isStuck)
            {
                Thread.Sleep(1);
            }

            if (bus._isUnplugged)
            {
                throw new IOException("Error 121 performing I2C data transfer.");
            }

            lock (bus.Messages)
            {
                bus.Messages.Add(buffer.ToArray());
            }
        }

        public override void WriteByte(byte value) => Write([value]);

        public override void Read(Span<byte> buffer) => throw new NotSupportedException();

        public override byte ReadByte() => throw new NotSupportedException();

        public override void WriteRead(ReadOnlySpan<byte> writeBuffer, Span<byte> readBuffer) => throw new NotSupportedException();
    }
}
