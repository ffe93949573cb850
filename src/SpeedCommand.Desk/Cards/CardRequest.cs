using SpeedCommand.Displays.Units;
using SpeedCommand.Replay.Conditions;

namespace SpeedCommand.Desk.Cards;

/// <summary>What a card shall hold. SI units.</summary>
/// <param name="Conditions">Glider, air and bugs; its climb, air motion, headwind and bank join the ranges below.</param>
/// <param name="MassesKg">The flying masses, one or two.</param>
/// <param name="Units">Units to print in; the ranges are round in them.</param>
internal sealed record CardRequest(FlightConditions Conditions, IReadOnlyList<double> MassesKg, DisplayUnits Units)
{
    // What a pilot meets (common practice): climbs up to 5 m/s, sink between thermals up to 3 m/s, winds up to 60 km/h.
    private static readonly double[] ClimbsMps = [0, 0.5, 1, 1.5, 2, 3, 4, 5], ClimbsKt = [0, 1, 2, 3, 4, 6, 8, 10];
    private static readonly double[] AirsMps = [1, 0, -1, -2, -3], AirsKt = [2, 0, -2, -4, -6];
    private static readonly double[] WindsKmh = [-20, 0, 20, 40, 60], WindsKt = [-10, 0, 10, 20, 30];
    private static readonly double[] BanksDegrees = [0, 30, 45];

    public IEnumerable<double> Climbs =>
        Joined(Units.Vertical.Symbol == "m/s" ? ClimbsMps : ClimbsKt, Units.Vertical, Conditions.ClimbMps).Order();

    public IEnumerable<double> Airs =>
        Joined(Units.Vertical.Symbol == "m/s" ? AirsMps : AirsKt, Units.Vertical, Conditions.AirMps).OrderDescending();

    public IEnumerable<double> Headwinds =>
        Joined(Units.Speed.Symbol == "km/h" ? WindsKmh : WindsKt, Units.Speed, Conditions.HeadwindMps).Order();

    public IEnumerable<double> BanksRad
    {
        get
        {
            var banks = BanksDegrees.Select(degrees => degrees * Math.PI / 180).ToList();
            var wanted = Math.Abs(Conditions.BankRad);
            return banks.Exists(bank => Math.Abs(bank - wanted) < 0.002) ? banks : banks.Append(wanted).Order();
        }
    }

    /// <summary>The range in SI units, with one value more unless it is there already.</summary>
    private static IEnumerable<double> Joined(double[] range, DisplayUnit unit, double wanted)
    {
        var values = range.Select(unit.DifferenceToSi).ToList();
        return values.Exists(value => Math.Abs(value - wanted) < 0.005) ? values : values.Append(wanted);
    }
}
