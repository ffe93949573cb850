using SpeedCommand.Estimation.Command;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Stages;

/// <summary>
/// Changes of the controls in, the mass, bugs and expected climb that the other stages work with out. It begins with the settings.
/// Ballast that runs out is worked out from when the valves were opened, so that it does not matter how often it is asked.
/// </summary>
internal sealed class PilotStage
{
    private readonly LastClimbs _climbs = new();
    private readonly double _dryKg;
    private ControlChange _expectedClimb;
    private ControlChange _ballast;
    private long _ballastUs;
    private double _qnhAltitudeM;

    public PilotStage(FlightSettings settings)
    {
        _dryKg = settings.MassKg - settings.BallastKg;
        _expectedClimb = new ControlChange(ControlId.ExpectedClimb, settings.ExpectedClimbMps);
        _ballast = new ControlChange(ControlId.Ballast, settings.BallastKg);
        Values = ControlValues.Standard with
        {
            ExpectedClimbMps = settings.ExpectedClimbMps,
            MassKg = settings.MassKg,
            BallastKg = settings.BallastKg,
            BugsFraction = settings.BugsFraction,
            ForcedPhase = settings.ForcedPhase,
        };
    }

    /// <summary>How every control stands.</summary>
    public ControlValues Values { get; private set; }

    public double ExpectedClimbMps => Values.ExpectedClimbMps;

    public Loading LoadingAt(double loadFactor) => new(Values.MassKg, loadFactor, Values.BugsFraction);

    /// <summary>What the altimeter shows at a pressure altitude.</summary>
    public double AltitudeM(double pressureAltitudeM) => pressureAltitudeM - _qnhAltitudeM;

    /// <summary>Takes a change at its own stamp.</summary>
    public void Take(long timeUs, in ControlChange change)
    {
        Values = Values with { LastChanged = change.Control, LastChangedUs = timeUs };
        switch (change.Control)
        {
            case ControlId.ExpectedClimb:
                _expectedClimb = change;
                FollowClimbs();
                break;
            case ControlId.Ballast:
                (_ballast, _ballastUs) = (change, timeUs);
                AdvanceTo(timeUs);
                break;
            case ControlId.Bugs:
                Values = Values with { BugsFraction = change.Value };
                break;
            case ControlId.Phase:
                Values = Values with { ForcedPhase = change.IsAutomatic ? null : (FlightPhase)change.Value };
                break;
            case ControlId.Qnh when Altimeter.TryPressureAltitude(0, change.Value, out var zeroM):
                _qnhAltitudeM = zeroM;
                Values = Values with { QnhPa = change.Value };
                break;
            case ControlId.Brightness:
                Values = Values with { Brightness = change.Value };
                break;
            case ControlId.Volume:
                Values = Values with { Volume = change.Value };
                break;
            case ControlId.Mute:
                Values = Values with { IsMuted = change.Value != 0 };
                break;
        }
    }

    /// <summary>Lets water run out. The glider never gets lighter than it is without.</summary>
    public void AdvanceTo(long nowUs)
    {
        if (_ballast.DumpKgPerS == 0 && Values.BallastKg == _ballast.Value && Values.DumpKgPerS == 0)
        {
            return;
        }

        var goneKg = _ballast.DumpKgPerS * Math.Max(0, nowUs - _ballastUs) * 1e-6;
        var leftKg = Math.Max(0, _ballast.Value - goneKg);
        var isEmpty = leftKg == 0 && Values.DumpKgPerS > 0;
        Values = Values with { BallastKg = leftKg, MassKg = _dryKg + leftKg, DumpKgPerS = leftKg > 0 ? _ballast.DumpKgPerS : 0 };
        if (isEmpty)
        {
            Note(ControlId.Ballast, nowUs);
        }
    }

    /// <summary>Takes a climb that has ended.</summary>
    public void AddClimb(long nowUs, double climbMps, double lastedS)
    {
        if (_climbs.Add(climbMps, lastedS) && _expectedClimb.IsAutomatic)
        {
            FollowClimbs();
            Note(ControlId.ExpectedClimb, nowUs);
        }
    }

    private void FollowClimbs()
    {
        var isFollowing = _expectedClimb.IsAutomatic && _climbs.IsKnown;
        Values = Values with
        {
            IsExpectedClimbAutomatic = _expectedClimb.IsAutomatic,
            ExpectedClimbMps = isFollowing ? _climbs.MeanMps : _expectedClimb.Value,
            ExpectedClimbSigmaMps = isFollowing ? _climbs.SigmaMps : double.NaN,
        };
    }

    private void Note(ControlId control, long nowUs) => Values = Values with { LastChanged = control, LastChangedUs = nowUs };
}
