using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>A total-gas reading printed for people.</summary>
internal static class TotalGasText
{
    internal static void Write(TextWriter output, TotalGas g)
    {
        TotalGasReading r = g.Reading;
        void Line(FormattableString text)
        {
            output.WriteLine(text.ToString(CultureInfo.InvariantCulture));
        }

        Line($"ΔP {Plain(g.Delta)} hPa ({MillimetresOfMercury(g.Delta.Value)} mmHg): total dissolved gas is {Plain(g.Percent)} % of the air's pressure");
        Line($"");
        Line($"  water at {WaterWords.Celsius(r.Temperature.Value)}, salinity {r.Salinity.Value}, under air of {r.Air.Hectopascal:F2} hPa ({MillimetresOfMercury(r.Air.Hectopascal)} mmHg), absolute");
        if (PressureWords.Caution(r.Air.Source, r.Air.UncertaintyHectopascal) is string second)
        {
            Line($"  {second}");
        }

        Line($"");
        Pressure("total pressure", g.Total);
        Pressure("excess (ΔP)", g.Delta);
        Row("of the air's", g.Percent, 2, "%", "");
        Pressure("vapour", new UncertainQuantity(g.VapourHectopascal, 0));
        if (g.Parts is TotalGasParts parts)
        {
            Line($"");
            Pressure("oxygen", parts.OxygenHectopascal);
            Row("", parts.OxygenPercent, 2, "%", "of equilibrium with the air");
            Pressure("nitrogen, argon", parts.NitrogenArgonHectopascal);
            Row("", parts.NitrogenArgonPercent, 2, "%", "of equilibrium with the air");
            if (r.CarbonDioxideHectopascal is double carbonDioxide)
            {
                Pressure("carbon dioxide", new UncertainQuantity(carbonDioxide, 0));
            }
            else
            {
                Line($"  carbon dioxide     neglected: what there is of it counts as nitrogen and argon (--carbon-dioxide)");
            }
        }
        else
        {
            Line($"  (with the oxygen, --concentration 9.8mg/L, the rest is told apart as nitrogen and argon)");
        }

        Line($"");
        if (0 < g.CompensationDepthMetres.Value)
        {
            Row("compensation depth", g.CompensationDepthMetres, 3, "m", "below it the water above holds the gas in solution");
        }
        else
        {
            Line($"  compensation depth none: the water holds less than the air");
        }

        if (g.DeltaAtDepth is UncertainQuantity left)
        {
            Pressure(string.Create(CultureInfo.InvariantCulture, $"ΔP at {r.DepthMetres} m"), left);
        }

        if (g.IsNearEdge)
        {
            Line($"  note: the temperature is just outside the range of the equations");
        }

        if (g.Caution is string caution)
        {
            TextTable.WriteWrapped(output, "  caution: ", "    ", caution);
        }

        TextTable.WriteWrapped(output, "  ", "    ", "± is a standard uncertainty (k = 1)" + Exact(g));

        void Pressure(string name, UncertainQuantity value)
        {
            Row(name, value, 2, "hPa", "(" + MillimetresOfMercury(value.Value) + " mmHg)");
        }

        void Row(string name, UncertainQuantity value, int decimals, string unit, string more)
        {
            string sure = value.StandardUncertainty == 0 ? "" : "± " + Number.Significant(value.StandardUncertainty, 2);
            output.WriteLine($"  {name,-18} {Number.Fixed(value.Value, decimals),9} {unit,-4} {sure,-9} {more}".TrimEnd());
        }
    }

    /// <summary>The value with as many digits as its uncertainty leaves a meaning to.</summary>
    private static string Plain(UncertainQuantity quantity)
    {
        UncertainNumber number = new(quantity.Value, quantity.StandardUncertainty, "");
        return number.Uncertainty is null ? number.Value : $"{number.Value} ± {number.Uncertainty}";
    }

    private static string Exact(TotalGas g)
    {
        List<string> exact = [];
        Add("total pressure", g.Reading.Delta.StandardUncertainty);
        Add("air pressure", g.Reading.Air.UncertaintyHectopascal);
        Add("temperature", g.Reading.Temperature.StandardUncertainty);
        Add("salinity", g.Reading.Salinity.StandardUncertainty);
        if (g.Reading.Oxygen is MeasuredConcentration oxygen)
        {
            Add("oxygen", oxygen.Given.StandardUncertainty);
        }

        return exact.Count == 0 ? "" : "; " + string.Join(", ", exact) + " taken as exact";

        void Add(string name, double uncertainty)
        {
            if (uncertainty == 0)
            {
                exact.Add(name);
            }
        }
    }

    private static string MillimetresOfMercury(double hectopascal)
    {
        return Number.Fixed(PressureUnits.MillimetresOfMercuryFromHectopascal(hectopascal), 1);
    }
}
