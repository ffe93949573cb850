using SpeedCommand.Flight.Airspeeds;
using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Flight.Gliders;

/// <summary>Reads glider files: JSON with comments, quantities as text with units.</summary>
public static class GliderFile
{
    private const double LightestKg = 50;
    private const double HeaviestKg = 2000;

    /// <summary>Reads a glider file. Whatever the bytes are, the answer is a result, not an exception.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <param name="fileName">The file's name as the user gave it, for messages.</param>
    /// <returns>The glider, or every fault with its key and line.</returns>
    public static GliderFileResult Read(ReadOnlySpan<byte> utf8, string fileName)
    {
        if (!JsonPlaces.TryParse(utf8, fileName, out var top, out var problem))
        {
            return new(null, [problem]);
        }

        var places = new FaultyPlaces(fileName);
        if (top.Kind != JsonPlaceKind.Object)
        {
            places.Fault(top, "expected an object with the glider's data");
            return new(null, places.Problems);
        }

        var glider = ReadGlider(places, top);
        return new(places.HasFault ? null : glider, places.Problems);
    }

    private static Glider? ReadGlider(FaultyPlaces places, JsonPlace top)
    {
        places.WarnOfUnknownKeys(
            top, "name", "wingArea", "referenceMass", "emptyMass", "maxMass", "dragPolar", "sinkTable", "quadraticPolar", "flaps",
            "limits", "airspeedCorrection");
        var name = places.Find(top, "name", JsonPlaceKind.Text, isRequired: true, "the glider's name");
        var wingAreaM2 = places.Quantity(top, "wingArea", QuantityKind.Area, 1, 100, isRequired: NeedsWingArea(top));
        var referenceMassKg = places.Quantity(top, "referenceMass", QuantityKind.Mass, LightestKg, HeaviestKg);
        var emptyMassKg = places.Quantity(top, "emptyMass", QuantityKind.Mass, LightestKg, HeaviestKg, isRequired: false);
        var maxMassKg = places.Quantity(top, "maxMass", QuantityKind.Mass, LightestKg, HeaviestKg, isRequired: false);
        CheckMasses(places, top, referenceMassKg, emptyMassKg, maxMassKg);
        var polar = PolarPlaces.Read(places, top, wingAreaM2, referenceMassKg);
        var limits = LimitPlaces.Read(places, top);
        var correction = ReadCorrection(places, top);
        return polar is null || name is null || places.HasFault
            ? null
            : new Glider
            {
                Name = name.Text,
                Polar = polar,
                EmptyMassKg = emptyMassKg,
                MaxMassKg = maxMassKg,
                Limits = limits,
                AirspeedCorrection = correction,
            };
    }

    private static bool NeedsWingArea(JsonPlace top) =>
        top.Find("dragPolar") is not null || top.Find("flaps")?.Elements.Any(flap => flap.Find("dragPolar") is not null) == true;

    private static void CheckMasses(FaultyPlaces places, JsonPlace top, double referenceMassKg, double emptyMassKg, double maxMassKg)
    {
        if (referenceMassKg > maxMassKg)
        {
            places.FaultFound(top.Find("referenceMass")!, "at most maxMass");
        }

        if (emptyMassKg >= referenceMassKg)
        {
            places.FaultFound(top.Find("emptyMass")!, "less than referenceMass");
        }
    }

    private static AirspeedCorrection ReadCorrection(FaultyPlaces places, JsonPlace top)
    {
        const string Expectation = "a list of { \"indicated\", \"calibrated\" }";
        var list = places.Find(top, "airspeedCorrection", JsonPlaceKind.Array, isRequired: false, Expectation);
        if (list is null)
        {
            return AirspeedCorrection.None;
        }

        var points = new List<CorrectionPoint>();
        var isOrdered = list.Elements.Count > 0;
        if (!isOrdered)
        {
            places.Fault(list, $"expected {Expectation}, found none");
        }

        foreach (var element in list.Elements)
        {
            places.WarnOfUnknownKeys(element, "indicated", "calibrated");
            var point = new CorrectionPoint(
                places.Quantity(element, "indicated", QuantityKind.Speed, LimitPlaces.SlowestMps, LimitPlaces.FastestMps),
                places.Quantity(element, "calibrated", QuantityKind.Speed, LimitPlaces.SlowestMps, LimitPlaces.FastestMps));
            if (points.Count > 0 && (point.IndicatedMps <= points[^1].IndicatedMps || point.CalibratedMps <= points[^1].CalibratedMps))
            {
                places.Fault(element, "expected both airspeeds above those of the entry before");
            }

            points.Add(point);
        }

        return places.HasFault ? AirspeedCorrection.None : new AirspeedCorrection(points);
    }
}
