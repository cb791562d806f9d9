using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>One division or remainder as it stands in the reviewed list.</summary>
/// <param name="Method">Type and method.</param>
/// <param name="Statement">The statement's text in the source, white space made one blank.</param>
/// <param name="Count">How many divisions the statement holds.</param>
/// <param name="Reason">Why no divisor in it can be zero.</param>
internal sealed record Division(string Method, string Statement, int Count, string Reason)
{
    /// <summary>What a row says before it has been reviewed.</summary>
    public const string NotReviewed = "?";

    public string Key => Method + "\t" + Statement + "\t" + Count.ToString(CultureInfo.InvariantCulture);
}

/// <summary>Every <c>div</c> and <c>rem</c> of an assembly, and the reviewed list of them.</summary>
internal static class DivisionList
{
    private const string Header = "method\tstatement\tdivisions\twhy no divisor is zero";

    /// <summary>The divisions found in the IL; those by a constant give their reason themselves.</summary>
    public static List<Division> Found(IEnumerable<TypeDefinition> types)
    {
        return types.SelectMany(t => t.Methods).Where(m => m.HasBody)
            .SelectMany(m => m.Body.Instructions.Where(IsDivision).Select(at => (Method: m, At: at)))
            .GroupBy(d => (Method: NameOf(d.Method), Statement: Statement(d.Method, d.At)))
            .Select(g => new Division(g.Key.Method, g.Key.Statement, g.Count(),
                g.All(d => IsNonZeroConstant(d.At.Previous)) ? "the divisor is a constant" : Division.NotReviewed))
            .OrderBy(d => d.Key, StringComparer.Ordinal).ToList();
    }

    /// <summary>Reads the reviewed list.</summary>
    public static List<Division> Read(string path)
    {
        return File.ReadAllLines(path).Skip(1).Where(line => line.Length > 0).Select(line =>
        {
            string[] cells = line.Split('\t');
            return cells.Length == 4
                ? new Division(cells[0], cells[1], int.Parse(cells[2], CultureInfo.InvariantCulture), cells[3])
                : throw new FormatException("not four cells in " + path + ": " + line);
        }).ToList();
    }

    /// <summary>Writes what was found, keeping the reasons that the list already gave.</summary>
    public static void Update(string path, IEnumerable<Division> found)
    {
        Dictionary<string, string> reasons = Read(path).ToDictionary(d => d.Key, d => d.Reason);
        File.WriteAllLines(path, found.Select(d => d.Key + "\t" + reasons.GetValueOrDefault(d.Key, d.Reason)).Prepend(Header));
    }

    private static bool IsDivision(Instruction at)
    {
        return at.OpCode.Code is Code.Div or Code.Div_Un or Code.Rem or Code.Rem_Un;
    }

    private static bool IsNonZeroConstant(Instruction? at)
    {
        return at != null && ((at.OpCode.Code == Code.Ldc_R8 && (double)at.Operand != 0.0) || (IlOperands.IsIntegerConstant(at, out long value) && value != 0 && value != -1));
    }

    private static string NameOf(MethodDefinition method)
    {
        return method.DeclaringType.Name + "." + method.Name;
    }

    private static string Statement(MethodDefinition method, Instruction at)
    {
        SequencePoint point = method.DebugInformation.SequencePoints.Last(p => !p.IsHidden && p.Offset <= at.Offset);
        string[] lines = SourceText.Lines(point.Document.Url);
        IEnumerable<string> text = Enumerable.Range(point.StartLine, point.EndLine - point.StartLine + 1).Select(n =>
        {
            string line = lines[n - 1];
            int start = n == point.StartLine ? point.StartColumn - 1 : 0;
            int end = n == point.EndLine ? point.EndColumn - 1 : line.Length;
            return line[start..end];
        });
        return string.Join(' ', string.Join(' ', text).Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
    }
}
