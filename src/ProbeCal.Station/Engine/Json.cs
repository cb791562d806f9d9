using System;
using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace ProbeCal.Station.Engine;

/// <summary>How this room writes JSON.</summary>
internal static class Json
{
    // A payload is no web page: "°" and "µ" may stand as themselves.
    internal static JsonWriterOptions Options { get; } = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>ISO 8601 in UTC to the microsecond, as the journal keeps it.</summary>
    internal static string Time(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss.ffffff'Z'", CultureInfo.InvariantCulture);
    }

    /// <summary>A number, or null for what is none.</summary>
    internal static void Number(Utf8JsonWriter writer, string name, double value)
    {
        if (double.IsFinite(value))
        {
            writer.WriteNumber(name, value);
        }
        else
        {
            writer.WriteNull(name);
        }
    }
}
