using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Ports;

/// <summary>A sensor of the kernel's industrial-I/O subsystem, which speaks like any board: in sentences.</summary>
internal sealed class IioDevice : IDisposable
{
    /// <summary>Hundredths of a pascal, thousandths of a degree and of a per cent: finer than any of these sensors.</summary>
    private const int PressureDecimals = 2, OtherDecimals = 3;

    private readonly List<IioChannel> _channels = [];
    private readonly XdrMeasurement[] _measurements = new XdrMeasurement[3];
    private readonly byte[] _sentence = new byte[SentenceReader.MaxLength + 2];
    private readonly int _rateHz;
    private int _tick;

    /// <summary>Finds the device by its name and opens what is to be read of it.</summary>
    /// <exception cref="IOException">There is none, or it lacks something.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be read.</exception>
    public IioDevice(IioSettings settings)
    {
        _rateHz = settings.RateHz;
        Folder = Find(settings);
        try
        {
            foreach (var kind in new[] { settings.Pressure, settings.Temperature, settings.Humidity })
            {
                if (kind is { } wanted)
                {
                    _channels.Add(new IioChannel(Folder, wanted));
                }
            }
        }
        catch
        {
            Dispose();
            throw;
        }
    }

    /// <summary>Where it is.</summary>
    public string Folder { get; }

    /// <summary>
    /// Reads the sensor once: pressure each time, temperature and humidity once a second, since each read may keep the
    /// sensor's bus busy for milliseconds. Allocates nothing.
    /// </summary>
    /// <returns>A sentence without its line end, valid until the next call; empty when nothing was due.</returns>
    /// <exception cref="IOException">The device is gone or does not answer, or what it says makes no sense.</exception>
    public ReadOnlySpan<byte> Read()
    {
        var isSecond = _tick == 0;
        _tick = (_tick + 1) % _rateHz;
        var count = 0;
        foreach (var channel in _channels)
        {
            var isPressure = channel.Kind is not (ReadingKind.OutsideAirTemperatureK or ReadingKind.RelativeHumidity);
            if (isPressure || isSecond)
            {
                _measurements[count] = new XdrMeasurement(channel.Kind, channel.Read(), isPressure ? PressureDecimals : OtherDecimals);
                count++;
            }
        }

        if (count == 0)
        {
            return default;
        }

        return SentenceWriter.TryWriteXdr(_sentence, "YX"u8, _measurements.AsSpan(0, count), out var length)
            ? _sentence.AsSpan(0, length - 2)
            : throw new IOException($"{Folder}: expected values that fit into a sentence, found larger ones");
    }

    public void Dispose() => _channels.ForEach(channel => channel.Dispose());

    private static string Find(IioSettings settings)
    {
        var found = new List<string>();
        foreach (var folder in Directory.EnumerateDirectories(settings.Folder, "iio:device*").Order(StringComparer.Ordinal))
        {
            var nameFile = Path.Combine(folder, "name");
            var name = File.Exists(nameFile) ? File.ReadAllText(nameFile).Trim() : "";
            if (name == settings.Device)
            {
                return folder;
            }

            found.Add(name);
        }

        var others = found.Count == 0 ? "none" : string.Join(", ", found);
        throw new IOException($"{settings.Folder}: expected a device named '{settings.Device}', found {others}; is its driver loaded?");
    }
}
