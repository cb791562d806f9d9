using System.Collections.Generic;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An explanation printed for people: each step as symbol = formula = numbers put in = result, the citation where an equation begins.</summary>
internal static class ExplanationText
{
    private const string Indent = "  ";

    internal static void Write(TextWriter output, ExplainedEquilibrium explained)
    {
        Explanation explanation = explained.Explanation;
        GasEntry gas = Catalogue.Gas(explanation.Gas);
        output.WriteLine($"{gas.Name} ({gas.Symbol}) by {EquationNames.NameOf(explanation.Equation)}: {explained.What}");
        TextTable.WriteWrapped(output, "", "",
            "Every number stands in the digits that read back as the very same double; * is times, ^ a power, ln the natural logarithm. Rounded to ten significant digits at every step, the result still agrees to seven.");
        output.WriteLine();
        output.WriteLine("given");
        TextTable.Write(output, [.. Inputs(explanation)], Indent);

        foreach (string origin in ExplanationOrigins.Of(explained.Asked))
        {
            TextTable.WriteWrapped(output, Indent, Indent + Indent, origin);
        }

        HashSet<string> cited = [];
        string source = "";
        List<ExplainedStep> coefficients = [];
        foreach (ExplainedStep step in explanation.Steps.Where(static step => step.Kind != StepKind.Input))
        {
            if (step.Source.Length != 0 && step.Source != source)
            {
                WriteCoefficients(output, coefficients);
                source = step.Source;
                WriteHeading(output, explanation.Sources.First(known => known.Name == step.Source), cited.Add(source));
            }

            if (step.Kind == StepKind.Coefficient)
            {
                coefficients.Add(step);
                continue;
            }

            WriteCoefficients(output, coefficients);
            WriteStep(output, step);
        }

        ExplainedStep last = explanation.Steps[^1];
        output.WriteLine();
        output.WriteLine($"{last.Name}: {last.Symbol} = {Number.Print(last.Value)} {last.Unit}".TrimEnd());
        if (explained.NearEdge)
        {
            TextTable.WriteWrapped(output, "", "", "The temperature is just outside the range of the equation: the uncertainty is enlarged there (probecal equilibrium says by how much).");
        }
    }

    private static IEnumerable<string[]> Inputs(Explanation explanation)
    {
        return explanation.Steps.Where(static step => step.Kind == StepKind.Input)
            .Select(static step => new[] { step.Symbol, ("= " + Number.Print(step.Value) + " " + step.Unit).TrimEnd(), step.Name });
    }

    private static void WriteHeading(TextWriter output, ExplanationSource source, bool first)
    {
        output.WriteLine();
        string doi = source.Doi.Length == 0 ? "" : ", doi:" + source.Doi;
        TextTable.WriteWrapped(output, source.Name, Indent, first ? ": " + source.Citation + doi : " (above)");
    }

    /// <summary>Numbers that the equation brings along, on as few lines as they take.</summary>
    private static void WriteCoefficients(TextWriter output, List<ExplainedStep> coefficients)
    {
        if (coefficients.Count == 0)
        {
            return;
        }

        // No line may end between a symbol and its number.
        string line = Indent;
        foreach (ExplainedStep step in coefficients)
        {
            string unit = step.Unit.Length == 0 ? "" : " " + step.Unit;
            string words = step.Name == "coefficient" ? "" : " (" + step.Name + ")";
            string part = step.Symbol + " = " + Number.Print(step.Value) + unit + words;
            if (Indent.Length < line.Length && TextTable.Widest < line.Length + part.Length + 2)
            {
                output.WriteLine(line.TrimEnd());
                line = Indent;
            }

            line += part + (step == coefficients[^1] ? "" : "; ");
        }

        output.WriteLine(line);
        coefficients.Clear();
    }

    private static void WriteStep(TextWriter output, ExplainedStep step)
    {
        string start = Indent + step.Symbol + " ";
        string further = new(' ', start.Length);
        string iterated = step.Kind == StepKind.Iterated ? ", found by iteration" : "";
        TextTable.WriteWrapped(output, start, further + "  ", "= " + step.Formula + "    [" + step.Name + iterated + "]");
        if (step.WithNumbers != step.Formula)
        {
            TextTable.WriteWrapped(output, further, further + "  ", "= " + step.WithNumbers);
        }

        output.WriteLine(further + ("= " + Number.Print(step.Value) + " " + step.Unit).TrimEnd());
    }
}
