using System.Device.I2c;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>The kernel's I2C buses, and in words what is wrong with one.</summary>
internal static class I2cLine
{
    public static I2cDevice Open(I2cPlace place) => I2cDevice.Create(new I2cConnectionSettings(place.Bus, place.Address));

    public static string Explain(I2cPlace place, Exception fault)
    {
        var file = FormattableString.Invariant($"/dev/i2c-{place.Bus}");
        return fault is PlatformNotSupportedException ? "this system has no I2C"
            : !File.Exists(file) ? $"no such bus, {file} is missing; is I2C switched on?"
            : !IsAllowed(file) ? $"no permission for {file}; its group is usually 'i2c'"
            : $"does not answer, is it wired and powered? ({fault.Message})";
    }

    private static bool IsAllowed(string file)
    {
        try
        {
            using var handle = File.OpenHandle(file, FileMode.Open, FileAccess.ReadWrite, FileShare.ReadWrite);
            return true;
        }
        catch (UnauthorizedAccessException)
        {
            return false;
        }
        catch (IOException)
        {
            // Something else is wrong with it.
            return true;
        }
    }
}
