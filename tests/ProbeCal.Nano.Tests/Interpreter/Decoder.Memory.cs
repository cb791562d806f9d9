using System;
using Mono.Cecil;
using Mono.Cecil.Cil;
using ProbeCal.Nano.Tests.Gate;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>Fields, arrays, addresses, objects and calls.</summary>
internal sealed partial class Decoder
{
    private bool DecodeMemory(Instruction at, Code code)
    {
        switch (code)
        {
            case Code.Ldfld or Code.Ldflda:
                var field = (FieldReference)at.Operand;
                StackKind kind = code == Code.Ldflda ? StackKind.Address : StackKinds.KindOf(field.FieldType);
                Operation load = code == Code.Ldflda ? Operation.AddressOfField : Choose(kind, Operation.LoadFieldBits, Operation.LoadFieldAll);
                EmitResult(kind, new DecodedInstruction { Operation = load, A = Pop().Slot, Immediate = FieldSlot(field) });
                return true;
            case Code.Stfld:
                Operand value = Pop();
                Operand target = Pop();
                Emit(new DecodedInstruction
                {
                    Operation = Choose(value.Kind, Operation.StoreFieldBits, Operation.StoreFieldAll),
                    A = target.Slot,
                    B = value.Slot,
                    Immediate = FieldSlot((FieldReference)at.Operand),
                });
                return true;
            case Code.Ldsfld or Code.Ldsflda or Code.Stsfld:
                DecodeStatic((FieldReference)at.Operand, code);
                return true;
            case Code.Ldind_I1 or Code.Ldind_U1 or Code.Ldind_I2 or Code.Ldind_U2 or Code.Ldind_I4 or Code.Ldind_U4 or Code.Ldind_I8 or Code.Ldind_R8 or Code.Ldind_Ref:
                StackKind loaded = KindAfter(at);
                EmitResult(loaded, new DecodedInstruction { Operation = Choose(loaded, Operation.LoadBits, Operation.LoadAll), A = Pop().Slot });
                return true;
            case Code.Stind_I1 or Code.Stind_I2 or Code.Stind_I4 or Code.Stind_I8 or Code.Stind_R8 or Code.Stind_Ref:
                Operand stored = Pop();
                Operand address = Pop();
                Emit(new DecodedInstruction { Operation = Choose(stored.Kind, Operation.StoreBits, Operation.StoreAll), A = address.Slot, B = stored.Slot });
                return true;
            case Code.Newarr:
                EmitResult(StackKind.Object, new DecodedInstruction { Operation = Operation.NewArray, A = Pop().Slot, Object = at.Operand });
                return true;
            case Code.Ldlen:
                EmitResult(StackKind.I4, new DecodedInstruction { Operation = Operation.Length, A = Pop().Slot });
                return true;
            case Code.Ldelem_I1 or Code.Ldelem_U1 or Code.Ldelem_I2 or Code.Ldelem_U2 or Code.Ldelem_I4 or Code.Ldelem_U4 or Code.Ldelem_I8 or Code.Ldelem_R8 or Code.Ldelem_Ref or Code.Ldelema:
                DecodeLoadElement(at, code);
                return true;
            case Code.Stelem_I1 or Code.Stelem_I2 or Code.Stelem_I4 or Code.Stelem_I8 or Code.Stelem_R8 or Code.Stelem_Ref:
                Operand element = Pop();
                Operand index = Pop();
                Operand array = Pop();
                Emit(new DecodedInstruction
                {
                    Operation = Choose(element.Kind, Operation.StoreElementBits, Operation.StoreElementAll),
                    A = array.Slot,
                    B = index.Slot,
                    Target = element.Slot,
                });
                return true;
            case Code.Isinst or Code.Castclass:
                EmitResult(StackKind.Object, new DecodedInstruction
                {
                    Operation = code == Code.Isinst ? Operation.IsInstance : Operation.CastClass,
                    A = Pop().Slot,
                    Object = at.Operand,
                });
                return true;
            default:
                return false;
        }
    }

    private void DecodeLoadElement(Instruction at, Code code)
    {
        StackKind kind = code == Code.Ldelema ? StackKind.Address : KindAfter(at);
        int index = Pop().Slot;
        int array = Pop().Slot;
        EmitResult(kind, new DecodedInstruction
        {
            Operation = code == Code.Ldelema ? Operation.AddressOfElement : Choose(kind, Operation.LoadElementBits, Operation.LoadElementAll),
            A = array,
            B = index,
        });
    }

