using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;

namespace SpeedCommand.Flight.UncertainClimbs;

/// <summary>MacCready's average speed as a function of the climb setting, and back: strictly rising, tabulated finely in equal ratios.</summary>
internal sealed class ClassicPace
{
    private const double LowestMps = 1e-3;
    private const double HighestMps = 40;
    private const int Count = 1200;

    private readonly double[] _averageMps = new double[Count];

    private ClassicPace()
    {
    }

    /// <summary>The pace of one glider in one air; null when it has no speed to fly.</summary>
    public static ClassicPace? Make(SpeedTargets targets, in Air air, in Loading loading)
    {
        var pace = new ClassicPace();
        for (var i = 0; i < Count; i++)
        {
            var target = targets.SpeedToFly(air, loading, Setting(i), 0);
            if (!target.Speed.IsKnown)
            {
                return null;
            }

            pace._averageMps[i] = target.AverageSpeedMps;
        }

        return pace;
    }

    public double AverageSpeedMps(double settingMps)
    {
        var at = Math.Log(settingMps / LowestMps) / Math.Log(HighestMps / LowestMps) * (Count - 1);
        var i = (int)Math.Clamp(at, 0, Count - 2);
        return _averageMps[i] + (at - i) * (_averageMps[i + 1] - _averageMps[i]);
    }

    /// <summary>The setting that gives an average speed; below the table in proportion, above it the highest.</summary>
    public double SettingMps(double averageMps)
    {
        if (averageMps <= _averageMps[0])
        {
            return LowestMps * averageMps / _averageMps[0];
        }

        var i = Array.BinarySearch(_averageMps, averageMps);
        i = i < 0 ? ~i - 1 : i;
        return i >= Count - 1
            ? HighestMps
            : Setting(i + (averageMps - _averageMps[i]) / (_averageMps[i + 1] - _averageMps[i]));
    }

    private static double Setting(double index) => LowestMps * Math.Pow(HighestMps / LowestMps, index / (Count - 1));
}
