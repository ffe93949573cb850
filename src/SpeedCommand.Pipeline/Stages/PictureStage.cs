using SpeedCommand.Estimation.Command;
using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>Puts one picture together from what the other stages know at that moment.</summary>
internal sealed class PictureStage
{
    private const double AverageSpanS = 30;

    /// <summary>While a receiver contradicts the pressures, vertical speeds are this much more doubtful, m/s: the speed at which they part.</summary>
    private const double DisagreementMps = 1.25;

    /// <summary>A thermometer in the sun reads some 3 K high (common practice); density altitude moves 36 m per K (ISO 2533, troposphere).</summary>
    private const double SunK = 3, DensityAltitudeMPerK = 36;

    /// <summary>Handbook polars are measured to about this share of the sink (common practice: "a few per cent").</summary>
    private const double PolarUncertainty = 0.05;

    private readonly PhaseStage _phase;
    private readonly EnergyHistory _history = new(AverageSpanS, PipelineBounds.PicturePeriodUs * 1e-6);
    private readonly ThermalAverage _thermal = new(PipelineBounds.PicturePeriodUs * 1e-6);
    private readonly TargetStage _targets;
    private readonly HeightInHandStage _heightInHand;
    private readonly PilotStage _pilot;
    private readonly AirDataStage _airData;
    private readonly LoadStage _load;
    private readonly IEnergyEstimator _energy;
    private readonly EventFaults _events;

    public PictureStage(FlightSettings settings, PilotStage pilot, AirDataStage airData, LoadStage load, IEnergyEstimator energy, EventFaults events)
    {
        _pilot = pilot;
        _airData = airData;
        _load = load;
        _energy = energy;
        _events = events;
        var targets = new SpeedTargets(settings.Glider, settings.StallMargin);
        _phase = new PhaseStage(settings.ForcedPhase);
        _targets = new TargetStage(pilot, targets);
        _heightInHand = new HeightInHandStage(settings, pilot, targets);
    }

    /// <summary>The pilot insists on a phase, or no longer on any.</summary>
    public void Force(FlightPhase? phase) => _phase.Force(phase);

    /// <summary>What is fresh decides what is computed; the rest stays blank.</summary>
    public CockpitPicture MakeAt(long nowUs)
    {
        var blank = CockpitPicture.Blank(nowUs, Faults.None) with { Controls = _pilot.Values };
        var picture = _airData.IsStaticFresh(nowUs) ? WithAir(blank, nowUs) : blank;
        var estimate = _energy.EstimateAt(nowUs);
        picture = WithClimb(picture, estimate, nowUs);
        if (IsComplete(nowUs))
        {
            picture = WithTargets(WithAirspeed(picture, estimate, nowUs), nowUs);
        }
        else
        {
            _targets.Reset();
        }

        var phase = _phase.Judge(new PhaseEvidence(_load.IsMeasured(nowUs), _load.Steady(nowUs, FlightPhase.Gliding),
            picture.ClimbMps.Value, picture.IndicatedAirspeedMps.Value, picture.MinSinkIndicatedMps.Value));
        return picture with
        {
            Phase = phase,
            ThermalAverageMps = ThermalAverage(phase, picture.ClimbMps.AgeS, nowUs),
            HoldIndicatedMps = phase == FlightPhase.Climbing ? picture.MinSinkIndicatedMps : picture.SpeedToFlyIndicatedMps,
            Faults = FaultsAt(nowUs, picture),
        };
    }

