using System.Text.Json;

namespace SpeedCommand.Replay.Conditions;

/// <summary>JSON answers: one indented object, numbers unrounded, null for what is not known or without bound.</summary>
public static class JsonNumbers
{
    /// <summary>Writes one object and a line end.</summary>
    /// <param name="output">Where to; it is left open.</param>
    /// <param name="writeMembers">Writes what the object holds.</param>
    public static void WriteObject(Stream output, Action<Utf8JsonWriter> writeMembers)
    {
        ArgumentNullException.ThrowIfNull(output);
        ArgumentNullException.ThrowIfNull(writeMembers);
        using (var json = new Utf8JsonWriter(output, new JsonWriterOptions { Indented = true }))
        {
            json.WriteStartObject();
            writeMembers(json);
            json.WriteEndObject();
        }

        output.WriteByte((byte)'\n');
    }

    /// <summary>Writes a number.</summary>
    /// <param name="json">Where to.</param>
    /// <param name="name">Name of the member.</param>
    /// <param name="value">The number; not finite becomes null.</param>
    public static void Write(Utf8JsonWriter json, string name, double value)
    {
        ArgumentNullException.ThrowIfNull(json);
        if (double.IsFinite(value))
        {
            json.WriteNumber(name, value);
        }
        else
        {
            json.WriteNull(name);
        }
    }
}
