using SpeedCommand.Flight.Atmosphere;

namespace SpeedCommand.Flight.HeightInHand;

/// <summary>A measured profile, straight between its levels. Below the lowest and above the highest nothing is known.</summary>
public sealed class MeasuredColumn : IAirColumn
{
    private readonly ColumnLevel[] _levels;

    /// <summary>Makes the column.</summary>
    /// <param name="levels">At least two levels of strictly rising altitude.</param>
    /// <exception cref="ArgumentException">There are fewer, or they do not rise.</exception>
    public MeasuredColumn(IReadOnlyList<ColumnLevel> levels)
    {
        _levels = [.. levels];
        for (var i = 1; i < _levels.Length; i++)
        {
            if (!(_levels[i].PressureAltitudeM > _levels[i - 1].PressureAltitudeM))
            {
                throw new ArgumentException("altitudes must rise from level to level", nameof(levels));
            }
        }

        if (_levels.Length < 2)
        {
            throw new ArgumentException("at least two levels are needed", nameof(levels));
        }
    }

    /// <inheritdoc/>
    public bool TryAt(double pressureAltitudeM, out Air air)
    {
        air = default;
        if (!(pressureAltitudeM >= _levels[0].PressureAltitudeM && pressureAltitudeM <= _levels[^1].PressureAltitudeM)
            || !StandardAtmosphere.TryAt(pressureAltitudeM, out var state))
        {
            return false;
        }

        var upper = 1;
        while (_levels[upper].PressureAltitudeM < pressureAltitudeM)
        {
            upper++;
        }

        var (below, above) = (_levels[upper - 1], _levels[upper]);
        var share = (pressureAltitudeM - below.PressureAltitudeM) / (above.PressureAltitudeM - below.PressureAltitudeM);
        return Air.TryMeasured(
            state.PressurePa,
            below.TemperatureK + share * (above.TemperatureK - below.TemperatureK),
            below.RelativeHumidity + share * (above.RelativeHumidity - below.RelativeHumidity),
            out air,
            out _);
    }
}