    private CockpitPicture WithAir(in CockpitPicture picture, long nowUs)
    {
        var air = _airData.Air;
        var ageS = _airData.StaticAgeS(nowUs);
        var sunK = (_events.At(nowUs) & Faults.ThermometerDoubtful) != 0 ? SunK : double.NaN;
        var temperatureAgeS = air.TemperatureSource == TemperatureSource.Measured ? _airData.TemperatureAgeS(nowUs) : ageS;
        return picture with
        {
            PressureAltitudeM = new Gauge(air.PressureAltitudeM, double.NaN, ageS),
            AltitudeM = new Gauge(_pilot.AltitudeM(air.PressureAltitudeM), double.NaN, ageS),
            DensityAltitudeM = new Gauge(air.DensityAltitudeM, sunK * DensityAltitudeMPerK, ageS),
            TemperatureK = new Gauge(air.TemperatureK, sunK, temperatureAgeS),
            TemperatureSource = air.TemperatureSource,
        };
    }

    private bool IsComplete(long nowUs) => _airData.IsStaticFresh(nowUs) && _airData.IsAirspeedFresh(nowUs);

    /// <summary>Climb rests on static pressure and airspeed, or on a total-energy probe alone.</summary>
    private CockpitPicture WithClimb(in CockpitPicture picture, in EnergyEstimate estimate, long nowUs)
    {
        var ageS = Math.Min(IsComplete(nowUs) ? AgeS(nowUs) : double.PositiveInfinity,
            _airData.IsProbeFresh(nowUs) ? _airData.ProbeAgeS(nowUs) : double.PositiveInfinity);
        if (double.IsInfinity(ageS))
        {
            _history.Add(double.NaN);
            return picture;
        }

        _history.Add(estimate.EnergyHeightM);
        var average = _history.AverageClimbMps(AverageSpanS);
        var isContradicted = (_events.At(nowUs) & (Faults.StaticDisagrees | Faults.AirspeedDisagrees)) != 0;
        var sigma = isContradicted ? Math.Sqrt(estimate.ClimbSigmaMps * estimate.ClimbSigmaMps + DisagreementMps * DisagreementMps) : estimate.ClimbSigmaMps;
        return picture with
        {
            ClimbMps = estimate.IsKnown ? new Gauge(estimate.ClimbMps, sigma, ageS) : Gauge.Blank,
            AverageClimbMps = double.IsNaN(average) ? Gauge.Blank : new Gauge(average, double.NaN, ageS),
        };
    }

    private CockpitPicture WithAirspeed(in CockpitPicture picture, in EnergyEstimate estimate, long nowUs)
    {
        if (!_airData.TryAirspeeds(nowUs, out var indicated, out var trueAirspeed))
        {
            return picture;
        }

        // Sink is bent: at a gusty airspeed it would come out too high, and the pilot has no use for a gust either.
        var smooth = double.IsFinite(estimate.TrueAirspeedMps) ? new TrueAirspeed(estimate.TrueAirspeedMps) : trueAirspeed;
        var ageS = AgeS(nowUs);
        return picture with
        {
            IndicatedAirspeedMps = new Gauge(indicated.Mps, double.NaN, ageS),
            TrueAirspeedMps = new Gauge(trueAirspeed.Mps, double.NaN, ageS),
            SmoothIndicatedAirspeedMps = _airData.TryIndicated(smooth, out var steady) ? new Gauge(steady.Mps, double.NaN, ageS) : Gauge.Blank,
            NettoMps = Netto(nowUs, picture.ClimbMps, smooth, ageS),
        };
    }

    private CockpitPicture WithTargets(in CockpitPicture picture, long nowUs)
    {
        var targets = _targets.At(new TargetInputs(
            _airData.Air, _load.Steady(nowUs, _phase.Phase), picture.NettoMps, IsOutsidePolar(picture), nowUs, AgeS(nowUs)));
        var inHand = _heightInHand.At(_airData.Air, _airData.StaticAgeS(nowUs));
        return picture with
        {
            MinSinkIndicatedMps = targets.MinSink,
            BestGlideIndicatedMps = targets.BestGlide,
            SpeedToFlyIndicatedMps = targets.SpeedToFly,
            LimitedBy = targets.LimitedBy,
            RelativeNettoMps = RelativeNetto(picture.NettoMps, targets.CirclingSinkMps),
            EnduranceS = inHand.EnduranceS,
            RangeM = inHand.RangeM,
        };
    }

