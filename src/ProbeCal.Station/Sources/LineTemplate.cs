using System;
using System.Collections.Generic;
using System.Globalization;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>
/// How a probe's lines read, as a technician writes it: <c>{time},{signal:nA},{temperature},{pressure:mmHg}</c>. Text
/// outside braces must stand in the line as it is; a blank there stands for any number of blanks. Immutable.
/// </summary>
/// <remarks>
/// A number in the line has a point as decimal mark and may carry its unit. Without one it is °C, hPa and practical
/// salinity, unless the template says otherwise; <see cref="Explanation"/> tells what holds. The lines that
/// <c>probecal simulate</c> writes follow the same rules.
/// </remarks>
public sealed class LineTemplate
{
    /// <summary>Longest line that is read, in bytes.</summary>
    public const int LongestLine = 1024;

    /// <summary>The form that is used unless another is given.</summary>
    public const string UsualText = "{time},{signal},{temperature},{pressure}";

    private readonly List<LinePiece> _pieces;

    private LineTemplate(string text, List<LinePiece> pieces)
    {
        Text = text;
        _pieces = pieces;
    }

    /// <summary>The template as it was written.</summary>
    public string Text { get; }

    /// <summary>Unit of the signal as the template names it, empty when it names none. It is a label: nothing is converted.</summary>
    public string SignalUnit => Find(LineFieldKind.Signal)?.UnitText ?? "";

    /// <summary>True when lines carry their time.</summary>
    public bool HasTime => Find(LineFieldKind.Time) is not null;

    /// <summary>True when lines carry the temperature at the probe.</summary>
    public bool HasTemperature => Find(LineFieldKind.Temperature) is not null;

    /// <summary>True when lines carry the station pressure.</summary>
    public bool HasPressure => Find(LineFieldKind.Pressure) is not null;

    /// <summary>True when lines carry the salinity.</summary>
    public bool HasSalinity => Find(LineFieldKind.Salinity) is not null;

    /// <summary>What each field is taken for, one line a field, to be shown before readings are believed.</summary>
    public IReadOnlyList<string> Explanation
    {
        get
        {
            List<string> lines = [];
            foreach (LinePiece piece in _pieces)
            {
                if (piece.Field is LineField part && part.Kind is not (LineFieldKind.Skip or LineFieldKind.Date))
                {
                    lines.Add(Explain(part));
                }
            }

            return lines;
        }
    }

    internal IReadOnlyList<LinePiece> Pieces => _pieces;

    /// <summary>Reads a template.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="text">The template.</param>
    /// <exception cref="InputException">It is none; the message says what is wrong.</exception>
    public static LineTemplate Parse(string what, string text)
    {
        return new LineTemplate(text, LineTemplateParser.Parse(what, text));
    }

    /// <summary>Reads one line, without its line end.</summary>
    /// <param name="line">The line.</param>
    /// <param name="receivedUtc">When its last byte arrived.</param>
    /// <returns>A <see cref="RawSample"/>, or a <see cref="RejectedLine"/> with its reason. Never throws.</returns>
    public SourceEvent Read(string line, DateTimeOffset receivedUtc)
    {
        return LineReader.Read(this, line, receivedUtc);
    }

    /// <summary>Writes a sample as a line of this form, without the line end: what simulations and tests send.</summary>
    /// <param name="sample">What is to be written; a null becomes an empty field.</param>
    /// <param name="decimals">Decimals of signal, temperature and salinity; pressure takes two fewer. Null writes every digit.</param>
    public string Write(RawSample sample, int? decimals = null)
    {
        StringBuilder line = new();
        foreach (LinePiece piece in _pieces)
        {
            line.Append(piece.Field is LineField field ? FieldText(field, sample, decimals) : piece.Literal);
        }

        return line.ToString();
    }

    /// <inheritdoc/>
    public override string ToString()
    {
        return Text;
    }

    private static string Explain(LineField field)
    {
        string scale = field.Scale == 1 ? "" : ", the number times " + Number.Print(field.Scale);
        switch (field.Kind)
        {
            case LineFieldKind.Time:
                return "time: " + field.TimeForm switch
                {
                    TimeForm.EpochSeconds => "seconds since 1970-01-01T00:00:00Z",
                    TimeForm.EpochMilliseconds => "milliseconds since 1970-01-01T00:00:00Z",
                    TimeForm.OffsetFromTemplate => "ISO 8601, UTC" + (field.Offset == TimeSpan.Zero ? "" : OffsetText(field.Offset)) + " where the line gives no offset",
                    _ => "ISO 8601 with Z or an offset",
                };
            case LineFieldKind.Signal:
                return "signal: " + (field.UnitText ?? "as it stands, no unit named") + scale;
            case LineFieldKind.Salinity:
                return "salinity: practical salinity" + scale;
            default:
                string unit = field.Unit!.Name == "C" ? "°C" : field.Unit.Name;
                string absolute = field.Kind == LineFieldKind.Pressure ? ", absolute at the station, not reduced to sea level" : "";
                return field.Name + ": " + unit + (field.UnitText is null ? " unless the line gives a unit" : "") + absolute + scale;
        }
    }

    private string FieldText(LineField field, RawSample sample, int? decimals)
    {
        switch (field.Kind)
        {
            case LineFieldKind.Time:
                return TimeText(field, sample.TimeUtc, withDate: Find(LineFieldKind.Date) is null);
            case LineFieldKind.Date:
                return sample.TimeUtc.UtcDateTime.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
            case LineFieldKind.Signal:
                return NumberText(sample.Signal / field.Scale, decimals);
            case LineFieldKind.Temperature when sample.TemperatureCelsius is double celsius:
                return NumberText(field.Unit!.FromCanonical(celsius) / field.Scale, decimals);
            case LineFieldKind.Pressure when sample.PressureHectopascal is double hectopascal:
                return NumberText(field.Unit!.FromCanonical(hectopascal) / field.Scale, decimals - 2);
            case LineFieldKind.Salinity when sample.Salinity is double salinity:
                return NumberText(salinity / field.Scale, decimals);
            default:
                return "";
        }
    }

    private static string NumberText(double value, int? decimals)
    {
        return decimals is int places ? Number.Fixed(value, Math.Max(0, places)) : Number.Print(value);
    }

    private static string TimeText(LineField field, DateTimeOffset utc, bool withDate)
    {
        long microseconds = (utc - DateTimeOffset.UnixEpoch).Ticks / TimeSpan.TicksPerMicrosecond;
        return field.TimeForm switch
        {
            TimeForm.EpochSeconds => Number.Print(microseconds / 1e6),
            TimeForm.EpochMilliseconds => Number.Print(microseconds / 1e3),
            _ => utc.UtcDateTime.ToString(withDate ? "yyyy-MM-ddTHH:mm:ss.FFFFFFF'Z'" : "HH:mm:ss.FFFFFFF'Z'", CultureInfo.InvariantCulture),
        };
    }

    private static string OffsetText(TimeSpan offset)
    {
        return (offset < TimeSpan.Zero ? "-" : "+") + offset.ToString("hh\\:mm", CultureInfo.InvariantCulture);
    }

    private LineField? Find(LineFieldKind kind)
    {
        foreach (LinePiece piece in _pieces)
        {
            if (piece.Field is LineField field && field.Kind == kind)
            {
                return field;
            }
        }

        return null;
    }
}
