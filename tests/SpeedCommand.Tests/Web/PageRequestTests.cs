using System.Net;
using System.Net.Sockets;
using System.Text;
using SpeedCommand.Settings;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Web;

/// <summary>What the page's server answers, and to how many.</summary>
public sealed class PageRequestTests : IAsyncLifetime, IDisposable
{
    // A stream that is let go is not to be read to an end that never comes.
    private readonly HttpClient _http = new(new SocketsHttpHandler { ResponseDrainTimeout = TimeSpan.Zero });
    private ServedPage _page = null!;

    public async Task InitializeAsync()
    {
        _page = await ServedPage.StartAsync();
        _http.BaseAddress = _page.Address;
    }

    public async Task DisposeAsync() => await _page.DisposeAsync();

    public void Dispose() => _http.Dispose();

    private async Task<string> AskRawAsync(string request)
    {
        using var client = new TcpClient();
        await client.ConnectAsync(IPAddress.Loopback, _page.Address.Port);
        await client.GetStream().WriteAsync(Encoding.ASCII.GetBytes(request));
        using var reader = new StreamReader(client.GetStream(), Encoding.ASCII);
        var answer = await reader.ReadLineAsync();
        // Every refusal ends the connection; a server that waited for a body would not come to this end.
        await ReadToEndAsync(reader);
        return answer ?? "nothing";
    }

    [Theory]
    [InlineData("/", "text/html")]
    [InlineData("/page.css", "text/css")]
    [InlineData("/page.js", "text/javascript")]
    [InlineData("/set.js", "text/javascript")]
    public async Task OwnFiles_AreServed_WithHeadersThatForbidTheOutside(string path, string type)
    {
        using var answer = await _http.GetAsync(path);
        Assert.Equal((HttpStatusCode.OK, type), (answer.StatusCode, answer.Content.Headers.ContentType!.MediaType));
        Assert.StartsWith("default-src 'none'; script-src 'self'; ", answer.Headers.GetValues("Content-Security-Policy").Single(), StringComparison.Ordinal);
        Assert.Equal("nosniff", answer.Headers.GetValues("X-Content-Type-Options").Single());
        Assert.False(answer.Headers.Contains("Server"));
        // No address of another place stands in the page, with a scheme or without.
        Assert.DoesNotMatch("://|[\"'(]//", await answer.Content.ReadAsStringAsync());
    }

    [Theory]
    [InlineData("GET /favicon.ico HTTP/1.1\r\nHost: x\r\n\r\n", 404)]
    [InlineData("GET /../page.css/ HTTP/1.1\r\nHost: x\r\n\r\n", 404)]
    [InlineData("GET /Page.css HTTP/1.1\r\nHost: x\r\n\r\n", 404)]
    [InlineData("GET / HTTP/1.1\r\nHost: evil.example\r\n\r\n", 403)]
    [InlineData("GET /events HTTP/1.1\r\nHost: 127.0.0.1.evil.example:8080\r\n\r\n", 403)]
    [InlineData("HEAD / HTTP/1.1\r\nHost: x\r\n\r\n", 405)]
    [InlineData("PUT /nothing HTTP/1.1\r\nHost: x\r\nContent-Length: 9\r\n\r\n", 404)]
    [InlineData("POST / HTTP/1.1\r\nHost: x\r\nContent-Length: 1000000000\r\n\r\n", 405)]
    [InlineData("POST /events HTTP/1.1\r\nHost: x\r\nTransfer-Encoding: chunked\r\n\r\n", 405)]
    [InlineData("GET / HTTP/1.1\r\nHost: x\r\nContent-Length: 5\r\n\r\n", 413)]
    [InlineData("POST /set HTTP/1.1\r\nHost: localhost\r\nX-SpeedCommand: set\r\nContent-Length: 9\r\n\r\nbugs 10 %", 404)]
    [InlineData("nonsense\r\n\r\n", 400)]
    public async Task AnythingElse_IsRefused_WithoutWaitingForABody(string request, int status) =>
        Assert.StartsWith($"HTTP/1.1 {status} ", await AskRawAsync(request), StringComparison.Ordinal);

