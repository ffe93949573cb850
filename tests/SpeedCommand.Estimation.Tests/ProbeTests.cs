using SpeedCommand.Estimation.Energy;
using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Estimation.Tests;

/// <summary>A total-energy probe beside, instead of and without the pressures. The flights made here are the outside truth.</summary>
public class ProbeTests
{
    private const double SigmaM = 0.1;
    private const double KineticM = 60;

    [Fact]
    public void ProbeAlone_SteadyClimb_IsFound()
    {
        var flight = new MadeFlight();
        flight.Fly(60, 1.5, height: false, kinetic: false, probe: true);
        var estimate = flight.Estimate;
        Assert.Equal(1.5, estimate.ClimbMps, 4 * estimate.ClimbSigmaMps);
        Assert.InRange(estimate.ClimbSigmaMps, 0.02, 0.3);
        Assert.True(double.IsNaN(estimate.TrueAirspeedMps));
        Assert.InRange(Math.Sqrt(flight.Estimator.Noise.ProbeVarianceM2) / SigmaM, 0.7, 1.3);
    }

    [Fact]
    public void ProbeThatDies_ChangesSigmaOnly()
    {
        var flight = new MadeFlight();
        flight.Fly(60, 1.5, height: true, kinetic: true, probe: true);
        var with = flight.Estimate;
        flight.Fly(10, 1.5, height: true, kinetic: true, probe: false);
        var without = flight.Estimate;
        Assert.Equal(1.5, without.ClimbMps, 0.15);
        Assert.InRange(without.ClimbSigmaMps / with.ClimbSigmaMps, 1.0, 2);
        Assert.Equal(15, without.EnergyHeightM - with.EnergyHeightM, 0.5);
    }

    [Theory]
    [InlineData(false, true)]
    [InlineData(true, false)]
    [InlineData(true, true)]
    public void ProbeThatAppears_WithADatumOfItsOwn_ChangesNoClimb(bool height, bool kinetic)
    {
        var flight = new MadeFlight { ProbeDatumM = -700 };
        flight.Fly(60, 2, height: true, kinetic: true, probe: false);
        flight.Fly(5, 2, height: true, kinetic: true, probe: true);
        Assert.Equal(2, flight.Estimate.ClimbMps, 0.15);
        flight.Fly(60, 2, height, kinetic, probe: true);
        Assert.Equal(2, flight.Estimate.ClimbMps, 0.15);
    }

    [Fact]
    public void PressuresThatAppearAfterTheProbe_ChangeNeitherClimbNorEnergyHeight()
    {
        // The kinetic height guessed was 45 m; the true one is 60 m, and the heights have another datum than the probe's.
        var flight = new MadeFlight { ProbeDatumM = 300 };
        flight.Fly(40, 1, height: false, kinetic: false, probe: true);
        var alone = flight.Estimate;
        // The gust that the probe alone could not tell from climb takes a moment to be told apart.
        flight.Worst = 0;
        flight.Fly(4, 1, height: true, kinetic: true, probe: true);
        Assert.InRange(flight.Worst, 0, 0.8);
        flight.Fly(16, 1, height: true, kinetic: true, probe: true);
        Assert.Equal(20, flight.Estimate.EnergyHeightM - alone.EnergyHeightM, 1.5);
        Assert.Equal(Math.Sqrt(2 * 9.80665 * KineticM), flight.Estimate.TrueAirspeedMps, 0.1);
    }

    [Fact]
    public void ProbeThatUndercompensates_IsFoundOutByPullUps()
    {
        // A lossless exchange of 40 m every twenty seconds; the probe feels a twentieth of the kinetic height too little. Taken at its word it
        // would show (1+Cp)(V/g)dV/dt (Nicks, NASA TM X-73928), here up to 0.5 m/s.
        var flight = new MadeFlight { ProbeShare = -0.05, SwapM = 40 };
        flight.Fly(120, 0, height: true, kinetic: true, probe: true);
        flight.Worst = 0;
        flight.Fly(60, 0, height: true, kinetic: true, probe: true);
        Assert.InRange(flight.Worst, 0, 0.25);
    }

    [Theory]
    [InlineData(30, 1000)]
    [InlineData(58, 1000)]
    [InlineData(70, 6000)]
    public void TotalEnergyProbe_CompressibleImpactPressure_IsKineticHeight(double speedMps, double heightM)
    {
        // Isentropic flow (NASA RP-1046): p / p0 = (1 + V²/(7 R T))^-3.5, so the probe at p less impact pressure.
        Assert.True(StandardAtmosphere.TryAt(heightM, out var state));
        Assert.True(Air.TryStandard(state.PressurePa, 0, out var air, out _));
        var impactPa = air.PressurePa * (Math.Pow(1 + speedMps * speedMps / (7 * 287.05287 * air.TemperatureK), 3.5) - 1);
        var kineticM = speedMps * speedMps / (2 * 9.80665);
        var probe = new TotalEnergyProbe();
        var atRest = probe.HeightAt(air.PressurePa, air, 0);
        var flying = probe.HeightAt(air.PressurePa - impactPa, air, kineticM);
        Assert.Equal(kineticM, flying - atRest, 0.001 * kineticM);
    }

    [Fact]
    public void Add_WithAProbe_AllocatesNothing()
    {
        var flight = new MadeFlight();
        flight.Fly(10, 0, height: true, kinetic: true, probe: true);
        Assert.Equal(0, Allocation.Of(() =>
        {
            flight.Fly(10, 0, height: true, kinetic: false, probe: true);
            flight.Fly(10, 0, height: true, kinetic: true, probe: false);
            flight.Fly(10, 0, height: true, kinetic: true, probe: true);
        }));
    }

    /// <summary>A glider with three sensors at 20 Hz.</summary>
    private sealed class MadeFlight
    {
        private readonly Random _random = new(11);
        private long _timeUs;
        private double _energyM = 1000;

        public AdaptiveEnergyEstimator Estimator { get; } = new();

        public double ProbeDatumM { get; init; }

        public double ProbeShare { get; init; }

        public double SwapM { get; init; }

        public double Worst { get; set; }

        public EnergyEstimate Estimate => Estimator.EstimateAt(_timeUs);

        public void Fly(double seconds, double climbMps, bool height, bool kinetic, bool probe)
        {
            for (var i = 0; i < seconds * 20; i++)
            {
                _timeUs += 50_000;
                _energyM += 0.05 * climbMps;
                var kineticM = KineticM + SwapM / 2 * (Math.Cos(2 * Math.PI * _timeUs * 1e-6 / 20) - 1);
                if (height)
                {
                    Estimator.AddHeight(_timeUs, _energyM - kineticM + Noise());
                }

                if (kinetic)
                {
                    Estimator.AddKineticHeight(_timeUs, kineticM + Noise());
                }

                if (probe)
                {
                    Estimator.AddProbeHeight(_timeUs, _energyM + ProbeShare * kineticM + ProbeDatumM + Noise());
                }

                Worst = Math.Max(Worst, Math.Abs(Estimate.ClimbMps - climbMps));
            }
        }

        private double Noise() =>
            SigmaM * Math.Sqrt(-2 * Math.Log(1 - _random.NextDouble())) * Math.Cos(2 * Math.PI * _random.NextDouble());
    }
}
