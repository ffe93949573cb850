using Microsoft.Extensions.Hosting;
using SpeedCommand.Ports;

namespace SpeedCommand.Service;

/// <summary>Reads the sensors' ports for as long as the service runs.</summary>
internal sealed class PortService(IPortReader reader, IEnumerable<PortIntake> intakes) : BackgroundService
{
    private readonly PortLine[] _lines = [.. intakes.Select(intake => intake.Line)];

    protected override Task ExecuteAsync(CancellationToken stoppingToken) => reader.RunAsync(_lines, stoppingToken);
}
