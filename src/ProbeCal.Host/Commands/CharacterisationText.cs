using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Characterising;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>A characterisation for people: each part with its values, how sure they are, and how well it fits.</summary>
internal static class CharacterisationText
{
    internal static void Write(TextWriter output, Characterisation found)
    {
        output.WriteLine("Characterisation" + (found.Probe is null ? "" : " of " + Wrong.OneLine(found.Probe)) + " (uncertainties after ± hold 95 %)");
        foreach (CharacterisedPart part in found.Parts)
        {
            output.WriteLine();
            output.WriteLine($"{part.Part}: {found.Files.First(each => each.Part == part.Part).File}");
            List<string[]> rows = [];
            foreach (Estimate each in part.Parameters.Concat(part.Derived))
            {
                UncertainNumber number = new(each.Value, (each.CoverageFactor ?? part.CoverageFactor) * each.StandardUncertainty, each.Unit);
                rows.Add([each.Name, number.Value + (number.Uncertainty is null ? "" : " ± " + number.Uncertainty) + (number.Unit.Length == 0 ? "" : " " + number.Unit), "u " + Number.Significant(each.StandardUncertainty, 3)]);
            }

            TextTable.Write(output, rows, "  ");
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {part.Points} points{(part.Rows == part.Points ? "" : $" of {part.Rows} rows")}, {part.DegreesOfFreedom} degrees of freedom (k = {part.CoverageFactor:F2}), residuals {Number.Significant(part.ResidualStandardDeviation, 3)} {part.ResidualUnit}"));
            output.WriteLine("  " + part.Model);
            if (part.LackOfFitProbability is double probability)
            {
                output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  lack of fit against repeats (F test, ISO 11095): p = {probability:F3}{(probability < 0.05 ? ": the form does not fit" : "")}"));
            }

            foreach (string note in part.Notes)
            {
                output.WriteLine("  note: " + note);
            }
        }

        if (found.CoefficientText is string text)
        {
            output.WriteLine();
            output.WriteLine($"for calibrate: --coefficient \"{text}\"");
        }
    }
}
