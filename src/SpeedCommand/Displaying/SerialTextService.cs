using Microsoft.Extensions.Logging;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>A character display of 4 lines of 20 on a serial port. Blocked or unplugged, it delays nobody but itself.</summary>
internal sealed class SerialTextService(
    SerialTextSettings serialText, LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<SerialTextService> log)
    : DisplayLoop(latest, time, log)
{
    private static readonly TimeSpan ReopenDelay = TimeSpan.FromSeconds(1);

    private readonly CharacterText20x4 _text = new(settings.Units);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private readonly byte[] _frame = new byte[CharacterText20x4.Length];
    private readonly IDisplayLine _line = SerialDrivers.Display(serialText, settings.Serial);
    private string _lastComplaint = "";

    /// <summary>Whole pictures, and at most half of what the line carries: 200 ms at 9600 baud, 100 ms from 19200 on.</summary>
    protected override TimeSpan FramePeriod { get; } = TimeSpan.FromMicroseconds(PipelineBounds.PicturePeriodUs
        * Math.Ceiling(2e6 * CharacterText20x4.Length * serialText.Framing.BitsPerByte / serialText.Baud / PipelineBounds.PicturePeriodUs));

    protected override ValueTask ShowCautionAsync(CancellationToken stop) => SendAsync(CautionText.RenderCharacters20x4(_frame), stop);

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop) =>
        SendAsync(_text.Render(_steadier.Next(picture), _frame), stop);

    protected override async ValueTask ShowStoppedAsync()
    {
        _frame[0] = (byte)'\f';
        await SendAsync(1, CancellationToken.None).ConfigureAwait(false);
        await _line.DisposeAsync().ConfigureAwait(false);
    }

    private async ValueTask SendAsync(int length, CancellationToken stop)
    {
        if (await _line.TryWriteAsync(_frame.AsMemory(0, length)).ConfigureAwait(false) is { } complaint)
        {
            if (complaint != _lastComplaint)
            {
                log.LogWarning("character display: {Complaint}", complaint);
            }

            _lastComplaint = complaint;
            await PauseAsync(ReopenDelay, stop).ConfigureAwait(false);
        }
        else
        {
            _lastComplaint = "";
        }
    }
}
