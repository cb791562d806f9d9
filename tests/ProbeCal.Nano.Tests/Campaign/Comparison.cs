using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Reflection;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>
/// Tells the desktop's value from the device's: doubles by their bits (one NaN is as good as another: no processor promises
/// which one an operation gives), arrays and objects by all they hold.
/// </summary>
internal sealed class Comparison
{
    private readonly Dictionary<TypeDefinition, (FieldInfo Desktop, FieldDefinition Device)[]> fields = [];

    /// <summary>The first difference, or null.</summary>
    public string? Difference(string name, TypeReference type, object? desktop, Value device)
    {
        if (type is ByReferenceType reference)
        {
            return Difference(name, reference.ElementType, desktop, ((Value[])device.R!)[device.I]);
        }
        if (type is ArrayType array)
        {
            return ArrayDifference(name, array, (Array?)desktop, (ArrayObject?)device.R);
        }
        if (type.MetadataType == MetadataType.Double)
        {
            double d = (double)desktop!;
            bool same = BitConverter.DoubleToInt64Bits(d) == device.I || (double.IsNaN(d) && double.IsNaN(device.D));
            return same ? null : $"{name}: desktop {Print(d)}, device {Print(device.D)}";
        }
        if (type.IsPrimitive || type is TypeDefinition { IsEnum: true })
        {
            long bits = ToBits(desktop!);
            return bits == device.I ? null : $"{name}: desktop {desktop}, device {device.I}";
        }
        return ObjectDifference(name, desktop, device.R);
    }

    /// <summary>An integer, boolean or enumeration as a slot of the interpreter holds it.</summary>
    public static long ToBits(object value)
    {
        return value switch
        {
            bool b => b ? 1 : 0,
            uint u => unchecked((int)u),
            ulong u => unchecked((long)u),
            char c => c,
            Enum e => Convert.ToInt64(e, CultureInfo.InvariantCulture),
            _ => Convert.ToInt64(value, CultureInfo.InvariantCulture),
        };
    }

    public static string Print(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture) + " (" + BitConverter.DoubleToInt64Bits(value).ToString("X16", CultureInfo.InvariantCulture) + ")";
    }

    private string? ArrayDifference(string name, ArrayType type, Array? desktop, ArrayObject? device)
    {
        if (desktop == null || device == null)
        {
            return desktop == null && device == null ? null : name + ": null on one side only";
        }
        if (desktop.Length != device.Items.Length)
        {
            return $"{name}: {desktop.Length} elements on the desktop, {device.Items.Length} on the device";
        }
        for (int i = 0; i < desktop.Length; i++)
        {
            string? difference = Difference($"{name}[{i}]", type.ElementType, desktop.GetValue(i), device.Items[i]);
            if (difference != null)
            {
                return difference;
            }
        }
        return null;
    }

    private string? ObjectDifference(string name, object? desktop, object? device)
    {
        if (desktop == null || device == null)
        {
            return desktop == null && device == null ? null : $"{name}: {(desktop == null ? "null" : "an object")} on the desktop, {(device == null ? "null" : "an object")} on the device";
        }
        var instance = (Instance)device;
        TypeDefinition type = instance.Type.Definition;
        if (desktop.GetType().FullName != type.FullName)
        {
            return $"{name}: {desktop.GetType().FullName} on the desktop, {type.FullName} on the device";
        }
        foreach ((FieldInfo own, FieldDefinition field) in FieldsOf(type))
        {
            string? difference = Difference(name + "." + field.Name, field.FieldType, own.GetValue(desktop), instance.Fields[instance.Type.SlotOf(field)]);
            if (difference != null)
            {
                return difference;
            }
        }
        return null;
    }

    private (FieldInfo, FieldDefinition)[] FieldsOf(TypeDefinition type)
    {
        if (!fields.TryGetValue(type, out (FieldInfo, FieldDefinition)[]? found))
        {
            found = type.Fields.Where(f => !f.IsStatic).Select(f => (Surface.DesktopOf(f), f)).ToArray();
            fields.Add(type, found);
        }
        return found;
    }
}
