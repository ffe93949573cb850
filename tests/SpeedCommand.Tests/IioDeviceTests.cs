using System.Text;
using SpeedCommand.Ports;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests;

/// <summary>
/// Industrial-I/O sensors on a made-up tree of files. Units and the order of offset and scale are those of the kernel's
/// Documentation/ABI/testing/sysfs-bus-iio, from memory: kilopascal, milli-degrees Celsius, milli per cent, (raw + offset) × scale.
/// </summary>
public sealed class IioDeviceTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    private void Write(int device, string file, string text)
    {
        var folder = Path.Combine(_folder.FullName, $"iio:device{device}");
        Directory.CreateDirectory(folder);
        File.WriteAllText(Path.Combine(folder, file), text);
    }

    private IioSettings Settings(ReadingKind? pressure = ReadingKind.StaticPressurePa, bool withOthers = false, int rateHz = 2) => new(
        "baro", "bme280", _folder.FullName, rateHz, pressure,
        withOthers ? ReadingKind.OutsideAirTemperatureK : null, withOthers ? ReadingKind.RelativeHumidity : null);

    [Fact]
    public void Inputs_AreRead_TheSlowOnesOnceASecond()
    {
        Write(0, "name", "other\n");
        Write(3, "name", "bme280\n");
        Write(3, "in_pressure_input", "95.461200000\n");
        Write(3, "in_temp_input", "-12300\n");
        Write(3, "in_humidityrelative_input", "45200\n");
        using var device = new IioDevice(Settings(withOthers: true));
        Assert.Equal(Path.Combine(_folder.FullName, "iio:device3"), device.Folder);
        Assert.Equal("$YXXDR,P,95461.20,P,STATIC,C,-12.300,C,OAT,H,45.200,P,RH*32", Encoding.ASCII.GetString(device.Read()));
        Assert.Equal("$YXXDR,P,95461.20,P,STATIC*44", Encoding.ASCII.GetString(device.Read()));
        Write(3, "in_pressure_input", "90\n");
        Write(3, "in_temp_input", "8500\n");
        Assert.StartsWith("$YXXDR,P,90000.00,P,STATIC,C,8.500,C,OAT,H", Encoding.ASCII.GetString(device.Read()), StringComparison.Ordinal);
    }

    [Fact]
    public void RawValue_IsOffsetThenScaled()
    {
        Write(0, "name", "bme280");
        Write(0, "in_pressure_raw", "1024\n");
        Write(0, "in_pressure_scale", "0.000250000\n");
        Write(0, "in_pressure_offset", "-24\n");
        using var device = new IioDevice(Settings(ReadingKind.ImpactPressurePa));
        Assert.Equal("$YXXDR,P,250.00,P,IMPACT", Encoding.ASCII.GetString(device.Read())[..^3]);
    }

    [Fact]
    public void Sentences_AreReadBackAsMeasured()
    {
        Write(0, "name", "bme280\n");
        Write(0, "in_pressure_input", "101.325000000\n");
        Write(0, "in_temp_input", "15000\n");
        Write(0, "in_humidityrelative_input", "50000\n");
        using var device = new IioDevice(Settings(withOthers: true));
        var readings = new Reading[LineFormat.MaxReadings];
        var content = IioReader.Stream.Format.Read(device.Read(), readings);
        Assert.Equal(new LineContent(true, 3, 0, double.NaN), content);
        Assert.Equal([101_325, 288.15, 0.5], readings[..3].Select(reading => Math.Round(reading.Value, 9)));
    }

    [Theory]
    [InlineData("")]
    [InlineData("no data\n")]
    [InlineData("95,4612\n")]
    [InlineData("1e2\n")]
    [InlineData("999999999999999999999999999999999999999999999999999999999999999\n")]
    public void Nonsense_IsAFaultThatNamesTheFile(string text)
    {
        Write(0, "name", "bme280\n");
        Write(0, "in_pressure_input", "95.4612\n");
        using var device = new IioDevice(Settings());
        device.Read();
        Write(0, "in_pressure_input", text);
        var fault = Assert.Throws<IOException>(() => device.Read().Length);
        Assert.StartsWith(_folder.FullName, fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void DeviceOrFileThatIsMissing_IsNamed()
    {
        Assert.Contains("expected a device named 'bme280', found none", Assert.Throws<IOException>(() => new IioDevice(Settings())).Message, StringComparison.Ordinal);
        Write(0, "name", "bmp280\n");
        Assert.Contains("found bmp280; is its driver loaded?", Assert.Throws<IOException>(() => new IioDevice(Settings())).Message, StringComparison.Ordinal);
        Write(0, "name", "bme280\n");
        Assert.Contains("in_pressure_raw", Assert.Throws<FileNotFoundException>(() => new IioDevice(Settings())).Message, StringComparison.Ordinal);
    }

    /// <summary>The kernel answers a read of its own first page of memory with EIO, as it does for a sensor that does not answer.</summary>
    [LinuxFact]
    public void SensorThatDoesNotAnswer_IsAFault()
    {
        Write(0, "name", "bme280\n");
        File.CreateSymbolicLink(Path.Combine(_folder.FullName, "iio:device0", "in_pressure_input"), "/proc/self/mem");
        using var device = new IioDevice(Settings());
        Assert.Contains("Input/output error", Assert.Throws<IOException>(() => device.Read().Length).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Reading_AllocatesNothing()
    {
        Write(0, "name", "bme280\n");
        Write(0, "in_pressure_input", "95.461200000\n");
        using var device = new IioDevice(Settings());
        Assert.Equal(0, Allocation.Of(() =>
        {
            for (var i = 0; i < 200; i++)
            {
                device.Read();
            }
        }));
    }
}
