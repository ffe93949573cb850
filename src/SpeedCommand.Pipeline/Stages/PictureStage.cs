using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>Puts one picture together from what the other stages know at that moment.</summary>
internal sealed class PictureStage(
    FlightSettings settings, AirDataStage airData, LoadStage load, IEnergyEstimator energy, EventFaults events)
{
    private const double AverageSpanS = 30;

    /// <summary>Handbook polars are measured to about this share of the sink (common practice: "a few per cent").</summary>
    private const double PolarUncertainty = 0.05;

    private readonly TargetStage _targets = new(settings);
    private readonly PhaseStage _phase = new();
    private readonly HeightInHandStage _heightInHand = new(settings);
    private readonly AverageClimb _average = new(AverageSpanS, PipelineBounds.PicturePeriodUs * 1e-6);

    public CockpitPicture MakeAt(long nowUs)
    {
        var isStatic = airData.IsStaticFresh(nowUs);
        var isMoving = airData.TryAirspeeds(nowUs, out var indicated, out var trueAirspeed);
        var isComplete = isStatic && airData.IsAirspeedFresh(nowUs);
        var air = airData.Air;
        var staticAgeS = airData.StaticAgeS(nowUs);
        var ageS = isComplete ? Math.Max(staticAgeS, airData.AirspeedAgeS(nowUs)) : double.NaN;

        var estimate = isComplete ? energy.EstimateAt(nowUs) : EnergyEstimate.Unknown;
        var average = _average.Add(estimate.EnergyHeightM);
        var climb = estimate.IsKnown ? new Gauge(estimate.ClimbMps, estimate.ClimbSigmaMps, ageS) : Gauge.Blank;
        var netto = isMoving ? Netto(nowUs, climb, trueAirspeed, air) : Gauge.Blank;
        var targets = Targets.Blank;
        if (isComplete)
        {
            targets = _targets.At(new TargetInputs(air, load.Steady(nowUs), netto, ageS));
        }
        else
        {
            _targets.Reset();
        }

        var indicatedMps = isMoving ? indicated.Mps : double.NaN;
        var phase = _phase.Judge(new PhaseEvidence(
            load.IsMeasured(nowUs), load.Steady(nowUs), climb.Value, indicatedMps, targets.MinSink.Value));
        var inHand = isComplete ? _heightInHand.At(air, targets, staticAgeS) : HeightInHandGauges.Blank;
        return new CockpitPicture
        {
            TimeUs = nowUs,
            Phase = phase,
            PressureAltitudeM = isStatic ? new Gauge(air.PressureAltitudeM, double.NaN, staticAgeS) : Gauge.Blank,
            DensityAltitudeM = isStatic ? new Gauge(air.DensityAltitudeM, double.NaN, staticAgeS) : Gauge.Blank,
            TemperatureK = isStatic ? Temperature(nowUs, air, staticAgeS) : Gauge.Blank,
            TemperatureSource = air.TemperatureSource,
            IndicatedAirspeedMps = isMoving ? new Gauge(indicated.Mps, double.NaN, ageS) : Gauge.Blank,
            TrueAirspeedMps = isMoving ? new Gauge(trueAirspeed.Mps, double.NaN, ageS) : Gauge.Blank,
            ClimbMps = climb,
            AverageClimbMps = double.IsNaN(average) ? Gauge.Blank : new Gauge(average, double.NaN, ageS),
            NettoMps = netto,
            MinSinkIndicatedMps = targets.MinSink,
            BestGlideIndicatedMps = targets.BestGlide,
            SpeedToFlyIndicatedMps = targets.SpeedToFly,
            HoldIndicatedMps = phase == FlightPhase.Climbing ? targets.MinSink : targets.SpeedToFly,
            LimitedBy = targets.LimitedBy,
            ExpectedClimbMps = settings.ExpectedClimbMps,
            EnduranceS = inHand.EnduranceS,
            RangeM = inHand.RangeM,
            Faults = FaultsAt(nowUs, isStatic, netto.IsKnown && !targets.SpeedToFly.IsKnown),
        };
    }

    /// <summary>Netto is the climb with the glider's own sink added back; its doubt is the climb's and the polar's together.</summary>
    private Gauge Netto(long nowUs, in Gauge climb, TrueAirspeed airspeed, in Air air)
    {
        if (!climb.IsKnown || !_targets.TrySink(airspeed, air, Math.Max(0, load.Present(nowUs)), out var sinkMps))
        {
            return Gauge.Blank;
        }

        var polarSigma = PolarUncertainty * sinkMps;
        return climb with { Value = climb.Value + sinkMps, Sigma = Math.Sqrt(climb.Sigma * climb.Sigma + polarSigma * polarSigma) };
    }

    private Gauge Temperature(long nowUs, in Air air, double staticAgeS) =>
        new(air.TemperatureK, double.NaN, air.TemperatureSource == TemperatureSource.Measured ? airData.TemperatureAgeS(nowUs) : staticAgeS);

    private Faults FaultsAt(long nowUs, bool isStatic, bool isWithoutLimits)
    {
        var faults = events.At(nowUs);
        faults |= isStatic ? Faults.None : Faults.StaticSilent;
        faults |= airData.IsAirspeedFresh(nowUs) ? Faults.None : Faults.AirspeedSilent;
        faults |= airData.IsTemperatureFresh(nowUs) ? Faults.None : Faults.TemperatureSilent;
        faults |= isWithoutLimits ? Faults.NoLimits : Faults.None;
        return faults;
    }
}
