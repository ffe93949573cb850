using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Tells the estimator how the glider's own sink changes with speed and load, so that it need not find out from the climb. Changes
/// only: an error of the polar that stays is left to the measurement.
/// </summary>
internal sealed class SinkStage(FlightSettings settings, PilotStage pilot, LoadStage load, IEnergyEstimator energy)
{
    /// <summary>After a longer time without a sink the difference says nothing of a moment, microseconds.</summary>
    private const long MaxGapUs = 2_000_000;

    private readonly SpeedTargets _targets = new(settings.Glider, settings.StallMargin);
    private double _sinkMps;
    private bool _isMeasured;
    private long _timeUs = long.MinValue / 2;

    /// <summary>What the pilot says of mass or bugs changes what is known of the sink, not the sink.</summary>
    public void Forget() => _timeUs = long.MinValue / 2;

    /// <summary>Looks anew after a reading of airspeed or load.</summary>
    public void Follow(long nowUs, in Air air)
    {
        var airspeed = new TrueAirspeed(energy.EstimateAt(nowUs).TrueAirspeedMps);
        var factor = load.Present(nowUs, FlightPhase.Gliding).Factor;
        if (!_targets.TrySink(airspeed, air, pilot.LoadingAt(Math.Max(0, factor)), out var sinkMps))
        {
            return;
        }

        // A sensor that comes or goes changes what is known of the load, not the load.
        var isMeasured = load.IsMeasured(nowUs);
        if (isMeasured == _isMeasured && nowUs - _timeUs <= MaxGapUs)
        {
            energy.AddSinkChange(sinkMps - _sinkMps);
        }

        (_sinkMps, _isMeasured, _timeUs) = (sinkMps, isMeasured, nowUs);
    }
}
