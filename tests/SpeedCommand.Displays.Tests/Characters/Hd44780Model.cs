using System.Text;

namespace SpeedCommand.Displays.Tests.Characters;

/// <summary>
/// A character display behind a PCF8574, line by line: enable edges, nibbles, instructions, the 80 cells of memory, and how long each instruction
/// keeps it busy. It fails where a real one would show garbage. Times are the slowest the HD44780U data sheet allows (oscillator at
/// 190 kHz, from memory), on a bus as fast as it may be.
/// </summary>
internal sealed class Hd44780Model(int rows, int columns) : FakeI2cDevice
{
    private const double ByteUs = 9 / 0.4;
    private const double ExecutionUs = 53, ClearUs = 2_160, PowerUpUs = 40_000;

    private readonly byte[] _memory = Enumerable.Repeat((byte)0xFF, 0x80).ToArray();
    private double _nowUs;
    private double _readyUs = PowerUpUs;
    private byte _lines;
    private int _upper = -1;
    private int _address;
    private int _startsSeen;
    private int _function = 0x30;
    private bool _isEightBit = true;

    public bool IsLit => (_lines & 0x08) != 0;

    public bool IsOn { get; private set; }

    /// <summary>Addresses written since the last look.</summary>
    public List<int> Written { get; } = [];

    /// <summary>What an eye sees: the lines begin at 00, 40, 14 and 54 (hexadecimal; two lines of 16 use the first two).</summary>
    public string[] Lines() => [.. Enumerable.Range(0, rows).Select(row =>
        Encoding.Latin1.GetString(_memory, new[] { 0x00, 0x40, 0x14, 0x54 }[row], columns))];

    /// <summary>Power was away for a moment: the memory is noise, and it wants eight lines again.</summary>
    public void LosePower()
    {
        Array.Fill(_memory, (byte)'x');
        (_isEightBit, _upper, IsOn, _startsSeen, _readyUs) = (true, -1, false, 0, _nowUs + PowerUpUs);
    }

    /// <summary>A disturbance looked like an enable: the display is half an instruction ahead.</summary>
    public void Glitch() => _upper = 0x20;

    protected override void Receive(ReadOnlySpan<byte> message)
    {
        foreach (var next in message)
        {
            _nowUs += ByteUs;
            var (before, rises, falls) = (_lines, (next & ~_lines & 0x04) != 0, (_lines & ~next & 0x04) != 0);
            if (rises || falls)
            {
                // Select and direction stand before enable rises; with the data they stand until it has fallen.
                Assert.Equal(before & 0xF3, next & 0xF3);
            }

            _lines = next;
            if (falls)
            {
                Assert.Equal(0, next & 0x02);
                Latch(next & 0xF0, (next & 0x01) != 0);
            }
        }
    }

    private void Latch(int nibble, bool isData)
    {
        Assert.True(_nowUs >= _readyUs, $"busy for another {_readyUs - _nowUs:F0} microseconds");
        if (_isEightBit)
        {
            // The lower four lines are not connected.
            Obey(nibble, isData);
        }
        else if (_upper < 0)
        {
            _upper = nibble;
        }
        else
        {
            Obey(_upper | nibble >> 4, isData);
            _upper = -1;
        }
    }

    private void Obey(int value, bool isData)
    {
        _readyUs = _nowUs + (value is 1 or 2 or 3 && !isData ? ClearUs : ExecutionUs);
        if (isData)
        {
            // Four lines, two rows, small dots.
            Assert.Equal(0x28, _function);
            Assert.True(_address is < 0x28 or >= 0x40 and < 0x68);
            _memory[_address] = (byte)value;
            Written.Add(_address++);
        }
        else if ((value & 0x80) != 0)
        {
            _address = value & 0x7F;
        }
        else if (value >= 0x20)
        {
            SetFunction(value);
        }
        else if (value is >= 0x08 and <= 0x0F)
        {
            IsOn = (value & 0x04) != 0;
        }
        else if (value == 1)
        {
            Array.Fill(_memory, (byte)' ');
            _address = 0;
        }
        else if (value is >= 4 and < 8)
        {
            Assert.Equal(6, value);
        }
    }

    private void SetFunction(int value)
    {
        _isEightBit = (value & 0x10) != 0;
        _startsSeen = _isEightBit ? _startsSeen + 1 : _startsSeen;
        if (_isEightBit)
        {
            // After power-up the first one takes 4.1 ms, the second 0.1 ms.
            _readyUs = _nowUs + _startsSeen switch { 1 => 4_100, 2 => 100, _ => ExecutionUs };
            _upper = -1;
        }

        _function = value;
    }
}
