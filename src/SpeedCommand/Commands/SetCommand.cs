using System.CommandLine;
using System.Net.Sockets;
using SpeedCommand.Controls;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Settings;

namespace SpeedCommand.Commands;

/// <summary>speedcommand set: a control of the running service, through its socket.</summary>
internal static class SetCommand
{
    public static Command Create()
    {
        var name = new Argument<string?>("NAME") { Description = "The control; without it, all are listed.", Arity = ArgumentArity.ZeroOrOne };
        var value = new Argument<string[]>("VALUE") { Description = "What it is to be: \"1.5 m/s\", +, -, auto; without it, what it is.", Arity = ArgumentArity.ZeroOrMore };
        var settings = SettingsOptions.File();
        var with = SettingsOptions.With();
        var command = new Command("set", "List the controls of the running service, or change one.") { name, value, settings, with };
        command.SetAction(parsed => Run(
            parsed.GetValue(name), string.Join(' ', parsed.GetValue(value) ?? []), parsed.GetValue(settings), parsed.GetValue(with)));
        return command;
    }

    private static int Run(string? name, string value, FileInfo? settingsFile, string[]? with)
    {
        // What no service could understand needs none to say so.
        if (name is not null && (value.Length > 0 || ControlCatalogue.Find(name) is null) && !ControlText.TryRead(name, value, out _, out var problem))
        {
            return Fail(ExitStatus.Usage, problem);
        }

        if (!SettingsOptions.TryOpen(settingsFile, with, out var source, out var exitStatus))
        {
            return exitStatus;
        }

        var path = ControlSettingsReader.ReadSocket(source);
        SettingsOptions.Tell(source);
        if (path is null)
        {
            return source.HasErrors ? ExitStatus.BadSettings : Fail(ExitStatus.NoInput, "controls.socket: expected the path of the service's socket, found 'off'");
        }

        try
        {
            using var client = new ControlClient(path);
            return name is null ? List(client) : Ask(client, $"{name} {value}");
        }
        catch (SocketException fault)
        {
            return fault.SocketErrorCode is SocketError.ConnectionRefused or SocketError.AddressNotAvailable or SocketError.HostNotFound || !Path.Exists(path)
                ? Fail(ExitStatus.NoInput, $"{path}: expected a running service, found none")
                : Fail(ExitStatus.InputOutput, $"{path}: {fault.Message}");
        }
    }

    private static int Ask(ControlClient client, string line)
    {
        if (!client.Ask(line, out var message))
        {
            return Fail(ExitStatus.Usage, message);
        }

        Console.WriteLine(message);
        return ExitStatus.Done;
    }

    private static int List(ControlClient client)
    {
        Console.WriteLine($"{"control",-15} {"now",-26} {"values",-24} meaning");
        foreach (var spec in ControlCatalogue.All)
        {
            var isKnown = client.Ask(spec.Name, out var message);
            var now = isKnown ? message[(spec.Name.Length + 1)..] : message;
            Console.WriteLine($"{spec.Name,-15} {now,-26} {spec.Range,-24} {spec.Meaning.Replace("`", "", StringComparison.Ordinal)}");
        }

        return ExitStatus.Done;
    }

    private static int Fail(int exitStatus, string message)
    {
        Console.Error.WriteLine(message);
        return exitStatus;
    }
}
