using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using SpeedCommand.Bench;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Ports;
using SpeedCommand.Service;
using SpeedCommand.Settings;

namespace SpeedCommand.Controls;

/// <summary>Puts the controls' part of the service together. A bench flight has no knobs and leaves what the pilot's cockpit keeps alone.</summary>
internal static class ControlService
{
    private const string PortName = "controls";

    /// <summary>The state of the knobs' port, if there is one.</summary>
    public static IEnumerable<PortState> States(CockpitSettings settings, BenchFlight? flight) =>
        settings.Controls.Port is null || flight is not null ? [] : [new PortState(PortName)];

    /// <summary>Adds the desk and every way to it. Before the ports: what was kept must be known before the first line.</summary>
    public static void Add(IServiceCollection services, CockpitSettings settings, BenchFlight? flight, IReadOnlyList<PortState> states)
    {
        var controls = settings.Controls;
        var keeps = flight is null && controls.StateFile is not null;
        services.AddSingleton(provider => MakeDesk(provider, settings, keeps ? controls.StateFile : null));
        if (keeps)
        {
            services.AddHostedService<ControlStateService>();
        }

        if (controls.Socket is { } socket)
        {
            services.AddSingleton<IHostedService>(provider => ActivatorUtilities.CreateInstance<ControlSocketService>(provider, socket));
        }

        if (controls.Port is { } port && flight is null)
        {
            var state = states.Single(one => one.Name == PortName);
            services.AddSingleton<IHostedService>(provider => ActivatorUtilities.CreateInstance<ControlPortService>(provider, port, state));
        }
    }

    /// <summary>What this cockpit allows.</summary>
    public static ControlRules RulesOf(FlightSettings flight, DisplayUnits units, double dumpKgPerS)
    {
        var spec = ControlCatalogue.Of(ControlId.Ballast);
        var roomKg = flight.Glider.MaxMassKg - (flight.MassKg - flight.BallastKg);
        return new ControlRules(
            double.IsNaN(roomKg) ? spec.Max : Math.Clamp(roomKg, 0, spec.Max), dumpKgPerS, [units.Vertical.Symbol, units.Pressure.Symbol]);
    }

    private static ControlDesk MakeDesk(IServiceProvider provider, CockpitSettings settings, string? stateFile)
    {
        var log = provider.GetRequiredService<ILogger<ControlDesk>>();
        var desk = new ControlDesk(provider.GetRequiredService<CockpitMachine>(),
            RulesOf(settings.Flight, settings.Units, settings.Controls.DumpKgPerS), provider.GetRequiredService<TimeProvider>(), log);
        desk.Begin(new ControlChange(ControlId.Volume, settings.Sound.Volume));
        if (stateFile is not null)
        {
            if (ControlStateFile.Load(stateFile, out var changes) is { } problem)
            {
                log.LogWarning("{Path}: damaged, the controls begin as the settings say: {Problem}", stateFile, problem);
            }

            desk.Restore(changes);
        }

        return desk;
    }
}
