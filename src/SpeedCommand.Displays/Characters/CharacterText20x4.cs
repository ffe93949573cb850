using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Characters;

/// <summary>The picture on 4 lines of 20 characters.</summary>
/// <param name="units">The units shown.</param>
public sealed class CharacterText20x4(DisplayUnits units) : CharacterText(CharacterFrame.Of20x4, units)
{
    // As many as the words leave room for.
    private const int MostStrokes = 6;

    /// <inheritdoc/>
    public override IReadOnlyList<string> Caution { get; } =
        ["   ADVISORY ONLY    ", "Placards, manual and", "airspeed indicator  ", "come first. Look out"];

    /// <inheritdoc/>
    protected override void WriteLines(in CockpitPicture picture, Span<byte> frame)
    {
        WriteHold(new AsciiLine(Frame.Line(frame, 0)), picture);
        WriteCorrection(new AsciiLine(Frame.Line(frame, 1)), SpeedCorrection.Of(picture, Units), HoldWords.IsTooUncertain(picture));
        if (ControlWords.ShortMoment(picture, Units) is { Length: > 0 } moment)
        {
            new AsciiLine(Frame.Line(frame, 2)).Add(moment);
        }
        else
        {
            WriteAir(new AsciiLine(Frame.Line(frame, 2)), picture);
        }

        if (picture.Faults == Faults.None)
        {
            WriteDensity(new AsciiLine(Frame.Line(frame, 3)), picture);
        }
        else
        {
            WriteFault(new AsciiLine(Frame.Line(frame, 3)), picture.Faults);
        }
    }

    private void WriteHold(AsciiLine line, in CockpitPicture picture)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var hold = Readout.Of(picture.HoldIndicatedMps, Units.Speed, Trust.Airspeed);
        var isLimited = !isClimbing && hold.IsKnown && picture.LimitedBy != LimitedBy.None;
        line.Add(isClimbing ? "CLIMB^" : "GLIDE ");
        line.Add(isLimited ? "limit " : " hold ");
        line.Add(hold, 3, false);
        line.Add(Units.Speed.Symbol);
    }

    /// <summary>Faster is to the right and slower to the left, so that the place tells the direction before it is read.</summary>
    private void WriteCorrection(AsciiLine line, SpeedCorrection correction, bool isTooUncertain)
    {
        Span<char> words = stackalloc char[16];
        switch (correction.Direction)
        {
            case CorrectionDirection.SpeedUp:
                line.MoveTo(Frame.Columns - MostStrokes - Words(words, "speed up ", correction.Amount) - 1);
                line.Add(words[..Words(words, "speed up ", correction.Amount)]);
                line.Add(" ");
                line.AddRun('>', Strokes(correction, MostStrokes));
                break;
            case CorrectionDirection.SlowDown:
                var strokes = Strokes(correction, MostStrokes);
                line.MoveTo(MostStrokes - strokes);
                line.AddRun('<', strokes);
                line.Add(" ");
                line.Add(words[..Words(words, "slow down ", correction.Amount)]);
                break;
            case CorrectionDirection.OnSpeed:
                line.Add("====  on speed  ====");
                break;
            default:
                line.Add(isTooUncertain ? "   " + HoldWords.TooUncertain : "         --");
                break;
        }
    }

    private void WriteAir(AsciiLine line, in CockpitPicture picture)
    {
        var climb = Readout.Of(picture.ClimbMps, Units.Vertical, Trust.Vertical);
        if (picture.Phase == FlightPhase.Climbing)
        {
            line.Add("up ");
            line.Add(climb, 4, true);
            line.Add("avg ");
            line.Add(Readout.Of(picture.AverageClimbMps, Units.Vertical, Trust.Vertical), 4, true);
        }
        else
        {
            line.Add("air ");
            line.Add(Readout.Of(picture.NettoMps, Units.Vertical, Trust.Vertical), 4, true);
            line.Add("up ");
            line.Add(climb, 4, true);
        }

        line.Add(Units.Vertical.Symbol);
    }

    private void WriteDensity(AsciiLine line, in CockpitPicture picture)
    {
        line.Add("DA ");
        line.Add(Readout.Of(picture.DensityAltitudeM, Units.Height, Trust.Height), 5, false);
        line.Add(Units.Height.Symbol);
        var temperature = Readout.Of(picture.TemperatureK, Units.Temperature, Trust.Temperature);
        // No space before the unit, but room for the mark, and for "std" behind.
        line.MoveTo(temperature.IsDoubtful ? 11 : 12);
        Span<char> text = stackalloc char[16];
        line.Add(text[..temperature.Write(text, false)], 3);
        line.Add(temperature.IsDoubtful ? Readout.PlainDoubtMark : "");
        line.Add(Units.Temperature.Symbol);
        if (temperature.IsKnown && picture.TemperatureSource == TemperatureSource.Standard)
        {
            line.AddRight("std");
        }
    }

    private static void WriteFault(AsciiLine line, Faults faults)
    {
        line.Add("! ");
        line.Add(FaultWords.Of(FaultWords.Gravest(faults)));
        var more = FaultWords.Count(faults) - 1;
        if (more > 0)
        {
            Span<char> text = ['+', (char)('0' + Math.Min(more, 9))];
            line.AddRight(text);
        }
    }
}
