using System.Diagnostics.CodeAnalysis;
using System.Text;
using SpeedCommand.Displaying;
using SpeedCommand.Pipeline;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Recording;

namespace SpeedCommand.Service;

/// <summary>
/// The pipeline as the service runs it: one lock, so that the order in which lines are stamped, recorded and taken is one
/// and the same. That order is what makes a replay give the same bytes.
/// </summary>
internal sealed class CockpitMachine : IDisposable
{
    private readonly Lock _gate = new();
    private readonly CockpitClock _clock;
    private readonly FlightRecorder? _recorder;
    private readonly FlightPipeline _pipeline;
    private readonly List<byte[]> _streamNames = [];

    public CockpitMachine(FlightSettings settings, CockpitClock clock, FlightRecorder? recorder, IEnumerable<IPictureSink> sinks)
    {
        _clock = clock;
        _recorder = recorder;
        _pipeline = new FlightPipeline(settings, new PictureFan(recorder is null ? [.. sinks] : [.. sinks, recorder]));
    }

    /// <summary>Counts of each stream; exact once the readers have stopped.</summary>
    public IReadOnlyList<StreamHealth> Streams => _pipeline.Streams;

    /// <summary>When each fault of the pipeline came and went; exact once the readers have stopped.</summary>
    public IEnumerable<FaultSpan> FaultSpans => _pipeline.FaultHistory.Spans;

    /// <summary>How the pilot's controls stand now.</summary>
    public ControlValues Controls
    {
        get
        {
            lock (_gate)
            {
                return _pipeline.Controls;
            }
        }
    }

    public FlightRecorder? Recorder => _recorder;

    public int AddStream(string name, StreamSettings settings)
    {
        lock (_gate)
        {
            _streamNames.Add(Encoding.ASCII.GetBytes(name));
            return _pipeline.AddStream(name, settings);
        }
    }

    /// <summary>Takes a line that arrived at the given time. A picture made meanwhile moves its stamp up, never back.</summary>
    public void Accept(long arrivalUs, int stream, ReadOnlySpan<byte> line)
    {
        lock (_gate)
        {
            var stampUs = Math.Max(arrivalUs, _pipeline.TimeUs);
            _recorder?.Record(stampUs, _streamNames[stream], line);
            _pipeline.Accept(stampUs, stream, line);
        }
    }

    /// <summary>Tells how a control stands before the flight; call before the first line.</summary>
    public void Begin(in ControlChange change)
    {
        lock (_gate)
        {
            _recorder?.BeginControl(change);
            _pipeline.Accept(0, change);
        }
    }

    /// <summary>Changes a control from how it stands at this moment. Stamped, recorded and taken as a line is, in one order with them.</summary>
    /// <returns>False with what was expected and what was found, when this cockpit cannot do it.</returns>
    public bool TryChange(in ControlRequest request, ControlRules rules, out ControlChange change, [NotNullWhen(false)] out string? problem)
    {
        lock (_gate)
        {
            // What a step or the end of a dump comes to depends on the moment: first the moment, then the step.
            _pipeline.AdvanceTo(_clock.NowUs);
            if (!ControlResolver.TryResolve(request, _pipeline.Controls, rules, out change, out problem))
            {
                return false;
            }

            _recorder?.RecordControl(_pipeline.TimeUs, change);
            _pipeline.Accept(_pipeline.TimeUs, change);
            return true;
        }
    }

    /// <summary>Makes the pictures that are due, even when every port is silent.</summary>
    public void Tick()
    {
        lock (_gate)
        {
            _pipeline.AdvanceTo(_clock.NowUs);
        }
    }

    /// <summary>Ends the flight in the log; call when the readers have stopped.</summary>
    public void Finish()
    {
        lock (_gate)
        {
            _recorder?.RecordEnd(_pipeline.TimeUs);
            _recorder?.Drain();
        }
    }

    public void Dispose() => _recorder?.Dispose();
}
