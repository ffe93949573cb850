using System.Globalization;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Flight.Atmosphere;
using SpeedCommand.Flight.Targets;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Characters;

/// <summary>
/// The picture as text for a display of 4 lines of 20 characters: a form feed, then four lines of exactly 20 ASCII
/// characters, each ended by carriage return and line feed. docs/display.md describes the lines. Nothing is allocated.
/// </summary>
/// <param name="units">The units shown.</param>
public sealed class CharacterText20x4(DisplayUnits units)
{
    /// <summary>Lines of the display.</summary>
    public const int Rows = 4;

    /// <summary>Characters of a line.</summary>
    public const int Columns = 20;

    /// <summary>Bytes of one frame: the form feed and four lines with their ends.</summary>
    public const int Length = 1 + Rows * (Columns + 2);

    // Strokes of the second line: one for each of these, in m/s (about 5 km/h), as many as the words leave room for.
    private const double StrokeMps = 1.5;
    private const int MostStrokes = 6;

    /// <summary>Writes one frame.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="destination">Where to write; at least <see cref="Length"/> bytes.</param>
    /// <returns>The bytes written, <see cref="Length"/>; 0 when they do not fit.</returns>
    public int Render(in CockpitPicture picture, Span<byte> destination)
    {
        if (!TryFrame(destination))
        {
            return 0;
        }

        WriteHold(new AsciiLine(Line(destination, 0)), picture);
        WriteCorrection(new AsciiLine(Line(destination, 1)), SpeedCorrection.Of(picture, units));
        WriteAir(new AsciiLine(Line(destination, 2)), picture);
        if (picture.Faults == Faults.None)
        {
            WriteDensity(new AsciiLine(Line(destination, 3)), picture);
        }
        else
        {
            WriteFault(new AsciiLine(Line(destination, 3)), picture.Faults);
        }

        return Length;
    }

    /// <summary>Writes the form feed and the line ends of a frame; false when they do not fit.</summary>
    internal static bool TryFrame(Span<byte> destination)
    {
        if (destination.Length < Length)
        {
            return false;
        }

        destination[0] = (byte)'\f';
        for (var row = 0; row < Rows; row++)
        {
            destination[1 + row * (Columns + 2) + Columns] = (byte)'\r';
            destination[1 + row * (Columns + 2) + Columns + 1] = (byte)'\n';
        }

        return true;
    }

    /// <summary>The cells of one line within a frame.</summary>
    internal static Span<byte> Line(Span<byte> frame, int row) => frame.Slice(1 + row * (Columns + 2), Columns);

    private void WriteHold(AsciiLine line, in CockpitPicture picture)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var hold = Readout.Of(picture.HoldIndicatedMps, units.Speed, Trust.Airspeed);
        var isLimited = !isClimbing && hold.IsKnown && picture.LimitedBy != LimitedBy.None;
        line.Add(isClimbing ? "CLIMB^" : "GLIDE ");
        line.Add(isLimited ? "limit" : " hold");
        line.Add(hold, 3, false);
        line.Add(" ");
        line.Add(units.Speed.Symbol);
    }

    /// <summary>Faster is to the right and slower to the left, so that the place tells the direction before it is read.</summary>
    private void WriteCorrection(AsciiLine line, SpeedCorrection correction)
    {
        var strokes = (int)Math.Clamp(units.Speed.DifferenceToSi(correction.Amount) / StrokeMps, 1, MostStrokes);
        Span<char> words = stackalloc char[16];
        switch (correction.Direction)
        {
            case CorrectionDirection.SpeedUp:
                line.MoveTo(Columns - MostStrokes - Words(words, "speed up ", correction.Amount) - 1);
                line.Add(words[..Words(words, "speed up ", correction.Amount)]);
                line.Add(" ");
                line.AddRun('>', strokes);
                break;
            case CorrectionDirection.SlowDown:
                line.MoveTo(MostStrokes - strokes);
                line.AddRun('<', strokes);
                line.Add(" ");
                line.Add(words[..Words(words, "slow down ", correction.Amount)]);
                break;
            case CorrectionDirection.OnSpeed:
                line.Add("====  on speed  ====");
                break;
            default:
                line.Add("         --");
                break;
        }
    }

    private static int Words(Span<char> destination, string words, double amount)
    {
        words.CopyTo(destination);
        return amount.TryFormat(destination[words.Length..], out var written, "0", CultureInfo.InvariantCulture)
            ? words.Length + written
            : words.Length;
    }

    private void WriteAir(AsciiLine line, in CockpitPicture picture)
    {
        var climb = Readout.Of(picture.ClimbMps, units.Vertical, Trust.Vertical);
        if (picture.Phase == FlightPhase.Climbing)
        {
            line.Add("up");
            line.Add(climb, 4, true);
            line.Add(" avg");
            line.Add(Readout.Of(picture.AverageClimbMps, units.Vertical, Trust.Vertical), 4, true);
        }
        else
        {
            line.Add("air");
            line.Add(Readout.Of(picture.NettoMps, units.Vertical, Trust.Vertical), 4, true);
            line.Add(" up");
            line.Add(climb, 4, true);
        }

        line.Add(" ");
        line.Add(units.Vertical.Symbol);
    }

    private void WriteDensity(AsciiLine line, in CockpitPicture picture)
    {
        line.Add("DA");
        line.Add(Readout.Of(picture.DensityAltitudeM, units.Height, Trust.Height), 5, false);
        line.Add(" ");
        line.Add(units.Height.Symbol);
        line.MoveTo(11);
        var temperature = Readout.Of(picture.TemperatureK, units.Temperature, Trust.Temperature);
        line.Add(temperature, 3, false);
        line.Add(units.Temperature.Symbol);
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
