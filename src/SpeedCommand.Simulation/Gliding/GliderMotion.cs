using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Simulation.AirMass;

namespace SpeedCommand.Simulation.Gliding;

/// <summary>
/// The glider as a point mass in energy form. Energy height E = h + V^2/2g changes by dE/dt = air - sink + launch, and
/// nothing else; what the pilot does moves energy between speed and height. Load factor n = (1 - V j/g^2)/cos(bank), from the
/// path's curvature for a change of acceleration j, sets the sink.
/// </summary>
public sealed class GliderMotion
{
    private const double GravityMps2 = StandardAtmosphere.StandardGravityMps2;

    private readonly AirProfile _air;
    private readonly IReadOnlyList<IVerticalMotion> _vertical;
    private readonly SpeedTargets _targets;
    private readonly PilotModel _pilot;
    private readonly double _massKg;

    /// <summary>Sets the scene.</summary>
    /// <param name="targets">The glider's polar.</param>
    /// <param name="massKg">Its mass with everything aboard, kg.</param>
    /// <param name="pilot">The pilot.</param>
    /// <param name="air">The day's air.</param>
    /// <param name="vertical">What moves the air up and down.</param>
    public GliderMotion(SpeedTargets targets, double massKg, PilotModel pilot, AirProfile air, IReadOnlyList<IVerticalMotion> vertical)
    {
        _targets = targets;
        _massKg = massKg;
        _pilot = pilot;
        _air = air;
        _vertical = vertical;
    }

    /// <summary>The state's rate of change, with what it came from.</summary>
    /// <param name="state">The state.</param>
    /// <param name="orders">What the pilot wants now.</param>
    /// <param name="timeS">Time since the start, s.</param>
    /// <param name="flow">The air, the sink and the energy balance behind it.</param>
    /// <returns>The rate of change of each number of the state.</returns>
    /// <exception cref="InvalidOperationException">The glider was asked to fly outside its polar or the air profile.</exception>
    public GliderState RateAt(in GliderState state, in PilotOrders orders, double timeS, out GliderFlow flow)
    {
        var v = state.AirspeedMps;
        var cosBank = Math.Cos(state.BankRad);
        var load = (1 - v * state.JerkMps3 / (GravityMps2 * GravityMps2)) / cosBank;
        var air = _air.At(state.HeightM);
        if (!_targets.TrySink(new TrueAirspeed(v), air, new Loading(_massKg, load, 0), out var sinkMps))
        {
            throw new InvalidOperationException(
                $"at {timeS:F1} s the plan asks for {v:F1} m/s true airspeed at load factor {load:F2}, outside the glider's polar");
        }

        var airMps = orders.TurbulenceMps;
        foreach (var motion in _vertical)
        {
            airMps += motion.AirMps(state.AlongM, state.AcrossM, state.HeightM, timeS);
        }

        var climbMps = airMps - sinkMps + orders.LaunchMps;
        flow = new GliderFlow(air, load, sinkMps, airMps, climbMps);
        var wantedMps2 = Math.Clamp((orders.AirspeedMps - v) / _pilot.SpeedLagS,
            -GravityMps2 * Math.Sin(_pilot.PitchLimitRad), GravityMps2 * Math.Sin(_pilot.PitchLimitRad));
        var jerkRoom = GravityMps2 * GravityMps2 / v;
        var wantedMps3 = Math.Clamp((wantedMps2 - state.AccelerationMps2) / _pilot.StickLagS,
            (1 - PilotModel.GreatestLoad) * jerkRoom, (1 - PilotModel.LeastLoad) * jerkRoom);
        return new GliderState(
            climbMps - v * state.AccelerationMps2 / GravityMps2,
            state.AccelerationMps2,
            state.JerkMps3,
            (wantedMps3 - state.JerkMps3) / _pilot.LoadLagS,
            (orders.BankRad - state.BankRad) / PilotModel.BankLagS,
            GravityMps2 * Math.Sin(state.BankRad) / (cosBank * v),
            v * Math.Cos(state.HeadingRad),
            v * Math.Sin(state.HeadingRad));
    }
}
