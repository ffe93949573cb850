using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Characters;

/// <summary>The picture on 2 lines of 16 characters: the speed to hold and the correction, and now and then what is wrong.</summary>
/// <param name="units">The units shown.</param>
public sealed class CharacterText16x2(DisplayUnits units) : CharacterText(CharacterFrame.Of16x2, units)
{
    private const int MostStrokes = 5;

    // There is no line for faults: of every eight seconds of data time, two show them in place of the correction.
    private const long FaultCycleUs = 8_000_000, FaultTurnUs = 2_000_000;

    /// <inheritdoc/>
    public override IReadOnlyList<string> Caution { get; } = [" ADVISORY ONLY  ", "ASI+manual first"];

    /// <inheritdoc/>
    protected override void WriteLines(in CockpitPicture picture, Span<byte> frame)
    {
        WriteHold(new AsciiLine(Frame.Line(frame, 0)), picture);
        var line = new AsciiLine(Frame.Line(frame, 1));
        var correction = SpeedCorrection.Of(picture, Units);
        if (ControlWords.ShortMoment(picture, Units) is { Length: > 0 } moment)
        {
            line.Add(moment);
        }
        else if (picture.Faults != Faults.None
            && (correction.Direction == CorrectionDirection.Unknown || picture.TimeUs % FaultCycleUs < FaultTurnUs))
        {
            line.Add("!");
            line.Add(FaultWords.Of(FaultWords.Gravest(picture.Faults)));
        }
        else
        {
            WriteCorrection(line, correction, HoldWords.IsTooUncertain(picture));
        }
    }

    private void WriteHold(AsciiLine line, in CockpitPicture picture)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var hold = Readout.Of(picture.HoldIndicatedMps, Units.Speed, Trust.Airspeed);
        line.Add(isClimbing ? "CLIMB^ " : hold.IsKnown && picture.LimitedBy != LimitedBy.None ? "LIMIT  " : "GLIDE  ");
        line.Add(hold, 3, false);
        line.Add(Units.Speed.Symbol);
        if (picture.Faults != Faults.None)
        {
            line.AddRight("!");
        }
    }

    /// <summary>Faster is to the right and slower to the left, so that the place tells the direction before it is read.</summary>
    private void WriteCorrection(AsciiLine line, SpeedCorrection correction, bool isTooUncertain)
    {
        Span<char> words = stackalloc char[16];
        switch (correction.Direction)
        {
            case CorrectionDirection.SpeedUp:
                var length = Words(words, "+", correction.Amount);
                line.MoveTo(Frame.Columns - MostStrokes - 1 - length);
                line.Add(words[..length]);
                line.Add(correction.IsDoubtful ? Readout.PlainDoubtMark : " ");
                line.AddRun('>', Strokes(correction, MostStrokes));
                break;
            case CorrectionDirection.SlowDown:
                var strokes = Strokes(correction, MostStrokes);
                line.MoveTo(MostStrokes - strokes);
                line.AddRun('<', strokes);
                line.Add(" ");
                line.Add(words[..Words(words, "-", correction.Amount)]);
                line.Add(correction.IsDoubtful ? Readout.PlainDoubtMark : "");
                break;
            case CorrectionDirection.OnSpeed:
                line.Add("==  on speed  ==");
                break;
            default:
                line.Add(isTooUncertain ? " " + HoldWords.TooUncertain : "       --");
                break;
        }
    }
}
