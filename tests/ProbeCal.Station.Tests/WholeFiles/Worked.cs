using System;
using System.Collections.Generic;
using System.IO;
using System.Text;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Tests.WholeFiles;

/// <summary>A formula that can be checked in the head: the pressure in hPa, and the temperature above 10 °C.</summary>
internal sealed class PlainFormula : IRowFormula
{
    private IReadOnlyList<string> _quantities = [];

    public IReadOnlyList<ColumnQuantity> Quantities { get; } =
    [
        new("temperature", QuantityKind.Temperature), new("pressure", QuantityKind.Pressure), new("salinity", QuantityKind.Salinity),
        new("concentration", QuantityKind.MassConcentration, QuantityKind.AmountConcentration),
    ];

    public IReadOnlyList<ResultColumn> Results { get; } = [new("pressure [hPa]", "pressureHPa"), new("above ten [K]", "aboveTenK")];

    /// <summary>What is done at each row before it is computed.</summary>
    internal Action<long> AtRow { get; init; } = static _ => { };

    internal long Rows { get; private set; }

    public IReadOnlyList<(string Key, string Value)> About => [];

    public void Begin(IReadOnlyList<string> quantities, IReadOnlyList<string> units)
    {
        _quantities = quantities;
    }

    public RowOutcome Compute(ReadOnlySpan<string> values, Span<double> results)
    {
        AtRow(++Rows);
        for (int i = 0; i < values.Length; i++)
        {
            if (_quantities[i] == "pressure")
            {
                results[0] = Quantity.PressureHectopascal("pressure", values[i]);
            }
            else if (_quantities[i] == "temperature")
            {
                double celsius = Quantity.TemperatureCelsius("temperature", values[i]);
                if (40 < celsius)
                {
                    return RowOutcome.Refused("too warm", values[i] + " is too warm");
                }

                results[1] = celsius - 10;
            }
        }

        return results[1] < 0 ? RowOutcome.Flagged("cold", "") : RowOutcome.Ok;
    }
}

/// <summary>One file worked through: what was written and what was said.</summary>
internal sealed record Worked(string Output, string[] Said)
{
    internal static Worked Of(string input, string[] columns, IRowFormula? formula = null, string output = "-",
        bool decimalComma = false, string? separator = null, string? headerLine = null)
    {
        return Of(Encoding.UTF8.GetBytes(input), columns, formula, output, decimalComma, separator, headerLine);
    }

    internal static Worked Of(byte[] input, string[] columns, IRowFormula? formula = null, string output = "-", bool decimalComma = false,
        string? separator = null, string? headerLine = null)
    {
        WholeFileRequest request = new()
        {
            Input = "-",
            Output = output,
            Columns = columns,
            DecimalComma = decimalComma,
            Separator = separator,
            HeaderLine = headerLine,
        };
        using MemoryStream written = new();
        List<string> said = [];
        WholeFile.Run(request, formula ?? new PlainFormula(), new WholeFileSurroundings(() => new MemoryStream(input), () => written, said.Add, TimeProvider.System), CancellationToken.None);
        return new Worked(Encoding.Latin1.GetString(written.ToArray()), [.. said]);
    }
}
