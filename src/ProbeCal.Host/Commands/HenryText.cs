using System;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>A Henry's-law constant printed for people.</summary>
internal static class HenryText
{
    private const int Digits = 6;

    internal static void Write(TextWriter output, HenryConstant h)
    {
        void Line(FormattableString text)
        {
            output.WriteLine(text.ToString(CultureInfo.InvariantCulture));
        }

        string water = string.Create(CultureInfo.InvariantCulture, $"at {h.Temperature.Value} °C, salinity {h.Salinity}");
        if (h.Gas is Gas gas)
        {
            Line($"Henry's law for {GasNames.NameOf(gas)} {water}, by {EquationNames.NameOf(h.Equation!.Value)}");
        }
        else
        {
            Line($"{h.GivenForm} = {h.GivenValue!.Value} {water}, in every form");
        }

        Line($"");
        string[][] rows = [.. h.Forms.Select(static form => new[]
        {
            form.Form, Number.Significant(form.Value, Digits), form.StandardUncertainty == 0 ? "" : "± " + Number.Significant(form.StandardUncertainty, 2), form.Unit, form.Meaning,
        })];
        int[] widths = [.. Enumerable.Range(0, 5).Select(column => rows.Max(row => row[column].Length))];
        foreach (string[] row in rows)
        {
            string sure = widths[2] == 0 ? "" : row[2].PadRight(widths[2]) + "  ";
            Line($"  {row[0].PadRight(widths[0])}  {row[1].PadLeft(widths[1])}  {sure}{row[3].PadRight(widths[3])}  {row[4]}");
        }

        Line($"");
        Line($"  density of the water {h.DensityKilogramsPerCubicMetre:F3} kg/m³ (EOS-80)");
        if (h.Salinity != 0)
        {
            Line($"  note: Hbp, Hxp and Kpx are per kilogram of this water, its salt counted as water");
        }

        foreach (string note in h.Notes)
        {
            Line($"  note: {note}");
        }

        string exact = (h.Gas is null ? "constant, " : "") + (h.Temperature.IsExact ? "temperature, " : "") + "salinity";
        Line($"  ± is a standard uncertainty (k = 1); {exact} taken as exact");
    }
}
