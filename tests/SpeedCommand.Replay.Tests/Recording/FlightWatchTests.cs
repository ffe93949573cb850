using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>
/// When a flight begins and ends, on flights of a few lines: seconds, height, airspeed. A launch, a landing and a parked glider are as any
/// pilot knows them (common practice).
/// </summary>
public sealed class FlightWatchTests : IDisposable
{
    private const double Flying = 25, Unknown = double.NaN;

    private readonly RecordedFiles _files = new();

    public void Dispose() => _files.Dispose();

    private static void Fly(FlightRecorder recorder, ref long timeUs, double seconds, Func<double, double> heightM, double airspeedMps)
    {
        for (var endUs = timeUs + (long)(seconds * 1e6); timeUs < endUs; timeUs += 100_000)
        {
            recorder.Record(timeUs, "static"u8, "$A"u8);
            recorder.OnPicture(CockpitPicture.Blank(timeUs, Faults.None) with
            {
                PressureAltitudeM = new Gauge(heightM(timeUs * 1e-6), 1, 0),
                IndicatedAirspeedMps = double.IsNaN(airspeedMps) ? Gauge.Blank : new Gauge(airspeedMps, 1, 0),
            });
            recorder.Drain();
        }
    }

    private FlightRecorder Open(RecordingBegin begin = RecordingBegin.Data) =>
        new(_files.Options with { Begin = begin, LandedAfterUs = 60_000_000 }, RecordedFiles.Header, 7);

    /// <summary>The seconds each file covers.</summary>
    private (double FromS, double ToS)[] Files(FlightRecorder recorder)
    {
        recorder.Drain();
        return [.. _files.Paths.Select(RecordedFiles.StampsUs).Select(stamps => (stamps[0] * 1e-6, stamps[^1] * 1e-6))];
    }

    private static double Climbing(double t) => 100 + 2 * t;

    [Fact]
    public void TwoFlights_MakeTwoFiles_AndTheGroundTimeBetweenMakesNone()
    {
        using var recorder = Open();
        var timeUs = 0L;
        Fly(recorder, ref timeUs, 30, _ => 100, 1);
        Fly(recorder, ref timeUs, 70, Climbing, Flying);
        Fly(recorder, ref timeUs, 200, t => 100 + Math.Sin(t), 2);
        Fly(recorder, ref timeUs, 50, Climbing, Flying);
        var files = Files(recorder);
        Assert.Equal(2, files.Length);
        Assert.Equal(0, files[0].FromS);
        Assert.InRange(files[0].ToS, 159.9, 160.3);
        Assert.InRange(files[1].FromS, 300, 300.2);
        Assert.Equal(349.9, files[1].ToS, 1e-6);
    }

    [Fact]
    public void BeginWithFlying_LeavesTheGroundOut()
    {
        using var recorder = Open(RecordingBegin.Flying);
        var timeUs = 0L;
        Fly(recorder, ref timeUs, 600, _ => 100, 3);
        Assert.Empty(_files.Paths);
        Fly(recorder, ref timeUs, 60, Climbing, Flying);
        Assert.InRange(Assert.Single(Files(recorder)).FromS, 600, 600.2);
    }

    /// <summary>A pitot full of water reads nothing in a flight that goes on; the height tells.</summary>
    [Fact]
    public void BlockedPitot_NeitherEndsTheFlight_NorKeepsTheNextFromBeginning()
    {
        using var recorder = Open(RecordingBegin.Flying);
        var timeUs = 0L;
        Fly(recorder, ref timeUs, 60, _ => 100, 0);
        Fly(recorder, ref timeUs, 600, Climbing, 0);
        Fly(recorder, ref timeUs, 600, t => 3000 - t, 0);
        var (fromS, toS) = Assert.Single(Files(recorder));
        Assert.InRange(fromS, 60, 60.2);
        Assert.Equal(1259.9, toS, 1e-6);
    }

    [Theory]
    [InlineData(Unknown, 100, "no airspeed: the board may be unplugged")]
    [InlineData(2, Unknown, "no height")]
    [InlineData(20, 100, "steady flight at one height, as in wave")]
    public void WhatIsNotKnown_EndsNoFlight(double airspeedMps, double heightM, string because)
    {
        using var recorder = Open();
        var timeUs = 0L;
        Fly(recorder, ref timeUs, 10, Climbing, Flying);
        Fly(recorder, ref timeUs, 1_000, _ => heightM, airspeedMps);
        Assert.True(Assert.Single(Files(recorder)).ToS > 1_009, because);
    }

    /// <summary>A stop of 40 s between two gusts, or a bounce, is no landing.</summary>
    [Fact]
    public void ShortStop_IsNoLanding()
    {
        using var recorder = Open();
        var timeUs = 0L;
        for (var i = 0; i < 5; i++)
        {
            Fly(recorder, ref timeUs, 10, _ => 100, Flying);
            Fly(recorder, ref timeUs, 40, _ => 100, 2);
        }

        Assert.Equal(249.9, Assert.Single(Files(recorder)).ToS, 1e-6);
    }
}
