using System.Text.Json;
using SpeedCommand.Displays.Tests;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Tests.Web;

/// <summary>The page as a browser shows it. SPEEDCOMMAND_WEB_PICTURES names a folder for photographs of every view.</summary>
[Collection(Live.LiveTests.Name)]
public sealed class BrowserTests(Browser browser) : IClassFixture<Browser>
{
    private static readonly string? PictureFolder = Environment.GetEnvironmentVariable("SPEEDCOMMAND_WEB_PICTURES");

    /// <summary>Every element with text of its own that can be seen: text, colours, size, place.</summary>
    private const string TextsOnThePage = """
        [...document.querySelectorAll('body *')].filter(e => e.checkVisibility({ visibilityProperty: true })
            && [...e.childNodes].some(n => n.nodeType === 3 && n.data.trim())).map(e => {
          let behind = e;
          while (getComputedStyle(behind).backgroundColor === 'rgba(0, 0, 0, 0)') behind = behind.parentElement;
          const range = document.createRange();
          range.selectNodeContents(e);
          const box = range.getBoundingClientRect();
          return { text: e.textContent, id: e.id || e.className, colour: getComputedStyle(e).color, background: getComputedStyle(behind).backgroundColor,
            size: parseFloat(getComputedStyle(e).fontSize), left: box.left, top: box.top, right: box.right, bottom: box.bottom };
        })
        """;

    private const string LeastKey =
        "Math.min(1000, ...[...document.querySelectorAll('#set, .control button')].filter(e => e.checkVisibility()).flatMap(e => [e.offsetWidth, e.offsetHeight]))";

    private const string DoKeysFit =
        "Math.max(0, ...buttons.map(e => e.getBoundingClientRect().bottom)) <= document.getElementById('foot').getBoundingClientRect().top";

    private readonly List<string> _offences = [];
    private int _views;

    private static readonly (string Name, int Width, int Height)[] Screens =
        [("phone-upright", 360, 640), ("phone-lying", 640, 360), ("panel", 1024, 600)];

    [ToolFact(Browser.Program)]
    public async Task Page_ShowsEveryState_OnEveryScreen_InBothLooks_ThenBlanksByItself()
    {
        await using var page = await ServedPage.StartAsync(maySet: true);
        page.Shown = Pictures.GlidingTooSlow;
        await browser.SetScreenAsync(360, 640, isBright: false);
        await browser.OpenAsync(page.Address);
        await browser.WaitForAsync("document.getElementById('speed') && document.getElementById('speed').textContent === '120'");
        // The caution is over everything, and goes by itself.
        Assert.False((await browser.EvaluateAsync("document.getElementById('caution').hidden")).GetBoolean());
        await LookAsync("caution", isCaution: true);
        await browser.WaitForAsync("document.getElementById('caution').hidden");

        foreach (var name in Pictures.Names)
        {
            page.Shown = Pictures.Named(name);
            await browser.WaitForAsync($"document.getElementById('faults').textContent === '{Faults(page.Shown.Value)}' && {Shows(name)}");
            await LookAsync(name);
        }

        await SetAsync(page);
        page.Shown = Pictures.ClimbingTooFast;
        await browser.WaitForAsync("document.getElementById('speed').textContent === '88'");
        // What was under way for two seconds is not true any more.
        await browser.EvaluateAsync("events.onmessage = e => { const f = JSON.parse(e.data); f.at -= 2000; take(f); }");
        await browser.WaitForAsync("document.getElementById('speed').textContent === '--'");
        await LookAsync("stale");
        var numbers = await browser.EvaluateAsync("[...document.querySelectorAll('.number')].map(e => e.textContent).join('')");
        Assert.Equal(new string('-', 24), numbers.GetString());
        Assert.Contains("no data for", await browser.TextAsync("faults"), StringComparison.Ordinal);
        // A stream that says nothing more, and one that ends, are both noticed.
        await browser.EvaluateAsync("events.onmessage = e => take(JSON.parse(e.data))");
        await browser.WaitForAsync("document.getElementById('speed').textContent === '88'");
        await page.StopServiceAsync();
        await browser.WaitForAsync("document.getElementById('speed').textContent === '--'");
        Assert.True(_offences.Count == 0, string.Join('\n', _offences));
    }

