using SpeedCommand.Pipeline.Controls;

namespace SpeedCommand.Controls;

/// <summary>
/// The keys of the terminal panel: bytes in, changes of controls out, and what the panel says meanwhile. A small letter is less, a
/// capital more. Sequences of function and arrow keys are passed over.
/// </summary>
/// <param name="desk">Where changes go.</param>
/// <param name="time">The clock of the moments.</param>
/// <param name="hasSound">Whether the settings have sound: without, its keys say that they change nothing to be heard.</param>
internal sealed class PanelKeys(ControlDesk desk, TimeProvider time, bool hasSound = true)
{
    private const char Help = '?', Entry = ':', EntryCursor = '_', Escape = '\u001b', Backspace = '\b', Delete = '\u007f';
    private const string NoSound = "sound is off in the settings (sound.active)";
    private static readonly TimeSpan NoticeTime = TimeSpan.FromSeconds(4);

    /// <summary>The page of keys hides the speed to hold, so it goes by itself.</summary>
    private static readonly TimeSpan PageTime = TimeSpan.FromSeconds(8);

    /// <summary>Every key; docs/display.md has the same table, and a test compares the two.</summary>
    public static IReadOnlyList<PanelKey> All { get; } =
    [
        new('+', "expected-climb +", "expected climb, a step up"),
        new('-', "expected-climb -", "expected climb, a step down"),
        new('a', "expected-climb auto", "expected climb follows the last climbs"),
        new('w', "ballast -", "a step less water"),
        new('W', "ballast +", "a step more water"),
        new('d', "ballast dump", "the valves open; once more, and they are shut"),
        new('b', "bugs -", "fewer bugs"),
        new('B', "bugs +", "more bugs"),
        new('p', "phase +", "phase: auto, climbing, gliding"),
        new('q', "qnh -", "altimeter setting, a step down"),
        new('Q', "qnh +", "altimeter setting, a step up"),
        new('l', "brightness -", "less light"),
        new('L', "brightness +", "more light"),
        new('v', "volume -", "less volume"),
        new('V', "volume +", "more volume"),
        new('m', "mute +", "sound off, or on again"),
        new(Entry, "", "type a line, such as qnh 1021 hPa; Enter does it, Escape gives it up"),
        new(Help, "", "these keys"),
    ];

    private readonly Lock _gate = new();
    private readonly char[] _entry = new char[60];
    private int _entryLength = -1;
    private SequencePart _sequence;
    private string _notice = "";
    private bool _isHelp;
    private long _since;

    /// <summary>Where in a key's sequence of bytes (ECMA-48: ESC, then "[" or "O", then up to a final byte) the input stands.</summary>
    private enum SequencePart
    {
        None,
        Escaped,
        Inside,
    }

    /// <summary>What the panel is to say now; empty for nothing.</summary>
    public string Notice
    {
        get
        {
            lock (_gate)
            {
                return _entryLength >= 0 ? $"{Entry} {_entry.AsSpan(0, _entryLength)}{EntryCursor}" : !_isHelp && time.GetElapsedTime(_since) < NoticeTime ? _notice : "";
            }
        }
    }

    /// <summary>The page of keys while it is asked for; else empty.</summary>
    public IReadOnlyList<string> Page
    {
        get
        {
            lock (_gate)
            {
                return _isHelp && time.GetElapsedTime(_since) < PageTime
                    ? ["KEYS (any key goes back)", .. All.Select(key => $"  {key.Key}  {key.Meaning}")]
                    : [];
            }
        }
    }

    /// <summary>Says something for a moment.</summary>
    public void Say(string notice)
    {
        lock (_gate)
        {
            (_notice, _isHelp, _since) = (notice, false, time.GetTimestamp());
        }
    }

    /// <summary>Takes what was typed, in any chunks.</summary>
    public void Take(ReadOnlySpan<byte> bytes)
    {
        foreach (var value in bytes)
        {
            lock (_gate)
            {
                if (!IsOfSequence((char)value))
                {
                    Press((char)value);
                }
            }
        }
    }

    private bool IsOfSequence(char value)
    {
        switch (_sequence)
        {
            case SequencePart.Escaped when value is '[' or 'O':
                _sequence = SequencePart.Inside;
                return true;
            case SequencePart.Inside:
                _sequence = value is >= '@' and <= '~' ? SequencePart.None : SequencePart.Inside;
                return true;
            default:
                _sequence = value == Escape ? SequencePart.Escaped : SequencePart.None;
                return false;
        }
    }

    private void Press(char key)
    {
        if (_entryLength >= 0)
        {
            Edit(key);
            return;
        }

        if (Page.Count > 0)
        {
            _isHelp = false;
            return;
        }

        switch (key)
        {
            case Help:
                (_isHelp, _since) = (true, time.GetTimestamp());
                break;
            case Entry:
                _entryLength = 0;
                break;
            case > ' ' and <= '~':
                Do(key == '=' ? '+' : key);
                break;
        }
    }

    private void Do(char key)
    {
        var found = All.FirstOrDefault(one => one.Key == key);
        if (found is null)
        {
            Say($"{key}: no such key; ? shows them");
            return;
        }

        // One key for the valves: what it does depends on how they stand.
        Ask(key == 'd' && desk.Values.DumpKgPerS > 0 ? $"ballast {ControlCatalogue.Stop}" : found.Request);
    }

    private void Edit(char key)
    {
        switch (key)
        {
            case Escape:
                _entryLength = -1;
                break;
            case '\r' or '\n':
                var line = new string(_entry, 0, _entryLength);
                _entryLength = -1;
                Ask(line);
                break;
            case Backspace or Delete:
                _entryLength = Math.Max(0, _entryLength - 1);
                break;
            case >= ' ' and <= '~' when _entryLength < _entry.Length:
                _entry[_entryLength++] = key;
                break;
        }
    }

    private static bool IsOfSound(string line) =>
        ControlText.TryRead(line, out var request, out _) && request.Control is ControlId.Volume or ControlId.Mute;

    /// <summary>What was done, the picture says by itself; what was not, is said here.</summary>
    private void Ask(string line)
    {
        var isDone = desk.TryAnswer(line, ControlSource.Key, out var message);
        var isQuestion = ControlCatalogue.Find(line.AsSpan().Trim(' ')) is not null;
        Say(!isDone || isQuestion ? message : !hasSound && IsOfSound(line) ? NoSound : "");
    }
}
