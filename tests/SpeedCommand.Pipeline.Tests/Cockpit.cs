using System.Globalization;
using System.Text;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Sentences;

namespace SpeedCommand.Pipeline.Tests;

/// <summary>A cockpit with ideal sensors: sends sentences as two boards would and keeps every picture.</summary>
internal sealed class Cockpit : IPictureSink
{
    public const long StepUs = 50_000;

    private readonly int _static;
    private readonly int _pitot;

    public Cockpit(FlightSettings? settings = null)
    {
        Pipeline = new FlightPipeline(settings ?? new FlightSettings(TestGliders.WithLimits), this);
        _static = Pipeline.AddStream("static", ChecksumRule.Required);
        _pitot = Pipeline.AddStream("pitot", ChecksumRule.Required);
    }

    public FlightPipeline Pipeline { get; }

    public List<CockpitPicture> Pictures { get; } = [];

    public CockpitPicture Last => Pictures[^1];

    public long NowUs { get; private set; }

    public void OnPicture(in CockpitPicture picture) => Pictures.Add(picture);

    public void SendStatic(string body) => Pipeline.Accept(NowUs, _static, Sentence(body));

    public void SendPitot(string body) => Pipeline.Accept(NowUs, _pitot, Sentence(body));

    public void SendRaw(byte[] line) => Pipeline.Accept(NowUs, _static, line);

    /// <summary>Flies for some seconds at 20 Hz; what a function returns null for is not sent.</summary>
    public void Fly(double seconds, Func<double, double?>? staticPa, Func<double, double?>? impactPa, string? alsoPitot = null)
    {
        for (var end = NowUs + (long)Math.Round(seconds * 1e6); NowUs < end;)
        {
            NowUs += StepUs;
            if (staticPa?.Invoke(NowUs * 1e-6) is { } p)
            {
                SendStatic(Number($"P,{p:F3},P,STATIC"));
            }

            if (impactPa?.Invoke(NowUs * 1e-6) is { } q)
            {
                SendPitot(Number($"P,{q:F4},P,IMPACT") + (alsoPitot is null ? "" : "," + alsoPitot));
            }
        }

        Pipeline.AdvanceTo(NowUs);
    }

    public static string Number(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);

    /// <summary>Framed here on its own, so that a fault in the writer cannot hide one in the reader.</summary>
    public static byte[] Sentence(string body)
    {
        var content = "YXXDR," + body;
        var checksum = content.Aggregate(0, (sum, character) => sum ^ character);
        return Encoding.ASCII.GetBytes($"${content}*{checksum:X2}");
    }
}
