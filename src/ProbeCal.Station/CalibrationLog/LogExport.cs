using System;
using System.Buffers;
using System.Globalization;
using System.IO;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// A whole log as JSON Lines. The first line names the log, its count and head and the rule by which the file is verified alone:
/// each further line has <c>index</c>, <c>sha256</c> and <c>bytes</c>, the stored bytes as a JSON string, whose UTF-8 has that hash and
/// names the hash of the line before.
/// </summary>
public static class LogExport
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-log-export";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    private const string Rule = "decode 'bytes' of each line as a JSON string: the SHA-256 of its UTF-8 is 'sha256'; the JSON in it has 'logId' and 'index' of this log in unbroken order from 1, and 'previousSha256', "
        + "the 'sha256' of the line before (64 zeros in the first); there are 'count' lines, and the last has 'headSha256'";

    private static readonly JsonWriterOptions Options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>Writes a log.</summary>
    /// <param name="log">The open log.</param>
    /// <param name="logId">An imported log; null for the log of the folder.</param>
    /// <param name="output">Where to, a line an entry.</param>
    /// <param name="now">The time, which the first line names.</param>
    /// <param name="software">Program and version.</param>
    /// <returns>Number of entries.</returns>
    /// <exception cref="InputException">There is no such log.</exception>
    /// <exception cref="WorkFailedException">Its chain is broken: a file that cannot be verified is not written.</exception>
    public static long Write(CalibrationLogStore log, string? logId, TextWriter output, DateTimeOffset now, string software)
    {
        LogVerification verified = LogVerification.Of(log, logId, []);
        if (!verified.Chain.IsWhole)
        {
            throw new WorkFailedException($"log {verified.LogId}: its chain is broken ({verified.Chain.Faults[0]}), so no export of it could be verified; keep the file itself as evidence");
        }

        output.Write(Line(writer =>
        {
            writer.WriteString("format", FormatName);
            writer.WriteNumber("version", CurrentVersion);
            writer.WriteString("logId", verified.LogId);
            writer.WriteNumber("count", verified.Chain.Count);
            writer.WriteString("headSha256", verified.Chain.HeadSha256);
            writer.WriteString("exportedUtc", now.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture));
            writer.WriteString("software", software);
            writer.WriteString("rule", Rule);
        }));
        foreach (StoredEntry stored in log.EntriesOf(verified.LogId))
        {
            string text = Strict.GetString(log.BytesOf(stored.Entry));
            output.Write(Line(writer =>
            {
                writer.WriteNumber("index", stored.Entry.Index);
                writer.WriteString("kind", stored.Entry.Kind);
                writer.WriteString("id", stored.Entry.Id);
                writer.WriteString("sha256", stored.Sha256);
                writer.WriteString("bytes", text);
            }));
        }

        return verified.Chain.Count;
    }

    private static string Line(Action<Utf8JsonWriter> content)
    {
        ArrayBufferWriter<byte> buffer = new();
        using Utf8JsonWriter writer = new(buffer, Options);
        writer.WriteStartObject();
        content(writer);
        writer.WriteEndObject();
        writer.Flush();
        return Encoding.UTF8.GetString(buffer.WrittenSpan) + "\n";
    }
}
