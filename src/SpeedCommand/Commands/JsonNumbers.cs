using System.Text.Json;

namespace SpeedCommand.Commands;

/// <summary>Numbers in JSON answers: unrounded, null for what is not known or without bound.</summary>
internal static class JsonNumbers
{
    public static void Write(Utf8JsonWriter json, string name, double value)
    {
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
