using Microsoft.Extensions.Logging;
using SpeedCommand.Displays.SentencesOut;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Displaying;

/// <summary>Tells another instrument the targets and the state of the air, in sentences on a serial port.</summary>
internal sealed class SentenceOutService(
    SentenceOutSettings sentences, LatestPicture latest, CockpitSettings settings, TimeProvider time, ILogger<SentenceOutService> log)
    : DeviceDisplay("sentences out", latest, time, log)
{
    private const Faults Stopped = Faults.StaticSilent | Faults.AirspeedSilent | Faults.TemperatureSilent;

    private readonly byte[] _frame = new byte[PictureSentences.MaxLength];
    private readonly IDisplayLine _line = SerialDrivers.Display(sentences.Line, settings.Serial);

    protected override TimeSpan FramePeriod { get; } = TimeSpan.FromSeconds(1.0 / sentences.RatePerS);

    protected override ValueTask<string?> TryCautionAsync() => _line.TryWriteAsync(_frame.AsMemory(0, PictureSentences.RenderCaution(_frame)));

    /// <summary>Not steadied: the other instrument rounds as it likes.</summary>
    protected override ValueTask<string?> TryPictureAsync(CockpitPicture picture) =>
        _line.TryWriteAsync(_frame.AsMemory(0, PictureSentences.Render(picture, _frame)));

    protected override async ValueTask<string?> TryStopAsync()
    {
        var nothing = CockpitPicture.Blank(0, Stopped) with { ExpectedClimbMps = double.NaN };
        var complaint = await TryPictureAsync(nothing).ConfigureAwait(false);
        await _line.DisposeAsync().ConfigureAwait(false);
        return complaint;
    }
}