    [ToolFact(Browser.Program)]
    public async Task LookButton_BeatsTheSystem()
    {
        await using var page = await ServedPage.StartAsync();
        await browser.SetScreenAsync(360, 640, isBright: true);
        await browser.OpenAsync(page.Address);
        const string Look = "document.documentElement.dataset.look";
        await browser.WaitForAsync($"document.getElementById('look') && {Look} === 'day'");
        await browser.EvaluateAsync("document.getElementById('look').click()");
        Assert.Equal("night", (await browser.EvaluateAsync(Look)).GetString());
        await browser.EvaluateAsync("localStorage.clear()");
    }

    /// <summary>The controls, opened, touched, refused, and left alone until they go.</summary>
    private async Task SetAsync(ServedPage page)
    {
        const string IsOpen = "getComputedStyle(document.getElementById('controls')).display === 'grid'";
        await browser.EvaluateAsync("document.getElementById('set').click()");
        // A machine in a hurry must not lose the view while it is looked at.
        await browser.EvaluateAsync("window.hand = setInterval(touch, 200)");
        await ClickAsync("expected-climb", "+");
        await ClickAsync("bugs", "-");
        await browser.WaitForAsync("document.getElementById('answer').textContent === \"! bugs: expected 0 to 100 %, found '-' at 0 %\"");
        Assert.Equal(0.5, page.Controls.ExpectedClimbMps);
        // The longest that a control can say, and the last change not long ago.
        page.Shown = Pictures.Doubtful with
        {
            Controls = ControlValues.Standard with
            {
                ExpectedClimbMps = 2.5,
                ExpectedClimbSigmaMps = 0.6,
                IsExpectedClimbAutomatic = true,
                BallastKg = 120,
                DumpKgPerS = 0.75,
                IsMuted = true,
                ForcedPhase = FlightPhase.Climbing,
                LastChanged = ControlId.ExpectedClimb,
                LastChangedUs = long.MaxValue / 2,
            },
        };
        await browser.WaitForAsync("document.getElementById('speed').textContent === '125~'");
        await LookAsync("set");
        await browser.WaitForAsync("document.getElementById('answer').textContent === 'expected climb auto 2.5 m/s ±0.6'");
        Assert.Equal(
            ["expected-climb auto", "ballast dump", "phase climbing", "mute on"],
            (await browser.EvaluateAsync("buttons.filter(one => one.ariaPressed === 'true').map(one => `${nameOf(one)} ${one.dataset.value}`)"))
            .EnumerateArray().Select(one => one.GetString()));
        await browser.EvaluateAsync($"clearInterval(hand), touchedAt -= SET_MS");
        await browser.WaitForAsync($"!({IsOpen})");
        await LookAsync("changed");
        Assert.Equal("expected climb auto 2.5 m/s ±0.6", await browser.TextAsync("moment"));
    }

    private Task<JsonElement> ClickAsync(string control, string value) =>
        browser.EvaluateAsync($"buttons.find(one => nameOf(one) === '{control}' && one.dataset.value === '{value}').click()");

    private static string Faults(CockpitPicture picture)
    {
        var words = FaultNames.All.Where(pair => (picture.Faults & pair.Key) != 0).Select(pair => Displays.Readings.FaultWords.Of(pair.Key)).ToList();
        var more = words.Count > 4 ? $", +{words.Count - 4} more" : "";
        return words.Count == 0 ? "no faults" : "! " + string.Join(", ", words.Take(4)) + more;
    }

