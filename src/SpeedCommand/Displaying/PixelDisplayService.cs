using System.Device.I2c;
using Microsoft.Extensions.Logging;
using SpeedCommand.Displays.Pixels;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>A display of 128 x 64 pixels on an I2C bus.</summary>
internal sealed class PixelDisplayService(
    PixelSettings pixels, LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<PixelDisplayService> log,
    Func<I2cPlace, I2cDevice> open) : I2cDisplay<PixelChip>("pixel display", pixels.Place, open, latest, time, log)
{
    private readonly PixelPanel _panel = new(settings.Units);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private readonly PixelPage _page = new();

    private int _brightnessPercent = pixels.BrightnessPercent;

    protected override PixelChip Drive(I2cDevice device) => pixels.Chip == PixelChipKind.Ssd1306 ? new Ssd1306(device) : new Sh1106(device);

    protected override void Forget(PixelChip driver) => driver.Forget();

    protected override void RenderCaution() => PixelPanel.RenderCaution(_page);

    protected override void Render(in CockpitPicture picture)
    {
        _brightnessPercent = (int)Math.Round(pixels.BrightnessPercent * picture.Controls.Brightness);
        _panel.Render(_steadier.Next(picture), _page);
    }

    protected override void Send(PixelChip driver)
    {
        driver.BrightnessPercent = _brightnessPercent;
        driver.Show(_page);
    }

    protected override void TurnOff(PixelChip driver) => driver.TurnOff();
}
