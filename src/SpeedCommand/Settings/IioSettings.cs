using SpeedCommand.Sentences;

namespace SpeedCommand.Settings;

/// <summary>One sensor that the kernel's industrial-I/O subsystem reads.</summary>
/// <param name="Name">The stream's name in logs.</param>
/// <param name="Device">What the device's "name" file says, such as bmp280.</param>
/// <param name="Folder">Where the devices are, /sys/bus/iio/devices but for tests.</param>
/// <param name="RateHz">Readings a second.</param>
/// <param name="Pressure">What its pressure is; null when it is not to be read.</param>
/// <param name="Temperature">What its temperature is; null when it is not to be read.</param>
/// <param name="Humidity">What its humidity is; null when it is not to be read.</param>
internal sealed record IioSettings(
    string Name, string Device, string Folder, int RateHz, ReadingKind? Pressure, ReadingKind? Temperature, ReadingKind? Humidity);