    private void DecodeStatic(FieldReference field, Code code)
    {
        InterpretedType type = machine.TypeOf(field.DeclaringType);
        EnsureInitialised(type);
        var decoded = new DecodedInstruction { Object = type.Statics, Immediate = type.StaticSlotOf(field) };
        switch (code)
        {
            case Code.Stsfld:
                Operand value = Pop();
                decoded.A = value.Slot;
                decoded.Operation = Choose(value.Kind, Operation.StoreStaticBits, Operation.StoreStaticAll);
                Emit(decoded);
                return;
            case Code.Ldsflda:
                decoded.Operation = Operation.AddressOfStatic;
                EmitResult(StackKind.Address, decoded);
                return;
            default:
                StackKind kind = StackKinds.KindOf(field.FieldType);
                decoded.Operation = Choose(kind, Operation.LoadStaticBits, Operation.LoadStaticAll);
                EmitResult(kind, decoded);
                return;
        }
    }

    /// <summary>On the desktop a class is initialised before it is first used; the device has done it at start-up.</summary>
    private void EnsureInitialised(InterpretedType type)
    {
        if (!Deviates(Deviations.EagerInitialisers) && type.Initialiser != null && type.Definition != method.DeclaringType)
        {
            Emit(new DecodedInstruction { Operation = Operation.EnsureInitialised, Object = type });
        }
    }

    private bool DecodeCall(Instruction at, Code code)
    {
        if (code is not (Code.Call or Code.Callvirt or Code.Newobj))
        {
            return false;
        }
        var callee = (MethodReference)at.Operand;
        if (callee is MethodDefinition own)
        {
            EnsureInitialised(machine.TypeOf(own.DeclaringType));
        }
        else if (DecodeIntrinsic(callee, code))
        {
            return true;
        }
        int count = callee.Parameters.Count + (callee.HasThis && code != Code.Newobj ? 1 : 0);
        for (int depth = stack.Count - count; depth < stack.Count; depth++)
        {
            Settle(depth); // the callee's frame begins where its arguments lie
        }
        stack.RemoveRange(stack.Count - count, count);
        var decoded = new DecodedInstruction { Target = stackStart + stack.Count, B = count };
        if (code == Code.Newobj)
        {
            DecodeCreation(callee, decoded);
            return true;
        }
        if (callee is MethodDefinition target)
        {
            bool isVirtual = code == Code.Callvirt && target.IsVirtual && !target.IsFinal && !target.DeclaringType.IsSealed;
            decoded.Operation = isVirtual ? Operation.CallVirtual : Operation.Call;
            decoded.Object = isVirtual ? target : machine.MethodOf(target);
        }
        else
        {
            decoded.Operation = Operation.CallNative;
            decoded.Object = Natives.Find(callee);
        }
        Emit(decoded);
        if (callee.ReturnType.MetadataType != MetadataType.Void)
        {
            stack.Add(new Operand(decoded.Target, StackKinds.KindOf(callee.ReturnType)));
        }
        return true;
    }

    private void DecodeCreation(MethodReference constructor, DecodedInstruction decoded)
    {
        if (constructor is not MethodDefinition own)
        {
            throw new NotSupportedException("an object of another assembly's class " + constructor.DeclaringType.FullName);
        }
        decoded.Operation = Operation.NewObject;
        decoded.Object = new Creation(machine.TypeOf(own.DeclaringType), machine.MethodOf(own));
        Emit(decoded);
        stack.Add(new Operand(decoded.Target, StackKind.Object));
    }

    /// <summary>The few calls that are worth an instruction of their own.</summary>
    private bool DecodeIntrinsic(MethodReference callee, Code code)
    {
        if (code == Code.Newobj)
        {
            return false;
        }
        (Operation Operation, StackKind Kind)? intrinsic = (callee.DeclaringType.FullName + "." + callee.Name) switch
        {
            "System.Double.IsNaN" => (Operation.IsNaN, StackKind.I4),
            "System.Double.IsInfinity" => (Operation.IsInfinity, StackKind.I4),
            "System.Double.IsPositiveInfinity" => (Operation.IsPositiveInfinity, StackKind.I4),
            "System.Double.IsNegativeInfinity" => (Operation.IsNegativeInfinity, StackKind.I4),
            "System.BitConverter.DoubleToInt64Bits" => (Operation.MoveBits, StackKind.I8),
            "System.BitConverter.Int64BitsToDouble" => (Operation.MoveBits, StackKind.R8),
            _ => null,
        };
        if (intrinsic is not { } found)
        {
            return false;
        }
        EmitResult(found.Kind, new DecodedInstruction { Operation = found.Operation, A = Pop().Slot });
        return true;
    }

    private int FieldSlot(FieldReference field)
    {
        return machine.TypeOf(field.DeclaringType).SlotOf(field);
    }

    private StackKind KindAfter(Instruction at)
    {
        return kinds.Before(at.Next!)![^1];
    }

    private static Operation Choose(StackKind kind, Operation bits, Operation all)
    {
        return IsReference(kind) ? all : bits;
    }
}

/// <summary>What <c>newobj</c> needs: the class and its constructor.</summary>
internal sealed record Creation(InterpretedType Type, InterpretedMethod Constructor);
