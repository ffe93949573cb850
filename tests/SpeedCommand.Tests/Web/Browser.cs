using System.Diagnostics;
using System.Net.WebSockets;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;

namespace SpeedCommand.Tests.Web;

/// <summary>
/// A headless Chromium with one page, driven by the DevTools protocol over a web socket (Target, Page, Runtime and Emulation, from
/// memory): one question at a time, events passed over.
/// </summary>
public sealed class Browser : IAsyncLifetime, IDisposable
{
    public const string Program = "chromium";

    private readonly DirectoryInfo _profile = Directory.CreateTempSubdirectory();
    private readonly ClientWebSocket _socket = new();
    private readonly byte[] _buffer = new byte[1 << 16];
    private Process? _process;
    private string _session = "";
    private int _count;

    public async Task InitializeAsync()
    {
        if (ToolFactAttribute.Find(Program) is null)
        {
            return;
        }

        _process = Process.Start(new ProcessStartInfo(Program,
        [
            "--headless=new", "--no-sandbox", "--disable-gpu", "--disable-background-networking", "--no-first-run", "--hide-scrollbars",
            "--remote-debugging-port=0", $"--user-data-dir={_profile.FullName}", "about:blank",
        ])
        { RedirectStandardError = true, RedirectStandardOutput = true })!;
        _process.BeginErrorReadLine();
        _process.BeginOutputReadLine();
        // The browser writes its port and the path of its socket there.
        var port = Path.Combine(_profile.FullName, "DevToolsActivePort");
        await Eventually.HoldsAsync(() => File.Exists(port) && File.ReadAllLines(port).Length > 1, "the browser listens");
        var lines = await File.ReadAllLinesAsync(port);
        await _socket.ConnectAsync(new Uri($"ws://127.0.0.1:{lines[0]}{lines[1]}"), CancellationToken.None);
        var target = await AskAsync("Target.createTarget", new JsonObject { ["url"] = "about:blank" });
        var session = await AskAsync("Target.attachToTarget", new JsonObject { ["targetId"] = target.GetProperty("targetId").GetString(), ["flatten"] = true });
        _session = session.GetProperty("sessionId").GetString()!;
    }

    public async Task DisposeAsync()
    {
        if (_process is not null)
        {
            await AskAsync("Browser.close", []);
            await _process.WaitForExitAsync();
            _process.Dispose();
        }

        _profile.Delete(recursive: true);
    }

    public void Dispose() => _socket.Dispose();

    public Task OpenAsync(Uri address) => AskAsync("Page.navigate", new JsonObject { ["url"] = address.ToString() });

    public async Task SetScreenAsync(int width, int height, bool isBright)
    {
        await AskAsync("Emulation.setDeviceMetricsOverride",
            new JsonObject { ["width"] = width, ["height"] = height, ["deviceScaleFactor"] = 1, ["mobile"] = false });
        var look = new JsonObject { ["name"] = "prefers-color-scheme", ["value"] = isBright ? "light" : "dark" };
        await AskAsync("Emulation.setEmulatedMedia", new JsonObject { ["features"] = new JsonArray(look) });
    }

    /// <summary>The value of an expression in the page, as JSON.</summary>
    public async Task<JsonElement> EvaluateAsync(string expression)
    {
        var answer = await AskAsync("Runtime.evaluate", new JsonObject { ["expression"] = expression, ["returnByValue"] = true, ["awaitPromise"] = true });
        Assert.False(answer.TryGetProperty("exceptionDetails", out var fault), fault.ToString());
        return answer.GetProperty("result").TryGetProperty("value", out var value) ? value : default;
    }

    public async Task<string> TextAsync(string id) => (await EvaluateAsync($"document.getElementById('{id}').textContent")).GetString()!;

    public async Task WaitForAsync(string condition)
    {
        for (var i = 0; i < 1000; i++)
        {
            if ((await EvaluateAsync($"Boolean({condition})")).GetBoolean())
            {
                return;
            }

            await Task.Delay(20);
        }

        throw new TimeoutException($"twenty seconds went by and still not: {condition}");
    }

    public async Task<byte[]> PhotographAsync() =>
        (await AskAsync("Page.captureScreenshot", new JsonObject { ["format"] = "png" })).GetProperty("data").GetBytesFromBase64();

    private async Task<JsonElement> AskAsync(string method, JsonObject parameters)
    {
        var id = ++_count;
        var question = new JsonObject { ["id"] = id, ["method"] = method, ["params"] = parameters };
        if (_session.Length > 0 && !method.StartsWith("Browser.", StringComparison.Ordinal))
        {
            question["sessionId"] = _session;
        }

        await _socket.SendAsync(Encoding.UTF8.GetBytes(question.ToJsonString()), WebSocketMessageType.Text, true, CancellationToken.None);
        while (true)
        {
            var message = await ReceiveAsync();
            if (message.TryGetProperty("id", out var answered) && answered.GetInt32() == id)
            {
                return message.TryGetProperty("result", out var result) ? result : throw new InvalidOperationException($"{method}: {message}");
            }
        }
    }

    private async Task<JsonElement> ReceiveAsync()
    {
        using var message = new MemoryStream();
        WebSocketReceiveResult part;
        do
        {
            part = await _socket.ReceiveAsync(_buffer, CancellationToken.None);
            message.Write(_buffer, 0, part.Count);
        }
        while (!part.EndOfMessage);
        return JsonDocument.Parse(message.ToArray()).RootElement;
    }
}
