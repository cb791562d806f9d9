using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>What a column of the output holds.</summary>
internal enum OutputKind
{
    /// <summary>A quantity of the reading.</summary>
    Value,
    /// <summary>Its standard uncertainty.</summary>
    Uncertainty,
    /// <summary>Drift correction, mg/L.</summary>
    Drift,
    /// <summary>Fouling correction, mg/L.</summary>
    Fouling,
    /// <summary>Concentration after both, mg/L.</summary>
    Corrected,
    /// <summary>Rating of the value.</summary>
    Rating,
    /// <summary>Time of the reading, UTC.</summary>
    Time,
    /// <summary>Id of the calibration.</summary>
    Calibration,
}

/// <summary>One column that is written behind each row.</summary>
/// <param name="Name">As the option names it.</param>
/// <param name="Kind">What it holds.</param>
/// <param name="Quantity">Which quantity, for a value or an uncertainty.</param>
/// <param name="Unit">Its unit as the header writes it; empty for a text.</param>
/// <param name="Decimals">Decimals, or <see cref="FixedText.Shortest"/>.</param>
internal sealed record OutputColumn(string Name, OutputKind Kind, ReadingQuantity Quantity, string Unit, int Decimals)
{
    private static readonly OutputColumn[] Known =
    [
        Value("partial-pressure", ReadingQuantity.PartialPressure, "hPa", 3),
        Value("mg/L", ReadingQuantity.MilligramsPerLitre, "mg/L", 3),
        Value("umol/L", ReadingQuantity.MicromolesPerLitre, "umol/L", 2),
        Value("umol/kg", ReadingQuantity.MicromolesPerKilogram, "umol/kg", 2),
        Value("percent-local", ReadingQuantity.PercentLocal, "% local", 2),
        Value("percent-1atm", ReadingQuantity.PercentOneAtmosphere, "% 1 atm", 2),
        Uncertain("u(partial-pressure)", ReadingQuantity.PartialPressure, "hPa", 3),
        Uncertain("u(mg/L)", ReadingQuantity.MilligramsPerLitre, "mg/L", 3),
        Uncertain("u(umol/L)", ReadingQuantity.MicromolesPerLitre, "umol/L", 2),
        Uncertain("u(umol/kg)", ReadingQuantity.MicromolesPerKilogram, "umol/kg", 2),
        Uncertain("u(percent-local)", ReadingQuantity.PercentLocal, "% local", 2),
        Uncertain("u(percent-1atm)", ReadingQuantity.PercentOneAtmosphere, "% 1 atm", 2),
        new("drift", OutputKind.Drift, default, "mg/L", 3),
        new("fouling", OutputKind.Fouling, default, "mg/L", 3),
        new("corrected", OutputKind.Corrected, default, "mg/L", 3),
        new("rating", OutputKind.Rating, default, "", 0),
        new("time", OutputKind.Time, default, "", 0),
        new("calibration", OutputKind.Calibration, default, "", 0),
    ];

    private static readonly string[] UsualPlain = ["partial-pressure", "mg/L", "percent-local", "percent-1atm"];
    private static readonly string[] UsualService = ["drift", "fouling", "corrected", "rating"];

    /// <summary>Names that the option takes, for messages and help.</summary>
    internal static string Names => string.Join(", ", Known.Select(static each => each.Name));

    /// <summary>True when the column needs what service visits say.</summary>
    internal bool IsOfService => Kind is OutputKind.Drift or OutputKind.Fouling or OutputKind.Corrected or OutputKind.Rating;

    /// <summary>The text in the header.</summary>
    /// <param name="gas">The gas as records write it.</param>
    internal string Header(string gas)
    {
        return Kind switch
        {
            OutputKind.Value => (Quantity == ReadingQuantity.PartialPressure ? "p " : "") + gas + " [" + Unit + "]",
            OutputKind.Uncertainty => "u " + (Quantity == ReadingQuantity.PartialPressure ? "p " : "") + gas + " [" + Unit + "]",
            OutputKind.Drift => "drift correction [mg/L]",
            OutputKind.Fouling => "fouling correction [mg/L]",
            OutputKind.Corrected => gas + " corrected [mg/L]",
            OutputKind.Time => "time [UTC]",
            _ => Name,
        };
    }

    /// <summary>As an option says it: name and decimals.</summary>
    internal string Text => Unit.Length == 0 ? Name : Name + ":" + (Decimals == FixedText.Shortest ? "shortest" : Decimals.ToString(CultureInfo.InvariantCulture));

    /// <summary>Reads what was asked for, or the usual columns.</summary>
    /// <param name="asked">Texts of the option; one may hold several, separated by commas.</param>
    /// <param name="withService">True when service visits play a part.</param>
    /// <exception cref="InputException">A name or a number of decimals is unknown, or a column is asked for twice.</exception>
    internal static OutputColumn[] Parse(IReadOnlyList<string> asked, bool withService)
    {
        string[] texts = [.. asked.SelectMany(static text => text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))];
        if (texts.Length == 0)
        {
            texts = withService ? [.. UsualPlain, .. UsualService] : UsualPlain;
        }

        OutputColumn[] columns = [.. texts.Select(ParseOne)];
        for (int i = 0; i < columns.Length; i++)
        {
            if (Array.FindIndex(columns, each => each.Name == columns[i].Name) < i)
            {
                throw Wrong.Input("--write", texts[i], columns[i].Name + " is asked for twice; leave one out");
            }
        }

        return columns;
    }

    private static OutputColumn ParseOne(string text)
    {
        int colon = text.IndexOf(':', StringComparison.Ordinal);
        string name = (colon < 0 ? text : text[..colon]).Trim();
        OutputColumn known = Known.FirstOrDefault(each => each.Name == name)
            ?? throw Wrong.Input("--write", text, $"there is no column {Wrong.Shown(name)}{NearestName.DidYouMean(name, Known.Select(static each => each.Name))}; there are {Names}");
        if (colon < 0)
        {
            return known;
        }

        if (known.Unit.Length == 0)
        {
            throw Wrong.Input("--write", text, known.Name + " is a text and has no decimals");
        }

        string decimals = text[(colon + 1)..].Trim();
        return decimals == "shortest"
            ? known with { Decimals = FixedText.Shortest }
            : int.TryParse(decimals, NumberStyles.None, CultureInfo.InvariantCulture, out int number) && number <= FixedText.MostDecimals
            ? known with { Decimals = number }
            : throw Wrong.Input("--write", text, $"write the decimals as a number from 0 to {Number.Print(FixedText.MostDecimals)}, or shortest for the shortest text that reads back as the same number");
    }

    private static OutputColumn Value(string name, ReadingQuantity quantity, string unit, int decimals)
    {
        return new OutputColumn(name, OutputKind.Value, quantity, unit, decimals);
    }

    private static OutputColumn Uncertain(string name, ReadingQuantity quantity, string unit, int decimals)
    {
        return new OutputColumn(name, OutputKind.Uncertainty, quantity, unit, decimals);
    }
}
