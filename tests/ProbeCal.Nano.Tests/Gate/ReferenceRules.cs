using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>Every reference that leaves the assembly exists in the device's mscorlib and stands in the list of allowed ones.</summary>
internal static class ReferenceRules
{
    public static IEnumerable<Breach> Check(TypeDefinition type)
    {
        if (type.BaseType != null && IsExternal(type.BaseType) && !AllowedMembers.Types.ContainsKey(type.BaseType.FullName))
        {
            yield return new Breach("external-type", type.FullName, "its base " + type.BaseType.FullName + " is not in the list of allowed types");
        }
        foreach (InterfaceImplementation each in type.Interfaces)
        {
            if (IsExternal(each.InterfaceType))
            {
                yield return new Breach("external-type", type.FullName, "it implements " + each.InterfaceType.FullName + ", which is not ours");
            }
        }
        foreach (MethodDefinition method in type.Methods.Where(m => m.HasBody))
        {
            foreach (Instruction at in method.Body.Instructions)
            {
                foreach (Breach breach in Check(method, at))
                {
                    yield return breach;
                }
            }
        }
    }

    public static bool IsExternal(TypeReference type)
    {
        return type.GetElementType() is not TypeDefinition && type.Scope is not ModuleDefinition;
    }

    /// <summary>The identity under which a method stands in the list.</summary>
    public static string NameOf(MethodReference method)
    {
        return method.DeclaringType.FullName + "::" + method.Name + "(" + string.Join(",", method.Parameters.Select(p => p.ParameterType.FullName)) + ")";
    }

    /// <summary>Whether the device's mscorlib has this method.</summary>
    public static bool ExistsOnTheDevice(MethodReference method)
    {
        TypeDefinition? type = DeviceAssembly.Mscorlib.MainModule.GetType(method.DeclaringType.FullName);
        string name = NameOf(method);
        return type != null && type.Methods.Any(m => NameOf(m) == name);
    }

    private static IEnumerable<Breach> Check(MethodDefinition method, Instruction at)
    {
        switch (at.Operand)
        {
            case GenericInstanceMethod generic:
                yield return Breach.At("generic-method", method, at, "calls the generic method " + generic.FullName);
                break;
            case MethodReference callee when callee.DeclaringType is GenericInstanceType:
                yield return Breach.At("generic-type", method, at, "calls " + callee.FullName + " (Func<> and Action<> fail too: write a delegate type of our own)");
                break;
            case MethodReference callee when callee.DeclaringType is ArrayType:
                yield return Breach.At("multidimensional-array", method, at, callee.FullName);
                break;
            case MethodReference callee when IsExternal(callee.DeclaringType):
                if (!ExistsOnTheDevice(callee))
                {
                    yield return Breach.At("missing-member", method, at, NameOf(callee) + " does not exist in the device's mscorlib");
                }
                else if (!AllowedMembers.Members.ContainsKey(NameOf(callee)))
                {
                    yield return Breach.At("external-member", method, at, NameOf(callee) + " is not in the list of allowed members");
                }
                break;
            case FieldReference field when IsExternal(field.DeclaringType):
                yield return Breach.At("external-member", method, at, field.FullName + ": no field of another assembly may be used");
                break;
            case TypeReference type when IsExternal(type) && !AllowedMembers.Types.ContainsKey(type.GetElementType().FullName):
                yield return Breach.At("external-type", method, at, type.FullName + " is not in the list of allowed types");
                break;
        }
    }
}
