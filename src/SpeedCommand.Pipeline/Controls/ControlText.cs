using System.Diagnostics.CodeAnalysis;
using SpeedCommand.Flight.Quantities;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>
/// Controls as text, the same on every input, in logs and in the state file. A change that was written reads back to the same bits,
/// which is what lets a replay give the flight's own bytes.
/// </summary>
public static class ControlText
{
    /// <summary>Longest text worth repeating in a message.</summary>
    private const int MaxShown = 40;

    /// <summary>Writes a change.</summary>
    /// <param name="change">The change.</param>
    /// <returns>Name and value, for example "expected-climb auto 1.5 m/s".</returns>
    public static string Write(in ControlChange change) => $"{ControlCatalogue.Of(change.Control).Name} {WriteValue(change)}";

    /// <summary>Writes a change's value alone.</summary>
    /// <param name="change">The change.</param>
    /// <returns>For example "auto 1.5 m/s".</returns>
    public static string WriteValue(in ControlChange change)
    {
        var spec = ControlCatalogue.Of(change.Control);
        return change switch
        {
            { Control: ControlId.Phase, IsAutomatic: true } => ControlCatalogue.Automatic,
            { Control: ControlId.Phase } => spec.Words[change.Value == (double)FlightPhase.Climbing ? 1 : 2],
            { Control: ControlId.Mute } => spec.Words[change.Value == 0 ? 0 : 1],
            { IsAutomatic: true } => $"{ControlCatalogue.Automatic} {spec.Text(change.Value)}",
            { DumpKgPerS: > 0 } => $"{spec.Text(change.Value)} {ControlCatalogue.Dump} {DumpText(change.DumpKgPerS)}",
            _ => spec.Text(change.Value),
        };
    }

    /// <summary>Rounds a change to what its text keeps.</summary>
    /// <param name="change">The change.</param>
    /// <returns>The change that reading its text gives.</returns>
    public static ControlChange Round(in ControlChange change) => change with
    {
        Value = ControlCatalogue.Of(change.Control).Round(change.Value),
        DumpKgPerS = change.DumpKgPerS > 0 ? ControlSpec.RoundTrip(DumpText(change.DumpKgPerS), QuantityKind.WaterFlow) : 0,
    };

    /// <summary>Reads a whole change, as logs and the state file have it.</summary>
    /// <param name="text">Name and value.</param>
    /// <param name="change">The change.</param>
    /// <param name="problem">Which control, what was expected and what was found, when it cannot be read.</param>
    /// <returns>Whether it could be read.</returns>
    public static bool TryReadChange(ReadOnlySpan<char> text, out ControlChange change, [NotNullWhen(false)] out string? problem)
    {
        change = default;
        if (!TryRead(text, out var request, out problem))
        {
            return false;
        }

        var isWhole = request.Verb == ControlVerb.Set
            || (request.Verb == ControlVerb.Automatic && (request.Control == ControlId.Phase || double.IsFinite(request.Value)));
        if (!isWhole)
        {
            problem = $"expected a value that stands by itself, found '{Show(text)}'";
            return false;
        }

        change = Round(new ControlChange(request.Control, double.IsNaN(request.Value) ? 0 : request.Value, request.Verb == ControlVerb.Automatic,
            double.IsNaN(request.DumpKgPerS) ? 0 : request.DumpKgPerS));
        return true;
    }

    /// <summary>Reads a request, name and value with spaces between.</summary>
    /// <param name="text">The request.</param>
    /// <param name="request">What is asked.</param>
    /// <param name="problem">Which control, what was expected and what was found, when it cannot be read.</param>
    /// <returns>Whether it could be read.</returns>
    public static bool TryRead(ReadOnlySpan<char> text, out ControlRequest request, [NotNullWhen(false)] out string? problem)
    {
        text = text.Trim(' ');
        var space = text.IndexOf(' ');
        return space < 0 ? TryRead(text, "", out request, out problem) : TryRead(text[..space], text[(space + 1)..], out request, out problem);
    }

    /// <summary>Reads a request.</summary>
    /// <param name="name">The control's name.</param>
    /// <param name="value">The value, a step or a word.</param>
    /// <param name="request">What is asked.</param>
    /// <param name="problem">Which control, what was expected and what was found, when it cannot be read.</param>
    /// <returns>Whether it could be read.</returns>
    public static bool TryRead(ReadOnlySpan<char> name, ReadOnlySpan<char> value, out ControlRequest request, [NotNullWhen(false)] out string? problem)
    {
        problem = null;
        request = default;
        if (ControlCatalogue.Find(name) is not { } spec)
        {
            problem = $"expected one of {string.Join(", ", ControlCatalogue.All.Select(one => one.Name))}, found '{Show(name)}'";
            return false;
        }

        value = value.Trim(' ');
        if (ReadValue(spec, value) is not { } read)
        {
            // A good quantity that is too much or too little is told its range, anything else what is understood.
            var isQuantity = spec.Quantity is { } kind && Quantity.TryParse(value, kind, out _, out _);
            problem = $"{spec.Name}: expected {(isQuantity ? spec.Range : spec.Expectation)}, found '{Show(value)}'";
            return false;
        }

        request = read;
        return true;
    }

