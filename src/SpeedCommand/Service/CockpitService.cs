using System.Device.I2c;
using System.Diagnostics.CodeAnalysis;
using System.Runtime.InteropServices;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using NLog.Extensions.Logging;
using SpeedCommand.Bench;
using SpeedCommand.Controls;
using SpeedCommand.Displaying;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Replay.Logs;
using SpeedCommand.Replay.Recording;
using SpeedCommand.Settings;
using SpeedCommand.Sounding;
using SpeedCommand.Web;

namespace SpeedCommand.Service;

/// <summary>Puts the service together, runs it, and ends the flight in good order.</summary>
internal static class CockpitService
{
    /// <summary>Runs until a signal, or the end of the bench flight.</summary>
    /// <returns>The exit status.</returns>
    public static async Task<int> RunAsync(CockpitSettings settings, BenchFlight? flight, double pace, params IPictureSink[] extraSinks)
    {
        using var host = Build(settings, flight, pace, extraSinks);
        // A terminal that closes must not leave a number standing on another display, nor the flight's log without its end.
        using var hangUp = PosixSignalRegistration.Create(PosixSignal.SIGHUP, signal =>
        {
            signal.Cancel = true;
            host.Services.GetRequiredService<IHostApplicationLifetime>().StopApplication();
        });
        await host.StartAsync().ConfigureAwait(false);
        await host.WaitForShutdownAsync().ConfigureAwait(false);
        host.Services.GetRequiredService<CockpitMachine>().Finish();
        TellFaults(host);
        var exitStatus = ExitStatusOf(host);
        if (flight is not null)
        {
            exitStatus = BenchSummary.Write(host.Services, flight, exitStatus);
        }

        return exitStatus;
    }

    /// <summary>What was wrong, how often and when, for who looks into it after the flight.</summary>
    private static void TellFaults(IHost host)
    {
        var log = host.Services.GetRequiredService<ILogger<CockpitMachine>>();
        foreach (var span in host.Services.GetRequiredService<CockpitMachine>().FaultSpans)
        {
            log.LogInformation("fault {Name}: {Count} times, {LastedS:F1} s in all, first at {FirstS:F1} s, last at {LastS:F1} s",
                span.Name, span.Count, span.LastedUs / 1e6, span.FirstUs / 1e6, span.LastUs / 1e6);
        }
    }

    internal static IHost Build(CockpitSettings settings, BenchFlight? flight, double pace, params IPictureSink[] extraSinks)
    {
        var builder = new HostApplicationBuilder(new HostApplicationBuilderSettings
        {
            DisableDefaults = true,
            ContentRootPath = AppContext.BaseDirectory,
        });
        var isPanelShown = settings.IsTerminalOn && !Console.IsOutputRedirected;
        builder.Logging.AddNLog(ServiceLog.Configure(settings, isPanelShown));
        builder.Services.AddSystemd();
        builder.Services.Configure<ConsoleLifetimeOptions>(options => options.SuppressStatusMessages = true);
        builder.Services.Configure<HostOptions>(options => options.ShutdownTimeout = TimeSpan.FromSeconds(5));
        var clock = new CockpitClock(TimeProvider.System, pace);
        var ports = (flight is null ? settings.Ports : PortsOf(flight, settings)).ToArray();
        var sensors = flight is null ? settings.IioDevices : [];
        PortState[] states = [.. ports.Select(port => new PortState(port.Name)), .. sensors.Select(sensor => new PortState(sensor.Name)), .. ControlService.States(settings, flight)];
        var latest = new LatestPicture(states);
        builder.Services
            .AddSingleton(TimeProvider.System)
            .AddSingleton(settings)
            .AddSingleton(clock)
            .AddSingleton(latest)
            .AddSingleton(new SoundLevel(settings.Sound.Volume))
            .AddSingleton(_ => new CockpitMachine(settings.Flight, clock, MakeRecorder(settings, flight, clock), [latest, .. extraSinks]));
        ControlService.Add(builder.Services, settings, flight, states);
        AddPorts(builder.Services, settings, ports, sensors, states);
        builder.Services.AddHostedService<PictureTicker>();
        builder.Services.AddHostedService<RecordingService>();
        AddDisplays(builder.Services, settings, isPanelShown);
        if (flight is not null)
        {
            builder.Services.AddSingleton(flight).AddSingleton<BenchPlayer>()
                .AddSingleton<IHostedService>(services => services.GetRequiredService<BenchPlayer>());
        }

        return builder.Build();
    }

