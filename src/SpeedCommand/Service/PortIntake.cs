using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Service;

/// <summary>Takes what comes in on one port: stamps its lines on arrival, keeps its state, tells the log what happens to it.</summary>
internal sealed class PortIntake(PortSettings settings, PortState state, CockpitMachine machine, CockpitClock clock, ILogger<PortIntake> log)
    : IPortListener, ILineSink
{
    private readonly LineFramer _framer = new();
    private readonly int _stream = machine.AddStream(settings.Name, settings.Stream);
    private long _arrivalUs;
    private string _lastComplaint = "";

    public PortLine Line => new(settings, this);

    public void OnOpen(string path)
    {
        _framer.Reset();
        _lastComplaint = "";
        state.Open();
        var leadsTo = path == settings.Device ? "" : $" ({path})";
        log.LogInformation("{Port}: {Device}{LeadsTo} is open at {Baud} baud, {Framing}", settings.Name, settings.Device, leadsTo, settings.Baud, settings.Framing);
    }

    public void OnBytes(ReadOnlySpan<byte> bytes)
    {
        _arrivalUs = clock.NowUs;
        _framer.Push(bytes, this);
    }

    void ILineSink.OnLine(ReadOnlySpan<byte> line) => machine.Accept(_arrivalUs, _stream, line);

    public void OnGone(string cause)
    {
        state.Close(Faults.PortMissing);
        log.LogWarning("{Port}: {Device} is gone ({Cause})", settings.Name, settings.Device, cause);
    }

    public void OnTrouble(PortTrouble trouble)
    {
        state.Close(trouble.Fault);
        // The same complaint twice a second would bury the others.
        if (trouble.Text != _lastComplaint)
        {
            _lastComplaint = trouble.Text;
            log.LogWarning("{Port}: {Complaint}", settings.Name, trouble.Text);
        }
    }
}
