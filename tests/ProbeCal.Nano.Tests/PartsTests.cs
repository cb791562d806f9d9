using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection.Metadata.Ecma335;
using System.Reflection.PortableExecutable;
using Mono.Cecil;
using Mono.Cecil.Cil;
using Xunit;

namespace ProbeCal.Nano.Tests;

/// <summary>The assemblies that a device gets are the whole that the other tests take apart, cut into pieces that it can load.</summary>
public class PartsTests
{
    public static TheoryData<string> Parts => new(DeviceAssembly.PartNames);

    /// <summary>The device's offsets into code, strings and signatures are 16 bits wide; a quarter is kept free.</summary>
    [Theory]
    [MemberData(nameof(Parts))]
    public void A_part_stays_well_below_the_64_KB_that_the_offsets_of_a_device_reach(string part)
    {
        const int Most = 48 * 1024;
        int code = Part(part).MainModule.GetTypes().SelectMany(t => t.Methods).Where(m => m.HasBody).Sum(m => m.Body.CodeSize);
        Assert.InRange(code, 1, Most);
        using var reader = new PEReader(File.OpenRead(Path.Combine(AppContext.BaseDirectory, "device", part + ".dll")));
        System.Reflection.Metadata.MetadataReader metadata = System.Reflection.Metadata.PEReaderExtensions.GetMetadataReader(reader);
        Assert.InRange(metadata.GetHeapSize(HeapIndex.String) + metadata.GetHeapSize(HeapIndex.UserString), 1, Most);
        Assert.InRange(metadata.GetHeapSize(HeapIndex.Blob), 1, Most);
    }

    [Fact]
    public void The_parts_hold_the_very_instructions_of_the_whole()
    {
        Dictionary<string, string> whole = Methods(DeviceAssembly.Nano);
        Dictionary<string, string> parts = DeviceAssembly.Parts.SelectMany(Methods).ToDictionary(p => p.Key, p => p.Value);
        Assert.Equal(whole.Keys.Order(StringComparer.Ordinal), parts.Keys.Order(StringComparer.Ordinal));
        string[] different = whole.Where(m => parts[m.Key] != m.Value).Select(m => m.Key).ToArray();
        Assert.True(different.Length == 0, string.Join("\n", different));
        Assert.True(whole.Count >= 500);
    }

    [Fact]
    public void A_part_refers_to_nothing_but_mscorlib_and_earlier_parts()
    {
        for (int i = 0; i < DeviceAssembly.Parts.Length; i++)
        {
            string[] allowed = [.. DeviceAssembly.PartNames.Take(i), "mscorlib"];
            Assert.All(DeviceAssembly.Parts[i].MainModule.AssemblyReferences, reference => Assert.Contains(reference.Name, allowed));
        }
    }

    private static AssemblyDefinition Part(string name)
    {
        return DeviceAssembly.Parts[Array.IndexOf(DeviceAssembly.PartNames, name)];
    }

    private static Dictionary<string, string> Methods(AssemblyDefinition assembly)
    {
        // What the compiler adds to an assembly for itself is not Core's.
        return assembly.MainModule.GetTypes().Where(type => type.Namespace == "ProbeCal" || type.DeclaringType?.Namespace == "ProbeCal")
            .SelectMany(type => type.Methods).ToDictionary(method => method.FullName, Text);
    }

    private static string Text(MethodDefinition method)
    {
        return method.HasBody ? string.Join("\n", method.Body.Instructions.Select(each => each.ToString())) : "";
    }
}
