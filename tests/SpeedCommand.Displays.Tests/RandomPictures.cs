using CsCheck;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests;

/// <summary>Pictures far beyond any flight, blank in places: no display may break on one.</summary>
internal static class RandomPictures
{
    private static readonly Gen<double> Sigma = Gen.OneOf(Gen.Const(double.NaN), Gen.Double[0, 3]);

    public static Gen<CockpitPicture> Any { get; } =
        from speeds in Between(0, 400).Array[6]
        from verticals in Between(-200, 200).Array[5]
        from heights in Between(-2000, 32_000).Array[2]
        from temperature in Between(150, 350)
        from hand in Between(-1e6, 1e6).Array[2]
        from flags in Gen.Int[0, (1 << 24) - 1]
        from limit in Gen.Int[0, 4]
        from time in Gen.Long[0, 400_000_000_000]
        select new CockpitPicture
        {
            TimeUs = time,
            Phase = flags % 2 == 0 ? FlightPhase.Gliding : FlightPhase.Climbing,
            PressureAltitudeM = heights[0],
            DensityAltitudeM = heights[1],
            TemperatureK = temperature,
            TemperatureSource = limit % 2 == 0 ? TemperatureSource.Measured : TemperatureSource.Standard,
            IndicatedAirspeedMps = speeds[0],
            TrueAirspeedMps = speeds[1],
            ClimbMps = verticals[0],
            AverageClimbMps = verticals[1],
            NettoMps = verticals[2],
            ThermalAverageMps = verticals[3],
            RelativeNettoMps = verticals[4],
            MinSinkIndicatedMps = speeds[2],
            BestGlideIndicatedMps = speeds[3],
            SpeedToFlyIndicatedMps = speeds[4],
            HoldIndicatedMps = speeds[5],
            LimitedBy = (LimitedBy)limit,
            ExpectedClimbMps = verticals[0].Value,
            EnduranceS = hand[0],
            RangeM = hand[1],
            Faults = (Faults)flags,
        };

    private static Gen<Gauge> Between(double low, double high) => Gen.Frequency(
        (1, Gen.Const(Gauge.Blank)),
        (5, Gen.Select(Gen.Double[low, high], Sigma, (value, sigma) => new Gauge(value, sigma, 0.1))));
}
