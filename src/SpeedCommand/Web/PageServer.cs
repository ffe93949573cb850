using System.Net;
using System.Net.Sockets;
using Microsoft.AspNetCore.Hosting.Server.Features;
using Microsoft.AspNetCore.Http;
using Microsoft.AspNetCore.Server.Kestrel.Core;
using Microsoft.AspNetCore.Server.Kestrel.Transport.Sockets;
using Microsoft.Extensions.Logging;
using Microsoft.Extensions.Options;

namespace SpeedCommand.Web;

/// <summary>
/// The web server bare: no second host, no routing, no configuration of its own. Made only when the page is wanted, so a service without it
/// never loads any of this.
/// </summary>
internal sealed class PageServer : IDisposable
{
    /// <summary>What the kernel holds for a browser that does not read, bytes: some twenty frames.</summary>
    private const int SendBufferBytes = 32_768;

    /// <summary>What this program holds for it.</summary>
    private const int ResponseBufferBytes = 16_384;

    private readonly KestrelServer _server;

    public PageServer(IPAddress address, int port, ILoggerFactory logs)
    {
        var options = new KestrelServerOptions { AddServerHeader = false };
        SetLimits(options.Limits);
        options.Listen(address, port, listen => listen.Protocols = HttpProtocols.Http1);
        var sockets = new SocketTransportOptions
        {
            Backlog = PageHub.MaxClients,
            CreateBoundListenSocket = endpoint =>
            {
                var socket = SocketTransportOptions.CreateDefaultBoundListenSocket(endpoint);
                // A connection inherits this from the socket that listens.
                socket.SendBufferSize = SendBufferBytes;
                return socket;
            },
        };
        _server = new KestrelServer(Options.Create(options), new SocketTransportFactory(Options.Create(sockets), logs), logs);
    }

    /// <summary>Where it listens, once started.</summary>
    public string Address => _server.Features.Get<IServerAddressesFeature>()!.Addresses.First();

    /// <summary>Begins to listen.</summary>
    /// <exception cref="IOException">The address or port cannot be used.</exception>
    public async Task StartAsync(PageApplication application, CancellationToken cancel)
    {
        try
        {
            await _server.StartAsync<HttpContext>(application, cancel).ConfigureAwait(false);
        }
        catch (SocketException fault)
        {
            throw new IOException(fault.Message, fault);
        }
    }

    public Task StopAsync(CancellationToken cancel) => _server.StopAsync(cancel);

    public void Dispose() => _server.Dispose();

    /// <summary>The requests of a browser for this page are small; what is larger, slower or more is none.</summary>
    private static void SetLimits(KestrelServerLimits limits)
    {
        limits.MaxConcurrentConnections = 2 * PageHub.MaxClients;
        limits.MaxRequestLineSize = 1024;
        limits.MaxRequestHeaderCount = 50;
        limits.MaxRequestHeadersTotalSize = 8192;
        limits.MaxRequestBufferSize = 16_384;
        limits.MaxRequestBodySize = 0;
        limits.MaxResponseBufferSize = ResponseBufferBytes;
        limits.RequestHeadersTimeout = TimeSpan.FromSeconds(5);
        limits.KeepAliveTimeout = TimeSpan.FromSeconds(30);
    }
}
