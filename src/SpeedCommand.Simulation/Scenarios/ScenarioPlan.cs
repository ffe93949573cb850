using SpeedCommand.Flight.Quantities;
using SpeedCommand.Simulation.Gliding;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>Reads a scenario's pilot and flight plan.</summary>
internal static class ScenarioPlan
{
    public static PilotModel ReadPilot(JsonFields fields)
    {
        var usual = new PilotModel();
        var pilot = new PilotModel(
            fields.Quantity("speedLag", QuantityKind.Duration, usual.SpeedLagS, 0.1),
            fields.Quantity("stickLag", QuantityKind.Duration, usual.StickLagS, 0.1),
            fields.Quantity("loadLag", QuantityKind.Duration, usual.LoadLagS, 0.05),
            fields.Quantity("pitchLimit", QuantityKind.Angle, usual.PitchLimitRad, 0.01),
            fields.Quantity("wander", QuantityKind.Speed, usual.WanderMps, 0),
            fields.Quantity("wanderTime", QuantityKind.Duration, usual.WanderTimeS, 0.1));
        fields.RejectUnknown();
        return pilot;
    }

    public static List<FlightLeg> ReadLegs(JsonFields top)
    {
        var legs = top.Objects("plan").Select(ReadLeg).ToList();
        if (legs.Count == 0)
        {
            top.Problem("plan: expected at least one leg");
        }

        return legs;
    }

    private static FlightLeg ReadLeg(JsonFields fields)
    {
        var leg = new FlightLeg(
            fields.Quantity("for", QuantityKind.Duration, double.NaN, 0),
            fields.Quantity("distance", QuantityKind.Length, double.NaN, 0),
            fields.Quantity("toHeight", QuantityKind.Length, double.NaN),
            fields.Quantity("turn", QuantityKind.Angle, double.NaN, 0),
            fields.Quantity("airspeed", QuantityKind.Speed, double.NaN, 1),
            fields.Quantity("expectedClimb", QuantityKind.Speed, double.NaN, 0),
            fields.Quantity("bank", QuantityKind.Angle, 0),
            fields.Quantity("launch", QuantityKind.Speed, 0));
        fields.RejectUnknown();
        if (Ends.Count(fields.Has) != 1)
        {
            fields.Problem("expected one of for, distance, toHeight, turn");
        }

        if (fields.Has("airspeed") == fields.Has("expectedClimb"))
        {
            fields.Problem("expected one of airspeed, expectedClimb");
        }

        if (!(Math.Abs(leg.BankRad) <= MaxBankRad))
        {
            fields.Problem("bank: expected at most 60 deg either way");
        }

        return leg;
    }

    private static readonly string[] Ends = ["for", "distance", "toHeight", "turn"];

    /// <summary>Steeper turns are aerobatics, where the small-angle polar no longer holds.</summary>
    private const double MaxBankRad = Math.PI / 3 + 1e-9;
}
