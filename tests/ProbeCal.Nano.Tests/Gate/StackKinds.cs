using System;
using System.Collections.Generic;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>What a slot of the evaluation stack holds, as the device sees it: its slots carry their type with them.</summary>
internal enum StackKind : byte
{
    I4,
    U4,
    I8,
    U8,
    R4,
    R8,

    /// <summary>An object, an array, a string or null.</summary>
    Object,

    /// <summary>The address of a local, an argument, a field or an array element.</summary>
    Address,
}

/// <summary>
/// Follows one method body and tells what stands on the evaluation stack before each instruction. The kinds differ from the
/// standard's in one point, on purpose: unsigned integers stay apart from signed ones, because a cast that changes only the
/// sign is no instruction at all and the device goes on with the type the value had.
/// </summary>
internal sealed class StackKinds
{
    private readonly MethodDefinition method;
    private readonly Dictionary<Instruction, StackKind[]> before = [];

    private StackKinds(MethodDefinition method)
    {
        this.method = method;
    }

    /// <summary>The stack before an instruction, bottom first; null where control never comes.</summary>
    public StackKind[]? Before(Instruction instruction)
    {
        return before.GetValueOrDefault(instruction);
    }

    public static StackKinds Of(MethodDefinition method)
    {
        var result = new StackKinds(method);
        result.Follow();
        return result;
    }

    /// <summary>The kind in which a value of this type stands on the stack.</summary>
    public static StackKind KindOf(TypeReference type)
    {
        switch (type.MetadataType)
        {
            case MetadataType.Boolean:
            case MetadataType.Char:
            case MetadataType.SByte:
            case MetadataType.Byte:
            case MetadataType.Int16:
            case MetadataType.UInt16:
            case MetadataType.Int32:
                return StackKind.I4;
            case MetadataType.UInt32:
                return StackKind.U4;
            case MetadataType.Int64:
                return StackKind.I8;
            case MetadataType.UInt64:
                return StackKind.U8;
            case MetadataType.Single:
                return StackKind.R4;
            case MetadataType.Double:
                return StackKind.R8;
            case MetadataType.ByReference:
                return StackKind.Address;
            case MetadataType.String:
            case MetadataType.Object:
            case MetadataType.Class:
            case MetadataType.Array:
                return StackKind.Object;
            case MetadataType.ValueType:
                return EnumKind(type);
            default:
                throw new NotSupportedException("a value of type " + type.FullName);
        }
    }

    private static StackKind EnumKind(TypeReference type)
    {
        TypeDefinition definition = type as TypeDefinition ?? type.Resolve();
        if (!definition.IsEnum)
        {
            throw new NotSupportedException("the structure " + type.FullName);
        }
        foreach (FieldDefinition field in definition.Fields)
        {
            if (!field.IsStatic)
            {
                return KindOf(field.FieldType);
            }
        }
        throw new NotSupportedException("the enumeration " + type.FullName);
    }

    private void Follow()
    {
        var waiting = new Stack<(Instruction, StackKind[])>();
        waiting.Push((method.Body.Instructions[0], []));
        while (waiting.TryPop(out (Instruction At, StackKind[] Stack) next))
        {
            Instruction? at = next.At;
            StackKind[] stack = next.Stack;
            while (at != null && before.TryAdd(at, stack))
            {
                var after = new List<StackKind>(stack);
                Apply(at, after);
                stack = after.ToArray();
                if (at.Operand is Instruction target)
                {
                    waiting.Push((target, stack));
                }
                else if (at.Operand is Instruction[] targets)
                {
                    foreach (Instruction each in targets)
                    {
                        waiting.Push((each, stack));
                    }
                }
                at = at.OpCode.FlowControl is FlowControl.Branch or FlowControl.Return or FlowControl.Throw ? null : at.Next;
            }
        }
    }

