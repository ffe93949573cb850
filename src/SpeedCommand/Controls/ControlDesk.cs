using Microsoft.Extensions.Logging;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Service;

namespace SpeedCommand.Controls;

/// <summary>
/// The one way in for whatever changes a control: checks, hands the change to the machine, which stamps, records and takes it in
/// order with the sensors' lines, and says in one line what became of it. May be called from any thread.
/// </summary>
internal sealed class ControlDesk(CockpitMachine machine, ControlRules rules, TimeProvider time, ILogger<ControlDesk> log)
{
    /// <summary>A hand on a knob makes fewer; a knob with a broken wire would fill the flight's log.</summary>
    public const int MaxChangesPerSecond = 50;

    private readonly Lock _gate = new();
    private readonly bool[] _isTouched = new bool[ControlCatalogue.All.Count];
    private long _secondBegan = time.GetTimestamp();
    private int _changesInSecond;

    /// <summary>What was kept from before the service started, for the pilot to see; empty for nothing.</summary>
    public IReadOnlyList<ControlId> Kept { get; private set; } = [];

    /// <summary>How every control stands now.</summary>
    public ControlValues Values => machine.Controls;

    /// <summary>Changes a control.</summary>
    /// <param name="name">Its name in <see cref="ControlCatalogue"/>.</param>
    /// <param name="value">A value with its unit, a step (+ or -) or a word, as docs/controls.md lists them.</param>
    /// <param name="source">Who asks.</param>
    /// <param name="message">Name and value as accepted; or which control, what was expected and what was found. One line of ASCII.</param>
    /// <returns>Whether the control changed.</returns>
    public bool TryChange(ReadOnlySpan<char> name, ReadOnlySpan<char> value, ControlSource source, out string message)
    {
        if (!ControlText.TryRead(name, value, out var request, out var problem))
        {
            message = problem;
            return false;
        }

        return TryChange(request, source, out message);
    }

    /// <summary>Changes a control, or tells how it stands.</summary>
    /// <param name="line">Name and value with spaces between; a name alone asks.</param>
    /// <param name="source">Who asks.</param>
    /// <param name="message">Name and value; or which control, what was expected and what was found.</param>
    /// <returns>Whether the line was understood and done.</returns>
    public bool TryAnswer(ReadOnlySpan<char> line, ControlSource source, out string message)
    {
        line = line.Trim(' ');
        if (ControlCatalogue.Find(line) is { } asked)
        {
            message = ControlText.Write(Values.ChangeOf(asked.Id));
            return true;
        }

        var space = line.IndexOf(' ');
        return space < 0 ? TryChange(line, "", source, out message) : TryChange(line[..space], line[(space + 1)..], source, out message);
    }

    /// <summary>Sets a control to what the settings say; call before the first line.</summary>
    public void Begin(in ControlChange change)
    {
        if (change != ControlText.Round(Values.ChangeOf(change.Control)))
        {
            machine.Begin(ControlText.Round(change));
        }
    }

    /// <summary>Brings controls to where they stood before the service started; call before the first line. What this glider cannot have is left out.</summary>
    public void Restore(IEnumerable<ControlChange> changes)
    {
        var kept = new List<ControlId>();
        foreach (var change in changes)
        {
            var request = new ControlRequest(change.Control, change.IsAutomatic ? ControlVerb.Automatic : ControlVerb.Set, change.Value, change.DumpKgPerS);
            if (ControlResolver.TryResolve(request, Values, rules, out var resolved, out var problem))
            {
                machine.Begin(resolved);
                _isTouched[(int)change.Control] = true;
                kept.Add(change.Control);
                log.LogInformation("kept from before: {Change}", ControlText.Write(resolved));
            }
            else
            {
                log.LogWarning("not kept from before: {Problem}", problem);
            }
        }

        Kept = kept;
    }

    /// <summary>What is to be kept over a restart: every control that somebody has changed, as it stands now.</summary>
    public IReadOnlyList<ControlChange> ToKeep()
    {
        lock (_gate)
        {
            var values = Values;
            return [.. ControlCatalogue.All.Where(spec => _isTouched[(int)spec.Id]).Select(spec => ControlText.Round(values.ChangeOf(spec.Id)))];
        }
    }

    private bool TryChange(in ControlRequest request, ControlSource source, out string message)
    {
        lock (_gate)
        {
            if (time.GetElapsedTime(_secondBegan) >= TimeSpan.FromSeconds(1))
            {
                (_secondBegan, _changesInSecond) = (time.GetTimestamp(), 0);
            }

            if (++_changesInSecond > MaxChangesPerSecond)
            {
                message = $"{ControlCatalogue.Of(request.Control).Name}: expected at most {MaxChangesPerSecond} changes a second, found more";
                return false;
            }

            if (!machine.TryChange(request, rules, out var change, out var problem))
            {
                message = problem;
                return false;
            }

            _isTouched[(int)change.Control] = true;
            message = ControlText.Write(change);
        }

        log.LogInformation("{Source}: {Change}", source, message);
        return true;
    }
}
