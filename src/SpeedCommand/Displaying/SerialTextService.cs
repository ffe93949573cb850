using System.IO.Ports;
using Microsoft.Extensions.Logging;
using SpeedCommand.Displays;
using SpeedCommand.Displays.Characters;
using SpeedCommand.Displays.Readings;
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
    /// <summary>A frame takes a tenth of a second at 9600 baud; a display that takes nothing for this long is stuck.</summary>
    private const int WriteLimitMs = 500;

    private static readonly TimeSpan ReopenDelay = TimeSpan.FromSeconds(1);

    private readonly CharacterText20x4 _text = new(settings.Units);
    private readonly SpeedSteadier _steadier = new(settings.Units.Speed);
    private readonly byte[] _frame = new byte[CharacterText20x4.Length];
    private SerialPort? _port;
    private string _lastComplaint = "";

    /// <summary>What 9600 baud carries with room to spare.</summary>
    protected override TimeSpan FramePeriod => TimeSpan.FromMilliseconds(250);

    protected override ValueTask ShowCautionAsync(CancellationToken stop) => SendAsync(CautionText.RenderCharacters20x4(_frame), stop);

    protected override ValueTask ShowAsync(CockpitPicture picture, CancellationToken stop) =>
        SendAsync(_text.Render(_steadier.Next(picture), _frame), stop);

    protected override async ValueTask ShowStoppedAsync()
    {
        _frame[0] = (byte)'\f';
        await SendAsync(1, CancellationToken.None).ConfigureAwait(false);
        if (_port is { } port)
        {
            await SerialPorts.CloseAsync(port).ConfigureAwait(false);
        }
    }

    private async ValueTask SendAsync(int length, CancellationToken stop)
    {
        try
        {
            if (_port is null)
            {
                _port = SerialPorts.Open(serialText.Device, serialText.Baud);
                _port.WriteTimeout = WriteLimitMs;
            }

            _port.Write(_frame, 0, length);
            _lastComplaint = "";
        }
        catch (Exception fault) when (SerialPorts.IsPortFault(fault) || fault is TimeoutException)
        {
            Complain(fault is TimeoutException ? $"{serialText.Device}: takes no more characters" : PortFault.Explain(serialText.Device, fault));
            if (_port is { } port)
            {
                _port = null;
                await SerialPorts.CloseAsync(port).ConfigureAwait(false);
            }

            await PauseAsync(ReopenDelay, stop).ConfigureAwait(false);
        }
    }

    private void Complain(string complaint)
    {
        if (complaint != _lastComplaint)
        {
            log.LogWarning("character display: {Complaint}", complaint);
            _lastComplaint = complaint;
        }
    }
}
