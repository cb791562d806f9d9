using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;
using ProbeCal.Station;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>Station shows what its host uses and what that is made of; the rest is nobody's business.</summary>
public class StationSurfaceTests
{
    private const BindingFlags Declared = BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;

    private static readonly Assembly _station = typeof(RawSample).Assembly;

    // What ISampleSource delivers goes together: whoever reads a source has to tell them apart. The others are used by
    // their constants, which leave no trace in the host.
    private static readonly string[] _also = ["RejectedLine", "SourceState", "SourceStateChanged", "CalibrationIds", "Droplets", "CorrectionForms"];

    [Fact]
    public void Public_types_of_Station_are_those_that_Host_uses()
    {
        HashSet<string> used = UsedByHost();
        Type[] shown = [.. _station.GetExportedTypes().Where(static type => !type.IsNested)];
        HashSet<Type> needed = [];
        Queue<Type> open = new(shown.Where(type => used.Contains(type.FullName!) || _also.Contains(type.Name)));
        while (open.TryDequeue(out Type? type))
        {
            if (needed.Add(type))
            {
                foreach (Type next in NamedBy(type))
                {
                    open.Enqueue(next);
                }
            }
        }

        Assert.True(20 < needed.Count, "the search found next to nothing");
        Assert.Empty(shown.Except(needed).Select(static type => type.FullName));
    }

    private static HashSet<string> UsedByHost()
    {
        using FileStream file = File.OpenRead(typeof(Program).Assembly.Location);
        using PEReader portable = new(file);
        MetadataReader metadata = portable.GetMetadataReader();
        HashSet<string> used = [];
        foreach (TypeReferenceHandle handle in metadata.TypeReferences)
        {
            TypeReference type = metadata.GetTypeReference(handle);
            if (type.ResolutionScope.Kind == HandleKind.AssemblyReference
                && metadata.GetString(metadata.GetAssemblyReference((AssemblyReferenceHandle)type.ResolutionScope).Name) == _station.GetName().Name)
            {
                used.Add(metadata.GetString(type.Namespace) + "." + metadata.GetString(type.Name));
            }
        }

        return used;
    }

    /// <summary>The types of Station that stand in what a type shows to others.</summary>
    private static IEnumerable<Type> NamedBy(Type type)
    {
        List<Type> named = [.. type.GetInterfaces()];
        if (type.BaseType is { } parent)
        {
            named.Add(parent);
        }

        foreach (MemberInfo member in type.GetMembers(Declared))
        {
            if (member is MethodBase { IsPublic: true } or MethodBase { IsFamily: true })
            {
                named.AddRange(((MethodBase)member).GetParameters().Select(static each => each.ParameterType));
                if (member is MethodInfo method)
                {
                    named.Add(method.ReturnType);
                }
            }
            else if (member is FieldInfo { IsPublic: true } field)
            {
                named.Add(field.FieldType);
            }
        }

        return named.SelectMany(Parts).Where(static part => part.Assembly == _station);
    }

    private static IEnumerable<Type> Parts(Type type)
    {
        if (type.HasElementType)
        {
            return Parts(type.GetElementType()!);
        }

        if (type.IsGenericParameter)
        {
            return [];
        }

        Type plain = type.IsGenericType ? type.GetGenericTypeDefinition() : type;
        return type.GetGenericArguments().SelectMany(Parts).Append(plain);
    }
}
