using Microsoft.Extensions.Logging.Abstractions;
using SpeedCommand.Controls;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Service;

namespace SpeedCommand.Tests.Controls;

/// <summary>A desk on a real machine with a clock that stands until it is moved.</summary>
internal sealed class TestDesk : IDisposable
{
    private readonly CockpitMachine _machine;

    public TestDesk(double ballastKg = 0)
    {
        var flight = TestSettings.Flight with { MassKg = 340 + ballastKg, BallastKg = ballastKg };
        _machine = new CockpitMachine(flight, new CockpitClock(Time, 1), null, []);
        Desk = new ControlDesk(_machine, ControlService.RulesOf(flight, DisplayUnits.Metric, 0.7), Time, NullLogger<ControlDesk>.Instance);
    }

    public ManualTime Time { get; } = new();

    public ControlDesk Desk { get; }

    public void Advance(double seconds)
    {
        Time.NowUs += (long)(seconds * 1e6);
        _machine.Tick();
    }

    /// <summary>What the desk says, marked as the line protocol marks it.</summary>
    public string Say(string line) => (Desk.TryAnswer(line, ControlSource.Socket, out var message) ? "ok " : "error ") + message;

    public void Dispose() => _machine.Dispose();
}
