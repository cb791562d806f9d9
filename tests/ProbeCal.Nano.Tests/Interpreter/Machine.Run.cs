using System;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>The loop that executes decoded instructions.</summary>
internal sealed partial class Machine
{
    /// <summary>
    /// Runs a method whose arguments lie at the start of its frame, and leaves its result there. Frames overlap: the arguments
    /// of a call are the top of the caller's evaluation stack.
    /// </summary>
    private void Run(InterpretedMethod method, int frame)
    {
        DecodedInstruction[] code = method.Code ?? Decoded(method);
        Span<Value> f = slots.AsSpan(frame, method.FrameSize);
        f.Slice(method.ArgumentCount, method.LocalCount).Clear();
        int next = 0;
        while (true)
        {
            ref readonly DecodedInstruction i = ref code[next++];
            if (counts != null)
            {
                counts[(int)i.Operation]++;
            }
            switch (i.Operation)
            {
                case Operation.Constant: f[i.Target].I = i.Immediate; break;
                case Operation.ObjectConstant: f[i.Target].R = i.Object; break;
                case Operation.MoveBits: f[i.Target].I = f[i.A].I; break;
                case Operation.MoveAll: f[i.Target] = f[i.A]; break;
                case Operation.Return: return;
                case Operation.ReturnBits: f[0].I = f[i.A].I; return;
                case Operation.ReturnAll: f[0] = f[i.A]; return;
                case Operation.EnsureInitialised: EnsureInitialised((InterpretedType)i.Object!); break;

                case Operation.Jump: next = i.Target; break;
                case Operation.JumpIfZero: if (f[i.A].I == 0) { next = i.Target; } break;
                case Operation.JumpIfNotZero: if (f[i.A].I != 0) { next = i.Target; } break;
                case Operation.JumpIfNull: if (f[i.A].R == null) { next = i.Target; } break;
                case Operation.JumpIfNotNull: if (f[i.A].R != null) { next = i.Target; } break;
                case Operation.JumpTable:
                    int[] table = (int[])i.Object!;
                    if ((ulong)f[i.A].I < (ulong)table.Length)
                    {
                        next = table[f[i.A].I];
                    }
                    break;

                case Operation.AddDouble: f[i.Target].D = f[i.A].D + f[i.B].D; break;
                case Operation.SubtractDouble: f[i.Target].D = f[i.A].D - f[i.B].D; break;
                case Operation.MultiplyDouble: f[i.Target].D = f[i.A].D * f[i.B].D; break;
                case Operation.DivideDouble: f[i.Target].D = f[i.A].D / f[i.B].D; break;
                case Operation.RemainderDouble: f[i.Target].D = f[i.A].D % f[i.B].D; break;
                case Operation.DivideDoubleOrThrow: if (f[i.B].D == 0.0) { throw ZeroDivisor(); } f[i.Target].D = f[i.A].D / f[i.B].D; break;
                case Operation.RemainderDoubleOrThrow: if (f[i.B].D == 0.0) { throw ZeroDivisor(); } f[i.Target].D = f[i.A].D % f[i.B].D; break;
                case Operation.NegateDouble: f[i.Target].D = -f[i.A].D; break;

                case Operation.Add32: f[i.Target].I = (int)(f[i.A].I + f[i.B].I); break;
                case Operation.Subtract32: f[i.Target].I = (int)(f[i.A].I - f[i.B].I); break;
                case Operation.Multiply32: f[i.Target].I = (int)(f[i.A].I * f[i.B].I); break;
                case Operation.Divide32: if ((int)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = ((int)f[i.A].I / (int)f[i.B].I); break;
                case Operation.DivideUnsigned32: if ((uint)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = (int)((uint)f[i.A].I / (uint)f[i.B].I); break;
                case Operation.Remainder32: if ((int)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = ((int)f[i.A].I % (int)f[i.B].I); break;
                case Operation.RemainderUnsigned32: if ((uint)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = (int)((uint)f[i.A].I % (uint)f[i.B].I); break;
                case Operation.ShiftLeft32: f[i.Target].I = (int)f[i.A].I << (int)f[i.B].I; break;
                case Operation.ShiftRight32: f[i.Target].I = (int)f[i.A].I >> (int)f[i.B].I; break;
                case Operation.ShiftRightUnsigned32: f[i.Target].I = (int)((uint)f[i.A].I >> (int)f[i.B].I); break;
                case Operation.Negate32: f[i.Target].I = -(int)f[i.A].I; break;
                case Operation.AddChecked32: f[i.Target].I = checked((int)f[i.A].I + (int)f[i.B].I); break;
                case Operation.SubtractChecked32: f[i.Target].I = checked((int)f[i.A].I - (int)f[i.B].I); break;
                case Operation.MultiplyChecked32: f[i.Target].I = checked((int)f[i.A].I * (int)f[i.B].I); break;

                case Operation.Add64: f[i.Target].I = f[i.A].I + f[i.B].I; break;
                case Operation.Subtract64: f[i.Target].I = f[i.A].I - f[i.B].I; break;
                case Operation.Multiply64: f[i.Target].I = f[i.A].I * f[i.B].I; break;
                case Operation.Divide64: if ((long)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = ((long)f[i.A].I / (long)f[i.B].I); break;
                case Operation.DivideUnsigned64: if ((ulong)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = (long)((ulong)f[i.A].I / (ulong)f[i.B].I); break;
                case Operation.Remainder64: if ((long)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = ((long)f[i.A].I % (long)f[i.B].I); break;
                case Operation.RemainderUnsigned64: if ((ulong)f[i.B].I == 0) { throw ZeroDivisor(); } f[i.Target].I = (long)((ulong)f[i.A].I % (ulong)f[i.B].I); break;
                case Operation.ShiftLeft64: f[i.Target].I = (long)f[i.A].I << (int)f[i.B].I; break;
                case Operation.ShiftRight64: f[i.Target].I = (long)f[i.A].I >> (int)f[i.B].I; break;
                case Operation.ShiftRightUnsigned64: f[i.Target].I = (long)((ulong)f[i.A].I >> (int)f[i.B].I); break;
                case Operation.Negate64: f[i.Target].I = -(long)f[i.A].I; break;

                case Operation.And: f[i.Target].I = f[i.A].I & f[i.B].I; break;
                case Operation.Or: f[i.Target].I = f[i.A].I | f[i.B].I; break;
                case Operation.Xor: f[i.Target].I = f[i.A].I ^ f[i.B].I; break;
                case Operation.Not: f[i.Target].I = ~f[i.A].I; break;
                case Operation.ToSigned8: f[i.Target].I = (sbyte)f[i.A].I; break;
                case Operation.ToUnsigned8: f[i.Target].I = (byte)f[i.A].I; break;
                case Operation.ToSigned16: f[i.Target].I = (short)f[i.A].I; break;
                case Operation.ToUnsigned16: f[i.Target].I = (ushort)f[i.A].I; break;
                case Operation.To32: f[i.Target].I = (int)f[i.A].I; break;
                case Operation.ZeroExtend32: f[i.Target].I = (uint)f[i.A].I; break;
                case Operation.DoubleFromSigned: f[i.Target].D = f[i.A].I; break;
                case Operation.DoubleFromUnsigned32: f[i.Target].D = (uint)f[i.A].I; break;
                case Operation.DoubleFromUnsigned64: f[i.Target].D = (ulong)f[i.A].I; break;
                case Operation.IntegerFromDouble: f[i.Target].I = ToInteger(f[i.A].D, (Code)i.Immediate); break;

                case Operation.EqualDouble: f[i.Target].I = f[i.A].D == f[i.B].D ? 1 : 0; break;
                case Operation.LessDouble: f[i.Target].I = f[i.A].D < f[i.B].D ? 1 : 0; break;
                case Operation.LessUnDouble: f[i.Target].I = !(f[i.A].D >= f[i.B].D) ? 1 : 0; break;
                case Operation.GreaterDouble: f[i.Target].I = f[i.A].D > f[i.B].D ? 1 : 0; break;
                case Operation.GreaterUnDouble: f[i.Target].I = !(f[i.A].D <= f[i.B].D) ? 1 : 0; break;
                case Operation.EqualInteger: f[i.Target].I = f[i.A].I == f[i.B].I ? 1 : 0; break;
                case Operation.LessInteger: f[i.Target].I = f[i.A].I < f[i.B].I ? 1 : 0; break;
                case Operation.LessUnInteger: f[i.Target].I = (ulong)f[i.A].I < (ulong)f[i.B].I ? 1 : 0; break;
                case Operation.GreaterInteger: f[i.Target].I = f[i.A].I > f[i.B].I ? 1 : 0; break;
                case Operation.GreaterUnInteger: f[i.Target].I = (ulong)f[i.A].I > (ulong)f[i.B].I ? 1 : 0; break;
                case Operation.EqualObject: f[i.Target].I = f[i.A].R == f[i.B].R ? 1 : 0; break;
                case Operation.NotEqualObject: f[i.Target].I = f[i.A].R != f[i.B].R ? 1 : 0; break;
                case Operation.CompareByOrder: f[i.Target].I = Holds(i.Immediate, f[i.A].D, f[i.B].D) ? 1 : 0; break;

                case Operation.JumpEqualDouble: if (f[i.A].D == f[i.B].D) { next = i.Target; } break;
                case Operation.JumpNotEqualDouble: if (f[i.A].D != f[i.B].D) { next = i.Target; } break;
                case Operation.JumpLessDouble: if (f[i.A].D < f[i.B].D) { next = i.Target; } break;
                case Operation.JumpLessUnDouble: if (!(f[i.A].D >= f[i.B].D)) { next = i.Target; } break;
                case Operation.JumpLessEqualDouble: if (f[i.A].D <= f[i.B].D) { next = i.Target; } break;
                case Operation.JumpLessEqualUnDouble: if (!(f[i.A].D > f[i.B].D)) { next = i.Target; } break;
                case Operation.JumpGreaterDouble: if (f[i.A].D > f[i.B].D) { next = i.Target; } break;
                case Operation.JumpGreaterUnDouble: if (!(f[i.A].D <= f[i.B].D)) { next = i.Target; } break;
                case Operation.JumpGreaterEqualDouble: if (f[i.A].D >= f[i.B].D) { next = i.Target; } break;
                case Operation.JumpGreaterEqualUnDouble: if (!(f[i.A].D < f[i.B].D)) { next = i.Target; } break;
                case Operation.JumpEqualInteger: if (f[i.A].I == f[i.B].I) { next = i.Target; } break;
                case Operation.JumpNotEqualInteger: if (f[i.A].I != f[i.B].I) { next = i.Target; } break;
                case Operation.JumpLessInteger: if (f[i.A].I < f[i.B].I) { next = i.Target; } break;
                case Operation.JumpLessUnInteger: if ((ulong)f[i.A].I < (ulong)f[i.B].I) { next = i.Target; } break;
                case Operation.JumpLessEqualInteger: if (f[i.A].I <= f[i.B].I) { next = i.Target; } break;
                case Operation.JumpLessEqualUnInteger: if ((ulong)f[i.A].I <= (ulong)f[i.B].I) { next = i.Target; } break;
                case Operation.JumpGreaterInteger: if (f[i.A].I > f[i.B].I) { next = i.Target; } break;
                case Operation.JumpGreaterUnInteger: if ((ulong)f[i.A].I > (ulong)f[i.B].I) { next = i.Target; } break;
                case Operation.JumpGreaterEqualInteger: if (f[i.A].I >= f[i.B].I) { next = i.Target; } break;
                case Operation.JumpGreaterEqualUnInteger: if ((ulong)f[i.A].I >= (ulong)f[i.B].I) { next = i.Target; } break;
                case Operation.JumpEqualObject: if (f[i.A].R == f[i.B].R) { next = i.Target; } break;
                case Operation.JumpNotEqualObject: if (f[i.A].R != f[i.B].R) { next = i.Target; } break;
                case Operation.JumpByOrder: if (Holds(i.Immediate, f[i.A].D, f[i.B].D)) { next = i.Target; } break;

                case Operation.IsNaN: f[i.Target].I = double.IsNaN(f[i.A].D) ? 1 : 0; break;
                case Operation.IsInfinity: f[i.Target].I = double.IsInfinity(f[i.A].D) ? 1 : 0; break;
                case Operation.IsPositiveInfinity: f[i.Target].I = double.IsPositiveInfinity(f[i.A].D) ? 1 : 0; break;
                case Operation.IsNegativeInfinity: f[i.Target].I = double.IsNegativeInfinity(f[i.A].D) ? 1 : 0; break;

                case Operation.AddressOfSlot: f[i.Target] = Value.OfAddress(slots, frame + i.A); break;
                case Operation.AddressOfField: f[i.Target] = Value.OfAddress(((Instance)f[i.A].R!).Fields, (int)i.Immediate); break;
                case Operation.AddressOfStatic: f[i.Target] = Value.OfAddress((Value[])i.Object!, (int)i.Immediate); break;
                case Operation.AddressOfElement: f[i.Target] = Value.OfAddress(((ArrayObject)f[i.A].R!).Items, CheckedIndex((ArrayObject)f[i.A].R!, f[i.B].I)); break;
                case Operation.LoadBits: f[i.Target].I = ((Value[])f[i.A].R!)[f[i.A].I].I; break;
                case Operation.LoadAll: f[i.Target] = ((Value[])f[i.A].R!)[f[i.A].I]; break;
                case Operation.StoreBits: ((Value[])f[i.A].R!)[f[i.A].I].I = f[i.B].I; break;
                case Operation.StoreAll: ((Value[])f[i.A].R!)[f[i.A].I] = f[i.B]; break;
                case Operation.LoadFieldBits: f[i.Target].I = ((Instance)f[i.A].R!).Fields[i.Immediate].I; break;
                case Operation.LoadFieldAll: f[i.Target] = ((Instance)f[i.A].R!).Fields[i.Immediate]; break;
                case Operation.StoreFieldBits: ((Instance)f[i.A].R!).Fields[i.Immediate].I = f[i.B].I; break;
                case Operation.StoreFieldAll: ((Instance)f[i.A].R!).Fields[i.Immediate] = f[i.B]; break;
                case Operation.LoadStaticBits: f[i.Target].I = ((Value[])i.Object!)[i.Immediate].I; break;
                case Operation.LoadStaticAll: f[i.Target] = ((Value[])i.Object!)[i.Immediate]; break;
                case Operation.StoreStaticBits: ((Value[])i.Object!)[i.Immediate].I = f[i.A].I; break;
                case Operation.StoreStaticAll: ((Value[])i.Object!)[i.Immediate] = f[i.A]; break;
                case Operation.LoadElementBits: f[i.Target].I = ((ArrayObject)f[i.A].R!).Items[f[i.B].I].I; break;
                case Operation.LoadElementAll: f[i.Target] = ((ArrayObject)f[i.A].R!).Items[f[i.B].I]; break;
                case Operation.StoreElementBits: ((ArrayObject)f[i.A].R!).Items[f[i.B].I].I = f[i.Target].I; break;
                case Operation.StoreElementAll: ((ArrayObject)f[i.A].R!).Items[f[i.B].I] = f[i.Target]; break;
                case Operation.Length: f[i.Target].I = ((ArrayObject)f[i.A].R!).Items.Length; break;
                case Operation.NewArray: f[i.Target] = Value.OfObject(new ArrayObject((TypeReference)i.Object!, checked((int)f[i.A].I))); break;
                case Operation.NewObject: NewObject(in i, frame); break;
                case Operation.IsInstance: f[i.Target] = Is(f[i.A].R, i.Object!) ? f[i.A] : default; break;
                case Operation.CastClass: if (f[i.A].R != null && !Is(f[i.A].R, i.Object!)) { throw new InvalidCastException(); } f[i.Target] = f[i.A]; break;

                case Operation.Call: Run((InterpretedMethod)i.Object!, frame + i.Target); break;
                case Operation.CallVirtual: Run(((Instance)f[i.Target].R!).Type.Target((MethodDefinition)i.Object!, MethodOf), frame + i.Target); break;
                case Operation.CallNative: ((Native)i.Object!)(f[i.Target..]); break;
                default:
                    throw new NotSupportedException(i.Operation.ToString());
            }
        }
    }

    private void NewObject(in DecodedInstruction i, int frame)
    {
        var creation = (Creation)i.Object!;
        int start = frame + i.Target;
        Array.Copy(slots, start, slots, start + 1, i.B);
        Value created = Value.OfObject(new Instance(creation.Type));
        slots[start] = created;
        Run(creation.Constructor, start);
        slots[start] = created;
    }

    private static bool Is(object? value, object type)
    {
        return value is Instance instance && instance.Type.Is((TypeDefinition)type);
    }

    private static int CheckedIndex(ArrayObject array, long index)
    {
        return (ulong)index < (ulong)array.Items.Length ? (int)index : throw new IndexOutOfRangeException();
    }
}
