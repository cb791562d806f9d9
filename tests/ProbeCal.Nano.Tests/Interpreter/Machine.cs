using System;
using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>
/// Interprets the IL of one assembly, with the deviations asked for. One machine serves one thread.
/// </summary>
internal sealed partial class Machine
{
    /// <summary>Set in the immediate value of a comparison by order whose IL also accepts unordered operands.</summary>
    public const long UnorderedBit = 8;

    private const int StackSlots = 1 << 16;

    /// <summary>Slots between an initialiser, which runs apart from whoever caused it, and one that it causes in turn.</summary>
    private const int FarApart = 1 << 11;

    private readonly Value[] slots = new Value[StackSlots];
    private readonly Dictionary<TypeDefinition, InterpretedType> types = [];
    private readonly Dictionary<MethodDefinition, InterpretedMethod> methods = [];
    private readonly bool zeroDivisorThrows;
    private readonly bool nanOrdersAsGreater;
    private readonly bool infinitiesCompareEqual;
    private readonly bool conversionsRefused;
    private long[]? counts;
    private int initialisersRunning;

    public Machine(IEnumerable<TypeDefinition> program, Deviations deviations)
    {
        Deviations = deviations;
        zeroDivisorThrows = (deviations & Deviations.ZeroDivisorThrows) != 0;
        nanOrdersAsGreater = (deviations & Deviations.NaNOrdersAsGreater) != 0;
        infinitiesCompareEqual = (deviations & Deviations.InfinitiesCompareEqual) != 0;
        conversionsRefused = (deviations & Deviations.ConversionsOutOfRangeRefused) != 0;
        if ((deviations & Deviations.EagerInitialisers) != 0)
        {
            InitialiseAll(program);
        }
    }

    public Deviations Deviations { get; }

    public InterpretedType TypeOf(TypeReference reference)
    {
        var definition = (TypeDefinition)reference;
        if (!types.TryGetValue(definition, out InterpretedType? type))
        {
            InterpretedType? parent = definition.BaseType is TypeDefinition own ? TypeOf(own) : null;
            type = new InterpretedType(definition, parent);
            types.Add(definition, type);
        }
        return type;
    }

    public InterpretedMethod MethodOf(MethodDefinition definition)
    {
        if (!methods.TryGetValue(definition, out InterpretedMethod? method))
        {
            method = new InterpretedMethod(definition);
            methods.Add(definition, method);
        }
        return method;
    }

    /// <summary>Calls a method with its arguments, <c>this</c> first; the method of an object is the one its class gives.</summary>
    public Value Call(MethodDefinition definition, ReadOnlySpan<Value> arguments)
    {
        InterpretedMethod method = definition.IsVirtual ? ((Instance)arguments[0].R!).Type.Target(definition, MethodOf) : MethodOf(definition);
        EnsureInitialised(TypeOf(definition.DeclaringType));
        arguments.CopyTo(slots);
        Run(method, 0);
        return slots[0];
    }

    /// <summary>Makes an object with a constructor.</summary>
    public Value Create(MethodDefinition constructor, ReadOnlySpan<Value> arguments)
    {
        InterpretedType type = TypeOf(constructor.DeclaringType);
        EnsureInitialised(type);
        Value created = Value.OfObject(new Instance(type));
        slots[0] = created;
        arguments.CopyTo(slots.AsSpan(1));
        Run(MethodOf(constructor), 0);
        return created;
    }

    /// <summary>Calls a method once and counts its operations.</summary>
    public OperationCount Count(MethodDefinition definition, ReadOnlySpan<Value> arguments)
    {
        counts = new long[256];
        try
        {
            Call(definition, arguments);
            long divisions = counts[(int)Operation.DivideDouble] + counts[(int)Operation.DivideDoubleOrThrow];
            long others = counts[(int)Operation.AddDouble] + counts[(int)Operation.SubtractDouble] + counts[(int)Operation.MultiplyDouble]
                + counts[(int)Operation.NegateDouble] + counts[(int)Operation.RemainderDouble] + counts[(int)Operation.RemainderDoubleOrThrow];
            return new OperationCount(divisions + others, divisions, counts[(int)Operation.Call] + counts[(int)Operation.CallVirtual], counts.Sum());
        }
        finally
        {
            counts = null;
        }
    }