    /// <summary>Sizes and words that a pilot must find, written out from docs/display.md.</summary>
    private static string Shows(string name) => name switch
    {
        "gliding-too-slow" => "document.getElementById('speed').textContent === '120' && document.getElementById('fasterWords').textContent === 'speed up 12 km/h' && !document.querySelector('.rise').checkVisibility() && document.querySelectorAll('#faster .lit').length === 3",
        "climbing-too-fast" => "document.getElementById('speed').textContent === '88' && document.getElementById('slowerWords').textContent === 'slow down 8 km/h' && document.querySelector('.rise').checkVisibility() && document.querySelectorAll('#slower .lit').length === 2",
        "rough-air-limit" => "document.getElementById('limit').textContent === 'not faster: rough-air limit' && document.getElementById('onWords').textContent === 'on speed'",
        "doubtful" => "document.getElementById('speed').textContent === '125~' && document.getElementById('sigma').textContent === 'roughly, ±8'",
        _ => "document.getElementById('speed').textContent === '--' && document.getElementById('onWords').textContent === '--'",
    };

    /// <summary>All screens and looks of what is shown now.</summary>
    private async Task LookAsync(string name, bool isCaution = false)
    {
        foreach (var (screen, width, height) in Screens)
        {
            // The looks take turns; only photographs are wanted of all.
            string[] looks = _views++ % 2 == 0 ? ["night", "day"] : ["day", "night"];
            foreach (var look in PictureFolder is null ? looks[..1] : looks)
            {
                await browser.SetScreenAsync(width, height, isBright: look == "day");
                await browser.WaitForAsync($"document.documentElement.dataset.look === '{look}' && innerWidth === {width}");
                // What a glove must meet, px.
                var least = (await browser.EvaluateAsync(LeastKey)).GetDouble();
                if (least < 48)
                {
                    _offences.Add($"{name}, {screen}, {look}: a button of {least} px");
                }

                if (!(await browser.EvaluateAsync(DoKeysFit)).GetBoolean())
                {
                    _offences.Add($"{name}, {screen}, {look}: a button reaches into the last row");
                }

                var texts = (await browser.EvaluateAsync(TextsOnThePage)).EnumerateArray().ToList();
                if (PictureFolder is not null)
                {
                    await File.WriteAllBytesAsync(Path.Combine(PictureFolder, $"{name}-{screen}-{look}.png"), await browser.PhotographAsync());
                }

                _offences.AddRange(Offences(texts, width, height, isCaution).Select(offence => $"{name}, {screen}, {look}: {offence}"));
            }
        }
    }

    private static IEnumerable<string> Offences(List<JsonElement> texts, int width, int height, bool isCaution)
    {
        Assert.InRange(texts.Count, 20, 120);
        foreach (var text in texts)
        {
            if (Contrast.Of(Text(text, "colour"), Text(text, "background")) < 7)
            {
                yield return $"too faint: {text}";
            }

            if (Number(text, "left") < -1 || Number(text, "top") < -1 || Number(text, "right") > width + 1 || Number(text, "bottom") > height + 1)
            {
                yield return $"off the screen: {text}";
            }
        }

        if (isCaution)
        {
            yield break;
        }

        var hold = texts.Single(text => Text(text, "id") == "speed");
        if (Number(hold, "size") < 3 * texts.Where(text => Text(text, "id") != "speed").Max(text => Number(text, "size")))
        {
            yield return "the speed to hold does not dominate";
        }

        foreach (var (i, text) in texts.Index())
        {
            foreach (var other in texts.Skip(i + 1).Where(other => Overlap(text, other)))
            {
                yield return $"one over the other: {text} {other}";
            }
        }
    }

    /// <summary>The line box of the big digits is higher than the digits, so a seventh of a size may overlap.</summary>
    private static bool Overlap(JsonElement a, JsonElement b)
    {
        var slack = 0.15 * Math.Max(Number(a, "size"), Number(b, "size"));
        return !(Number(a, "right") <= Number(b, "left") + 1 || Number(b, "right") <= Number(a, "left") + 1
            || Number(a, "bottom") <= Number(b, "top") + slack || Number(b, "bottom") <= Number(a, "top") + slack);
    }

    private static string Text(JsonElement element, string name) => element.GetProperty(name).GetString()!;

    private static double Number(JsonElement element, string name) => element.GetProperty(name).GetDouble();
}
