using System.Diagnostics;

namespace SpeedCommand.House.Tests.DocumentCommands;

/// <summary>A copy of the repository to run commands in, with stand-ins for the programs they name and a home of its own.</summary>
public sealed class ScratchCopy : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(2);

    private readonly string _folder = Directory.CreateTempSubdirectory("speedcommand-documents-").FullName;

    public ScratchCopy()
    {
        foreach (var file in Repository.Files)
        {
            var copy = Path.Combine(Root, file);
            Directory.CreateDirectory(Path.GetDirectoryName(copy)!);
            File.Copy(Repository.PathOf(file), copy);
        }

        Directory.CreateDirectory(Home);
        Directory.CreateDirectory(StandIns);
        foreach (var name in new[] { "dotnet", "speedcommand", "speedcommand-desk" })
        {
            File.Copy(Path.Combine(AppContext.BaseDirectory, "DocumentCommands", "stand-in.sh"), Path.Combine(StandIns, name));
            MakeRunnable(Path.Combine(StandIns, name));
        }

        // The real one runs these tests again.
        File.WriteAllText(Path.Combine(Root, ".ci", "run"), "#!/bin/sh\nexit 0\n");
    }

    private string Root => Path.Combine(_folder, "repository");

    private string Home => Path.Combine(_folder, "home");

    private string StandIns => Path.Combine(_folder, "stand-ins");

    /// <summary>Runs a script with bash, stopping at the first command that fails.</summary>
    /// <returns>The exit status and everything printed.</returns>
    public (int ExitStatus, string Printed) Run(string script)
    {
        var path = Path.Combine(_folder, "block.sh");
        File.WriteAllText(path, "set -euo pipefail\nexec 2>&1\n" + script + "\n");
        var start = new ProcessStartInfo("bash", [path])
        {
            WorkingDirectory = Root,
            RedirectStandardOutput = true,
            RedirectStandardInput = true,
        };
        SetEnvironment(start.Environment);
        using var bash = Process.Start(start)!;
        bash.StandardInput.Close();
        var printed = bash.StandardOutput.ReadToEndAsync();
        if (!bash.WaitForExit(Patience))
        {
            bash.Kill(entireProcessTree: true);
            return (-1, $"did not end within {Patience}");
        }

        return (bash.ExitCode, printed.GetAwaiter().GetResult());
    }

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    private void SetEnvironment(IDictionary<string, string?> environment)
    {
        foreach (var name in environment.Keys.Where(name => name.StartsWith("SPEEDCOMMAND_", StringComparison.Ordinal)
            || name.StartsWith("XDG_", StringComparison.Ordinal)).ToList())
        {
            environment.Remove(name);
        }

        environment["HOME"] = Home;
        environment["TERM"] = "dumb";
        environment["REAL_DOTNET"] = Which("dotnet");
        environment["BUILT_REPOSITORY"] = Repository.Root;
        environment["BUILT_CONFIGURATION"] = Repository.Configuration;
        environment["PATH"] = StandIns + Path.PathSeparator + environment["PATH"];
    }

    private static string Which(string program) => Environment.GetEnvironmentVariable("PATH")!.Split(Path.PathSeparator)
        .Select(folder => Path.Combine(folder, program)).First(File.Exists);

    private static void MakeRunnable(string path) => File.SetUnixFileMode(path, File.GetUnixFileMode(path) | UnixFileMode.UserExecute);
}
