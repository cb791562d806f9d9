using System;
using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;
using ProbeCal.Nano.Tests.Gate;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>
/// Turns a method's IL into instructions on numbered slots. The evaluation stack's depth is known at each instruction, so
/// each of its places is a slot of the frame; a load of a local is not an instruction but a note where the operand lies.
/// </summary>
internal sealed partial class Decoder
{
    private readonly Machine machine;
    private readonly MethodDefinition method;
    private readonly StackKinds kinds;
    private readonly Deviations deviations;
    private readonly List<DecodedInstruction> code = [];
    private readonly List<Operand> stack = [];
    private readonly Dictionary<Instruction, int> starts = [];
    private readonly HashSet<Instruction> leaders;
    private readonly HashSet<int> addressTaken;
    private readonly int argumentCount;
    private readonly int stackStart;

    /// <summary>The slot that the last instruction wrote into and that a following store may replace; -1 if there is none.</summary>
    private int replaceable = -1;

    private Decoder(Machine machine, MethodDefinition method)
    {
        this.machine = machine;
        this.method = method;
        deviations = machine.Deviations;
        kinds = StackKinds.Of(method);
        argumentCount = method.Parameters.Count + (method.HasThis ? 1 : 0);
        stackStart = argumentCount + method.Body.Variables.Count;
        leaders = method.Body.Instructions.SelectMany(TargetsOf).ToHashSet();
        addressTaken = method.Body.Instructions.Where(at => at.OpCode.Code is Code.Ldloca or Code.Ldloca_S or Code.Ldarga or Code.Ldarga_S)
            .Select(SlotOfVariable).ToHashSet();
    }

    /// <summary>A place of the evaluation stack: the slot its value lies in, and what it is.</summary>
    private readonly record struct Operand(int Slot, StackKind Kind);

    public static void Decode(Machine machine, InterpretedMethod target)
    {
        MethodDefinition method = target.Definition;
        if (method.Body.HasExceptionHandlers)
        {
            throw new NotSupportedException("exception handlers in " + method.FullName);
        }
        var decoder = new Decoder(machine, method);
        decoder.DecodeAll();
        target.LocalCount = method.Body.Variables.Count;
        target.FrameSize = decoder.stackStart + method.Body.MaxStackSize + 2;
        target.Code = decoder.code.ToArray();
    }

    private static IEnumerable<Instruction> TargetsOf(Instruction at)
    {
        return at.Operand switch
        {
            Instruction target => [target],
            Instruction[] targets => targets,
            _ => [],
        };
    }

    private void DecodeAll()
    {
        foreach (Instruction at in method.Body.Instructions)
        {
            StackKind[]? before = kinds.Before(at);
            if (before == null)
            {
                continue;
            }
            if (leaders.Contains(at))
            {
                SettleAll();
                replaceable = -1;
                stack.Clear();
                stack.AddRange(before.Select((kind, depth) => new Operand(stackStart + depth, kind)));
            }
            else if (stack.Count != before.Length)
            {
                stack.Clear();
                stack.AddRange(before.Select((kind, depth) => new Operand(stackStart + depth, kind)));
            }
            starts.Add(at, code.Count);
            DecodeOne(at);
        }
        for (int i = 0; i < code.Count; i++)
        {
            DecodedInstruction each = code[i];
            if (each.Object is Instruction target)
            {
                each.Target = starts[target];
                each.Object = null;
            }
            else if (each.Object is Instruction[] targets)
            {
                each.Object = targets.Select(t => starts[t]).ToArray();
            }
            code[i] = each;
        }
    }

    private void DecodeOne(Instruction at)
    {
        Code code = at.OpCode.Code;
        if (DecodeLoad(at, code) || DecodeStore(at, code) || DecodeArithmetic(code) || DecodeComparison(at, code)
            || DecodeConversion(code) || DecodeMemory(at, code) || DecodeCall(at, code))
        {
            return;
        }
        switch (code)
        {
            case Code.Nop:
                return;
            case Code.Pop:
                Pop();
                return;
            case Code.Dup:
                stack.Add(stack[^1]);
                replaceable = -1;
                return;
            case Code.Br or Code.Br_S:
                SettleAll();
                Emit(new DecodedInstruction { Operation = Operation.Jump, Object = at.Operand });
                return;
            case Code.Brtrue or Code.Brtrue_S or Code.Brfalse or Code.Brfalse_S:
                DecodeTest(at, code is Code.Brtrue or Code.Brtrue_S);
                return;
            case Code.Switch:
                int selector = Pop().Slot;
                SettleAll();
                Emit(new DecodedInstruction { Operation = Operation.JumpTable, A = selector, Object = at.Operand });
                return;
            case Code.Ret:
                DecodeReturn();
                return;
            default:
                throw new NotSupportedException($"the instruction {at} in {method.FullName}");
        }
    }

    private void DecodeTest(Instruction at, bool whenTrue)
    {
        Operand tested = Pop();
        SettleAll();
        bool isObject = tested.Kind is StackKind.Object or StackKind.Address;
        Emit(new DecodedInstruction
        {
            Operation = whenTrue
                ? (isObject ? Operation.JumpIfNotNull : Operation.JumpIfNotZero)
                : (isObject ? Operation.JumpIfNull : Operation.JumpIfZero),
            A = tested.Slot,
            Object = at.Operand,
        });
    }

