using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Polars;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Flight.Gliders;

/// <summary>Reads the polar of a glider file: exactly one of the kinds.</summary>
internal static class PolarPlaces
{
    private static readonly string[] SingleKinds = ["dragPolar", "sinkTable", "quadraticPolar"];
    private static readonly string[] Kinds = [.. SingleKinds, "flaps"];

    /// <summary>The polar; null when there is a fault, in it or in the mass or wing area it rests on.</summary>
    public static IPolar? Read(FaultyPlaces places, JsonPlace top, double wingAreaM2, double referenceMassKg) =>
        Read(places, top, Kinds, wingAreaM2, referenceMassKg);

    private static IPolar? Read(FaultyPlaces places, JsonPlace parent, string[] kinds, double wingAreaM2, double referenceMassKg)
    {
        var given = kinds.Where(kind => parent.Find(kind) is not null).ToList();
        if (given.Count != 1)
        {
            var found = given.Count == 0 ? "none" : string.Join(" and ", given);
            places.Fault(parent, $"expected one of {string.Join(", ", kinds)}, found {found}");
            return null;
        }

        return given[0] switch
        {
            "dragPolar" => ReadDragPolar(places, parent, wingAreaM2, referenceMassKg),
            "sinkTable" => ReadSinkTable(places, parent, wingAreaM2, referenceMassKg),
            "flaps" => ReadFlaps(places, parent, wingAreaM2, referenceMassKg),
            _ => ReadQuadratic(places, parent, wingAreaM2, referenceMassKg),
        };
    }

    private static FlappedPolar? ReadFlaps(FaultyPlaces places, JsonPlace top, double wingAreaM2, double referenceMassKg)
    {
        var list = places.Find(top, "flaps", JsonPlaceKind.Array, isRequired: true, "a list of { \"setting\", and a polar }");
        if (list is { Elements.Count: 0 })
        {
            places.Fault(list, "expected at least one setting, found none");
        }

        var settings = new List<FlapSetting>();
        foreach (var element in list?.Elements ?? [])
        {
            places.WarnOfUnknownKeys(element, ["setting", .. SingleKinds]);
            var name = places.Find(element, "setting", JsonPlaceKind.Text, isRequired: true, "what stands beside the flap lever");
            var polar = Read(places, element, SingleKinds, wingAreaM2, referenceMassKg);
            if (name is not null && polar is not null)
            {
                if (settings.Count > 0 && (polar.MinAirspeedMps > settings.Max(s => s.Polar.MaxAirspeedMps)
                    || polar.MaxAirspeedMps < settings.Min(s => s.Polar.MinAirspeedMps)))
                {
                    places.Fault(element, "expected a speed range that meets that of the settings before");
                    continue;
                }

                settings.Add(new(name.Text, polar));
            }
        }

        return places.HasFault ? null : new FlappedPolar(settings);
    }

    private static DragPolar? ReadDragPolar(FaultyPlaces places, JsonPlace parent, double wingAreaM2, double referenceMassKg)
    {
        var polar = places.Find(parent, "dragPolar", JsonPlaceKind.Object, isRequired: true, "an object with cd0, k1, k2, clMax");
        if (polar is null)
        {
            return null;
        }

        places.WarnOfUnknownKeys(polar, "cd0", "k1", "k2", "clMax");
        var cd0 = places.Number(polar, "cd0", 0.001, 0.2);
        var k1 = places.Number(polar, "k1", -0.2, 0.2);
        var k2 = places.Number(polar, "k2", 0.001, 0.5);
        var clMax = places.Number(polar, "clMax", 0.2, 5, isRequired: false);
        if (k1 <= -2 * Math.Sqrt(cd0 * k2))
        {
            places.FaultFound(polar.Find("k1")!, "a k1 that keeps the drag positive at every lift, above -2 √(cd0 k2)");
        }

        return places.HasFault ? null : new DragPolar(wingAreaM2, referenceMassKg, cd0, k1, k2, clMax);
    }

    private static QuadraticPolar? ReadQuadratic(FaultyPlaces places, JsonPlace parent, double wingAreaM2, double referenceMassKg)
    {
        var polar = places.Find(
            parent, "quadraticPolar", JsonPlaceKind.Object, isRequired: true, "an object with a, b, c (m/s), minAirspeed, maxAirspeed");
        if (polar is null)
        {
            return null;
        }

        places.WarnOfUnknownKeys(polar, "a", "b", "c", "minAirspeed", "maxAirspeed");
        var a = places.Number(polar, "a", 1e-5, 0.1);
        var b = places.Number(polar, "b", -5, 5);
        var c = places.Number(polar, "c", -50, 50);
        var min = places.Quantity(polar, "minAirspeed", QuantityKind.Speed, LimitPlaces.SlowestMps, LimitPlaces.FastestMps);
        var max = places.Quantity(polar, "maxAirspeed", QuantityKind.Speed, LimitPlaces.SlowestMps, LimitPlaces.FastestMps);
        if (max <= min)
        {
            places.FaultFound(polar.Find("maxAirspeed")!, "above minAirspeed");
        }

        var slowest = Math.Max(min, Math.Min(max, -b / (2 * a)));
        if (c + slowest * (b + a * slowest) <= 0)
        {
            places.Fault(polar, "expected a sink above 0 from minAirspeed to maxAirspeed");
        }

        return places.HasFault ? null : new QuadraticPolar(a, b, c, min, max, referenceMassKg, wingAreaM2);
    }

    private static SinkTablePolar? ReadSinkTable(FaultyPlaces places, JsonPlace parent, double wingAreaM2, double referenceMassKg)
    {
        var list = places.Find(parent, "sinkTable", JsonPlaceKind.Array, isRequired: true, "a list of { \"airspeed\", \"sink\" }");
        if (list is null)
        {
            return null;
        }

        var points = new List<SinkPoint>();
        foreach (var element in list.Elements)
        {
            places.WarnOfUnknownKeys(element, "airspeed", "sink");
            var airspeedMps = places.Quantity(element, "airspeed", QuantityKind.Speed, LimitPlaces.SlowestMps, LimitPlaces.FastestMps);
            var sinkMps = places.Quantity(element, "sink", QuantityKind.Speed, 0.05, 50);
            if (points.Count > 0 && airspeedMps <= points[^1].AirspeedMps)
            {
                places.FaultFound(element.Find("airspeed")!, "an airspeed above that of the entry before");
            }

            points.Add(new(airspeedMps, sinkMps, double.IsNaN(sinkMps) ? 0 : RoundingMps(element.Find("sink")!.Text)));
        }

        if (points.Count < 3)
        {
            places.Fault(list, $"expected at least 3 points, found {points.Count}");
        }

        if (places.HasFault)
        {
            return null;
        }

        var polar = new SinkTablePolar(points, referenceMassKg, wingAreaM2);
        if (!polar.IsConvex)
        {
            places.Warn(list, "the points do not lie on a convex curve within their rounding: check them against the handbook");
        }

        return polar;
    }

    /// <summary>Half a unit of the last digit written: "0.68 m/s" says no more than 0.675 to 0.685.</summary>
    private static double RoundingMps(string text)
    {
        var numberEnd = text.AsSpan().LastIndexOfAnyInRange('0', '9') + 1;
        var point = text.IndexOf('.', StringComparison.Ordinal);
        var decimals = point < 0 ? 0 : numberEnd - point - 1;
        var unit = text[numberEnd..].Trim();
        return QuantityUnits.Of(QuantityKind.Speed).Single(known => known.Symbol == unit).ToSi(0.5 * Math.Pow(10, -decimals));
    }
}
