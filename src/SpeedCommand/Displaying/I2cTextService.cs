using System.Device.I2c;
using Microsoft.Extensions.Logging;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>A character display behind a port expander on an I2C bus.</summary>
internal sealed class I2cTextService(
    I2cTextSettings text, LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<I2cTextService> log,
    Func<I2cPlace, I2cDevice> open) : I2cDisplay<Hd44780>("character display", text.Place, open, latest, time, log)
{
    private readonly CharacterText _text = CharacterText.For(text.Frame, settings.Units);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private readonly byte[] _frame = new byte[text.Frame.Length];

    protected override Hd44780 Drive(I2cDevice device) => new(device, text.Frame);

    protected override void Forget(Hd44780 driver) => driver.Forget();

    protected override void RenderCaution() => _text.RenderCaution(_frame);

    protected override void Render(in CockpitPicture picture) => _text.Render(_steadier.Next(picture), _frame);

    protected override void Send(Hd44780 driver) => driver.Show(_frame);

    protected override void TurnOff(Hd44780 driver) => driver.TurnOff();
}