    private void DecodeReturn()
    {
        if (method.ReturnType.MetadataType == MetadataType.Void)
        {
            Emit(new DecodedInstruction { Operation = Operation.Return });
            return;
        }
        Operand result = Pop();
        Emit(new DecodedInstruction { Operation = IsReference(result.Kind) ? Operation.ReturnAll : Operation.ReturnBits, A = result.Slot });
    }

    private bool DecodeLoad(Instruction at, Code code)
    {
        switch (code)
        {
            case Code.Ldarg_0 or Code.Ldarg_1 or Code.Ldarg_2 or Code.Ldarg_3 or Code.Ldarg_S or Code.Ldarg
                or Code.Ldloc_0 or Code.Ldloc_1 or Code.Ldloc_2 or Code.Ldloc_3 or Code.Ldloc_S or Code.Ldloc:
                var operand = new Operand(SlotOfVariable(at), KindOfVariable(at));
                stack.Add(operand);
                replaceable = -1;
                if (addressTaken.Contains(operand.Slot))
                {
                    Settle(stack.Count - 1); // a call may change it before it is used
                }
                return true;
            case Code.Ldarga or Code.Ldarga_S or Code.Ldloca or Code.Ldloca_S:
                EmitResult(StackKind.Address, new DecodedInstruction { Operation = Operation.AddressOfSlot, A = SlotOfVariable(at) });
                return true;
            case Code.Ldc_R8:
                EmitConstant(StackKind.R8, BitConverter.DoubleToInt64Bits((double)at.Operand));
                return true;
            case Code.Ldnull:
                EmitResult(StackKind.Object, new DecodedInstruction { Operation = Operation.ObjectConstant });
                return true;
            case Code.Ldtoken:
                EmitResult(StackKind.Object, new DecodedInstruction { Operation = Operation.ObjectConstant, Object = ((FieldReference)at.Operand).Resolve().InitialValue });
                return true;
        }
        if (IlOperands.IsIntegerConstant(at, out long value))
        {
            EmitConstant(code == Code.Ldc_I8 ? StackKind.I8 : StackKind.I4, value);
            return true;
        }
        return false;
    }

    private bool DecodeStore(Instruction at, Code code)
    {
        if (code is not (Code.Stloc_0 or Code.Stloc_1 or Code.Stloc_2 or Code.Stloc_3 or Code.Stloc_S or Code.Stloc or Code.Starg_S or Code.Starg))
        {
            return false;
        }
        int slot = SlotOfVariable(at);
        for (int depth = 0; depth < stack.Count - 1; depth++)
        {
            if (stack[depth].Slot == slot)
            {
                Settle(depth);
            }
        }
        int candidate = replaceable;
        Operand value = Pop();
        if (candidate == value.Slot && !stack.Exists(o => o.Slot == candidate))
        {
            DecodedInstruction last = this.code[^1];
            last.Target = slot;
            this.code[^1] = last;
            replaceable = -1;
        }
        else
        {
            EmitMove(value, slot);
        }
        return true;
    }

    private int SlotOfVariable(Instruction at)
    {
        switch (at.OpCode.Code)
        {
            case Code.Ldarg_0 or Code.Ldarg_1 or Code.Ldarg_2 or Code.Ldarg_3 or Code.Ldarg_S or Code.Ldarg or Code.Ldarga or Code.Ldarga_S or Code.Starg_S or Code.Starg:
                return IlOperands.ArgumentIndex(method, at);
            default:
                return argumentCount + IlOperands.LocalIndex(at);
        }
    }

    private StackKind KindOfVariable(Instruction at)
    {
        return kinds.Before(at.Next!) is { } after ? after[^1] : throw new NotSupportedException("a load at the end of " + method.FullName);
    }

    private Operand Pop()
    {
        Operand top = stack[^1];
        stack.RemoveAt(stack.Count - 1);
        return top;
    }

    /// <summary>Brings an operand that is only noted into its own slot.</summary>
    private void Settle(int depth)
    {
        Operand operand = stack[depth];
        int home = stackStart + depth;
        if (operand.Slot != home)
        {
            EmitMove(operand, home);
            stack[depth] = operand with { Slot = home };
        }
    }

    private void SettleAll()
    {
        for (int depth = 0; depth < stack.Count; depth++)
        {
            Settle(depth);
        }
    }

    private void Emit(DecodedInstruction instruction)
    {
        code.Add(instruction);
        replaceable = -1;
    }

    private void EmitMove(Operand from, int slot)
    {
        Emit(new DecodedInstruction { Operation = IsReference(from.Kind) ? Operation.MoveAll : Operation.MoveBits, Target = slot, A = from.Slot });
    }

    private void EmitResult(StackKind kind, DecodedInstruction instruction)
    {
        int home = stackStart + stack.Count;
        instruction.Target = home;
        Emit(instruction);
        stack.Add(new Operand(home, kind));
        replaceable = home;
    }

    private void EmitConstant(StackKind kind, long bits)
    {
        EmitResult(kind, new DecodedInstruction { Operation = Operation.Constant, Immediate = bits });
    }

    private static bool IsReference(StackKind kind)
    {
        return kind is StackKind.Object or StackKind.Address;
    }

    private bool Deviates(Deviations deviation)
    {
        return (deviations & deviation) != 0;
    }
}