    private static ControlRequest? ReadValue(ControlSpec spec, ReadOnlySpan<char> value) => value switch
    {
        "+" => new ControlRequest(spec.Id, ControlVerb.More),
        "-" => new ControlRequest(spec.Id, ControlVerb.Less),
        _ when spec.Id == ControlId.ExpectedClimb => ReadExpectedClimb(spec, value),
        _ when spec.Id == ControlId.Ballast => ReadBallast(spec, value),
        _ when spec.Quantity is not null => ReadQuantity(spec, value) is { } si ? new ControlRequest(spec.Id, ControlVerb.Set, si) : null,
        _ => ReadWord(spec, value),
    };

    private static ControlRequest? ReadExpectedClimb(ControlSpec spec, ReadOnlySpan<char> value)
    {
        if (value is ControlCatalogue.Automatic)
        {
            return new ControlRequest(spec.Id, ControlVerb.Automatic);
        }

        var isAutomatic = TakeWord(ref value, ControlCatalogue.Automatic);
        return ReadQuantity(spec, value) is { } si ? new ControlRequest(spec.Id, isAutomatic ? ControlVerb.Automatic : ControlVerb.Set, si) : null;
    }

    /// <summary>"80 kg", "dump", "dump 1.5 kg/s", "stop", and whole: "80 kg dump 1.5 kg/s".</summary>
    private static ControlRequest? ReadBallast(ControlSpec spec, ReadOnlySpan<char> value)
    {
        switch (value)
        {
            case ControlCatalogue.Dump:
                return new ControlRequest(spec.Id, ControlVerb.Dump);
            case ControlCatalogue.Stop:
                return new ControlRequest(spec.Id, ControlVerb.Stop);
        }

        if (TakeWord(ref value, ControlCatalogue.Dump))
        {
            return ReadDump(value) is { } rate ? new ControlRequest(spec.Id, ControlVerb.Dump, DumpKgPerS: rate) : null;
        }

        var dump = value.IndexOf($" {ControlCatalogue.Dump} ");
        if (dump < 0)
        {
            return ReadQuantity(spec, value) is { } kg ? new ControlRequest(spec.Id, ControlVerb.Set, kg) : null;
        }

        return ReadQuantity(spec, value[..dump]) is { } leftKg && ReadDump(value[(dump + ControlCatalogue.Dump.Length + 2)..]) is { } dumping
            ? new ControlRequest(spec.Id, ControlVerb.Set, leftKg, dumping)
            : null;
    }

    private static ControlRequest? ReadWord(ControlSpec spec, ReadOnlySpan<char> value)
    {
        for (var index = 0; index < spec.Words.Count; index++)
        {
            if (value.SequenceEqual(spec.Words[index]))
            {
                return OfWord(spec, index);
            }
        }

        return null;
    }

    /// <summary>The request that a word of a control stands for.</summary>
    internal static ControlRequest OfWord(ControlSpec spec, int index) => (spec.Id, index) switch
    {
        (ControlId.Phase, 0) => new ControlRequest(spec.Id, ControlVerb.Automatic),
        (ControlId.Phase, _) => new ControlRequest(spec.Id, ControlVerb.Set, (double)(index == 1 ? FlightPhase.Climbing : FlightPhase.Gliding)),
        _ => new ControlRequest(spec.Id, ControlVerb.Set, index),
    };

    private static bool TakeWord(ref ReadOnlySpan<char> value, string word)
    {
        if (!value.StartsWith(word, StringComparison.Ordinal) || value.Length <= word.Length || value[word.Length] != ' ')
        {
            return false;
        }

        value = value[(word.Length + 1)..];
        return true;
    }

    private static double? ReadQuantity(ControlSpec spec, ReadOnlySpan<char> text) =>
        Quantity.TryParse(text, spec.Quantity!.Value, out var si, out _) && si >= spec.Min && si <= spec.Max ? si : null;

    private static double? ReadDump(ReadOnlySpan<char> text) =>
        Quantity.TryParse(text, QuantityKind.WaterFlow, out var rate, out _)
        && rate is >= ControlCatalogue.MinDumpKgPerS and <= ControlCatalogue.MaxDumpKgPerS ? rate : null;

    private static string DumpText(double kgPerS) =>
        ControlSpec.QuantityText(kgPerS, QuantityKind.WaterFlow, ControlCatalogue.DumpUnit, ControlCatalogue.DumpDecimals);

    /// <summary>What was found, fit for one line of a log.</summary>
    private static string Show(ReadOnlySpan<char> text)
    {
        var cut = text.Length > MaxShown ? text[..MaxShown] : text;
        var shown = new string(cut);
        shown = string.Concat(shown.Select(one => one is >= ' ' and <= '~' or '°' or '²' ? one : '?'));
        return text.Length > MaxShown ? shown + "..." : shown;
    }
}
