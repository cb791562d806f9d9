using System.Collections.Generic;
using System.IO;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>Steps of a guided procedure as plain text.</summary>
internal static class ProcedureText
{
    /// <summary>Writes a whole procedure, numbered, with where waits and order come from.</summary>
    internal static void Write(TextWriter output, IReadOnlyList<ProcedureStep> steps)
    {
        Dictionary<string, int> cautioned = [];
        for (int i = 0; i < steps.Count; i++)
        {
            // A caution is written out in the first step that meets its hazard; read as a whole, the plan points back to it.
            int step = i + 1;
            string[] before = [.. steps[i].Cautions.Where(cautioned.ContainsKey)];
            string[] back = [.. before.Select(caution => $"as in step {Number.Print(cautioned[caution])}").Distinct()];
            Write(output, steps[i] with { Cautions = [.. steps[i].Cautions.Except(before), .. back] }, withSource: true, Number.Print(step) + ". ");
            foreach (string caution in steps[i].Cautions)
            {
                cautioned.TryAdd(caution, step);
            }
        }

        string[] sources = [.. steps.Select(static step => step.Source).OfType<string>().SelectMany(static source => source.Split("; ")).Distinct()];
        if (sources.Length != 0)
        {
            output.WriteLine();
            TextTable.WriteWrapped(output, "Sources: ", "  ", string.Join("; ", sources));
        }
    }

    /// <summary>Writes one step: title with its usual wait, what to do and look for, what to write down, and cautions.</summary>
    internal static void Write(TextWriter output, ProcedureStep step, bool withSource, string number = "")
    {
        string wait = (step.LeastMinutes, step.MostMinutes) switch
        {
            (double least, double most) when least != most => $" ({Number.Print(least)} to {Number.Print(most)} min)",
            (double least, _) => $" ({Number.Print(least)} min or more)",
            (null, double most) => $" (up to {Number.Print(most)} min)",
            _ => "",
        };
        TextTable.WriteWrapped(output, number, new string(' ', number.Length), step.Title + wait);
        string indent = withSource ? "   " : "  ";
        Lines("", step.Do);
        Lines("Look: ", step.LookFor);
        Lines("Write down: ", step.WriteDown == null ? [] : [step.WriteDown]);
        Lines("Caution: ", step.Cautions);

        void Lines(string before, IReadOnlyList<string> lines)
        {
            foreach (string line in lines)
            {
                // A caution may begin with the word already.
                bool said = before.Length != 0 && line.StartsWith(before.TrimEnd(), System.StringComparison.OrdinalIgnoreCase);
                TextTable.WriteWrapped(output, indent + (said ? "" : before), indent + "  ", line);
            }
        }
    }
}
