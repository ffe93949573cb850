using System.Net.Sockets;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;

namespace SpeedCommand.Controls;

/// <summary>
/// The local socket that "speedcommand set" and scripts speak to: the line protocol, for the service's own user only. Each client has
/// a task and a little memory of its own; one that does not read is dropped, and none delays another.
/// </summary>
internal sealed class ControlSocketService(string path, ControlDesk desk, TimeProvider time, ILogger<ControlSocketService> log) : BackgroundService
{
    /// <summary>A person, a page and some scripts; more is a script gone wrong.</summary>
    public const int MaxClients = 8;

    /// <summary>A client that says nothing for so long has gone home.</summary>
    private static readonly TimeSpan IdleLimit = TimeSpan.FromMinutes(10);

    /// <summary>An answer that is not taken within this is not wanted.</summary>
    private static readonly TimeSpan SendLimit = TimeSpan.FromSeconds(1);

    private readonly Lock _gate = new();
    private Socket? _listener;
    private int _clients;

    /// <summary>Opens the socket before anything else runs, so that whoever was told that the service is up can speak to it.</summary>
    public override Task StartAsync(CancellationToken cancellationToken)
    {
        try
        {
            _listener = Listen();
            log.LogInformation("controls are taken at {Path}", path);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or SocketException)
        {
            log.LogWarning("{Path}: no controls are taken there: {Cause}", path, fault.Message);
        }

        return base.StartAsync(cancellationToken);
    }

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        await Task.Yield();
        if (_listener is not { } listener)
        {
            return;
        }

        try
        {
            while (!stoppingToken.IsCancellationRequested)
            {
                _ = ServeAsync(await listener.AcceptAsync(stoppingToken).ConfigureAwait(false), stoppingToken);
            }
        }
        catch (OperationCanceledException)
        {
            // The service stops.
        }
        catch (SocketException fault)
        {
            log.LogError("{Path}: no more controls are taken there: {Cause}", path, fault.Message);
        }
        finally
        {
            listener.Dispose();
            File.Delete(path);
        }
    }

    /// <summary>A socket that nobody listens at is left over from a service that was killed; one that answers belongs to another.</summary>
    private Socket Listen()
    {
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        if (Path.Exists(path))
        {
            // A socket has no length; somebody's file at a path that was mistyped is not ours to delete.
            if (Directory.Exists(path) || new FileInfo(path).Length > 0)
            {
                throw new IOException("expected a socket or nothing, found a file or a folder");
            }

            if (IsAnswered())
            {
                throw new IOException("expected a socket that is free, found one that another service answers at");
            }

            File.Delete(path);
        }

        var listener = new Socket(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified);
        try
        {
            listener.Bind(new UnixDomainSocketEndPoint(path));
            // Nobody can connect before the next call, so the file is never open to others.
            if (!OperatingSystem.IsWindows())
            {
                File.SetUnixFileMode(path, UnixFileMode.UserRead | UnixFileMode.UserWrite);
            }

            listener.Listen(MaxClients);
            return listener;
        }
        catch
        {
            listener.Dispose();
            throw;
        }
    }

    private bool IsAnswered()
    {
        using var probe = new Socket(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified);
        try
        {
            probe.Connect(new UnixDomainSocketEndPoint(path));
            return true;
        }
        catch (SocketException)
        {
            return false;
        }
    }

    private async Task ServeAsync(Socket client, CancellationToken stop)
    {
        using var socket = client;
        try
        {
            if (!TryEnter())
            {
                await SendAsync(client, $"{ControlLines.Refused}expected at most {MaxClients} clients at a time, found one more", stop).ConfigureAwait(false);
                return;
            }

            try
            {
                await ConverseAsync(client, stop).ConfigureAwait(false);
            }
            finally
            {
                Leave();
            }
        }
        catch (Exception fault) when (fault is SocketException or OperationCanceledException or ObjectDisposedException)
        {
            // The client hung up, fell silent, or does not read; or the service stops.
        }
    }

    private async Task ConverseAsync(Socket client, CancellationToken stop)
    {
        var lines = new ControlLines(desk, ControlSource.Socket);
        var buffer = new byte[256];
        var answers = new List<string>();
        while (true)
        {
            using var idle = new CancellationTokenSource(IdleLimit, time);
            using var either = CancellationTokenSource.CreateLinkedTokenSource(stop, idle.Token);
            var count = await client.ReceiveAsync(buffer, either.Token).ConfigureAwait(false);
            if (count == 0)
            {
                return;
            }

            lines.Push(buffer.AsSpan(0, count), answers.Add);
            foreach (var answer in answers)
            {
                await SendAsync(client, answer, stop).ConfigureAwait(false);
            }

            answers.Clear();
        }
    }

    private async Task SendAsync(Socket client, string answer, CancellationToken stop)
    {
        using var limit = new CancellationTokenSource(SendLimit, time);
        using var either = CancellationTokenSource.CreateLinkedTokenSource(stop, limit.Token);
        ReadOnlyMemory<byte> left = ControlLines.Encode(answer);
        while (!left.IsEmpty)
        {
            left = left[await client.SendAsync(left, either.Token).ConfigureAwait(false)..];
        }
    }

    private bool TryEnter()
    {
        lock (_gate)
        {
            return _clients < MaxClients && ++_clients > 0;
        }
    }

    private void Leave()
    {
        lock (_gate)
        {
            _clients--;
        }
    }
}
