using System;
using System.Buffers;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace ProbeCal.Host.Commands;

/// <summary>What commands on the calibration log print as JSON: a format and its version, then what the command has to say.</summary>
internal static class LogJson
{
    internal static string Of(string format, Action<Utf8JsonWriter> content)
    {
        ArrayBufferWriter<byte> buffer = new();
        using Utf8JsonWriter writer = new(buffer, new JsonWriterOptions { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping });
        writer.WriteStartObject();
        writer.WriteString("format", format);
        writer.WriteNumber("version", 1);
        content(writer);
        writer.WriteEndObject();
        writer.Flush();
        return Encoding.UTF8.GetString(buffer.WrittenSpan);
    }
}
