using SpeedCommand.Pipeline.Health;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Replaying;

/// <summary>What a whole flight comes to, picked up from its pictures.</summary>
public sealed class FlightTotals : IPictureSink
{
    private StartupSilence _startup;
    private Faults _counted;
    private Faults _latest;

    /// <summary>Time of the last picture, microseconds since the start.</summary>
    public long TimeUs { get; private set; }

    /// <summary>Greatest pressure altitude, m; NaN when none was known.</summary>
    public double MaxPressureAltitudeM { get; private set; } = double.NaN;

    /// <summary>Greatest total-energy climb averaged over 30 s, m/s; NaN when none was known.</summary>
    public double MaxAverageClimbMps { get; private set; } = double.NaN;

    /// <summary>Every fault that occurred; the silence of a sensor that had yet to speak up at the start is none.</summary>
    public Faults Faults => _startup.HasData ? _counted : _counted | _latest;

    /// <inheritdoc/>
    public void OnPicture(in CockpitPicture picture)
    {
        TimeUs = picture.TimeUs;
        _latest = picture.Faults;
        _counted |= _startup.Counted(picture.TimeUs, picture.Faults);
        MaxPressureAltitudeM = Greater(MaxPressureAltitudeM, picture.PressureAltitudeM.Value);
        MaxAverageClimbMps = Greater(MaxAverageClimbMps, picture.AverageClimbMps.Value);
    }

    private static double Greater(double greatest, double value) => value > greatest || double.IsNaN(greatest) ? value : greatest;
}
