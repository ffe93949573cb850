using SpeedCommand.Flight.Quantities;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Scenarios;

/// <summary>Reads a scenario's satellite receiver.</summary>
internal static class ScenarioGnss
{
    public static GnssSpec? Read(JsonFields top)
    {
        if (!top.Has("gnss"))
        {
            return null;
        }

        var fields = top.Object("gnss");
        var usual = new GnssSpec("");
        const double StepS = ScenarioFile.StepUs / 1e6;
        var read = new GnssSpec(
            fields.Text("stream"),
            Math.Max(1, Math.Round(fields.Quantity("every", QuantityKind.Duration, usual.EveryS, StepS) / StepS)) * StepS,
            fields.Quantity("latency", QuantityKind.Duration, usual.LatencyS, 0),
            fields.Quantity("positionNoise", QuantityKind.Length, usual.PositionNoiseM, 0),
            fields.Quantity("heightNoise", QuantityKind.Length, usual.HeightNoiseM, 0),
            fields.Quantity("speedNoise", QuantityKind.Speed, usual.SpeedNoiseMps, 0),
            fields.Quantity("latitude", QuantityKind.Angle, 0),
            fields.Quantity("longitude", QuantityKind.Angle, 0),
            fields.Quantity("track", QuantityKind.Angle, 0));
        if (!(Math.Abs(read.LatitudeRad) < MaxLatitudeRad) || !(Math.Abs(read.LongitudeRad) <= Math.PI))
        {
            fields.Problem("expected a latitude within 80 deg and a longitude within 180 deg either way");
        }

        if (!ScenarioSensors.IsStreamName(read.Stream))
        {
            fields.Problem(ScenarioSensors.StreamExpectation);
        }

        fields.RejectUnknown();
        return read;
    }

    /// <summary>Nearer the poles the earth about the start is not flat enough.</summary>
    private const double MaxLatitudeRad = 80 * Math.PI / 180;
}
