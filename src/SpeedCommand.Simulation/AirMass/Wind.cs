namespace SpeedCommand.Simulation.AirMass;

/// <summary>
/// Wind by height, straight between the given heights, constant beyond. It carries glider and thermals over the ground and
/// does nothing else: energy gained or lost in its shear is left out.
/// </summary>
public sealed class Wind
{
    private readonly double[] _heightM;
    private readonly double[] _eastMps;
    private readonly double[] _northMps;

    /// <summary>Takes the wind at some heights.</summary>
    /// <param name="heightM">Heights, m, rising; none for calm.</param>
    /// <param name="fromRad">Where the wind comes from, rad clockwise from true north.</param>
    /// <param name="speedMps">Its speed, m/s.</param>
    public Wind(double[] heightM, double[] fromRad, double[] speedMps)
    {
        ArgumentNullException.ThrowIfNull(speedMps);
        _heightM = heightM;
        _eastMps = [.. fromRad.Zip(speedMps, (from, speed) => -speed * Math.Sin(from))];
        _northMps = [.. fromRad.Zip(speedMps, (from, speed) => -speed * Math.Cos(from))];
    }

    /// <summary>The wind at a height.</summary>
    /// <param name="heightM">Geopotential height, m.</param>
    /// <returns>Where it blows to, m/s east and north.</returns>
    public (double EastMps, double NorthMps) At(double heightM)
    {
        if (_heightM.Length == 0)
        {
            return (0, 0);
        }

        var above = Array.FindIndex(_heightM, height => height > heightM);
        if (above <= 0)
        {
            var end = above == 0 ? 0 : _heightM.Length - 1;
            return (_eastMps[end], _northMps[end]);
        }

        var share = (heightM - _heightM[above - 1]) / (_heightM[above] - _heightM[above - 1]);
        return (_eastMps[above - 1] + share * (_eastMps[above] - _eastMps[above - 1]),
            _northMps[above - 1] + share * (_northMps[above] - _northMps[above - 1]));
    }
}
