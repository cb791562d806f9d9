using System;
using System.Collections.Generic;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Gate;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>A method of the device's mscorlib. The arguments lie at the start of the slots; a result goes into the first.</summary>
internal delegate void Native(Span<Value> slots);

/// <summary>The methods of mscorlib that Core may call, as far as they are not instructions of their own.</summary>
internal static class Natives
{
    private static readonly Dictionary<string, Native> All = new()
    {
        ["System.Object::.ctor()"] = static _ => { },
        ["System.Runtime.CompilerServices.RuntimeHelpers::InitializeArray(System.Array,System.RuntimeFieldHandle)"] = InitializeArray,
    };

    public static Native Find(MethodReference method)
    {
        return All.TryGetValue(ReferenceRules.NameOf(method), out Native? native)
            ? native
            : throw new NotSupportedException("the interpreter does not know " + ReferenceRules.NameOf(method));
    }

    private static void InitializeArray(Span<Value> slots)
    {
        var array = (ArrayObject)slots[0].R!;
        byte[] bytes = (byte[])slots[1].R!;
        int size = array.Items.Length == 0 ? 1 : bytes.Length / array.Items.Length;
        for (int i = 0; i < array.Items.Length; i++)
        {
            ReadOnlySpan<byte> element = bytes.AsSpan(i * size, size);
            array.Items[i].I = size switch
            {
                8 => BitConverter.ToInt64(element),
                4 => BitConverter.ToInt32(element),
                2 when array.Element.MetadataType == MetadataType.Int16 => BitConverter.ToInt16(element),
                2 => BitConverter.ToUInt16(element),
                1 when array.Element.MetadataType == MetadataType.SByte => (sbyte)element[0],
                _ => element[0],
            };
        }
    }
}
