using System;
using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>A class of the interpreted assembly: where its fields lie and which method answers a virtual call.</summary>
internal sealed class InterpretedType
{
    private readonly Dictionary<string, int> instanceSlots = [];
    private readonly Dictionary<string, int> staticSlots = [];
    private readonly Dictionary<MethodDefinition, InterpretedMethod> targets = [];
    private readonly InterpretedType? parent;

    public InterpretedType(TypeDefinition definition, InterpretedType? parent)
    {
        Definition = definition;
        this.parent = parent;
        FieldCount = parent?.FieldCount ?? 0;
        foreach (FieldDefinition field in definition.Fields.Where(f => !f.IsLiteral))
        {
            if (field.IsStatic)
            {
                staticSlots.Add(field.Name, staticSlots.Count);
            }
            else
            {
                instanceSlots.Add(field.Name, FieldCount++);
            }
        }
        Statics = new Value[staticSlots.Count];
        Initialiser = definition.Methods.FirstOrDefault(m => m.IsConstructor && m.IsStatic);
        Initialised = Initialiser == null;
    }

    public TypeDefinition Definition { get; }

    public int FieldCount { get; }

    public Value[] Statics { get; }

    public MethodDefinition? Initialiser { get; }

    public bool Initialised { get; set; }

    public int SlotOf(FieldReference field)
    {
        return instanceSlots[field.Name];
    }

    public int StaticSlotOf(FieldReference field)
    {
        return staticSlots[field.Name];
    }

    /// <summary>Whether an object of this class can be cast to the other type.</summary>
    public bool Is(TypeDefinition other)
    {
        for (InterpretedType? type = this; type != null; type = type.parent)
        {
            if (type.Definition == other || type.Definition.Interfaces.Any(i => i.InterfaceType == other))
            {
                return true;
            }
        }
        return false;
    }

    /// <summary>The method that a virtual call of <paramref name="called"/> reaches in an object of this class.</summary>
    public InterpretedMethod Target(MethodDefinition called, Func<MethodDefinition, InterpretedMethod> methods)
    {
        if (!targets.TryGetValue(called, out InterpretedMethod? target))
        {
            target = methods(Find(called));
            targets.Add(called, target);
        }
        return target;
    }

    private MethodDefinition Find(MethodDefinition called)
    {
        for (InterpretedType? type = this; type != null; type = type.parent)
        {
            MethodDefinition? found = type.Definition.Methods.FirstOrDefault(m => m.Overrides.Any(o => o == called))
                ?? type.Definition.Methods.FirstOrDefault(m => m == called && m.HasBody)
                ?? type.Definition.Methods.FirstOrDefault(m => m.IsVirtual && m.HasBody && SameSignature(m, called));
            if (found != null)
            {
                return found;
            }
        }
        throw new NotSupportedException(Definition.FullName + " does not answer " + called.FullName);
    }

    private static bool SameSignature(MethodDefinition a, MethodDefinition b)
    {
        return a.Name == b.Name && a.Parameters.Select(p => p.ParameterType.FullName).SequenceEqual(b.Parameters.Select(p => p.ParameterType.FullName));
    }
}

/// <summary>A method and, once it has been called, its decoded form.</summary>
internal sealed class InterpretedMethod(MethodDefinition definition)
{
    public readonly MethodDefinition Definition = definition;
    public readonly int ArgumentCount = definition.Parameters.Count + (definition.HasThis ? 1 : 0);

    /// <summary>Null until the first call.</summary>
    public DecodedInstruction[]? Code;

    public int LocalCount;
    public int FrameSize;
}
