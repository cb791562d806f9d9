using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Characterising;

/// <summary>A characterisation as files: JSON with everything, and the coefficients as a firmware loads them.</summary>
public static class CharacterisationFiles
{
    private const string Prefix = "PROBECAL_";

    /// <summary>Writes the JSON file, format <c>probecal-characterisation</c>.</summary>
    /// <param name="characterisation">What was found.</param>
    /// <param name="path">The file.</param>
    /// <param name="force">True to replace an existing one.</param>
    /// <param name="madeUtc">When, UTC.</param>
    /// <param name="software">Program and version.</param>
    /// <exception cref="InputException">There is such a file already, or the path is no file.</exception>
    /// <exception cref="WorkFailedException">It cannot be written.</exception>
    public static void WriteJson(Characterisation characterisation, string path, bool force, DateTimeOffset madeUtc, string software)
    {
        Write(characterisation, "--output", path, force, Json(characterisation, madeUtc, software));
    }

    /// <summary>Writes the coefficients: a C header when the name ends in <c>.h</c>, otherwise lines of <c>key=value</c>.</summary>
    /// <param name="characterisation">What was found.</param>
    /// <param name="path">The file.</param>
    /// <param name="force">True to replace an existing one.</param>
    /// <exception cref="InputException">There is such a file already, or the path is no file.</exception>
    /// <exception cref="WorkFailedException">It cannot be written.</exception>
    public static void WriteFirmware(Characterisation characterisation, string path, bool force)
    {
        string text = path.EndsWith(".h", StringComparison.OrdinalIgnoreCase) ? Header(characterisation) : KeyValues(characterisation);
        Write(characterisation, "--firmware", path, force, Encoding.UTF8.GetBytes(text));
    }

    internal static byte[] Json(Characterisation characterisation, DateTimeOffset madeUtc, string software)
    {
        using MemoryStream stream = new();
        using (Utf8JsonWriter w = new(stream, new JsonWriterOptions { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping }))
        {
            w.WriteStartObject();
            w.WriteString("format", Characterisation.FormatName);
            w.WriteNumber("version", Characterisation.CurrentVersion);
            w.WriteString("madeUtc", madeUtc.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture));
            w.WriteString("software", software);
            w.WriteString("probe", characterisation.Probe);
            w.WriteString("signalUnit", characterisation.SignalUnit);
            w.WriteString("coefficient", characterisation.CoefficientText);
            w.WriteStartArray("files");
            foreach ((string part, string file) in characterisation.Files)
            {
                w.WriteStartObject();
                w.WriteString("part", part);
                w.WriteString("file", file);
                w.WriteEndObject();
            }

            w.WriteEndArray();
            w.WriteStartArray("parts");
            foreach (CharacterisedPart part in characterisation.Parts)
            {
                Part(w, part);
            }

            w.WriteEndArray();
            w.WriteEndObject();
        }

