using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>What the shape of a type, a signature or a local must not have.</summary>
internal static class TypeRules
{
    public static IEnumerable<Breach> Check(TypeDefinition type)
    {
        if (type.HasGenericParameters)
        {
            yield return new Breach("generic-type", type.FullName, "the device's loader fails on an assembly with a generic type");
        }
        if (type.IsValueType && !type.IsEnum && !IsInitialiserData(type))
        {
            yield return new Breach("structure", type.FullName, "a structure lives on the device's heap and is copied at each use: write a sealed class or pass doubles");
        }
        foreach (FieldDefinition field in type.Fields)
        {
            foreach (Breach breach in Signature(field.FieldType, type.FullName + "." + field.Name))
            {
                yield return breach;
            }
        }
        foreach (MethodDefinition method in type.Methods)
        {
            foreach (Breach breach in Check(method))
            {
                yield return breach;
            }
        }
    }

    /// <summary>Whether the type only gives a size to the bytes of an array initialiser, which no code ever loads.</summary>
    private static bool IsInitialiserData(TypeDefinition type)
    {
        return type.DeclaringType?.Name == "<PrivateImplementationDetails>";
    }

    private static IEnumerable<Breach> Check(MethodDefinition method)
    {
        if (method.HasGenericParameters)
        {
            yield return Breach.At("generic-method", method, null, "a call of a generic method fails on the device");
        }
        if (method.DeclaringType.IsInterface && !method.IsAbstract)
        {
            yield return Breach.At("default-interface-method", method, null, "a body in an interface fails on the device");
        }
        IEnumerable<TypeReference> types = method.Parameters.Select(p => p.ParameterType).Append(method.ReturnType);
        if (method.HasBody)
        {
            types = types.Concat(method.Body.Variables.Select(v => v.VariableType));
        }
        foreach (TypeReference each in types)
        {
            foreach (Breach breach in Signature(each, Breach.PlaceOf(method, null)))
            {
                yield return breach;
            }
        }
    }

    private static IEnumerable<Breach> Signature(TypeReference type, string place)
    {
        switch (type)
        {
            case GenericInstanceType:
                yield return new Breach("generic-type", place, type.FullName + " is generic");
                yield break;
            case FunctionPointerType:
                yield return new Breach("function-pointer", place, "function pointers fail on the device");
                yield break;
            case PointerType or PinnedType:
                yield return new Breach("pointer", place, type.FullName + " is refused when the assembly is converted for the device");
                yield break;
            case ArrayType { Rank: > 1 }:
                yield return new Breach("multidimensional-array", place, type.FullName + " is refused when the assembly is converted: use an array of arrays");
                yield break;
            case TypeSpecification nested:
                foreach (Breach breach in Signature(nested.ElementType, place))
                {
                    yield return breach;
                }
                yield break;
        }
        if (type.MetadataType == MetadataType.Single)
        {
            yield return new Breach("single-precision", place, "float keeps 7 digits: use double");
        }
        if (ReferenceRules.IsExternal(type) && !type.IsGenericParameter && !AllowedMembers.Types.ContainsKey(type.FullName))
        {
            yield return new Breach("external-type", place, type.FullName + " is not in the list of allowed types");
        }
    }
}
