using SpeedCommand.Flight.LocatedJson;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Simulation.Scenarios;

namespace SpeedCommand.Simulation.Faults;

/// <summary>Reads fault plans; docs/failures.md describes every key.</summary>
public static class FaultPlanFile
{
    /// <summary>Beyond these a plan is a mistake: a second of nothing but faults, a burst longer than any serial buffer, a mad board.</summary>
    private const double MostPerHour = 3600, MostBytes = 65_536, MostTimes = 100, MostBaud = 4e6;

    private static readonly (string Word, bool Value)[] Drains = [("open", false), ("blocked", true)];

    /// <summary>The words of the kinds, in the order of <see cref="FaultKind"/>.</summary>
    internal static readonly (string Word, FaultKind Value)[] Kinds =
    [
        ("unplugged", FaultKind.Unplugged), ("loose-wire", FaultKind.LooseWire), ("silent", FaultKind.Silent),
        ("garbage", FaultKind.Garbage), ("bit-flips", FaultKind.BitFlips), ("half-lines", FaultKind.HalfLines),
        ("duplicated", FaultKind.Duplicated), ("reordered", FaultKind.Reordered), ("wrong-baud", FaultKind.WrongBaud),
        ("flood", FaultKind.Flood), ("frozen", FaultKind.Frozen), ("spike", FaultKind.Spike),
        ("pitot-blocked", FaultKind.PitotBlocked), ("static-blocked", FaultKind.StaticBlocked), ("clock-step", FaultKind.ClockStep),
    ];

    /// <summary>The word for a kind in plans, tables and logs.</summary>
    /// <param name="kind">The kind.</param>
    /// <returns>For example "loose-wire".</returns>
    public static string WordOf(FaultKind kind) => Kinds[(int)kind].Word;

    /// <summary>Reads a plan.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <param name="fileName">Its name, for messages.</param>
    /// <returns>The plan or every fault of the file with key and line.</returns>
    public static FaultPlanFileResult Read(ReadOnlySpan<byte> utf8, string fileName)
    {
        var problems = new List<JsonProblem>();
        if (!JsonPlaces.TryParse(utf8, fileName, out var top, out var problem))
        {
            return new FaultPlanFileResult(null, [problem]);
        }

        if (top.Kind != JsonPlaceKind.Object)
        {
            return new FaultPlanFileResult(null, [new JsonProblem(fileName, top.Line, "", $"expected an object, found '{top.Text}'")]);
        }

        var fields = new JsonFields(top, fileName, problems);
        var plan = new FaultPlan(fields.Text("name"), [.. fields.Objects("faults").Select(ReadFault)]);
        if (plan.Faults.Count == 0)
        {
            fields.Problem("faults: expected at least one");
        }

        fields.RejectUnknown();
        return new FaultPlanFileResult(problems.Count > 0 ? null : plan, problems);
    }

    private static FaultSpec ReadFault(JsonFields fields)
    {
        var kind = fields.Word("what", null, Kinds);
        var spec = ReadSpecial(fields, ReadTimes(fields, new FaultSpec(kind)));
        if (kind != FaultKind.ClockStep)
        {
            spec = spec with { Stream = fields.Text("stream", "") };
        }

        fields.RejectUnknown();
        return spec;
    }

    private static FaultSpec ReadTimes(JsonFields fields, FaultSpec spec)
    {
        var (isMoment, isOfLines) = (IsMoment(spec.Kind), IsOfLines(spec.Kind));
        if (fields.Has("at") && fields.Has("perHour"))
        {
            fields.Problem("expected one of at, perHour, found both");
        }

        if (!fields.Has("at") && !fields.Has("perHour") && !(isOfLines && fields.Has("perLine")))
        {
            fields.Problem(isOfLines ? "expected one of at, perHour, perLine, found none" : "expected one of at, perHour, found none");
        }

        return spec with
        {
            AtS = fields.Quantity("at", QuantityKind.Duration, double.NaN, 0),
            PerHour = Within(fields, "perHour", 0, 0, MostPerHour),
            ForS = isMoment ? 0 : fields.Quantity("for", QuantityKind.Duration, isOfLines ? 0 : null, 0),
            PerLine = isOfLines ? fields.Quantity("perLine", QuantityKind.Fraction, 1, 0) : 1,
        };
    }

    private static FaultSpec ReadSpecial(JsonFields fields, FaultSpec spec)
    {
        switch (spec.Kind)
        {
            case FaultKind.Garbage:
                return spec with { Bytes = (int)Within(fields, "bytes", spec.Bytes, 1, MostBytes) };
            case FaultKind.Flood:
                return spec with { Times = (int)Within(fields, "times", spec.Times, 2, MostTimes) };
            case FaultKind.WrongBaud:
                return spec with
                {
                    SentBaud = Within(fields, "sent", spec.SentBaud, 1, MostBaud),
                    HeardBaud = Within(fields, "heard", spec.HeardBaud, 1, MostBaud),
                };
            case FaultKind.Frozen:
                return spec with { Measures = fields.Word("measures", null, ScenarioSensors.Kinds) };
            case FaultKind.Spike:
                var measures = fields.Word("measures", null, ScenarioSensors.Kinds);
                return spec with { Measures = measures, Size = ScenarioSensors.ErrorIn(fields, "size", measures, null) };
            case FaultKind.PitotBlocked:
                return spec with
                {
                    IsDrainBlocked = fields.Word("drain", false, Drains),
                    DrainS = fields.Quantity("drainTime", QuantityKind.Duration, spec.DrainS, 0.01),
                    NoisePa = fields.Quantity("noise", QuantityKind.Pressure, spec.NoisePa, 0),
                };
            case FaultKind.StaticBlocked:
                return spec with { NoisePa = fields.Quantity("noise", QuantityKind.Pressure, spec.NoisePa, 0) };
            case FaultKind.ClockStep:
                return spec with { ByS = fields.Quantity("by", QuantityKind.Duration) };
            default:
                return spec;
        }
    }

    private static double Within(JsonFields fields, string key, double fallback, double least, double most)
    {
        var number = fields.Number(key, fallback);
        if (number < least || number > most)
        {
            fields.Problem(FormattableString.Invariant($"{key}: expected {least} to {most}, found {number}"));
        }

        return number;
    }

    /// <summary>What happens at a moment and does not last.</summary>
    private static bool IsMoment(FaultKind kind) => kind is FaultKind.Garbage or FaultKind.ClockStep;

    /// <summary>What happens to single lines.</summary>
    private static bool IsOfLines(FaultKind kind) => kind is FaultKind.BitFlips or FaultKind.HalfLines or FaultKind.Duplicated
        or FaultKind.Reordered or FaultKind.Spike;
}
