using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Health;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Desk.Reports;

/// <summary>A flight as a report sees it; collects the pictures of its replay.</summary>
/// <param name="name">Name of the recording.</param>
/// <param name="settings">What it is replayed with.</param>
internal sealed class ReportFlight(string name, FlightSettings settings) : IPictureSink
{
    private readonly SpeedTargets _targets = new(settings.Glider, settings.StallMargin);
    private readonly List<ReportMoment> _moments = [];
    private readonly List<FaultStretch> _faults = [];
    private readonly double[] _since = new double[FaultNames.All.Count];
    private StartupSilence _startup;
    private Faults _present;
    private Faults _latest;
    private double _beforeS;

    public string Name => name;

    public FlightSettings Settings => settings;

    /// <summary>Time of day at the start of the recording; null when it does not tell.</summary>
    public DateTimeOffset? StartUtc { get; init; }

    /// <summary>What the recording itself says should be known before its numbers.</summary>
    public List<string> Remarks { get; } = [];

    public IReadOnlyList<ReportMoment> Moments => _moments;

    /// <summary>Every presence of every fault, in the order of their ends.</summary>
    public IReadOnlyList<FaultStretch> Faults => _faults;

    public double DurationS => _moments.Count == 0 ? 0 : _moments[^1].TimeS;

    /// <summary>Every stretch of circling, climb or not.</summary>
    public IReadOnlyList<ClimbLeg> Circlings => FlightLegs.Circlings(_moments);

    /// <summary>Those that count as climbs.</summary>
    public IReadOnlyList<ClimbLeg> Climbs => [.. Circlings.Where(one => one.IsClimb)];

    public IReadOnlyList<GlideLeg> Glides => FlightLegs.Glides(_moments);

    /// <inheritdoc/>
    public void OnPicture(in CockpitPicture picture)
    {
        _moments.Add(ReportMoment.Of(picture, settings, _targets));
        Follow(_startup.Counted(picture.TimeUs, picture.Faults), picture.TimeS);
        _latest = picture.Faults;
        _beforeS = picture.TimeS;
    }

    /// <summary>Ends the flight and with it the faults that are still there.</summary>
    public void End()
    {
        if (!_startup.HasData)
        {
            Follow(_latest, _beforeS);
        }

        Follow(Pipeline.Picture.Faults.None, _beforeS);
    }

    private void Follow(Faults faults, double timeS)
    {
        for (var i = 0; faults != _present && i < _since.Length; i++)
        {
            var fault = FaultNames.All[i].Key;
            if ((faults & ~_present & fault) != 0)
            {
                _since[i] = timeS;
            }
            else if ((_present & ~faults & fault) != 0)
            {
                _faults.Add(new(fault, _since[i], _beforeS));
            }
        }

        _present = faults;
    }
}
