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

    /// <summary>No glider flies slower; a parked one in the wind may read less (40 km/h).</summary>
    private const double SlowestFlightMps = 40 / 3.6;

    /// <summary>Handbook polars are measured to about this share of the sink (common practice: "a few per cent").</summary>
    private const double PolarUncertainty = 0.05;

    private readonly PhaseStage _phase;
    private readonly EnergyHistory _history = new(AverageSpanS, PipelineBounds.PicturePeriodUs * 1e-6);
    private readonly ThermalAverage _thermal = new(PipelineBounds.PicturePeriodUs * 1e-6);
    private readonly TargetStage _targets;
    private readonly HeightInHandStage _heightInHand;
    private readonly FlightSettings _settings;
    private readonly AirDataStage _airData;
    private readonly LoadStage _load;
    private readonly IEnergyEstimator _energy;
    private readonly EventFaults _events;

    public PictureStage(FlightSettings settings, AirDataStage airData, LoadStage load, IEnergyEstimator energy, EventFaults events)
    {
        _settings = settings;
        _airData = airData;
        _load = load;
        _energy = energy;
        _events = events;
        var targets = new SpeedTargets(settings.Glider, settings.StallMargin);
        _phase = new PhaseStage(settings.ForcedPhase);
        _targets = new TargetStage(settings, targets);
        _heightInHand = new HeightInHandStage(settings, targets);
    }

    /// <summary>What is fresh decides what is computed; the rest stays blank.</summary>
    public CockpitPicture MakeAt(long nowUs)
    {
        var blank = CockpitPicture.Blank(nowUs, Faults.None) with { ExpectedClimbMps = _settings.ExpectedClimbMps };
        var picture = _airData.IsStaticFresh(nowUs) ? WithAir(blank, nowUs) : blank;
        var isComplete = _airData.IsStaticFresh(nowUs) && _airData.IsAirspeedFresh(nowUs);
        if (isComplete)
        {
            picture = WithTargets(WithMotion(picture, nowUs), nowUs);
        }
        else
        {
            _history.Add(double.NaN);
            _targets.Reset();
        }

        var phase = _phase.Judge(new PhaseEvidence(_load.IsMeasured(nowUs), _load.Steady(nowUs, FlightPhase.Gliding),
            picture.ClimbMps.Value, picture.IndicatedAirspeedMps.Value, picture.MinSinkIndicatedMps.Value));
        return picture with
        {
            Phase = phase,
            ThermalAverageMps = ThermalAverage(phase, picture.ClimbMps.AgeS),
            HoldIndicatedMps = phase == FlightPhase.Climbing ? picture.MinSinkIndicatedMps : picture.SpeedToFlyIndicatedMps,
            Faults = FaultsAt(nowUs, picture),
        };
    }

    private CockpitPicture WithAir(in CockpitPicture picture, long nowUs)
    {
        var air = _airData.Air;
        var ageS = _airData.StaticAgeS(nowUs);
        var temperatureAgeS = air.TemperatureSource == TemperatureSource.Measured ? _airData.TemperatureAgeS(nowUs) : ageS;
        return picture with
        {
            PressureAltitudeM = new Gauge(air.PressureAltitudeM, double.NaN, ageS),
            DensityAltitudeM = new Gauge(air.DensityAltitudeM, double.NaN, ageS),
            TemperatureK = new Gauge(air.TemperatureK, double.NaN, temperatureAgeS),
            TemperatureSource = air.TemperatureSource,
        };
    }

    private CockpitPicture WithMotion(in CockpitPicture picture, long nowUs)
    {
        var ageS = AgeS(nowUs);
        var estimate = _energy.EstimateAt(nowUs);
        _history.Add(estimate.EnergyHeightM);
        var average = _history.AverageClimbMps(AverageSpanS);
        var climb = estimate.IsKnown ? new Gauge(estimate.ClimbMps, estimate.ClimbSigmaMps, ageS) : Gauge.Blank;
        var moved = picture with
        {
            ClimbMps = climb,
            AverageClimbMps = double.IsNaN(average) ? Gauge.Blank : new Gauge(average, double.NaN, ageS),
        };
        return _airData.TryAirspeeds(nowUs, out var indicated, out var trueAirspeed)
            ? moved with
            {
                IndicatedAirspeedMps = new Gauge(indicated.Mps, double.NaN, ageS),
                TrueAirspeedMps = new Gauge(trueAirspeed.Mps, double.NaN, ageS),
                NettoMps = Netto(nowUs, climb, trueAirspeed, _airData.Air),
            }
            : moved;
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
    private static bool IsOutsidePolar(in CockpitPicture picture) =>
        picture.ClimbMps.IsKnown && !picture.NettoMps.IsKnown && picture.IndicatedAirspeedMps.IsKnown
        && picture.IndicatedAirspeedMps.Value > SlowestFlightMps;

    /// <summary>A number that rests on both inputs is as old as the older of them.</summary>
    private double AgeS(long nowUs) => Math.Max(_airData.StaticAgeS(nowUs), _airData.AirspeedAgeS(nowUs));

    /// <summary>Netto is the climb with the glider's own sink added back; its doubt is the climb's and the polar's together.</summary>
    private Gauge Netto(long nowUs, in Gauge climb, TrueAirspeed airspeed, in Air air)
    {
        if (!climb.IsKnown || !_targets.TrySink(airspeed, air, Math.Max(0, _load.Present(nowUs)), out var sinkMps))
        {
            return Gauge.Blank;
        }

        var polarSigma = PolarUncertainty * sinkMps;
        return climb with { Value = climb.Value + sinkMps, Sigma = Math.Sqrt(climb.Sigma * climb.Sigma + polarSigma * polarSigma) };
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
    private Gauge ThermalAverage(FlightPhase phase, double ageS)
    {
        var noticedAfterS = _settings.ForcedPhase is null ? PhaseStage.LastingUs * 1e-6 : 0;
        var average = _thermal.Add(phase == FlightPhase.Climbing, _history, noticedAfterS);
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
