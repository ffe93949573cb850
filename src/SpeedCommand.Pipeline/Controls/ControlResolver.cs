using System.Diagnostics.CodeAnalysis;
using SpeedCommand.Flight.Quantities;

namespace SpeedCommand.Pipeline.Controls;

/// <summary>Turns what is asked into a change that is complete in itself, from how the controls stand at that moment.</summary>
public static class ControlResolver
{
    /// <summary>A value within this share of a step of a whole one stands on it: 3 kt kept as metres per second are not quite 3.</summary>
    private const double OnStep = 0.01;

    /// <summary>Works out the change.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="now">How the controls stand.</param>
    /// <param name="rules">What this cockpit allows.</param>
    /// <param name="change">The change, rounded to what its text keeps.</param>
    /// <param name="problem">Which control, what was expected and what was found, when it cannot be done.</param>
    /// <returns>Whether it can be done.</returns>
    public static bool TryResolve(
        in ControlRequest request, in ControlValues now, ControlRules rules, out ControlChange change, [NotNullWhen(false)] out string? problem)
    {
        ArgumentNullException.ThrowIfNull(rules);
        change = now.ChangeOf(request.Control);
        var isDone = request.Verb switch
        {
            ControlVerb.More => TryStep(request.Control, 1, rules, ref change, out problem),
            ControlVerb.Less => TryStep(request.Control, -1, rules, ref change, out problem),
            ControlVerb.Dump => TryDump(request.DumpKgPerS, rules, ref change, out problem),
            _ => Take(request, ref change, out problem),
        };
        change = ControlText.Round(change);
        if (isDone && change.Control == ControlId.Ballast && change.Value > rules.MaxBallastKg)
        {
            problem = $"ballast: expected at most {ControlCatalogue.Of(ControlId.Ballast).Text(rules.MaxBallastKg)}, the glider's greatest mass, found {ControlText.WriteValue(change)}";
            return false;
        }

        return isDone;
    }

    private static bool Take(in ControlRequest request, ref ControlChange change, out string? problem)
    {
        problem = null;
        change = new ControlChange(
            request.Control,
            double.IsNaN(request.Value) ? change.Value : request.Value,
            request.Verb == ControlVerb.Automatic,
            request.Verb == ControlVerb.Set && request.DumpKgPerS > 0 ? request.DumpKgPerS : 0);
        return true;
    }

    private static bool TryDump(double askedKgPerS, ControlRules rules, ref ControlChange change, out string? problem)
    {
        problem = change.Value > 0 ? null : "ballast: expected water on board to dump, found 0 kg";
        change = change with { DumpKgPerS = double.IsNaN(askedKgPerS) ? rules.DumpKgPerS : askedKgPerS };
        return problem is null;
    }

    private static bool TryStep(ControlId control, int direction, ControlRules rules, ref ControlChange change, out string? problem)
    {
        problem = null;
        var spec = ControlCatalogue.Of(control);
        if (spec.Quantity is not { } kind)
        {
            change = NextWord(spec, change, direction);
            return true;
        }

        var max = control == ControlId.Ballast ? Math.Min(spec.Max, rules.MaxBallastKg) : spec.Max;
        if (direction > 0 ? change.Value >= max : change.Value <= spec.Min)
        {
            problem = $"{spec.Name}: expected {spec.Range}, found '{(direction > 0 ? '+' : '-')}' at {spec.Text(change.Value)}";
            return false;
        }

        var step = StepFor(spec, rules.Units);
        var steps = Quantity.FromSi(change.Value, kind, step.Unit) / step.Size;
        var whole = Math.Round(steps);
        var next = Math.Abs(steps - whole) < OnStep ? whole + direction : direction > 0 ? Math.Ceiling(steps) : Math.Floor(steps);
        var text = ControlSpec.QuantityText(ToSi(next * step.Size, kind, step.Unit), kind, spec.Unit, spec.Decimals);
        // The last step ends where the control does.
        change = new ControlChange(control, Math.Clamp(ControlSpec.RoundTrip(text, kind), spec.Min, max), DumpKgPerS: change.DumpKgPerS);
        return true;
    }

    private static double ToSi(double value, QuantityKind kind, string unit) => value / Quantity.FromSi(1, kind, unit);

    private static ControlStep StepFor(ControlSpec spec, IReadOnlyList<string> units)
    {
        foreach (var unit in units)
        {
            foreach (var step in spec.Steps)
            {
                if (step.Unit == unit)
                {
                    return step;
                }
            }
        }

        return spec.Steps[0];
    }

    private static ControlChange NextWord(ControlSpec spec, in ControlChange change, int direction)
    {
        var text = ControlText.WriteValue(change);
        var at = 0;
        while (spec.Words[at] != text)
        {
            at++;
        }

        var next = ControlText.OfWord(spec, (at + direction + spec.Words.Count) % spec.Words.Count);
        return new ControlChange(spec.Id, double.IsNaN(next.Value) ? 0 : next.Value, next.Verb == ControlVerb.Automatic);
    }
}
