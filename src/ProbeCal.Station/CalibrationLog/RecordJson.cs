using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>An entry of the log as UTF-8 JSON and back. The bytes written are the bytes kept and hashed.</summary>
internal static class RecordJson
{
    // Written for people too: one property a line, and "°" or "µ" as themselves.
    private static readonly RecordJsonContext Context = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        // A null where a record has none is a damaged record and not a crash of its reader.
        RespectNullableAnnotations = true,
        WriteIndented = true,
        NewLine = "\n",
    });

    // What this program can read: each kind by its format, the newest version of it, and its name for people.
    private static readonly Dictionary<string, (int Version, string Name, JsonTypeInfo Type)> Formats = new()
    {
        [CalibrationRecord.FormatName] = (CalibrationRecord.CurrentVersion, "calibration record", Context.CalibrationRecord),
        [EquipmentRecord.FormatName] = (EquipmentRecord.CurrentVersion, "equipment entry", Context.EquipmentRecord),
        [ServiceRecord.FormatName] = (ServiceRecord.CurrentVersion, "service entry", Context.ServiceRecord),
        [AmendmentRecord.FormatName] = (AmendmentRecord.CurrentVersion, "amendment", Context.AmendmentRecord),
        [PastCalibrationRecord.FormatName] = (PastCalibrationRecord.CurrentVersion, "past calibration", Context.PastCalibrationRecord),
        [VisitRecord.FormatName] = (VisitRecord.CurrentVersion, "visit", Context.VisitRecord),
    };

    /// <summary>The entry as the bytes that the log keeps.</summary>
    /// <exception cref="ArgumentException">A number in it is NaN or infinite.</exception>
    public static byte[] ToBytes(LogEntry entry)
    {
        return JsonSerializer.SerializeToUtf8Bytes(entry, Formats[entry.Format].Type);
    }

    /// <summary>Reads a calibration record.</summary>
    /// <param name="bytes">UTF-8 JSON.</param>
    /// <param name="where">What the bytes are, for the message: <c>record 3 of calibrations.db</c>.</param>
    /// <exception cref="InputException">It is of a newer version.</exception>
    /// <exception cref="WorkFailedException">It is no calibration record, or a damaged one.</exception>
    public static CalibrationRecord Read(ReadOnlySpan<byte> bytes, string where)
    {
        return ReadEntry(bytes, where) as CalibrationRecord
            ?? throw new WorkFailedException($"{where}: it is no calibration record");
    }

    /// <summary>Reads an entry of any kind.</summary>
    /// <param name="bytes">UTF-8 JSON.</param>
    /// <param name="where">What the bytes are, for the message: <c>record 3 of calibrations.db</c>.</param>
    /// <exception cref="InputException">It is of a newer version, or of a kind that only a newer program can have written.</exception>
    /// <exception cref="WorkFailedException">It is no entry of a log, or a damaged one.</exception>
    public static LogEntry ReadEntry(ReadOnlySpan<byte> bytes, string where)
    {
        try
        {
            RecordHead head = JsonSerializer.Deserialize(bytes, Context.RecordHead) ?? new RecordHead();
            if (head.Format == null || !Formats.TryGetValue(head.Format, out (int Version, string Name, JsonTypeInfo Type) known))
            {
                throw head.Format?.StartsWith("probecal-", StringComparison.Ordinal) == true
                    ? new InputException($"{where}: it is a '{Wrong.Shown(head.Format)}', a kind of entry that this program does not know; use a newer probecal")
                    : new WorkFailedException($"{where}: format is '{Wrong.Shown(head.Format ?? "")}'; a calibration record says '{CalibrationRecord.FormatName}'");
            }

            if (known.Version < head.Version)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture,
                    $"{where}: version {head.Version} of the {known.Name} is newer than this program, which reads up to {known.Version}; use a newer probecal"));
            }

            return (LogEntry?)JsonSerializer.Deserialize(bytes, known.Type)
                ?? throw new WorkFailedException($"{where}: an empty document is no {known.Name}");
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
[JsonSerializable(typeof(EquipmentRecord))]
[JsonSerializable(typeof(ServiceRecord))]
[JsonSerializable(typeof(AmendmentRecord))]
[JsonSerializable(typeof(PastCalibrationRecord))]
[JsonSerializable(typeof(VisitRecord))]
[JsonSerializable(typeof(RecordHead))]
internal sealed partial class RecordJsonContext : JsonSerializerContext;
