using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Web;

/// <summary>
/// One picture for the web page, as a server-sent event: every text ready to be shown, so that the page cannot round, mark or blank a
/// number in any other way than the other displays do. docs/web.md lists the fields.
/// </summary>
public static class PageFrame
{
    /// <summary>Leaning strokes on each side of the correction bar.</summary>
    public const int MaxStrokes = 8;

    private const int MaxFaults = 4;

    private const int UsualBytes = 3072;

    // What is not ASCII may stand as it is: the page takes it as text, never as markup.
    private static readonly JsonWriterOptions Plain = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Writes the event.</summary>
    /// <param name="picture">What to show.</param>
    /// <param name="units">The units to show it in.</param>
    /// <param name="sentMs">When it is sent, ms on any clock that runs on steadily: the page tells by it what was under way for long.</param>
    /// <param name="maySet">Whether the page may change the pilot's controls.</param>
    /// <returns>The event in UTF-8, its end included.</returns>
    public static byte[] Event(in CockpitPicture picture, DisplayUnits units, long sentMs, bool maySet = false)
    {
        ArgumentNullException.ThrowIfNull(units);
        var bytes = new ArrayBufferWriter<byte>(UsualBytes);
        bytes.Write("data: "u8);
        using (var json = new Utf8JsonWriter(bytes, Plain))
        {
            json.WriteStartObject();
            json.WriteNumber("at", sentMs);
            json.WriteString("time", StatusLine.TimeText(picture.TimeUs));
            json.WriteString("phase", picture.Phase == FlightPhase.Climbing ? "climbing" : "gliding");
            WriteHold(json, picture, units.Speed);
            WriteTurn(json, SpeedCorrection.Of(picture, units), units.Speed);
            json.WriteStartArray("reasons");
            new PageReasons(json, units).Write(picture);
            json.WriteEndArray();
            WriteFaults(json, picture.Faults);
            PageControls.Write(json, picture, units, maySet);
            json.WriteEndObject();
        }

        bytes.Write("\n\n"u8);
        return bytes.WrittenSpan.ToArray();
    }

    /// <summary>A number's text with its mark, its unit, and whether it is doubtful or blank.</summary>
    internal static void WriteNumber(Utf8JsonWriter json, Readout readout, DisplayUnit unit, bool isSigned)
    {
        json.WriteString("text", readout.MarkedText(isSigned));
        json.WriteString("unit", unit.Label);
        json.WriteBoolean("doubtful", readout.IsDoubtful);
        json.WriteBoolean("known", readout.IsKnown);
    }

    private static void WriteHold(Utf8JsonWriter json, in CockpitPicture picture, DisplayUnit unit)
    {
        var isClimbing = picture.Phase == FlightPhase.Climbing;
        var hold = Readout.Of(picture.HoldIndicatedMps, unit, Trust.Airspeed);
        json.WriteStartObject("hold");
        WriteNumber(json, hold, unit, false);
        json.WriteString("source", HoldWords.Source(picture));
        json.WriteString("sigma", hold.IsDoubtful ? $"roughly, {hold.SigmaText()}" : hold.SigmaText());
        json.WriteString("limit", !isClimbing && hold.IsKnown ? TerminalPanel.LimitWords(picture.LimitedBy) : "");
        json.WriteEndObject();
        json.WriteStartObject("flying");
        WriteNumber(json, Readout.Of(picture.IndicatedAirspeedMps, unit, Trust.Airspeed), unit, false);
        json.WriteEndObject();
    }

    private static void WriteTurn(Utf8JsonWriter json, SpeedCorrection correction, DisplayUnit unit)
    {
        var isTurn = correction.Direction is CorrectionDirection.SpeedUp or CorrectionDirection.SlowDown;
        var share = isTurn ? unit.DifferenceToSi(correction.Amount) / LeaningBar.FullMps : 0;
        json.WriteStartObject("turn");
        json.WriteString("way", correction.Direction switch
        {
            CorrectionDirection.SpeedUp => "faster",
            CorrectionDirection.SlowDown => "slower",
            CorrectionDirection.OnSpeed => "on",
            _ => "unknown",
        });
        json.WriteString("words", LeaningBar.Words(correction) + (isTurn ? $" {unit.Label}" : ""));
        json.WriteNumber("strokes", isTurn ? (int)Math.Clamp(Math.Round(share * MaxStrokes), 1, MaxStrokes) : 0);
        json.WriteBoolean("beyond", share > 1);
        json.WriteBoolean("doubtful", correction.IsDoubtful);
        json.WriteEndObject();
    }

    /// <summary>The gravest faults, and how many more there are: two lines on a phone.</summary>
    private static void WriteFaults(Utf8JsonWriter json, Faults faults)
    {
        json.WriteStartArray("faults");
        for (var count = 0; faults != Faults.None && count < MaxFaults; count++)
        {
            var fault = FaultWords.Gravest(faults);
            json.WriteStringValue(FaultWords.Of(fault));
            faults &= ~fault;
        }

        if (faults != Faults.None)
        {
            json.WriteStringValue($"+{FaultWords.Count(faults)} more");
        }

        json.WriteEndArray();
    }
}