    /// <summary>Decodes a method without calling it, to see that every instruction in it is known.</summary>
    public DecodedInstruction[] Decoded(MethodDefinition definition)
    {
        return Decoded(MethodOf(definition));
    }

    /// <summary>Whether a method has been called, or decoded for another reason.</summary>
    public bool WasCalled(MethodDefinition definition)
    {
        return methods.TryGetValue(definition, out InterpretedMethod? method) && method.Code != null;
    }

    private DecodedInstruction[] Decoded(InterpretedMethod method)
    {
        if (method.Code == null)
        {
            Decoder.Decode(this, method);
        }
        return method.Code!;
    }

    private void InitialiseAll(IEnumerable<TypeDefinition> program)
    {
        foreach (TypeDefinition definition in program.OrderBy(t => t.FullName, StringComparer.Ordinal))
        {
            if (definition.HasGenericParameters || definition.IsInterface)
            {
                continue;
            }
            InterpretedType type = TypeOf(definition);
            if (type.Initialised)
            {
                continue;
            }
            type.Initialised = true;
            try
            {
                Run(MethodOf(type.Initialiser!), 0);
            }
            catch (Exception thrown) when (thrown is not NotSupportedException)
            {
                // The device goes on; the fields keep what they had when it was thrown.
                FailedInitialisers.Add(definition.FullName + ": " + thrown.GetType().Name);
            }
        }
    }

    /// <summary>Static initialisers that threw at start-up.</summary>
    public List<string> FailedInitialisers { get; } = [];

    private void EnsureInitialised(InterpretedType type)
    {
        if (!type.Initialised)
        {
            type.Initialised = true;
            Run(MethodOf(type.Initialiser!), (StackSlots / 2) + (FarApart * initialisersRunning++));
            initialisersRunning--;
        }
    }

    private Exception ZeroDivisor()
    {
        return zeroDivisorThrows ? new DeviceException("division by zero") : new DivideByZeroException();
    }

    /// <summary>Whether a condition on two doubles holds when it is decided by their order.</summary>
    private bool Holds(long condition, double a, double b)
    {
        int order;
        if (double.IsNaN(a) || double.IsNaN(b))
        {
            if (!nanOrdersAsGreater)
            {
                return (condition & UnorderedBit) != 0;
            }
            order = 1;
        }
        else if (infinitiesCompareEqual && double.IsInfinity(a) && double.IsInfinity(b))
        {
            order = 0;
        }
        else
        {
            order = a < b ? -1 : a > b ? 1 : 0;
        }
        return (OrderCondition)(condition & (UnorderedBit - 1)) switch
        {
            OrderCondition.Equal => order == 0,
            OrderCondition.NotEqual => order != 0,
            OrderCondition.Less => order < 0,
            OrderCondition.LessEqual => order <= 0,
            OrderCondition.Greater => order > 0,
            _ => order >= 0,
        };
    }

    /// <summary>A double cast to an integer; outside its range by the machine's rule.</summary>
    private long ToInteger(double value, Code conversion)
    {
        (double lowest, double above) = conversion switch
        {
            Code.Conv_I1 => (-129.0, 128.0),
            Code.Conv_U1 => (-1.0, 256.0),
            Code.Conv_I2 => (-32769.0, 32768.0),
            Code.Conv_U2 => (-1.0, 65536.0),
            Code.Conv_I4 or Code.Conv_I => (-2147483649.0, 2147483648.0),
            Code.Conv_U4 or Code.Conv_U => (-1.0, 4294967296.0),
            Code.Conv_I8 => (-9223372036854777856.0, 9223372036854775808.0),
            _ => (-1.0, 18446744073709551616.0),
        };
        if (conversionsRefused && !(lowest < value && value < above))
        {
            throw new UnspecifiedException("a double outside the range of the integer it is cast to");
        }
        return conversion switch
        {
            Code.Conv_I1 => unchecked((sbyte)value),
            Code.Conv_U1 => unchecked((byte)value),
            Code.Conv_I2 => unchecked((short)value),
            Code.Conv_U2 => unchecked((ushort)value),
            Code.Conv_I4 or Code.Conv_I => unchecked((int)value),
            Code.Conv_U4 or Code.Conv_U => unchecked((int)(uint)value),
            Code.Conv_I8 => unchecked((long)value),
            _ => unchecked((long)(ulong)value),
        };
    }
}
