using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests.Controls;

/// <summary>What changes of the controls do to the pictures, in steady flight with ideal sensors.</summary>
public sealed class PilotTests
{
    private const double HeightM = 1000;
    private static readonly double PressurePa = IdealAir.StandardPa(HeightM);
    private static readonly double ImpactPa = IdealAir.ImpactPa(30, HeightM);

    private static Cockpit Fly(FlightSettings? settings = null)
    {
        var cockpit = new Cockpit(settings);
        Go(cockpit, 20);
        return cockpit;
    }

    private static void Go(Cockpit cockpit, double seconds) => cockpit.Fly(seconds, _ => PressurePa, _ => ImpactPa);

    private static void Change(Cockpit cockpit, string text, long aheadUs = 0)
    {
        Assert.True(ControlText.TryReadChange(text, out var change, out var problem), problem);
        cockpit.Pipeline.Accept(cockpit.NowUs + aheadUs, change);
    }

    [Fact] // at fixed lift coefficient speeds go with the root of the mass (closed form); compressibility leaves a few parts in ten thousand
    public void Ballast_MovesTheTargets_WithTheRootOfTheMass()
    {
        var cockpit = Fly();
        var dry = cockpit.Last.MinSinkIndicatedMps.Value;
        Change(cockpit, "ballast 100 kg");
        Go(cockpit, 0.2);
        Assert.Equal(440, cockpit.Last.Controls.MassKg);
        Assert.Equal(dry * Math.Sqrt(440 / 340.0), cockpit.Last.MinSinkIndicatedMps.Value, 0.02);
    }

    [Fact]
    public void Dump_RunsByLogTime_HoweverItIsAsked_AndEndsAtTheDryMass()
    {
        var cockpit = Fly(new FlightSettings(TestGliders.WithLimits) { MassKg = 400, BallastKg = 60 });
        Change(cockpit, "ballast 60 kg dump 1.5 kg/s", 25_000);
        Go(cockpit, 20.025 - 0.025);
        var silent = Fly(new FlightSettings(TestGliders.WithLimits) { MassKg = 400, BallastKg = 60 });
        Change(silent, "ballast 60 kg dump 1.5 kg/s", 25_000);
        silent.Pipeline.AdvanceTo(cockpit.NowUs);
        // 60 kg less 1.5 kg/s for 19.975 s.
        Assert.Equal(30.0375, cockpit.Last.Controls.BallastKg, 1e-9);
        Assert.Equal(cockpit.Last.Controls, silent.Last.Controls);
        Assert.Equal(370.0375, cockpit.Last.Controls.MassKg, 1e-9);
        Go(cockpit, 60);
        Assert.Equal((0, 340, 0), (cockpit.Last.Controls.BallastKg, cockpit.Last.Controls.MassKg, cockpit.Last.Controls.DumpKgPerS));
        // The end of the dump is a change to show, 40 s after it began.
        Assert.Equal(60.1, cockpit.Last.Controls.LastChangedUs * 1e-6, 0.11);
    }

    [Fact] // what the pilot says of mass changes what is known of the sink; the climb measured must not jump
    public void Ballast_DoesNotMoveTheClimb()
    {
        var cockpit = Fly();
        var before = cockpit.Last.ClimbMps.Value;
        Change(cockpit, "ballast 110 kg");
        Change(cockpit, "bugs 50 %");
        Go(cockpit, 1);
        Assert.All(cockpit.Pictures.TakeLast(10), picture => Assert.Equal(before, picture.ClimbMps.Value, 0.02));
    }

    [Fact] // MacCready 0 in still air is best glide (closed form); more climb asks for more speed, and bugs add sink to netto
    public void ExpectedClimbAndBugs_ReachTheTargets()
    {
        var sinkMps = 0.0;
        var cockpit = new Cockpit();
        // Descending with the glider's own sink, the air is still and netto 0.
        void Glide(double seconds) => cockpit.Fly(seconds, t => IdealAir.StandardPa(HeightM - sinkMps * t), _ => ImpactPa);
        Glide(20);
        sinkMps = cockpit.Last.NettoMps.Value;
        cockpit = new Cockpit();
        Glide(30);
        Assert.Equal(cockpit.Last.BestGlideIndicatedMps.Value, cockpit.Last.SpeedToFlyIndicatedMps.Value, 0.3);
        var netto = cockpit.Last.NettoMps.Value;
        Change(cockpit, "expected-climb 2 m/s");
        Glide(0.2);
        Assert.Equal(2, cockpit.Last.ExpectedClimbMps);
        Assert.True(cockpit.Last.SpeedToFlyIndicatedMps.Value > cockpit.Last.BestGlideIndicatedMps.Value + 3);
        Change(cockpit, "bugs 50 %");
        Glide(0.2);
        Assert.Equal(netto + 0.5 * sinkMps, cockpit.Last.NettoMps.Value, 0.05);
    }

