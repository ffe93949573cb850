using System.Text;
using SpeedCommand.Simulation.Randomness;
using SpeedCommand.Simulation.Sensors;
using SpeedCommand.Simulation.Truth;

namespace SpeedCommand.Simulation.Faults;

/// <summary>
/// Turns the lines of good sensors into the bytes of faulty ones: first what sensors do wrong, then boards with their lines, wires
/// with their bytes, the clock with its stamps. Works as it goes; the same lines, plan and seed give the same bytes. Truth is
/// no port's, and does not pass.
/// </summary>
public sealed class FlightSpoiler : ISimulatedFlightSink
{
    private readonly FaultPlan _plan;
    private readonly long _seed;
    private readonly LinesInOrder _pending = new();
    private readonly SpoiltSensors _sensors;
    private readonly Wires _wires;
    private readonly List<Board> _boards = [];

    /// <summary>Makes ready for one flight.</summary>
    /// <param name="plan">What goes wrong.</param>
    /// <param name="seed">The seed of every random number.</param>
    /// <param name="sink">Where the bytes go.</param>
    public FlightSpoiler(FaultPlan plan, long seed, IPortBytesSink sink)
    {
        ArgumentNullException.ThrowIfNull(plan);
        _plan = plan;
        _seed = seed;
        _sensors = new SpoiltSensors(FaultsOf("sensors"));
        _wires = new Wires(this, sink);
    }

    /// <summary>Takes a line of a good sensor; in the order of time.</summary>
    /// <param name="timeUs">When it was sent, microseconds since the start.</param>
    /// <param name="stream">Name of its stream.</param>
    /// <param name="line">The line without its end.</param>
    public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line)
    {
        AdvanceTo(timeUs);
        var board = BoardOf(stream);
        board.Lines.Take(timeUs, _sensors.Change(timeUs, board.Name, line), _pending);
    }

    /// <inheritdoc/>
    public void OnTruth(in TruthSample truth) => AdvanceTo(truth.TimeUs);

    /// <summary>Lets everything go that is due before a moment.</summary>
    /// <param name="timeUs">The moment by the true clock, microseconds.</param>
    public void AdvanceTo(long timeUs) => _pending.ReleaseUntil(timeUs, _wires);

    /// <summary>Lets everything go that still waits.</summary>
    /// <param name="timeUs">The end of the flight by the true clock, microseconds.</param>
    public void Finish(long timeUs)
    {
        foreach (var board in _boards)
        {
            board.Lines.Release(timeUs, _pending);
        }

        AdvanceTo(long.MaxValue);
    }

    /// <summary>What the clock that stamps arrivals says at a moment.</summary>
    /// <param name="timeUs">The moment by the true clock, microseconds.</param>
    /// <returns>Its stamp, microseconds.</returns>
    public long StampOf(long timeUs) => _wires.StampOf(timeUs);

    private IEnumerable<(FaultSpec Spec, SeededNoise Random)> FaultsOf(string owner) =>
        _plan.Faults.Select((spec, index) => (spec, new SeededNoise(_seed, $"fault {index} {owner}")));

    private Board BoardOf(ReadOnlySpan<byte> stream)
    {
        foreach (var board in _boards)
        {
            if (stream.SequenceEqual(board.Stream))
            {
                return board;
            }
        }

        var (name, bytes) = (Encoding.ASCII.GetString(stream), stream.ToArray());
        IEnumerable<(FaultSpec, SeededNoise)> Own(string part) => FaultsOf($"{part} {name}").Where(fault => fault.Spec.Concerns(name));
        _boards.Add(new Board(name, bytes, new SpoiltLines(bytes, Own("lines")), new SpoiltBytes(bytes, Own("bytes"))));
        return _boards[^1];
    }

    private sealed record Board(string Name, byte[] Stream, SpoiltLines Lines, SpoiltBytes Bytes);

    /// <summary>Takes the boards' lines when they are due, and stamps them.</summary>
    private sealed class Wires(FlightSpoiler owner, IPortBytesSink sink) : ISimulatedFlightSink
    {
        private readonly List<(FaultSpec Spec, FaultTimes Times)> _steps = [.. owner.FaultsOf("clock")
            .Where(fault => fault.Spec.Kind == FaultKind.ClockStep).Select(fault => (fault.Spec, new FaultTimes(fault.Spec, fault.Random)))];

        private long _aheadUs;

        public void OnLine(long timeUs, ReadOnlySpan<byte> stream, ReadOnlySpan<byte> line) =>
            owner.BoardOf(stream).Bytes.Send(timeUs, StampOf(timeUs), line, sink);

        public void OnTruth(in TruthSample truth)
        {
        }

        public long StampOf(long timeUs)
        {
            foreach (var (spec, times) in _steps)
            {
                _aheadUs += times.At(timeUs) == FaultMoment.Begins ? (long)Math.Round(spec.ByS * 1e6) : 0;
            }

            return Math.Max(0, timeUs + _aheadUs);
        }
    }
}
