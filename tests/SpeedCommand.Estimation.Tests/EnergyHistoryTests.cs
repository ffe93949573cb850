using SpeedCommand.Estimation.Command;

namespace SpeedCommand.Estimation.Tests;

public class EnergyHistoryTests
{
    private const double StepS = 0.1;

    [Fact]
    public void AverageClimbMps_SteadyClimb_IsTheClimbOnceTheSpanIsFull()
    {
        var history = new EnergyHistory(30, StepS);
        for (var i = 0; i <= 1000; i++)
        {
            history.Add(500 + 1.7 * i * StepS);
            Assert.Equal(i >= 300, double.IsFinite(history.AverageClimbMps(30)));
        }

        Assert.Equal(1.7, history.AverageClimbMps(30), 1e-9);
        Assert.Equal(1.7, history.AverageClimbMps(5), 1e-9);
    }

    [Fact]
    public void Add_Hole_EndsWhatWasBefore()
    {
        var history = new EnergyHistory(1, StepS);
        for (var i = 0; i < 20; i++)
        {
            history.Add(i);
        }

        history.Add(double.NaN);
        Assert.Equal(double.NaN, history.HeightAgoM(0));
        history.Add(40);
        Assert.Equal(40, history.HeightAgoM(0));
        Assert.Equal(double.NaN, history.HeightAgoM(StepS));
    }

    [Fact]
    public void ThermalAverage_BeginsWhereTheCirclingDid_NotWhereItWasNoticed()
    {
        // Sinking 1 m/s until t = 20 s, then climbing 2 m/s; noticed 6 s late.
        var history = new EnergyHistory(30, StepS);
        var thermal = new ThermalAverage(StepS);
        var average = double.NaN;
        for (var i = 0; i <= 500; i++)
        {
            var t = i * StepS;
            history.Add(t < 20 ? 1000 - t : 980 + 2 * (t - 20));
            average = thermal.Add(t >= 26 - 1e-9, history, 6);
            Assert.Equal(t >= 20 + ThermalAverage.LeastS - 1e-9, double.IsFinite(average));
        }

        Assert.Equal(2, average, 0.01);
    }

    [Fact]
    public void ThermalAverage_HoleAndNewThermal()
    {
        var history = new EnergyHistory(30, StepS);
        var thermal = new ThermalAverage(StepS);
        double Fly(int from, int to, bool circling, Func<double, double> energyM)
        {
            var average = double.NaN;
            for (var i = from; i < to; i++)
            {
                history.Add(energyM(i * StepS));
                average = thermal.Add(circling, history, 0);
            }

            return average;
        }

        Assert.Equal(1, Fly(0, 200, true, t => t), 1e-9);
        Assert.Equal(double.NaN, Fly(200, 210, true, _ => double.NaN));
        Assert.Equal(1, Fly(210, 300, true, t => t), 1e-9);
        Assert.Equal(double.NaN, Fly(300, 310, false, t => t));
        Assert.Equal(3, Fly(310, 500, true, t => 3 * t), 1e-9);

        // Circling noticed while the energy was not known starts with the first known one.
        Fly(500, 510, false, t => t);
        Fly(510, 530, true, _ => double.NaN);
        Assert.Equal(0.5, Fly(530, 700, true, t => 0.5 * t), 1e-9);
    }
}
