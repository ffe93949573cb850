using SpeedCommand.Commands;
using SpeedCommand.Displaying;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Replay.Files;
using SpeedCommand.Replay.Igc;
using SpeedCommand.Replay.Pictures;
using SpeedCommand.Replay.Replaying;
using SpeedCommand.Replay.Settings;
using SpeedCommand.Settings;

namespace SpeedCommand.Replaying;

/// <summary>
/// Replays one recording from file to file. It shares nothing with other recordings, so that any number can run side by side,
/// in one process or on many machines, and each gives the same bytes. What is wrong is told to a writer of its own.
/// </summary>
internal sealed class FlightJob(ReplayRequest request, TextWriter errors)
{
    private const int BufferBytes = 1 << 16;

    public FlightResult Run(string path, CancellationToken cancel)
    {
        if (!File.Exists(path))
        {
            return Failed(path, ExitStatus.NoInput, $"expected a flight log, found {(Directory.Exists(path) ? "a folder" : "no such file")}");
        }

        try
        {
            using var recording = RecordingFile.Open(path);
            if (!SettingsOptions.TryOpen(request.Settings, request.With, out var source, out var exitStatus, errors))
            {
                return new FlightResult(path, exitStatus, null, 0, 0);
            }

            source.Recorded = recording.Flown;
            var settings = CockpitSettingsReader.Read(source, request.Glider, recording.GliderFile, needsPorts: false);
            SettingsOptions.Tell(source, errors);
            if (settings is null)
            {
                return new FlightResult(path, ExitStatus.BadSettings, null, 0, 0);
            }

            // The log names a glider too, and only now is it known which.
            if (GliderFault(path, new InputFile("the glider file", GliderFiles.PathOf(recording.GliderFile, source.File))) is { } fault)
            {
                errors.WriteLine(fault.Message);
                return new FlightResult(path, fault.IsUsage ? ExitStatus.Usage : ExitStatus.InputOutput, null, 0, 0);
            }

            return Play(path, recording, settings, cancel);
        }
        catch (FormatException fault)
        {
            return Failed(path, ExitStatus.BadData, fault.Message);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Failed(path, ExitStatus.InputOutput, fault.Message);
        }
    }

    private OutputFault? GliderFault(string path, InputFile glider) =>
        ReplayOutputs.Of(path, request) is { } output and not ReplayRequest.StandardOutput
            ? OutputFile.FaultOf(ReplayOutputs.OptionOf(request), output, glider)
            : null;

    private FlightResult Play(string path, IRecording recording, CockpitSettings settings, CancellationToken cancel)
    {
        using var stream = ReplayOutputs.Of(path, request) switch
        {
            null => null,
            ReplayRequest.StandardOutput => Console.OpenStandardOutput(),
            { } output => new FileStream(output, FileMode.Create, FileAccess.Write, FileShare.Read, 1),
        };
        using var buffered = stream is null ? null : new BufferedStream(stream, BufferBytes);
        using var panel = request.IsShown ? new ReplayPanel(settings.Units, request.Pace) : null;
        using var sound = SoundOf(settings.Sound);
        var totals = new FlightTotals();
        List<IPictureSink> sinks = [totals];
        if (buffered is not null)
        {
            sinks.Add(request.IsTable ? new PictureTable(buffered) : new PictureLines(buffered));
        }

        if (panel is not null)
        {
            sinks.Add(panel);
        }

        if (sound is not null)
        {
            sinks.Add(sound);
        }

        foreach (var remark in recording.Remarks)
        {
            errors.WriteLine($"{path}: {remark}");
        }

        var replay = recording.Start(settings.Flight, new PictureFan([.. sinks]), settings.StreamOf);
        var pacer = new Pacer(TimeProvider.System, request.Pace, cancel);
        while (!cancel.IsCancellationRequested && replay.Step(pacer.IsPaced ? pacer.WaitUntil : null))
        {
        }

        TellProblems(path, recording);
        if (sound is { IsFull: true })
        {
            errors.WriteLine($"{request.Sound}: warning: a WAV file ends after {WavFile.MaxSamples / Synthesizer.SampleRateHz / 3600} hours; the rest of the flight is not in it");
        }

        if (recording is IgcRecording { Climbs: { } climbs } igc && !igc.Survey.HasAirspeed)
        {
            errors.Write(ClimbTable.Of(path, climbs));
        }

        var badLines = recording.ProblemCount + replay.Pipeline.Streams.Sum(one => one.BadLines);
        return new FlightResult(path, recording.ProblemCount > 0 ? ExitStatus.BadData : ExitStatus.Done, totals, replay.LineCount, badLines);
    }

    private SoundTrack? SoundOf(SoundSettings settings) => request.Sound is null
        ? null
        : new SoundTrack(settings.Style, SoundLevel.GainOf(settings.Volume),
            new FileStream(request.Sound, FileMode.Create, FileAccess.Write, FileShare.Read, BufferBytes));

    /// <summary>What could not be used is told with its line; the rest was replayed all the same.</summary>
    private void TellProblems(string path, IRecording recording)
    {
        foreach (var problem in recording.Problems)
        {
            errors.WriteLine($"{path}:{problem.LineNumber}: {problem.Message}");
        }

        if (recording.ProblemCount > recording.Problems.Count)
        {
            errors.WriteLine($"{path}: and {recording.ProblemCount - recording.Problems.Count} more lines that could not be used");
        }

        if (recording.IsCut)
        {
            errors.WriteLine($"{path}: warning: the log ends in the middle of a line, as after a power cut; replayed up to its last whole line");
        }
    }

    private FlightResult Failed(string path, int exitStatus, string message)
    {
        errors.WriteLine($"{path}: {message}");
        return new FlightResult(path, exitStatus, null, 0, 0);
    }
}
