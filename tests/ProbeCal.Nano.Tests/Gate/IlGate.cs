using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>All rules that can be decided from the IL alone.</summary>
internal static class IlGate
{
    /// <summary>Checks these types and the types nested in them.</summary>
    public static List<Breach> Check(IEnumerable<TypeDefinition> types)
    {
        List<TypeDefinition> all = types.SelectMany(WithNested).ToList();
        var calls = new CallRules(all);
        return all.SelectMany(type => TypeRules.Check(type)
            .Concat(ReferenceRules.Check(type))
            .Concat(InstructionRules.Check(type))
            .Concat(calls.Check(type))).ToList();
    }

    private static IEnumerable<TypeDefinition> WithNested(TypeDefinition type)
    {
        return type.NestedTypes.SelectMany(WithNested).Prepend(type);
    }
}
