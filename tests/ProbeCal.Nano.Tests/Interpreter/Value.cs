using System;
using System.Runtime.InteropServices;
using Mono.Cecil;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>
/// One slot: a double, an integer (32-bit ones kept sign-extended, unsigned ones too), an object, or an address, which is an
/// array of slots and an index in it.
/// </summary>
[StructLayout(LayoutKind.Explicit)]
internal struct Value
{
    [FieldOffset(0)]
    public double D;

    [FieldOffset(0)]
    public long I;

    [FieldOffset(8)]
    public object? R;

    public static Value OfDouble(double value)
    {
        return new Value { D = value };
    }

    public static Value OfInteger(long value)
    {
        return new Value { I = value };
    }

    public static Value OfObject(object? value)
    {
        return new Value { R = value };
    }

    public static Value OfAddress(Value[] slots, int index)
    {
        return new Value { R = slots, I = index };
    }
}

/// <summary>An object of an interpreted class.</summary>
internal sealed class Instance(InterpretedType type)
{
    public readonly InterpretedType Type = type;
    public readonly Value[] Fields = new Value[type.FieldCount];
}

/// <summary>An array of an interpreted program.</summary>
internal sealed class ArrayObject(TypeReference element, int length)
{
    public readonly TypeReference Element = element;
    public readonly Value[] Items = new Value[length];
}

/// <summary>What the device throws for a zero divisor: System.Exception and nothing more special.</summary>
internal sealed class DeviceException(string message) : Exception(message);

/// <summary>The program did something for which devices have no common result.</summary>
internal sealed class UnspecifiedException(string message) : Exception(message);