    private void Apply(Instruction at, List<StackKind> stack)
    {
        Code code = at.OpCode.Code;
        switch (code)
        {
            case Code.Ldarg_0 or Code.Ldarg_1 or Code.Ldarg_2 or Code.Ldarg_3 or Code.Ldarg_S or Code.Ldarg:
                stack.Add(ArgumentKind(IlOperands.ArgumentIndex(method, at)));
                return;
            case Code.Ldloc_0 or Code.Ldloc_1 or Code.Ldloc_2 or Code.Ldloc_3 or Code.Ldloc_S or Code.Ldloc:
                stack.Add(KindOf(method.Body.Variables[IlOperands.LocalIndex(at)].VariableType));
                return;
            case Code.Ldfld or Code.Ldsfld:
                Pop(stack, code == Code.Ldfld ? 1 : 0);
                stack.Add(KindOf(((FieldReference)at.Operand).FieldType));
                return;
            case Code.Ldarga or Code.Ldarga_S or Code.Ldloca or Code.Ldloca_S or Code.Ldsflda:
                stack.Add(StackKind.Address);
                return;
            case Code.Ldflda:
                Pop(stack, 1);
                stack.Add(StackKind.Address);
                return;
            case Code.Ldelema:
                Pop(stack, 2);
                stack.Add(StackKind.Address);
                return;
            case Code.Dup:
                stack.Add(stack[^1]);
                return;
            case Code.Call or Code.Callvirt or Code.Newobj:
                ApplyCall((MethodReference)at.Operand, code == Code.Newobj, stack);
                return;
            case Code.Add or Code.Sub or Code.Mul or Code.Div or Code.Div_Un or Code.Rem or Code.Rem_Un or Code.And or Code.Or
                or Code.Xor or Code.Shl or Code.Shr or Code.Shr_Un or Code.Add_Ovf or Code.Add_Ovf_Un or Code.Sub_Ovf
                or Code.Sub_Ovf_Un or Code.Mul_Ovf or Code.Mul_Ovf_Un:
                Pop(stack, 1); // the result takes the place and, on the device, the type of the left operand
                return;
            case Code.Neg or Code.Not or Code.Nop or Code.Castclass:
                return;
            case Code.Ret:
                stack.Clear();
                return;
        }
        ApplyByShape(at, stack);
    }

    /// <summary>Instructions whose result kind follows from the operation code alone.</summary>
    private static void ApplyByShape(Instruction at, List<StackKind> stack)
    {
        switch (at.OpCode.StackBehaviourPop)
        {
            case StackBehaviour.Pop0:
                break;
            case StackBehaviour.Pop1 or StackBehaviour.Popi or StackBehaviour.Popref:
                Pop(stack, 1);
                break;
            case StackBehaviour.Pop1_pop1 or StackBehaviour.Popi_pop1 or StackBehaviour.Popi_popi or StackBehaviour.Popi_popi8
                or StackBehaviour.Popi_popr4 or StackBehaviour.Popi_popr8 or StackBehaviour.Popref_pop1 or StackBehaviour.Popref_popi:
                Pop(stack, 2);
                break;
            case StackBehaviour.Popi_popi_popi or StackBehaviour.Popref_popi_popi or StackBehaviour.Popref_popi_popi8
                or StackBehaviour.Popref_popi_popr4 or StackBehaviour.Popref_popi_popr8 or StackBehaviour.Popref_popi_popref:
                Pop(stack, 3);
                break;
            default:
                throw new NotSupportedException("the instruction " + at);
        }
        switch (at.OpCode.StackBehaviourPush)
        {
            case StackBehaviour.Push0:
                return;
            case StackBehaviour.Pushi8:
                stack.Add(at.OpCode.Code is Code.Conv_U8 or Code.Conv_Ovf_U8 or Code.Conv_Ovf_U8_Un ? StackKind.U8 : StackKind.I8);
                return;
            case StackBehaviour.Pushr4:
                stack.Add(StackKind.R4);
                return;
            case StackBehaviour.Pushr8:
                stack.Add(StackKind.R8);
                return;
            case StackBehaviour.Pushref:
                stack.Add(StackKind.Object);
                return;
            case StackBehaviour.Pushi:
                stack.Add(at.OpCode.Code switch
                {
                    Code.Conv_U4 or Code.Conv_Ovf_U4 or Code.Conv_Ovf_U4_Un or Code.Ldelem_U4 or Code.Ldind_U4 => StackKind.U4,
                    Code.Ldtoken => StackKind.Object,
                    _ => StackKind.I4,
                });
                return;
            default:
                throw new NotSupportedException("the instruction " + at);
        }
    }

    private static void ApplyCall(MethodReference callee, bool creates, List<StackKind> stack)
    {
        Pop(stack, callee.Parameters.Count + (callee.HasThis && !creates ? 1 : 0));
        if (creates)
        {
            stack.Add(StackKind.Object);
        }
        else if (callee.ReturnType.MetadataType != MetadataType.Void)
        {
            stack.Add(KindOf(callee.ReturnType));
        }
    }

    private StackKind ArgumentKind(int index)
    {
        if (method.HasThis)
        {
            index--;
        }
        return index < 0 ? StackKind.Object : KindOf(method.Parameters[index].ParameterType);
    }

    private static void Pop(List<StackKind> stack, int count)
    {
        stack.RemoveRange(stack.Count - count, count);
    }
}
