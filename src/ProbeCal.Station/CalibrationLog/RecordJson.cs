using System;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A calibration record as UTF-8 JSON and back. The bytes written are the bytes kept and hashed.</summary>
internal static class RecordJson
{
    // Written for people too: one property a line, and "°" or "µ" as themselves.
    private static readonly RecordJsonContext Context = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        WriteIndented = true,
        NewLine = "\n",
    });

    /// <summary>The record as the bytes that the log keeps.</summary>
    /// <exception cref="ArgumentException">A number in it is NaN or infinite.</exception>
    public static byte[] ToBytes(CalibrationRecord record)
    {
        return JsonSerializer.SerializeToUtf8Bytes(record, Context.CalibrationRecord);
    }

    /// <summary>Reads a record.</summary>
    /// <param name="bytes">UTF-8 JSON.</param>
    /// <param name="where">What the bytes are, for the message: <c>record 3 of calibrations.db</c>.</param>
    /// <exception cref="InputException">It is a record of a newer version.</exception>
    /// <exception cref="WorkFailedException">It is no calibration record, or a damaged one.</exception>
    public static CalibrationRecord Read(ReadOnlySpan<byte> bytes, string where)
    {
        try
        {
            RecordHead head = JsonSerializer.Deserialize(bytes, Context.RecordHead) ?? new RecordHead();
            if (head.Format != CalibrationRecord.FormatName)
            {
                throw new WorkFailedException($"{where}: format is '{head.Format}'; a calibration record says '{CalibrationRecord.FormatName}'");
            }

            if (CalibrationRecord.CurrentVersion < head.Version)
            {
                throw new InputException(string.Create(System.Globalization.CultureInfo.InvariantCulture,
                    $"{where}: version {head.Version} of the calibration record is newer than this program, which reads up to {CalibrationRecord.CurrentVersion}; use a newer probecal"));
            }

            return JsonSerializer.Deserialize(bytes, Context.CalibrationRecord)
                ?? throw new WorkFailedException($"{where}: an empty document is no calibration record");
        }
        catch (JsonException damaged)
        {
            throw new WorkFailedException($"{where}: not a readable calibration record ({OneLine(damaged.Message)})", damaged);
        }
    }

    private static string OneLine(string message)
    {
        return message.ReplaceLineEndings(" ");
    }
}

/// <summary>The two properties that decide whether the rest can be read.</summary>
internal sealed record RecordHead
{
    public string? Format { get; init; }

    public int Version { get; init; }
}

[JsonSerializable(typeof(CalibrationRecord))]
[JsonSerializable(typeof(RecordHead))]
internal sealed partial class RecordJsonContext : JsonSerializerContext;