    /// <summary>In flight, netto goes blank where the polar ends; standing on the ground is no fault.</summary>
    private bool IsOutsidePolar(in CockpitPicture picture) =>
        picture.ClimbMps.IsKnown && !picture.NettoMps.IsKnown && picture.IndicatedAirspeedMps.IsKnown
        && _airData.IsFlying(picture.TimeUs);

    /// <summary>A number that rests on both inputs is as old as the older of them.</summary>
    private double AgeS(long nowUs) => Math.Max(_airData.StaticAgeS(nowUs), _airData.AirspeedAgeS(nowUs));

    /// <summary>Netto is the climb with the glider's own sink added back; its doubt is the climb's, the polar's and the load's together.</summary>
    private Gauge Netto(long nowUs, in Gauge climb, TrueAirspeed airspeed, double ageS)
    {
        var air = _airData.Air;
        var load = _load.Present(nowUs, _phase.Phase);
        var factor = Math.Max(0, load.Factor);
        if (!climb.IsKnown || !_targets.TrySink(airspeed, air, factor, out var sinkMps))
        {
            return Gauge.Blank;
        }

        var polarSigma = PolarUncertainty * sinkMps;
        // Near the stall the polar may end within the doubt of the load; then the other side tells.
        var loadSigma = _targets.TrySink(airspeed, air, factor + load.Sigma, out var otherMps)
            || _targets.TrySink(airspeed, air, Math.Max(0, factor - load.Sigma), out otherMps) ? otherMps - sinkMps : sinkMps;
        var sigma = Math.Sqrt(climb.Sigma * climb.Sigma + polarSigma * polarSigma + loadSigma * loadSigma);
        return new Gauge(climb.Value + sinkMps, sigma, ageS);
    }

    /// <summary>The circle's sink is as doubtful as the polar, and so adds to the doubt of the air's motion.</summary>
    private static Gauge RelativeNetto(in Gauge netto, double circlingSinkMps)
    {
        var polarSigma = PolarUncertainty * circlingSinkMps;
        return netto.IsKnown && double.IsFinite(circlingSinkMps)
            ? netto with { Value = netto.Value - circlingSinkMps, Sigma = Math.Sqrt(netto.Sigma * netto.Sigma + polarSigma * polarSigma) }
            : Gauge.Blank;
    }

    /// <summary>The phase is noticed late; the thermal began when its evidence did, unless the pilot said so.</summary>
    private Gauge ThermalAverage(FlightPhase phase, double ageS, long nowUs)
    {
        var noticedAfterS = _phase.IsForced ? 0 : PhaseStage.LastingUs * 1e-6;
        var average = _thermal.Add(phase == FlightPhase.Climbing, _history, noticedAfterS);
        _pilot.AddClimb(nowUs, _thermal.EndedMps, _thermal.EndedS);
        return double.IsNaN(average) ? Gauge.Blank : new Gauge(average, double.NaN, ageS);
    }

    private Faults FaultsAt(long nowUs, in CockpitPicture picture)
    {
        var faults = _events.At(nowUs);
        faults |= _airData.IsStaticFresh(nowUs) ? Faults.None : Faults.StaticSilent;
        faults |= _airData.IsAirspeedFresh(nowUs) ? Faults.None : Faults.AirspeedSilent;
        faults |= _airData.IsTemperatureFresh(nowUs) ? Faults.None : Faults.TemperatureSilent;
        faults |= IsOutsidePolar(picture) ? Faults.OutsidePolar : Faults.None;
        faults |= picture.NettoMps.IsKnown && !picture.SpeedToFlyIndicatedMps.IsKnown && _targets.IsSettled(nowUs) ? Faults.NoLimits : Faults.None;
        return faults;
    }
}
