using System.Device.I2c;

namespace SpeedCommand.Displays.Pixels;

/// <summary>
/// What the drivers of one-bit displays of 128 x 64 share: they keep what the display shows and send only what differs. After a write
/// that failed, and after <see cref="Forget"/>, the next picture begins with the chip's start-up commands and is sent whole, so a
/// display that was unplugged comes back. One thread at a time; nothing is allocated.
/// </summary>
/// <param name="device">The line to the chip; the driver disposes it.</param>
public abstract class PixelChip(I2cDevice device) : IDisposable
{
    // The control byte of both chips: nothing but commands follow, nothing but display data follow.
    private const byte CommandsFollow = 0x00, DataFollow = 0x40;

    private const byte SetContrast = 0x81, AllOff = 0xAE, AllOn = 0xAF;

    /// <summary>Addressing a new run costs about so many bytes: a shorter gap of unchanged columns is cheaper sent than skipped.</summary>
    private const int ShortestGap = 8;

    private readonly byte[] _shown = new byte[PixelPage.Width * PixelPage.Bands];
    private readonly byte[] _message = new byte[1 + PixelPage.Width];
    private bool _isKnown;
    private int _contrast = -1;
    private int _brightnessPercent = 100;

    /// <summary>Brightness, 0 (as dim as the chip can) to 100; it is sent with the next picture. May be set from another thread.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is set to less than 0 or more than 100.</exception>
    public int BrightnessPercent
    {
        get => Volatile.Read(ref _brightnessPercent);
        set
        {
            ArgumentOutOfRangeException.ThrowIfNegative(value);
            ArgumentOutOfRangeException.ThrowIfGreaterThan(value, 100);
            Volatile.Write(ref _brightnessPercent, value);
        }
    }

    /// <summary>The commands that make the chip ready, without lighting it.</summary>
    protected abstract ReadOnlySpan<byte> StartCommands { get; }

    /// <summary>Sends what differs from what is shown.</summary>
    /// <param name="page">The picture.</param>
    /// <exception cref="IOException">The display does not answer, or the bus failed.</exception>
    public void Show(PixelPage page)
    {
        ArgumentNullException.ThrowIfNull(page);
        var isNew = !_isKnown;
        if (isNew)
        {
            SendCommands(StartCommands);
            _contrast = -1;
        }

        // A failure from here on leaves the display in a state nobody knows.
        _isKnown = false;
        for (var band = 0; band < PixelPage.Bands; band++)
        {
            SendBand(band, page.Band(band), isNew);
        }

        SendContrast();
        if (isNew)
        {
            // Lit only now: what a chip holds at power-on is noise.
            SendCommands([AllOn]);
        }

        _isKnown = true;
    }

    /// <summary>The next picture is sent whole: whatever happened to the display on the way, it then shows the truth.</summary>
    public void Forget() => _isKnown = false;

    /// <summary>Turns the display off.</summary>
    /// <exception cref="IOException">The display does not answer, or the bus failed.</exception>
    public void TurnOff()
    {
        Forget();
        SendCommands([AllOff]);
    }

    /// <summary>Lets go of the line.</summary>
    public void Dispose()
    {
        device.Dispose();
        GC.SuppressFinalize(this);
    }

    /// <summary>Writes the commands that make the next data go to a place.</summary>
    /// <param name="commands">Where to write them; eight bytes.</param>
    /// <param name="band">The band, 0 to 7.</param>
    /// <param name="column">The first column of the page, 0 to 127.</param>
    /// <returns>The bytes written.</returns>
    protected abstract int WritePlace(Span<byte> commands, int band, int column);

    private void SendBand(int band, ReadOnlySpan<byte> columns, bool isWhole)
    {
        var shown = _shown.AsSpan(band * PixelPage.Width, PixelPage.Width);
        for (var column = 0; column < PixelPage.Width; column++)
        {
            if (isWhole || columns[column] != shown[column])
            {
                var length = isWhole ? PixelPage.Width : RunLength(columns[column..], shown[column..]);
                SendRun(band, column, columns.Slice(column, length));
                column += length;
            }
        }

        columns.CopyTo(shown);
    }

    /// <summary>From a changed column to the last one before a long gap.</summary>
    private static int RunLength(ReadOnlySpan<byte> columns, ReadOnlySpan<byte> shown)
    {
        var end = 1;
        for (var i = 1; i < columns.Length && i - end < ShortestGap; i++)
        {
            if (columns[i] != shown[i])
            {
                end = i + 1;
            }
        }

        return end;
    }

    private void SendRun(int band, int column, ReadOnlySpan<byte> columns)
    {
        Span<byte> place = stackalloc byte[8];
        SendCommands(place[..WritePlace(place, band, column)]);
        _message[0] = DataFollow;
        columns.CopyTo(_message.AsSpan(1));
        device.Write(_message.AsSpan(0, 1 + columns.Length));
    }

    private void SendContrast()
    {
        var contrast = (BrightnessPercent * byte.MaxValue + 50) / 100;
        if (contrast != _contrast)
        {
            SendCommands([SetContrast, (byte)contrast]);
            _contrast = contrast;
        }
    }

    private void SendCommands(ReadOnlySpan<byte> commands)
    {
        Span<byte> message = stackalloc byte[1 + commands.Length];
        message[0] = CommandsFollow;
        commands.CopyTo(message[1..]);
        device.Write(message);
    }
}
