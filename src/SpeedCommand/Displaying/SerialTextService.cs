using Microsoft.Extensions.Logging;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>A character display on a serial port. Blocked or unplugged, it delays nobody but itself.</summary>
internal sealed class SerialTextService(
    SerialTextSettings serialText, LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<SerialTextService> log)
    : DeviceDisplay("character display", latest, time, log)
{
    private readonly CharacterText _text = CharacterText.For(serialText.Frame, settings.Units);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private readonly byte[] _frame = new byte[serialText.Frame.Length];
    private readonly IDisplayLine _line = SerialDrivers.Display(serialText, settings.Serial);

    /// <summary>Whole pictures, and at most half of what the line carries: for four lines 200 ms at 9600 baud, 100 ms from 19200 on.</summary>
    protected override TimeSpan FramePeriod { get; } = TimeSpan.FromMicroseconds(PipelineBounds.PicturePeriodUs
        * Math.Ceiling(2 * serialText.TimeFor(serialText.Frame.Length).TotalMicroseconds / PipelineBounds.PicturePeriodUs));

    protected override ValueTask<string?> TryCautionAsync() => _line.TryWriteAsync(_frame.AsMemory(0, _text.RenderCaution(_frame)));

    protected override ValueTask<string?> TryPictureAsync(CockpitPicture picture) =>
        _line.TryWriteAsync(_frame.AsMemory(0, _text.Render(_steadier.Next(picture), _frame)));

    protected override async ValueTask<string?> TryStopAsync()
    {
        _frame[0] = (byte)'\f';
        var complaint = await _line.TryWriteAsync(_frame.AsMemory(0, 1)).ConfigureAwait(false);
        await _line.DisposeAsync().ConfigureAwait(false);
        return complaint;
    }
}