        stream.WriteByte((byte)'\n');
        return stream.ToArray();
    }

    private static void Part(Utf8JsonWriter w, CharacterisedPart part)
    {
        w.WriteStartObject();
        w.WriteString("part", part.Part);
        w.WriteString("model", part.Model);
        Estimates(w, "parameters", part.Parameters);
        w.WriteStartArray("covariance");
        foreach (double value in part.Covariance)
        {
            w.WriteNumberValue(value);
        }

        w.WriteEndArray();
        Estimates(w, "derived", part.Derived);
        w.WriteNumber("rows", part.Rows);
        w.WriteNumber("points", part.Points);
        w.WriteNumber("degreesOfFreedom", part.DegreesOfFreedom);
        w.WriteNumber("residualStandardDeviation", part.ResidualStandardDeviation);
        w.WriteString("residualUnit", part.ResidualUnit);
        w.WriteNumber("coverageFactor95", part.CoverageFactor);
        if (part.LackOfFitProbability is double probability)
        {
            w.WriteNumber("lackOfFitProbability", probability);
        }
        else
        {
            w.WriteNull("lackOfFitProbability");
        }

        w.WriteStartArray("notes");
        foreach (string note in part.Notes)
        {
            w.WriteStringValue(note);
        }

        w.WriteEndArray();
        w.WriteEndObject();
    }

    private static void Estimates(Utf8JsonWriter w, string name, System.Collections.Generic.IReadOnlyList<Estimate> estimates)
    {
        w.WriteStartArray(name);
        foreach (Estimate each in estimates)
        {
            w.WriteStartObject();
            w.WriteString("name", each.Name);
            w.WriteNumber("value", each.Value);
            w.WriteNumber("standardUncertainty", each.StandardUncertainty);
            w.WriteString("unit", each.Unit);
            if (each.CoverageFactor is double k)
            {
                w.WriteNumber("coverageFactor95", k);
            }

            w.WriteEndObject();
        }

        w.WriteEndArray();
    }

    internal static string Header(Characterisation characterisation)
    {
        StringBuilder text = new();
        text.Append("/* Coefficients of a probe, made by probecal characterise")
            .Append(characterisation.Probe is null ? "" : " for " + Comment(characterisation.Probe))
            .Append(". Behind each value: its standard uncertainty (k = 1) and unit. */\n#ifndef PROBECAL_CHARACTERISATION_H\n#define PROBECAL_CHARACTERISATION_H\n\n");
        foreach ((string name, string value) in characterisation.FirmwareTexts)
        {
            text.Append("#define ").Append(Macro(name)).Append(" \"").Append(value).Append("\"\n");
        }

        foreach (Estimate each in characterisation.Firmware)
        {
            text.Append("#define ").Append(Macro(each.Name)).Append(' ').Append(CNumber(each.Value)).Append(" /* ")
                .Append(each.StandardUncertainty == 0 ? "" : "u " + Number.Significant(each.StandardUncertainty, 3) + (each.Unit.Length == 0 ? "" : " "))
                .Append(Comment(each.Unit)).Append(" */\n");
        }

        return text.Append("\n#endif\n").ToString();
    }

    internal static string KeyValues(Characterisation characterisation)
    {
        StringBuilder text = new();
        text.Append("# Coefficients of a probe, made by probecal characterise. u.NAME is the standard uncertainty (k = 1), unit.NAME the unit.\nformat=").Append(Characterisation.FormatName).Append("\nversion=")
            .Append(Characterisation.CurrentVersion.ToString(CultureInfo.InvariantCulture)).Append('\n');
        if (characterisation.Probe is not null)
        {
            text.Append("probe=").Append(Wrong.OneLine(characterisation.Probe)).Append('\n');
        }

        foreach ((string name, string value) in characterisation.FirmwareTexts)
        {
            text.Append(name).Append('=').Append(value).Append('\n');
        }

        foreach (Estimate each in characterisation.Firmware)
        {
            text.Append(each.Name).Append('=').Append(Number.Print(each.Value)).Append('\n');
            if (each.StandardUncertainty != 0)
            {
                text.Append("u.").Append(each.Name).Append('=').Append(Number.Print(each.StandardUncertainty)).Append('\n');
            }

            if (each.Unit.Length != 0)
            {
                text.Append("unit.").Append(each.Name).Append('=').Append(Wrong.OneLine(each.Unit)).Append('\n');
            }
        }

        return text.ToString();
    }

    private static string Macro(string name)
    {
        return Prefix + name.ToUpperInvariant().Replace('-', '_');
    }

    /// <summary>A number that C takes for a double.</summary>
    private static string CNumber(double value)
    {
        string text = Number.Print(value);
        text = text.AsSpan().IndexOfAny('.', 'e', 'E') < 0 ? text + ".0" : text;
        return text.StartsWith('-') ? "(" + text + ")" : text;
    }

    private static string Comment(string text)
    {
        return Wrong.OneLine(text).Replace("*/", "* /", StringComparison.Ordinal);
    }

    private static void Write(Characterisation characterisation, string what, string path, bool force, byte[] bytes)
    {
        if (string.IsNullOrWhiteSpace(path) || Directory.Exists(path))
        {
            throw Wrong.Input(what, path, "name a file");
        }

        if (characterisation.InputPaths.Any(input => ResultFile.IsSameFile(path, input)))
        {
            throw Wrong.Input(what, path, "this is a file of the run itself, which is never overwritten; give the result another name");
        }

        if (File.Exists(path) && !force)
        {
            throw Exists(what, path);
        }

        try
        {
            using NewFile file = new(Path.GetFullPath(path));
            file.Stream.Write(bytes);
            if (!file.Keep(force))
            {
                throw Exists(what, path);
            }
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException($"{what} {Wrong.Shown(path)}: cannot be written ({fault.Message})", fault);
        }
    }

    private static InputException Exists(string what, string path)
    {
        return Wrong.Input(what, path, "this file exists already; give another name, or --force to replace it");
    }
}
