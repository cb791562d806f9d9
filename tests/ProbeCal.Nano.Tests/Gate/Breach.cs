using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>One place where the IL does what the device cannot do, or does otherwise.</summary>
/// <param name="Rule">Short name of the rule, for tests.</param>
/// <param name="Place">Type or method, with file and line where the symbols tell them.</param>
/// <param name="What">What is wrong and what would be right.</param>
internal sealed record Breach(string Rule, string Place, string What)
{
    public static Breach At(string rule, MethodDefinition method, Instruction? at, string what)
    {
        return new Breach(rule, PlaceOf(method, at), what);
    }

    public override string ToString()
    {
        return $"[{Rule}] {Place}: {What}";
    }

    /// <summary>The method, and the file and line an instruction comes from.</summary>
    public static string PlaceOf(MethodDefinition method, Instruction? at)
    {
        string name = method.DeclaringType.FullName + "." + method.Name;
        if (!method.HasBody || !method.DebugInformation.HasSequencePoints)
        {
            return name;
        }
        int offset = at?.Offset ?? 0;
        SequencePoint? point = method.DebugInformation.SequencePoints.LastOrDefault(p => !p.IsHidden && p.Offset <= offset)
            ?? method.DebugInformation.SequencePoints.FirstOrDefault(p => !p.IsHidden);
        return point == null ? name : $"{name} ({System.IO.Path.GetFileName(point.Document.Url)}:{point.StartLine})";
    }
}
