using System.Collections.Concurrent;
using SpeedCommand.Flight.Gliders;
using SpeedCommand.Simulation.Scenarios;
using SpeedCommand.Simulation.Sensors;

namespace SpeedCommand.Simulation.Faults.Trials;

/// <summary>Many short flights, each with a drawn fault, each held against the same flight without it.</summary>
public sealed class FaultTrials
{
    /// <summary>The scenarios flown in turn.</summary>
    public static IReadOnlyList<string> ScenarioNames { get; } = ["fault-glide", "fault-circle"];

    private readonly TrialFlight[] _flights;

    /// <summary>Flies the good flights: every scenario with every grade of sensors and a few seeds.</summary>
    /// <param name="glider">The glider of the scenarios.</param>
    /// <param name="seeds">Seeds a scenario and grade.</param>
    public FaultTrials(Glider glider, int seeds)
    {
        var settings = TrialFlight.SettingsOf(glider);
        var wanted = (from name in ScenarioNames
                      from grade in Enum.GetValues<SensorGrade>()
                      from seed in Enumerable.Range(1, seeds)
                      select (Name: name, Grade: grade, Seed: seed)).ToList();
        _flights = [.. wanted.AsParallel().AsOrdered().Select(flight => new TrialFlight(ScenarioOf(flight.Name, flight.Grade), settings, flight.Seed))];
    }

    /// <summary>Flies one trial.</summary>
    /// <param name="seed">Its seed: it picks the flight and draws the fault.</param>
    /// <returns>The fault and the wrong numbers, in order of time.</returns>
    public (FaultSpec Fault, IReadOnlyList<WrongNumber> Wrong) Fly(long seed)
    {
        var flight = _flights[(int)(seed % _flights.Length)];
        var fault = DrawnFaults.Draw(seed);
        var faulty = flight.Fly(new FaultPlan("drawn", [fault]), seed, out var isForged);
        // What the checksum let through is a value that is off, whatever made it.
        var own = FaultReach.Of(fault.Kind);
        var reach = isForged && own.IsNoticed ? FaultReach.Of(FaultKind.Spike) : own;
        return (fault, [.. WrongNumberJudge.Judge(flight, faulty, fault, reach, seed)]);
    }

    /// <summary>Flies many trials on all cores.</summary>
    /// <param name="firstSeed">Seed of the first, 0 or more; the others follow.</param>
    /// <param name="count">How many.</param>
    /// <returns>Each trial's fault and wrong numbers, in the order of seeds.</returns>
    public IReadOnlyList<(FaultSpec Fault, IReadOnlyList<WrongNumber> Wrong)> FlyMany(long firstSeed, int count)
    {
        var results = new (FaultSpec, IReadOnlyList<WrongNumber>)[count];
        Parallel.ForEach(Partitioner.Create(0, count), range =>
        {
            for (var i = range.Item1; i < range.Item2; i++)
            {
                results[i] = Fly(firstSeed + i);
            }
        });
        return results;
    }

    private static Scenario ScenarioOf(string name, SensorGrade grade) =>
        ScenarioFile.Read(BundledScenarios.Find(name)!, name, grade).Scenario!;
}
