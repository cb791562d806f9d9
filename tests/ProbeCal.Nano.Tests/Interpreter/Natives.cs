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
        ["System.Array::Copy(System.Array,System.Array,System.Int32)"] = static s => Array.Copy(Items(s[0]), Items(s[1]), (int)s[2].I),
        ["System.Array::Copy(System.Array,System.Int32,System.Array,System.Int32,System.Int32)"] =
            static s => Array.Copy(Items(s[0]), (int)s[1].I, Items(s[2]), (int)s[3].I, (int)s[4].I),
        ["System.Array::Clear(System.Array,System.Int32,System.Int32)"] = static s => Array.Clear(Items(s[0]), (int)s[1].I, (int)s[2].I),
        ["System.String::get_Length()"] = static s => s[0].I = ((string)s[0].R!).Length,
        ["System.String::get_Chars(System.Int32)"] = static s => s[0].I = ((string)s[0].R!)[(int)s[1].I],
        ["System.String::op_Equality(System.String,System.String)"] = static s => s[0].I = (string?)s[0].R == (string?)s[1].R ? 1 : 0,
    };

    public static Native Find(MethodReference method)
    {
        return All.TryGetValue(ReferenceRules.NameOf(method), out Native? native)
            ? native
            : throw new NotSupportedException("the interpreter does not know " + ReferenceRules.NameOf(method));
    }

    private static Value[] Items(Value value)
    {
        return ((ArrayObject)value.R!).Items;
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
