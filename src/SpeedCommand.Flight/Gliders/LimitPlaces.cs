using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Flight.Gliders;

/// <summary>Reads the "limits" of a glider file.</summary>
internal static class LimitPlaces
{
    /// <summary>Below this an airspeed in a glider file is a slip of unit or key, m/s.</summary>
    public const double SlowestMps = 5;

    /// <summary>Above this an airspeed in a glider file is a slip of unit or key, m/s.</summary>
    public const double FastestMps = 150;

    public static GliderLimits? Read(FaultyPlaces places, JsonPlace top)
    {
        var limits = places.Find(top, "limits", JsonPlaceKind.Object, isRequired: false, "an object with the placarded limits");
        if (limits is null)
        {
            if (top.Find("limits") is null)
            {
                places.Warn(top, "no limits given: the speed to fly will not be shown");
            }

            return null;
        }

        places.WarnOfUnknownKeys(limits, "stall", "roughAir", "neverExceed");
        var stallMps = places.Quantity(limits, "stall", QuantityKind.Speed, SlowestMps, FastestMps);
        var roughAirMps = places.Quantity(limits, "roughAir", QuantityKind.Speed, SlowestMps, FastestMps, isRequired: false);
        if (roughAirMps <= stallMps)
        {
            places.FaultFound(limits.Find("roughAir")!, "above the stall speed");
        }

        var steps = ReadSteps(places, limits, stallMps);
        return places.HasFault ? null : new GliderLimits(stallMps, roughAirMps, steps);
    }

    private static List<NeverExceedStep> ReadSteps(FaultyPlaces places, JsonPlace limits, double stallMps)
    {
        const string Expectation = "a list of { \"upTo\", \"airspeed\" }";
        var steps = new List<NeverExceedStep>();
        var list = places.Find(limits, "neverExceed", JsonPlaceKind.Array, isRequired: true, Expectation);
        if (list is { Elements.Count: 0 })
        {
            places.Fault(list, $"expected {Expectation}, found none");
        }

        foreach (var element in list?.Elements ?? [])
        {
            places.WarnOfUnknownKeys(element, "upTo", "airspeed");
            var step = new NeverExceedStep(
                places.Quantity(element, "upTo", QuantityKind.Length, 100, 32_000),
                places.Quantity(element, "airspeed", QuantityKind.Speed, SlowestMps, FastestMps));
            if (step.AirspeedMps <= stallMps)
            {
                places.Fault(element, "expected an airspeed above the stall speed");
            }

            if (steps.Count > 0 && step.UpToM <= steps[^1].UpToM)
            {
                places.Fault(element, "expected an altitude above that of the entry before");
            }

            steps.Add(step);
        }

        return steps;
    }
}