    [Fact]
    public async Task EndlessHeaders_AreRefused()
    {
        Assert.StartsWith("HTTP/1.1 431 ", await AskRawAsync($"GET / HTTP/1.1\r\nHost: x\r\nX: {new string('a', 9000)}\r\n\r\n"), StringComparison.Ordinal);
        Assert.StartsWith("HTTP/1.1 414 ", await AskRawAsync($"GET /{new string('a', 2000)} HTTP/1.1\r\nHost: x\r\n\r\n"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task FiftyBrowsers_AllGetFrames_AndOneMoreIsSentAway()
    {
        var readers = await Task.WhenAll(Enumerable.Range(0, PageHub.MaxClients).Select(_ => OpenEventsAsync()));
        Assert.Equal(PageHub.MaxClients, _page.Hub.ClientCount);
        using var refused = await _http.GetAsync("/events", HttpCompletionOption.ResponseHeadersRead);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, refused.StatusCode);
        // Two frames: the stream goes on.
        for (var i = 0; i < 2; i++)
        {
            _page.Hub.Publish("data: frame\n\n"u8.ToArray());
            await Task.WhenAll(readers.Select(NextFrameAsync));
        }

        readers[0].Dispose();
        await Eventually.HoldsAsync(() => _page.Hub.ClientCount == PageHub.MaxClients - 1, "a browser that went is forgotten");
        Array.ForEach(readers, reader => reader.Dispose());
        await Eventually.HoldsAsync(() => _page.Hub.ClientCount == 0, "all are forgotten");
    }

    [Fact]
    public async Task BrowserThatNeverReads_IsLetGo_AndDelaysNobody()
    {
        using var deaf = new Socket(SocketType.Stream, ProtocolType.Tcp) { ReceiveBufferSize = 4096 };
        await deaf.ConnectAsync(IPAddress.Loopback, _page.Address.Port);
        await deaf.SendAsync("GET /events HTTP/1.1\r\nHost: x\r\n\r\n"u8.ToArray());
        using var good = await OpenEventsAsync();
        await Eventually.HoldsAsync(() => _page.Hub.ClientCount == 2, "both watch");
        var reading = ReadToEndAsync(good);
        // Frames faster than life, with room for the one that reads to take them; each is as large as a real one.
        var sent = 0;
        for (; _page.Hub.ClientCount == 2 && sent < 5000; sent++)
        {
            _page.Hub.Publish(Encoding.ASCII.GetBytes("data: " + new string('x', 2048) + "\n\n"));
            await Task.Delay(1);
        }

        await Eventually.HoldsAsync(() => _page.Hub.ClientCount == 1, "the deaf one is let go");
        // Its 32 KiB twice in the kernel, as Linux counts them, 16 KiB here, and 25 frames of patience: two hundred kilobytes at the very most.
        Assert.InRange(sent, 25, 100);
        Assert.False(reading.IsCompleted);
        await _page.StopServiceAsync();
        await reading;
    }

    [Fact]
    public async Task ServiceThatStops_EndsTheStream()
    {
        using var reader = await OpenEventsAsync();
        await _page.StopServiceAsync();
        await ReadToEndAsync(reader);
        await Assert.ThrowsAsync<HttpRequestException>(() => _http.GetAsync("/"));
    }

    [Fact]
    public void PageIsOff_UnlessAskedFor()
    {
        Assert.False(WebSettings.Standard.IsOn);
        Assert.True(IPAddress.IsLoopback(WebSettings.Standard.Address));
        Assert.False(WebSettings.Standard.MaySet);
    }

    private async Task<StreamReader> OpenEventsAsync()
    {
        var answer = await _http.GetAsync("/events", HttpCompletionOption.ResponseHeadersRead);
        Assert.Equal("text/event-stream", answer.Content.Headers.ContentType!.MediaType);
        return new StreamReader(await answer.Content.ReadAsStreamAsync());
    }

    /// <summary>However it ends: a connection that is cut ends as well.</summary>
    private static async Task ReadToEndAsync(StreamReader reader)
    {
        try
        {
            while (await reader.ReadLineAsync() is not null)
            {
            }
        }
        catch (IOException)
        {
            // Cut off.
        }
    }

    private static async Task NextFrameAsync(StreamReader reader)
    {
        string? line;
        do
        {
            line = await reader.ReadLineAsync();
            Assert.NotNull(line);
        }
        while (!line.StartsWith("data: ", StringComparison.Ordinal));
    }
}