    private static IEnumerable<PortSettings> PortsOf(BenchFlight flight, CockpitSettings settings) => flight.Lines.Select(line =>
        new PortSettings(line.Key, line.Value.DevicePath, 115_200, Sentences.ChecksumRule.Required) { Stream = settings.StreamOf(line.Key) });

    /// <summary>The first states are the ports', the rest the kernel's sensors'.</summary>
    private static void AddPorts(
        IServiceCollection services, CockpitSettings settings, PortSettings[] ports, IReadOnlyList<IioSettings> sensors, PortState[] states)
    {
        services.AddSingleton<IReadOnlyList<PortState>>(states).AddSingleton<IHostedService>(provider => new PortService(
            SerialDrivers.Reader(settings.Serial),
            ports.Zip(states, (port, state) => ActivatorUtilities.CreateInstance<PortIntake>(provider, port, state))));
        foreach (var (sensor, state) in sensors.Zip(states.Skip(ports.Length)))
        {
            services.AddSingleton<IHostedService>(provider => ActivatorUtilities.CreateInstance<IioReader>(provider, sensor, state));
        }
    }

    private static void AddDisplays(IServiceCollection services, CockpitSettings settings, bool isPanelShown)
    {
        if (settings.IsTerminalOn)
        {
            services.AddSingleton<IHostedService>(provider => isPanelShown
                ? ActivatorUtilities.CreateInstance<TerminalPanelService>(provider)
                : ActivatorUtilities.CreateInstance<StatusLineService>(provider));
        }

        AddDisplay<SerialTextService>(services, settings.SerialText);
        AddDisplay<PixelDisplayService>(services, settings.Displays.Pixels, I2cLine.Open);
        AddDisplay<I2cTextService>(services, settings.Displays.I2cText, I2cLine.Open);
        AddDisplay<SentenceOutService>(services, settings.Displays.Sentences);
        if (settings.Sound.IsOn)
        {
            services.AddHostedService<SoundService>();
        }

        if (settings.Web.IsOn)
        {
            services.AddHostedService<WebPageService>();
        }
    }

    /// <summary>Adds a display by its own settings, which are null when it is not there; one on a bus needs the way to it.</summary>
    private static void AddDisplay<[DynamicallyAccessedMembers(DynamicallyAccessedMemberTypes.PublicConstructors)] TDisplay>(
        IServiceCollection services, object? own, Func<I2cPlace, I2cDevice>? openBus = null)
        where TDisplay : DisplayLoop
    {
        if (own is not null)
        {
            object[] parameters = openBus is null ? [own] : [own, openBus];
            services.AddSingleton<IHostedService>(provider => ActivatorUtilities.CreateInstance<TDisplay>(provider, parameters));
        }
    }

    private static FlightRecorder? MakeRecorder(CockpitSettings settings, BenchFlight? flight, CockpitClock clock)
    {
        string[] notes = flight is null ? [] : [$"bench flight, played from {Path.GetFileName(flight.LogPath)}"];
        var header = new FlightLogHeader(clock.StartUtc, settings.GliderName, notes) { Program = ProgramName.WithVersion, Flown = settings.Flown };
        return settings.Recorder is { } options ? new FlightRecorder(options, header, Environment.ProcessId) : null;
    }

    /// <summary>A hosted service that broke is our own bug: the service manager must see it and start us again.</summary>
    private static int ExitStatusOf(IHost host) =>
        host.Services.GetServices<IHostedService>().OfType<BackgroundService>().Any(service => service.ExecuteTask?.IsFaulted == true)
            ? ExitStatus.InternalFault
            : ExitStatus.Done;
}
