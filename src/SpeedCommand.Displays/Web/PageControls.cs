using System.Text.Json;
using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Controls;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Web;

/// <summary>How the pilot's controls stand, and what was changed just now, in the words of the other displays.</summary>
internal static class PageControls
{
    public static void Write(Utf8JsonWriter json, in CockpitPicture picture, DisplayUnits units, bool maySet)
    {
        json.WriteStartObject("controls");
        json.WriteBoolean("open", maySet);
        json.WriteString("moment", ControlWords.Moment(picture, units));
        json.WriteStartArray("stand");
        foreach (var spec in ControlCatalogue.All)
        {
            json.WriteStartObject();
            json.WriteString("name", spec.Name);
            json.WriteString("text", ControlWords.Of(spec.Id, picture.Controls, units));
            json.WriteString("word", WordInForce(spec, picture.Controls));
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    /// <summary>The word of the control that holds now, as the line protocol has it; empty for a plain value.</summary>
    private static string WordInForce(ControlSpec spec, in ControlValues values) => spec.Id switch
    {
        ControlId.ExpectedClimb when values.IsExpectedClimbAutomatic => ControlCatalogue.Automatic,
        ControlId.Ballast when values.DumpKgPerS > 0 => ControlCatalogue.Dump,
        ControlId.Phase or ControlId.Mute => ControlText.WriteValue(values.ChangeOf(spec.Id)),
        _ => "",
    };
}