    [Fact]
    public void Phase_IsHeldFromTheNextPicture_AndLetGo()
    {
        var cockpit = Fly();
        Change(cockpit, "phase climbing");
        Go(cockpit, 0.1);
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Assert.Equal(cockpit.Last.MinSinkIndicatedMps, cockpit.Last.HoldIndicatedMps);
        Go(cockpit, 30);
        Assert.Equal(FlightPhase.Climbing, cockpit.Last.Phase);
        Change(cockpit, "phase auto");
        Go(cockpit, 20);
        Assert.Equal(FlightPhase.Gliding, cockpit.Last.Phase);
    }

    [Fact] // about 8.3 m a hPa near sea level (27.3 ft, ICAO altimetry, common practice); time in hand and limits know only pressure altitude
    public void Qnh_MovesTheAltitudeShown_AndNothingElse()
    {
        var cockpit = Fly();
        var before = cockpit.Last;
        Assert.Equal(before.PressureAltitudeM.Value, before.AltitudeM.Value);
        Change(cockpit, "qnh 1023.25 hPa");
        Go(cockpit, 0.1);
        Assert.Equal(before.PressureAltitudeM.Value + 83, cockpit.Last.AltitudeM.Value, 1.0);
        Assert.Equal(before.PressureAltitudeM.Value, cockpit.Last.PressureAltitudeM.Value);
        Assert.Equal(before.EnduranceS.Value, cockpit.Last.EnduranceS.Value);
        Assert.False(cockpit.Last.Controls.IsQnhStandard);
    }

    [Fact] // circling by the load sensor, 60 s at 2 m/s, then a glide: the average of the one climb, and its spread by hand
    public void Automatic_FollowsTheLastClimbs_FromWhenOneHasEnded()
    {
        var cockpit = new Cockpit();
        Change(cockpit, "expected-climb auto 1 m/s");
        var heightM = HeightM;
        void Fly(double seconds, double climbMps, string load) => cockpit.Fly(
            seconds, _ => IdealAir.StandardPa(heightM += climbMps * Cockpit.StepUs * 1e-6), _ => IdealAir.ImpactPa(25, heightM), load);
        Fly(30, -0.7, "G,1.00,,LOAD");
        Fly(60, 2, "G,1.30,,LOAD");
        Assert.Equal((1, true), (cockpit.Last.ExpectedClimbMps, double.IsNaN(cockpit.Last.Controls.ExpectedClimbSigmaMps)));
        Fly(15, -0.7, "G,1.00,,LOAD");
        // The load smoothed over a second passes 1.064 after 0.24 s and is below 1.019 again after 2.76 s (0.3 e^-t):
        // (2 x 59.76 - 0.7 x 2.76) m in 62.52 s.
        Assert.Equal(1.881, cockpit.Last.ExpectedClimbMps, 0.03);
        // One climb: the usual spread of 0.5 m/s, and as much for the mean of one: 0.5 sqrt(2).
        Assert.Equal(0.7071, cockpit.Last.Controls.ExpectedClimbSigmaMps, 1e-4);
        Assert.Equal(ControlId.ExpectedClimb, cockpit.Last.Controls.LastChanged);
        Change(cockpit, "expected-climb 3 m/s");
        Fly(0.2, -0.7, "G,1.00,,LOAD");
        Assert.Equal(3, cockpit.Last.ExpectedClimbMps);
    }

    [Fact]
    public void RunningDump_AllocatesNothing()
    {
        var pipeline = new FlightPipeline(new FlightSettings(TestGliders.WithLimits) { MassKg = 440, BallastKg = 100 }, new Nobody());
        var dump = new ControlChange(ControlId.Ballast, 100, DumpKgPerS: 0.5);
        var step = new ControlChange(ControlId.ExpectedClimb, 2);
        var least = long.MaxValue;
        for (var round = 0; round < 20; round++)
        {
            var before = GC.GetAllocatedBytesForCurrentThread();
            for (var i = 0; i < 50; i++)
            {
                pipeline.Accept((round * 50 + i) * 100_000L, i % 2 == 0 ? dump : step);
            }

            least = Math.Min(least, GC.GetAllocatedBytesForCurrentThread() - before);
        }

        Assert.Equal(0, least);
    }

    private sealed class Nobody : IPictureSink
    {
        public void OnPicture(in CockpitPicture picture)
        {
        }
    }
}
