using System.Net;
using System.Net.Sockets;
using System.Text;
using System.Text.RegularExpressions;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Tests.Controls;
using SpeedCommand.Web;

namespace SpeedCommand.Tests.Web;

/// <summary>Changes of controls by the web: what is done, what is refused, and that another site's page comes to nothing.</summary>
public sealed class SetRequestTests : IAsyncLifetime, IDisposable
{
    private readonly HttpClient _http = new();
    private ServedPage _page = null!;

    public async Task InitializeAsync()
    {
        _page = await ServedPage.StartAsync(maySet: true);
        _http.BaseAddress = _page.Address;
    }

    public async Task DisposeAsync() => await _page.DisposeAsync();

    public void Dispose() => _http.Dispose();

    private async Task<(int Status, string Text)> SetAsync(string line, Action<HttpRequestMessage>? change = null)
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, "/set") { Content = new StringContent(line) };
        request.Headers.Add("X-SpeedCommand", "set");
        change?.Invoke(request);
        using var answer = await _http.SendAsync(request);
        Assert.False(answer.Headers.Contains("Access-Control-Allow-Origin"));
        return ((int)answer.StatusCode, (await answer.Content.ReadAsStringAsync()).TrimEnd('\n'));
    }

    [Fact]
    public async Task EveryControl_IsSet_OrRefusedInOneLine()
    {
        (string Line, int Status, string Text)[] rows =
        [
            ("expected-climb 1.5 m/s", 200, "expected-climb 1.5 m/s"),
            ("expected-climb +\r\n", 200, "expected-climb 2 m/s"),
            ("expected-climb", 200, "expected-climb 2 m/s"),
            ("expected-climb 16 m/s", 422, "expected-climb: expected 0 to 15 m/s, found '16 m/s'"),
            ("ballast 60 l", 200, "ballast 60 kg"),
            ("ballast dump", 200, "ballast 60 kg dump 0.7 kg/s"),
            ("ballast -1 kg", 422, "ballast: expected 0 to 600 kg, found '-1 kg'"),
            ("bugs 10 %", 200, "bugs 10 %"),
            ("bugs 101 %", 422, "bugs: expected 0 to 100 %, found '101 %'"),
            ("phase gliding", 200, "phase gliding"),
            ("phase up", 422, "phase: expected auto, climbing, gliding, + or -, found 'up'"),
            ("qnh 1021 hPa", 200, "qnh 1021 hPa"),
            ("qnh 30 hPa", 422, "qnh: expected 870 to 1090 hPa, found '30 hPa'"),
            ("brightness -", 200, "brightness 90 %"),
            ("brightness 200 %", 422, "brightness: expected 0 to 100 %, found '200 %'"),
            ("volume 0 %", 200, "volume 0 %"),
            ("volume loud", 422, "volume: expected a number with a unit (%), + or -, found 'loud'"),
            ("mute on", 200, "mute on"),
            ("mute 1", 422, "mute: expected off, on, + or -, found '1'"),
            ("", 422, "expected one of expected-climb, ballast, bugs, phase, qnh, brightness, volume, mute, found ''"),
            ("bugs 1 %\nbugs 2 %", 422, "bugs: expected a number with a unit (%), + or -, found '1 %?bugs 2 %'"),
            ("mute \0ä", 422, "mute: expected off, on, + or -, found '???'"),
        ];
        foreach (var (line, status, text) in rows)
        {
            Assert.Equal((status, text), await SetAsync(line));
        }

        Assert.Equal((2, 0.1, 102_100, true), (_page.Controls.ExpectedClimbMps, _page.Controls.BugsFraction, _page.Controls.QnhPa, _page.Controls.IsMuted));
    }

    [Theory]
    [InlineData("[::1]:1", null, 200)]
    [InlineData("LOCALHOST:8080", "http://localhost:8080", 200)]
    [InlineData("192.168.4.1", "http://192.168.4.1", 200)]
    [InlineData("192.168.4.1", "http://192.168.4.1:80", 403)]
    [InlineData("192.168.4.1", "https://192.168.4.1", 403)]
    [InlineData("192.168.4.1", "http://evil.example", 403)]
    [InlineData("192.168.4.1", "null", 403)]
    [InlineData("evil.example", "http://evil.example", 403)]
    [InlineData("evil.example", null, 403)]
    [InlineData("localhost.evil.example", null, 403)]
    [InlineData("127.0.0.1.evil.example", null, 403)]
    [InlineData("cockpit.local", "http://cockpit.local", 200)]
    [InlineData("cockpit.local.evil.example", null, 403)]
    public async Task PageOfAnotherSite_ChangesNothing(string host, string? origin, int status)
    {
        var answer = await SetAsync("bugs 10 %", request =>
        {
            request.Headers.Host = host;
            request.Headers.Add("Origin", origin is null ? [] : [origin]);
        });
        Assert.Equal((status, status == 200 ? 0.1 : 0), (answer.Status, _page.Controls.BugsFraction));
    }

    [Fact]
    public async Task WithoutOurHeader_OrByAnotherMethod_NothingIsChanged()
    {
        Assert.Equal((403, "expected the header X-SpeedCommand: set, found none"), await SetAsync("bugs 10 %", request => request.Headers.Remove("X-SpeedCommand")));
        Assert.Equal(403, (await SetAsync("bugs 10 %", request => request.Headers.Add("X-SpeedCommand", "set"))).Status);
        // The question that a browser asks before a foreign page may send a header of its own (WHATWG Fetch, CORS preflight).
        foreach (var method in (string[])["OPTIONS", "GET", "PUT"])
        {
            using var request = new HttpRequestMessage(new HttpMethod(method), "/set");
            request.Headers.Add("X-SpeedCommand", "set");
            using var answer = await _http.SendAsync(request);
            Assert.Equal(HttpStatusCode.MethodNotAllowed, answer.StatusCode);
            Assert.Equal(["POST"], answer.Content.Headers.Allow);
        }

        Assert.Equal(0, _page.Controls.BugsFraction);
    }

    [Fact]
    public async Task BodyOfAHundredBytes_IsRead_AndOneMoreIsRefused()
    {
        var line = "bugs 10 %".PadRight(SetRequests.MaxBytes);
        Assert.Equal((200, "bugs 10 %"), await SetAsync(line));
        Assert.Equal((413, "expected at most 100 bytes, found more"), await SetAsync(line + " "));
        Assert.Equal(413, (await SetAsync(line + " ", request => request.Headers.TransferEncodingChunked = true)).Status);
    }

    [Theory]
    [InlineData("Content-Length: 9\r\n\r\nbugs")]
    [InlineData("Transfer-Encoding: chunked\r\n\r\n4\r\nbugs\r\n")]
    public async Task LineThatNeverEnds_IsDropped(string rest)
    {
        using var client = new TcpClient();
        await client.ConnectAsync(IPAddress.Loopback, _page.Address.Port);
        await client.GetStream().WriteAsync(Encoding.ASCII.GetBytes($"POST /set HTTP/1.1\r\nHost: 127.0.0.1\r\nX-SpeedCommand: set\r\n{rest}"));
        // Without an answer, however it ends; a server that waited for the rest would not come to this end.
        try
        {
            Assert.Equal(0, await client.GetStream().ReadAsync(new byte[100]));
        }
        catch (IOException)
        {
            // Cut off.
        }

        Assert.Equal((200, "bugs 0 %"), await SetAsync("bugs"));
    }

    [Fact]
    public async Task TouchesWithoutEnd_AreBounded()
    {
        var answers = new List<int>();
        for (var i = 0; i <= SpeedCommand.Controls.ControlDesk.MaxChangesPerSecond; i++)
        {
            answers.Add((await SetAsync(i % 2 == 0 ? "bugs +" : "bugs -")).Status);
        }

        Assert.Equal(422, answers[^1]);
        Assert.All(answers[..^1], status => Assert.Equal(200, status));
    }

    [Fact]
    public void EveryButtonOfThePage_IsUnderstood_AndEveryControlButTheLampsHasOne()
    {
        var page = Encoding.UTF8.GetString(PageFile.ReadAll()["/"].Bytes);
        var control = "";
        var touched = new List<string>();
        foreach (Match match in Regex.Matches(page, "<(div class=\"control\"|button) data-(?:name=\"([\\w-]+)\")?(?: data-)?(?:value=\"([^\"]+)\")?"))
        {
            if (match.Groups[1].Value != "button")
            {
                control = match.Groups[2].Value;
                continue;
            }

            var name = match.Groups[2].Success ? match.Groups[2].Value : control;
            using var desk = new TestDesk(ballastKg: 80);
            desk.Say("bugs 50 %");
            desk.Say("expected-climb 2 m/s");
            Assert.StartsWith($"ok {name} ", desk.Say($"{name} {match.Groups[3].Value}"), StringComparison.Ordinal);
            touched.Add(name);
        }

        Assert.Equal(18, touched.Count);
        Assert.Equal(ControlCatalogue.All.Select(spec => spec.Name).Except(["brightness"]), touched.Distinct().OrderBy(name => ControlCatalogue.Find(name)!.Id));
    }
}
