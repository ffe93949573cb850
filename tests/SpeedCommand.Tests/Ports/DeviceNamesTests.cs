using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;

namespace SpeedCommand.Tests.Ports;

/// <summary>Link names as udev's 60-serial.rules make them: usb-VENDOR_MODEL_SERIAL-ifNN[-portN].</summary>
public sealed class DeviceNamesTests : IDisposable
{
    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    [Theory]
    [InlineData("usb-FTDI_FT232R_USB_UART_A50285BI-if00-port0", "A50285BI", true)]
    [InlineData("usb-FTDI_FT232R_USB_UART_A50285BI-if00-port0", "A50285BI-if00-port0", true)]
    [InlineData("usb-FTDI_FT232R_USB_UART_A50285BI-if00-port0", "50285BI", false)]
    [InlineData("usb-FTDI_FT232R_USB_UART_A50285BI-if00-port0", "A50285B", false)]
    [InlineData("usb-FTDI_FT232R_USB_UART_A50285BI-if00-port0", "", false)]
    [InlineData("usb-Arduino__www.arduino.cc__0043_7583733303635151A1D2-if00", "7583733303635151A1D2", true)]
    [InlineData("usb-Board_with-iffy_name_77-if02", "77-if02", true)]
    [InlineData("usb-Board_with-iffy_name_77-if02", "77-if00", false)]
    [InlineData("usb-1a86_USB_Serial-if00-port0", "Serial", true)]
    public void SerialNumber_IsTheLastPart(string link, string serial, bool isIt) => Assert.Equal(isIt, DeviceNames.HasSerial(link, serial));

    [Fact]
    public void Paths_StandForThemselves()
    {
        Assert.True(new DeviceNames("/no/such/folder").TryResolve("/dev/ttyUSB0", out var path, out _));
        Assert.Equal("/dev/ttyUSB0", path);
    }

    [Fact]
    public void SerialNumber_IsLookedUpAnew()
    {
        var names = new DeviceNames(_folder.FullName);
        Assert.False(names.TryResolve("usb:7", out _, out var trouble));
        Assert.Equal(Faults.PortMissing, trouble.Fault);
        Assert.Contains("Nothing is found in", trouble.Text, StringComparison.Ordinal);
        var link = Path.Combine(_folder.FullName, "usb-Invented_board_7-if00");
        File.WriteAllText(link, "");
        Assert.True(names.TryResolve("usb:7", out var path, out _));
        Assert.Equal(link, path);
        Assert.False(names.TryResolve("usb:8", out _, out trouble));
        Assert.Contains("Found: usb-Invented_board_7-if00", trouble.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void SerialNumberTwice_IsRefused_NamingBoth()
    {
        File.WriteAllText(Path.Combine(_folder.FullName, "usb-Cheap_board_0001-if00-port0"), "");
        File.WriteAllText(Path.Combine(_folder.FullName, "usb-Other_board_0001-if00-port0"), "");
        Assert.False(new DeviceNames(_folder.FullName).TryResolve("usb:0001", out _, out var trouble));
        Assert.Equal(Faults.PortRefused, trouble.Fault);
        Assert.Contains("2 devices have that serial number: usb-Cheap_board_0001-if00-port0, usb-Other_board_0001-if00-port0", trouble.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Reopening_SlowsDown_ButStaysWithinHalfASecond()
    {
        var delay = new ReopenDelay();
        int[] expectedMs = [50, 100, 200, 400, 500, 500];
        Assert.Equal(expectedMs, expectedMs.Select(_ => (int)delay.Next().TotalMilliseconds));
        delay.Reset();
        Assert.Equal(50, delay.Next().TotalMilliseconds);
    }
}
