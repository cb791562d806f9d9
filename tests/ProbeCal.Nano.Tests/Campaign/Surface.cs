using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using Mono.Cecil;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>A public method or constructor, in the device assembly and on the desktop.</summary>
internal sealed record Member(string Name, MethodDefinition Device, MethodBase Desktop)
{
    /// <summary>Whether it does no more than hand out what an object holds.</summary>
    public bool IsGetter => Device.IsGetter;
}

/// <summary>The public surface of the device assembly, found by reflection so that nothing new is left out.</summary>
internal static class Surface
{
    private const BindingFlags Everything = BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;

    private static readonly Assembly Core = typeof(Status).Assembly;

    /// <summary>All public methods and constructors that have a body, getters last: by then the calls have filled the objects they read.</summary>
    public static List<Member> Members()
    {
        return DeviceAssembly.Nano.MainModule.Types.Where(t => t.IsPublic && !t.IsEnum && !t.IsInterface)
            .SelectMany(t => t.Methods).Where(m => m.IsPublic && m.HasBody && !(m.IsConstructor && m.IsStatic))
            .Select(m => new Member(NameOf(m), m, DesktopOf(m)))
            .OrderBy(m => m.IsGetter).ThenBy(m => m.Name, StringComparer.Ordinal).ToList();
    }

    /// <summary>The desktop's type for one of the device assembly.</summary>
    public static Type DesktopOf(TypeReference type)
    {
        switch (type)
        {
            case ByReferenceType reference:
                return DesktopOf(reference.ElementType).MakeByRefType();
            case ArrayType array:
                return DesktopOf(array.ElementType).MakeArrayType();
            default:
                return Core.GetType(type.FullName) ?? typeof(object).Assembly.GetType(type.FullName)
                    ?? throw new InvalidOperationException(type.FullName + " is not in the desktop's Core");
        }
    }

    public static FieldInfo DesktopOf(FieldDefinition field)
    {
        return DesktopOf(field.DeclaringType).GetField(field.Name, Everything)
            ?? throw new InvalidOperationException(field.FullName + " is not in the desktop's Core");
    }

    private static MethodBase DesktopOf(MethodDefinition method)
    {
        Type type = DesktopOf(method.DeclaringType);
        Type[] parameters = method.Parameters.Select(p => DesktopOf(p.ParameterType)).ToArray();
        MethodBase? found = method.IsConstructor
            ? type.GetConstructor(Everything, parameters)
            : type.GetMethod(method.Name, Everything, parameters);
        return found ?? throw new InvalidOperationException(method.FullName + " is not in the desktop's Core");
    }

    private static string NameOf(MethodDefinition method)
    {
        string name = method.DeclaringType.Name + (method.IsConstructor ? "" : "." + method.Name);
        bool isOverloaded = method.DeclaringType.Methods.Count(m => m.Name == method.Name && m.IsStatic == method.IsStatic) > 1;
        return isOverloaded ? name + "(" + string.Join(",", method.Parameters.Select(p => p.ParameterType.Name)) + ")" : name;
    }
}
