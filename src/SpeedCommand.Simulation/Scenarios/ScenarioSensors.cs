using SpeedCommand.Flight.Quantities;
using SpeedCommand.Sentences;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>Reads a scenario's sensors: the grade's figures with what the file says otherwise.</summary>
internal static class ScenarioSensors
{
    public static readonly (string Word, SensorGrade Value)[] Grades =
        [("common", SensorGrade.Common), ("fine", SensorGrade.Fine), ("poor", SensorGrade.Poor)];

    /// <summary>The words for the kinds of reading: the ids of their sentences.</summary>
    public static readonly (string Word, ReadingKind Value)[] Kinds =
    [
        ("STATIC", ReadingKind.StaticPressurePa), ("IMPACT", ReadingKind.ImpactPressurePa),
        ("TEPROBE", ReadingKind.TotalEnergyProbePa), ("IAS", ReadingKind.IndicatedAirspeedMps),
        ("OAT", ReadingKind.OutsideAirTemperatureK), ("RH", ReadingKind.RelativeHumidity),
        ("LOAD", ReadingKind.LoadFactor), ("BANK", ReadingKind.BankRad),
    ];

    private static readonly (string Word, SensorTroubleKind Value)[] Troubles =
        [("silent", SensorTroubleKind.Silent), ("stuck", SensorTroubleKind.Stuck), ("garbled", SensorTroubleKind.Garbled)];

    public static List<SensorSpec> Read(JsonFields top, SensorGrade grade) =>
        [.. top.Objects("sensors").Select(fields => ReadSensor(fields, grade))];

    private static SensorSpec ReadSensor(JsonFields fields, SensorGrade grade)
    {
        var kind = fields.Word("measures", null, Kinds);
        var usual = SensorGrades.Of(fields.Word<SensorGrade>("grade", grade, Grades), kind, fields.Text("stream"));
        var read = usual with
        {
            EveryS = fields.Quantity("every", QuantityKind.Duration, usual.EveryS, 0.002),
            Noise = ErrorIn(fields, "noise", kind, usual.Noise),
            Bias = ErrorIn(fields, "bias", kind, usual.Bias),
            Drift = ErrorIn(fields, "drift", kind, usual.Drift),
            Quantum = ErrorIn(fields, "quantum", kind, usual.Quantum),
            LagS = fields.Quantity("lag", QuantityKind.Duration, usual.LagS, 0),
            JitterS = fields.Quantity("jitter", QuantityKind.Duration, usual.JitterS, 0),
            ClockError = fields.Quantity("clockError", QuantityKind.Fraction, usual.ClockError),
            Coefficient = fields.Number("coefficient", usual.Coefficient),
            Troubles = [.. fields.Objects("troubles").Select(ReadTrouble)],
        };
        if (!IsStreamName(read.Stream))
        {
            fields.Problem(StreamExpectation);
        }

        fields.RejectUnknown();
        return read;
    }

    private static SensorTrouble ReadTrouble(JsonFields fields)
    {
        var trouble = new SensorTrouble(fields.Word("what", null, Troubles),
            fields.Quantity("from", QuantityKind.Duration, least: 0), fields.Quantity("for", QuantityKind.Duration, least: 0));
        fields.RejectUnknown();
        return trouble;
    }

    /// <summary>A deviation of a reading, in its SI unit; a missing one without a usual value is a fault.</summary>
    public static double ErrorIn(JsonFields fields, string key, ReadingKind kind, double? usual) => kind switch
    {
        ReadingKind.StaticPressurePa or ReadingKind.ImpactPressurePa or ReadingKind.TotalEnergyProbePa =>
            fields.Quantity(key, QuantityKind.Pressure, usual),
        ReadingKind.IndicatedAirspeedMps => fields.Quantity(key, QuantityKind.Speed, usual),
        ReadingKind.OutsideAirTemperatureK => fields.Quantity(key, QuantityKind.TemperatureDifference, usual),
        ReadingKind.RelativeHumidity => fields.Quantity(key, QuantityKind.Fraction, usual),
        ReadingKind.BankRad => fields.Quantity(key, QuantityKind.Angle, usual),
        _ => fields.Number(key, usual),
    };

    public const string StreamExpectation = "stream: expected 1 to 32 printable characters without spaces, and not 'truth'";

    public static bool IsStreamName(string name) =>
        name.Length is > 0 and <= 32 && name != "truth" && name[0] != '#' && name.All(letter => letter is > ' ' and <= '~');
}
