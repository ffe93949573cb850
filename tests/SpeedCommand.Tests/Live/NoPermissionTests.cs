using System.Diagnostics;
using System.Runtime.Versioning;
using SpeedCommand.Bench;

namespace SpeedCommand.Tests.Live;

/// <summary>A device that the user may not open. Root may open everything, so the program runs as nobody.</summary>
[Collection(LiveTests.Name)]
[SupportedOSPlatform("linux")]
public sealed class NoPermissionTests : IDisposable
{
    private const string Nobody = "65534";

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();

    public void Dispose() => _folder.Delete(recursive: true);

    [RunAsNobodyFact]
    public async Task ForbiddenDevice_IsToldWithItsGroup_AndOpensWhenItIsAllowed()
    {
        using var line = new PseudoTerminal();
        File.SetUnixFileMode(line.DevicePath, UnixFileMode.UserRead | UnixFileMode.UserWrite);
        using var service = Start(line.DevicePath, "run");
        var complaint = await LineWithAsync(service, "no permission");
        Assert.Matches($"static: {line.DevicePath}: no permission; its group is '[a-z0-9]+': run 'sudo usermod -aG ", complaint);
        File.SetUnixFileMode(line.DevicePath, (UnixFileMode)0b110_110_110);
        await LineWithAsync(service, $"static: {line.DevicePath} is open at 115200 baud");
        service.Kill();
    }

    [RunAsNobodyFact]
    public async Task Check_OfAForbiddenDevice_TellsHowToMendIt()
    {
        using var line = new PseudoTerminal();
        File.SetUnixFileMode(line.DevicePath, UnixFileMode.UserRead | UnixFileMode.UserWrite);
        using var check = Start(line.DevicePath, "check", "--port", "static", "--seconds", "1");
        var output = await check.StandardOutput.ReadToEndAsync();
        await check.WaitForExitAsync();
        Assert.Equal(ExitStatus.InputOutput, check.ExitCode);
        Assert.Contains("run 'sudo usermod -aG ", output, StringComparison.Ordinal);
    }

    private Process Start(string device, string command, params string[] options)
    {
        var settings = Path.Combine(_folder.FullName, "settings.json");
        File.WriteAllText(settings, $$"""
            { "glider": "marram-15.json", "ports": [ { "name": "static", "device": "{{device}}" } ], "recorder": { "active": "off" } }
            """);
        File.SetUnixFileMode(_folder.FullName, (UnixFileMode)0b111_101_101);
        var start = new ProcessStartInfo("setpriv", ["--reuid", Nobody, "--regid", Nobody, "--clear-groups", Environment.ProcessPath!,
            Path.Combine(AppContext.BaseDirectory, "speedcommand.dll"), command, "--settings", settings, .. options])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        start.Environment["HOME"] = _folder.FullName;
        return Process.Start(start)!;
    }

    private static async Task<string> LineWithAsync(Process process, string text)
    {
        using var limit = new CancellationTokenSource(TimeSpan.FromSeconds(30));
        while (await process.StandardError.ReadLineAsync(limit.Token) is { } line)
        {
            if (line.Contains(text, StringComparison.Ordinal))
            {
                return line;
            }
        }

        throw new InvalidOperationException($"the service ended without '{text}'");
    }
}
