using MathNet.Numerics.Distributions;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.UncertainClimbs;

/// <summary>Solves the equation stated at <see cref="ClimbPlan"/>: W(h) from the ground up, for the pace at which W(top) is 0.</summary>
internal sealed class ClimbPlanSolver
{
    private const double StepM = 5;
    private const int Quantiles = 400;

    /// <summary>Slowest pace looked at, s/m: below walking speed no plan is worth having.</summary>
    private const double SlowestPace = 2;

    private readonly ClassicPace _pace;
    private readonly ClimbProspect _prospect;
    private readonly double[] _strengthsMps;
    private readonly double[] _lostS;
    private readonly double _stepM;
    private double _secondsPerM;

    public ClimbPlanSolver(ClassicPace pace, ClimbProspect prospect)
    {
        (_pace, _prospect) = (pace, prospect);
        var steps = (int)Math.Ceiling(prospect.TopM / StepM);
        _stepM = prospect.TopM / steps;
        _lostS = new double[steps + 1];
        _strengthsMps = [.. Enumerable.Range(0, Quantiles)
            .Select(i => prospect.MeanMps + prospect.SpreadMps * Normal.InvCDF(0, 1, (i + 0.5) / Quantiles))
            .Where(strength => strength > 0)];
    }

    public bool TrySolve(out double secondsPerM)
    {
        // No plan is faster than meeting the best climb every time.
        var (fast, slow) = (1 / _pace.AverageSpeedMps(_strengthsMps[^1]), SlowestPace);
        secondsPerM = slow;
        if (LostAtTopS(slow) > 0)
        {
            return false;
        }

        for (var i = 0; i < 60; i++)
        {
            var middle = (fast + slow) / 2;
            (fast, slow) = LostAtTopS(middle) > 0 ? (middle, slow) : (fast, middle);
        }

        secondsPerM = slow;
        LostAtTopS(slow);
        return true;
    }

    public IReadOnlyList<ClimbPlanStep> Describe(SpeedTargets targets, in Air air, in Loading loading)
    {
        var steps = new ClimbPlanStep[_lostS.Length];
        var exposure = 0.0;
        var rateBelow = 0.0;
        for (var i = 0; i < steps.Length; i++)
        {
            var heightM = i * _stepM;
            var setting = SettingMps(heightM, _lostS[i]);
            var speed = targets.SpeedToFly(air, loading, setting, 0).Speed;
            var weakest = _lostS[i] > 0 ? (_prospect.TopM - heightM) / _lostS[i] : double.PositiveInfinity;
            var taken = _strengthsMps.Count(strength => strength > weakest) / (double)Quantiles;
            var rate = taken * speed.TrueAirspeedMps / speed.SinkMps / _prospect.SpacingM;
            exposure += i == 0 ? 0 : (rate + rateBelow) / 2 * _stepM;
            rateBelow = rate;
            steps[i] = new(heightM, setting, weakest, speed, Math.Exp(-exposure));
        }

        return steps;
    }

    /// <summary>Integrates W(h) upwards by the midpoint rule.</summary>
    private double LostAtTopS(double secondsPerM)
    {
        _secondsPerM = secondsPerM;
        _lostS[0] = _prospect.LandingCostS;
        for (var i = 1; i < _lostS.Length; i++)
        {
            var heightM = (i - 1) * _stepM;
            var middle = _lostS[i - 1] - _stepM / 2 / SettingMps(heightM, _lostS[i - 1]);
            _lostS[i] = _lostS[i - 1] - _stepM / SettingMps(heightM + _stepM / 2, middle);
        }

        return _lostS[^1];
    }

    private double SettingMps(double heightM, double lostS)
    {
        var gainS = 0.0;
        foreach (var strength in _strengthsMps)
        {
            gainS += Math.Max(0, lostS - (_prospect.TopM - heightM) / strength);
        }

        return _pace.SettingMps(1 / (_secondsPerM + gainS / Quantiles / _prospect.SpacingM));
    }
}
