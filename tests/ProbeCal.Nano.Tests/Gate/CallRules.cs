using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>Rules that look through calls: what a static initialiser reads, and where memory is taken.</summary>
internal sealed class CallRules
{
    private readonly IReadOnlyList<TypeDefinition> types;
    private readonly Dictionary<MethodDefinition, List<MethodDefinition>> callees = [];

    public CallRules(IReadOnlyList<TypeDefinition> types)
    {
        this.types = types;
    }

    public IEnumerable<Breach> Check(TypeDefinition type)
    {
        foreach (MethodDefinition method in type.Methods.Where(m => m.HasBody))
        {
            if (method.IsConstructor && method.IsStatic)
            {
                foreach (Breach breach in CheckInitialiser(method))
                {
                    yield return breach;
                }
            }
            if (IsHotPath(method))
            {
                foreach (Breach breach in CheckAllocation(method))
                {
                    yield return breach;
                }
            }
        }
    }

    /// <summary>
    /// A function of Core proper: static, answering with a number or an enumeration, everything in and out being a number or an
    /// array that the caller keeps.
    /// </summary>
    private static bool IsHotPath(MethodDefinition method)
    {
        return method.IsStatic && !method.IsConstructor && method.IsPublic
            && (method.ReturnType.IsPrimitive || IsEnum(method.ReturnType))
            && method.Parameters.All(p => p.ParameterType is not ByReferenceType reference || reference.ElementType.IsPrimitive || IsEnum(reference.ElementType));
    }

    private static bool IsEnum(TypeReference type)
    {
        return type is TypeDefinition { IsEnum: true };
    }

    /// <summary>Initialisers run at start-up in the order of the type names: another type's static may not be there yet.</summary>
    private IEnumerable<Breach> CheckInitialiser(MethodDefinition initialiser)
    {
        foreach (MethodDefinition method in Reachable(initialiser))
        {
            foreach (Instruction at in method.Body.Instructions)
            {
                if (at.OpCode.Code is Code.Ldsfld or Code.Ldsflda && ((FieldReference)at.Operand).DeclaringType != initialiser.DeclaringType)
                {
                    yield return Breach.At("initialiser", method, at, $"the static initialiser of {initialiser.DeclaringType.Name} reads {((FieldReference)at.Operand).Name} of another type, which the device may not have set yet");
                }
            }
        }
    }

    private IEnumerable<Breach> CheckAllocation(MethodDefinition function)
    {
        foreach (MethodDefinition method in Reachable(function))
        {
            foreach (Instruction at in method.Body.Instructions)
            {
                if (at.OpCode.Code is Code.Newobj or Code.Newarr or Code.Box)
                {
                    yield return Breach.At("allocation", method, at, $"takes memory on the way of {function.DeclaringType.Name}.{function.Name}");
                }
            }
        }
    }

    private HashSet<MethodDefinition> Reachable(MethodDefinition start)
    {
        var found = new HashSet<MethodDefinition> { start };
        var waiting = new Queue<MethodDefinition>([start]);
        while (waiting.TryDequeue(out MethodDefinition? next))
        {
            foreach (MethodDefinition callee in CalleesOf(next))
            {
                if (found.Add(callee))
                {
                    waiting.Enqueue(callee);
                }
            }
        }
        return found;
    }

    private List<MethodDefinition> CalleesOf(MethodDefinition method)
    {
        if (!callees.TryGetValue(method, out List<MethodDefinition>? list))
        {
            list = method.Body.Instructions.Select(at => at.Operand).OfType<MethodDefinition>()
                .SelectMany(callee => callee.IsVirtual ? Implementations(callee) : [callee])
                .Where(callee => callee.HasBody).Distinct().ToList();
            callees.Add(method, list);
        }
        return list;
    }

    /// <summary>Every method that a virtual call of this one may reach: same name and number of parameters, whatever the type.</summary>
    private IEnumerable<MethodDefinition> Implementations(MethodDefinition callee)
    {
        return types.SelectMany(t => t.Methods).Where(m => m.IsVirtual && m.Name == callee.Name && m.Parameters.Count == callee.Parameters.Count);
    }
}
