using System.Text;
using Microsoft.Win32.SafeHandles;
using SpeedCommand.Sentences;

namespace SpeedCommand.Ports;

/// <summary>
/// One quantity of an industrial-I/O device, by the kernel's sysfs interface (Documentation/ABI/testing/sysfs-bus-iio; from memory):
/// <c>in_TYPE_input</c> holds it ready, or else it is <c>(in_TYPE_raw + in_TYPE_offset) × in_TYPE_scale</c>, in kilopascal,
/// thousandths of a degree Celsius, thousandths of a per cent. The files stay open and each read gives a fresh value.
/// </summary>
internal sealed class IioChannel : IDisposable
{
    private const double PascalPerKilopascal = 1_000, Thousandth = 1e-3, IcePointK = 273.15;

    /// <summary>The files hold one number; what is longer is none.</summary>
    private readonly byte[] _text = new byte[64];
    private readonly string _path;
    private readonly SafeFileHandle _file;
    private readonly double _scale = 1;
    private readonly double _offset;

    /// <summary>Opens the channel.</summary>
    /// <param name="folder">The device's folder.</param>
    /// <param name="kind">What it measures; it decides which quantity of the device is meant.</param>
    /// <exception cref="IOException">A file is missing or holds no number.</exception>
    /// <exception cref="UnauthorizedAccessException">A file may not be read.</exception>
    public IioChannel(string folder, ReadingKind kind)
    {
        Kind = kind;
        var stem = Path.Combine(folder, kind switch
        {
            ReadingKind.OutsideAirTemperatureK => "in_temp",
            ReadingKind.RelativeHumidity => "in_humidityrelative",
            _ => "in_pressure",
        });
        _path = stem + "_input";
        if (!File.Exists(_path))
        {
            _path = stem + "_raw";
            _scale = ReadConstant(stem + "_scale", 1);
            _offset = ReadConstant(stem + "_offset", 0);
        }

        _file = File.OpenHandle(_path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
    }

    /// <summary>What it measures.</summary>
    public ReadingKind Kind { get; }

    /// <summary>Reads the present value. Allocates nothing.</summary>
    /// <returns>The value in the unit of its kind.</returns>
    /// <exception cref="IOException">The device is gone or does not answer, or what it says is no number.</exception>
    public double Read()
    {
        var length = RandomAccess.Read(_file, _text, 0);
        var text = _text.AsSpan(0, length).TrimEnd((byte)'\n');
        if (!SentenceNumber.TryRead(text, out var number))
        {
            throw Nonsense(_path, text);
        }

        var value = (number + _offset) * _scale;
        return Kind switch
        {
            ReadingKind.OutsideAirTemperatureK => value * Thousandth + IcePointK,
            ReadingKind.RelativeHumidity => value * Thousandth / 100,
            _ => value * PascalPerKilopascal,
        };
    }

    public void Dispose() => _file.Dispose();

    private static double ReadConstant(string path, double standard)
    {
        if (!File.Exists(path))
        {
            return standard;
        }

        var text = File.ReadAllBytes(path).AsSpan().TrimEnd((byte)'\n');
        return SentenceNumber.TryRead(text, out var number) ? number : throw Nonsense(path, text);
    }

    private static IOException Nonsense(string path, ReadOnlySpan<byte> text) =>
        new($"{path}: expected a number, found '{Encoding.Latin1.GetString(text)}'");
}
