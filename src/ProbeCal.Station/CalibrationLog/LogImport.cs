using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>An exported log, read whole and verified before anything is done with it.</summary>
public sealed class LogImport
{
    private LogImport(string logId, string origin, LogReading reading, List<byte[]> bytes)
    {
        LogId = logId;
        Origin = origin;
        Chain = reading.Chain;
        Entries = reading.Entries;
        Bytes = bytes;
    }

    /// <summary>Its own id.</summary>
    public string LogId { get; }

    /// <summary>The file, as it was named.</summary>
    public string Origin { get; }

    /// <summary>Its chain, which is whole.</summary>
    public ChainState Chain { get; }

    internal IReadOnlyList<StoredEntry> Entries { get; }

    internal IReadOnlyList<byte[]> Bytes { get; }

    /// <summary>True when a file begins as an exported log does, so that it is no table.</summary>
    public static bool IsLog(string path)
    {
        using StreamReader reader = Open(path);
        return reader.ReadLine()?.TrimStart().StartsWith('{') == true;
    }

    /// <summary>Reads and verifies an exported log.</summary>
    /// <exception cref="InputException">It is none, is damaged, cut off, or of a newer version; the line is named.</exception>
    public static LogImport Read(string path)
    {
        string name = Path.GetFileName(path);
        using StreamReader reader = Open(path);
        ExportHead head = ReadHead(name, reader.ReadLine());
        LogReading reading = new(head.LogId!);
        List<byte[]> bytes = [];
        long line = 1;
        while (reader.ReadLine() is string text)
        {
            line++;
            if (text.Length == 0)
            {
                continue;
            }

            string at = At(name, line);
            if (head.Count <= reading.Chain.Count)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{at}: there is an entry beyond the {head.Count} that line 1 counts; nothing was imported"));
            }

            ExportLine entry = Parse(at, text, LogImportContext.Default.ExportLine);
            if (entry.Bytes == null || entry.Sha256 == null)
            {
                throw new InputException($"{at}: 'bytes' or 'sha256' is missing; nothing was imported");
            }

            bytes.Add(Encoding.UTF8.GetBytes(entry.Bytes));
            Take(at, reading, entry, bytes[^1]);
        }

        if (reading.Chain.Count != head.Count)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{At(name, line)}: the file ends after entry {reading.Chain.Count} of the {head.Count} that line 1 counts: it was cut off; nothing was imported"));
        }

        return reading.Chain.HeadSha256 == head.HeadSha256
            ? new LogImport(head.LogId!, path, reading, bytes)
            : throw new InputException($"{At(name, line)}: the last entry is not the head that line 1 names; nothing was imported");
    }

    private static void Take(string at, LogReading reading, ExportLine entry, byte[] bytes)
    {
        try
        {
            reading.Take(entry.Index, bytes, entry.Sha256!, filed: null);
        }
        catch (InputException newer)
        {
            throw new InputException($"{at}: {newer.Message}; nothing was imported");
        }

        if (!reading.Chain.IsWhole)
        {
            throw new InputException($"{at}: {reading.Chain.Faults[0]}; nothing was imported");
        }
    }

    private static StreamReader Open(string path)
    {
        try
        {
            return new StreamReader(path, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: false));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw Wrong.Input("file", path, "it cannot be read: " + fault.Message);
        }
    }

    private static ExportHead ReadHead(string name, string? line)
    {
        string at = At(name, 1);
        ExportHead head = Parse(at, line ?? "", LogImportContext.Default.ExportHead);
        if (head.Format != LogExport.FormatName)
        {
            throw new InputException($"{at}: this is no exported log; its first line says \"format\":\"{LogExport.FormatName}\"");
        }

        if (LogExport.CurrentVersion < head.Version)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{at}: version {head.Version} of the export is newer than this program, which reads up to {LogExport.CurrentVersion}; use a newer probecal"));
        }

        bool isId = head.LogId is { Length: 12 } id && id.All(static c => char.IsAsciiHexDigitLower(c) || char.IsAsciiDigit(c));
        return isId && 0 <= head.Count && head.HeadSha256 != null
            ? head
            : throw new InputException($"{at}: 'logId', 'count' or 'headSha256' is missing or wrong; nothing was imported");
    }

    private static T Parse<T>(string at, string text, System.Text.Json.Serialization.Metadata.JsonTypeInfo<T> type)
        where T : class
    {
        try
        {
            return JsonSerializer.Deserialize(text, type) ?? throw new InputException($"{at}: an empty line of JSON; nothing was imported");
        }
        catch (JsonException damaged)
        {
            throw new InputException($"{at}: not a readable line of an exported log ({damaged.Message.ReplaceLineEndings(" ")}); nothing was imported");
        }
    }

    private static string At(string name, long line)
    {
        return string.Create(CultureInfo.InvariantCulture, $"{Wrong.Shown(name)}, line {line}");
    }
}

/// <summary>First line of an exported log.</summary>
internal sealed record ExportHead
{
    public string? Format { get; init; }

    public int Version { get; init; }

    public string? LogId { get; init; }

    public long Count { get; init; }

    public string? HeadSha256 { get; init; }
}

/// <summary>A further line of an exported log.</summary>
internal sealed record ExportLine
{
    public long Index { get; init; }

    public string? Sha256 { get; init; }

    public string? Bytes { get; init; }
}

[JsonSerializable(typeof(ExportHead))]
[JsonSerializable(typeof(ExportLine))]
[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase)]
internal sealed partial class LogImportContext : JsonSerializerContext;
