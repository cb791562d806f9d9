using System;
using Mono.Cecil.Cil;
using ProbeCal.Nano.Tests.Gate;

namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>Arithmetic, comparisons and conversions, each in the form that the deviations asked for give it.</summary>
internal sealed partial class Decoder
{
    private bool DecodeArithmetic(Code code)
    {
        switch (code)
        {
            case Code.Add or Code.Sub or Code.Mul or Code.Div or Code.Div_Un or Code.Rem or Code.Rem_Un or Code.And or Code.Or or Code.Xor
                or Code.Shl or Code.Shr or Code.Shr_Un or Code.Add_Ovf or Code.Sub_Ovf or Code.Mul_Ovf:
                Operand right = Pop();
                Operand left = Pop();
                EmitResult(left.Kind, new DecodedInstruction { Operation = Binary(code, left.Kind), A = left.Slot, B = right.Slot });
                return true;
            case Code.Neg:
                Operand negated = Pop();
                Operation negate = negated.Kind == StackKind.R8 ? Operation.NegateDouble : Is64(negated.Kind) ? Operation.Negate64 : Operation.Negate32;
                EmitResult(negated.Kind, new DecodedInstruction { Operation = negate, A = negated.Slot });
                return true;
            case Code.Not:
                Operand inverted = Pop();
                EmitResult(inverted.Kind, new DecodedInstruction { Operation = Operation.Not, A = inverted.Slot });
                return true;
            default:
                return false;
        }
    }

    private Operation Binary(Code code, StackKind kind)
    {
        if (code is Code.And or Code.Or or Code.Xor)
        {
            return code == Code.And ? Operation.And : code == Code.Or ? Operation.Or : Operation.Xor;
        }
        if (kind == StackKind.R8)
        {
            bool throws = Deviates(Deviations.ZeroDivisorThrows);
            return code switch
            {
                Code.Add => Operation.AddDouble,
                Code.Sub => Operation.SubtractDouble,
                Code.Mul => Operation.MultiplyDouble,
                Code.Div => throws ? Operation.DivideDoubleOrThrow : Operation.DivideDouble,
                Code.Rem => throws ? Operation.RemainderDoubleOrThrow : Operation.RemainderDouble,
                _ => throw new NotSupportedException(code + " on doubles"),
            };
        }
        bool unsigned = kind is StackKind.U4 or StackKind.U8 && Deviates(Deviations.UnsignedSurvivesCasts);
        if (code == Code.Shr && unsigned)
        {
            code = Code.Shr_Un;
        }
        if (code == Code.Rem && unsigned)
        {
            code = Code.Rem_Un;
        }
        if (code is Code.Add_Ovf or Code.Sub_Ovf or Code.Mul_Ovf && Deviates(Deviations.CheckedNeverThrows))
        {
            code = code == Code.Add_Ovf ? Code.Add : code == Code.Sub_Ovf ? Code.Sub : Code.Mul;
        }
        return Is64(kind) ? Binary64(code) : Binary32(code);
    }

    private static Operation Binary32(Code code)
    {
        return code switch
        {
            Code.Add => Operation.Add32,
            Code.Sub => Operation.Subtract32,
            Code.Mul => Operation.Multiply32,
            Code.Div => Operation.Divide32,
            Code.Div_Un => Operation.DivideUnsigned32,
            Code.Rem => Operation.Remainder32,
            Code.Rem_Un => Operation.RemainderUnsigned32,
            Code.Shl => Operation.ShiftLeft32,
            Code.Shr => Operation.ShiftRight32,
            Code.Shr_Un => Operation.ShiftRightUnsigned32,
            Code.Add_Ovf => Operation.AddChecked32,
            Code.Sub_Ovf => Operation.SubtractChecked32,
            Code.Mul_Ovf => Operation.MultiplyChecked32,
            _ => throw new NotSupportedException(code + " on 32 bits"),
        };
    }

    private static Operation Binary64(Code code)
    {
        return code switch
        {
            Code.Add => Operation.Add64,
            Code.Sub => Operation.Subtract64,
            Code.Mul => Operation.Multiply64,
            Code.Div => Operation.Divide64,
            Code.Div_Un => Operation.DivideUnsigned64,
            Code.Rem => Operation.Remainder64,
            Code.Rem_Un => Operation.RemainderUnsigned64,
            Code.Shl => Operation.ShiftLeft64,
            Code.Shr => Operation.ShiftRight64,
            Code.Shr_Un => Operation.ShiftRightUnsigned64,
            _ => throw new NotSupportedException(code + " on 64 bits"),
        };
    }

    private bool DecodeComparison(Instruction at, Code code)
    {
        Comparison? comparison = ComparisonOf(code);
        if (comparison is not { } asked)
        {
            return false;
        }
        Operand right = Pop();
        Operand left = Pop();
        var decoded = new DecodedInstruction { A = left.Slot, B = right.Slot };
        bool byOrder = left.Kind == StackKind.R8 && Deviates(Deviations.NaNOrdersAsGreater | Deviations.InfinitiesCompareEqual);
        if (byOrder)
        {
            decoded.Immediate = (long)asked.Condition | (asked.Unordered ? Machine.UnorderedBit : 0L);
            decoded.Operation = asked.Jumps ? Operation.JumpByOrder : Operation.CompareByOrder;
        }
        else
        {
            decoded.Operation = asked.Jumps ? JumpFor(asked, left.Kind) : CompareFor(asked, left.Kind);
        }
        if (asked.Jumps)
        {
            SettleAll();
            decoded.Object = at.Operand;
            Emit(decoded);
        }
        else
        {
            EmitResult(StackKind.I4, decoded);
        }
        return true;
    }

    /// <summary>What a comparing instruction asks, and whether it jumps or leaves 0 or 1.</summary>
    private readonly record struct Comparison(OrderCondition Condition, bool Unordered, bool Jumps);

    private static Comparison? ComparisonOf(Code code)
    {
        return code switch
        {
            Code.Ceq => new Comparison(OrderCondition.Equal, false, false),
            Code.Clt => new Comparison(OrderCondition.Less, false, false),
            Code.Clt_Un => new Comparison(OrderCondition.Less, true, false),
            Code.Cgt => new Comparison(OrderCondition.Greater, false, false),
            Code.Cgt_Un => new Comparison(OrderCondition.Greater, true, false),
            Code.Beq or Code.Beq_S => new Comparison(OrderCondition.Equal, false, true),
            Code.Bne_Un or Code.Bne_Un_S => new Comparison(OrderCondition.NotEqual, true, true),
            Code.Blt or Code.Blt_S => new Comparison(OrderCondition.Less, false, true),
            Code.Blt_Un or Code.Blt_Un_S => new Comparison(OrderCondition.Less, true, true),
            Code.Ble or Code.Ble_S => new Comparison(OrderCondition.LessEqual, false, true),
            Code.Ble_Un or Code.Ble_Un_S => new Comparison(OrderCondition.LessEqual, true, true),
            Code.Bgt or Code.Bgt_S => new Comparison(OrderCondition.Greater, false, true),
            Code.Bgt_Un or Code.Bgt_Un_S => new Comparison(OrderCondition.Greater, true, true),
            Code.Bge or Code.Bge_S => new Comparison(OrderCondition.GreaterEqual, false, true),
            Code.Bge_Un or Code.Bge_Un_S => new Comparison(OrderCondition.GreaterEqual, true, true),
            _ => null,
        };
    }

    private static Operation CompareFor(Comparison asked, StackKind kind)
    {
        if (IsReference(kind))
        {
            return asked.Condition == OrderCondition.Equal ? Operation.EqualObject : Operation.NotEqualObject;
        }
        bool isDouble = kind == StackKind.R8;
        return asked.Condition switch
        {
            OrderCondition.Equal => isDouble ? Operation.EqualDouble : Operation.EqualInteger,
            OrderCondition.Less when asked.Unordered => isDouble ? Operation.LessUnDouble : Operation.LessUnInteger,
            OrderCondition.Less => isDouble ? Operation.LessDouble : Operation.LessInteger,
            _ when asked.Unordered => isDouble ? Operation.GreaterUnDouble : Operation.GreaterUnInteger,
            _ => isDouble ? Operation.GreaterDouble : Operation.GreaterInteger,
        };
    }

    private static Operation JumpFor(Comparison asked, StackKind kind)
    {
        if (IsReference(kind))
        {
            return asked.Condition == OrderCondition.Equal ? Operation.JumpEqualObject : Operation.JumpNotEqualObject;
        }
        bool isDouble = kind == StackKind.R8;
        return asked.Condition switch
        {
            OrderCondition.Equal => isDouble ? Operation.JumpEqualDouble : Operation.JumpEqualInteger,
            OrderCondition.NotEqual => isDouble ? Operation.JumpNotEqualDouble : Operation.JumpNotEqualInteger,
            OrderCondition.Less when asked.Unordered => isDouble ? Operation.JumpLessUnDouble : Operation.JumpLessUnInteger,
            OrderCondition.Less => isDouble ? Operation.JumpLessDouble : Operation.JumpLessInteger,
            OrderCondition.LessEqual when asked.Unordered => isDouble ? Operation.JumpLessEqualUnDouble : Operation.JumpLessEqualUnInteger,
            OrderCondition.LessEqual => isDouble ? Operation.JumpLessEqualDouble : Operation.JumpLessEqualInteger,
            OrderCondition.Greater when asked.Unordered => isDouble ? Operation.JumpGreaterUnDouble : Operation.JumpGreaterUnInteger,
            OrderCondition.Greater => isDouble ? Operation.JumpGreaterDouble : Operation.JumpGreaterInteger,
            _ when asked.Unordered => isDouble ? Operation.JumpGreaterEqualUnDouble : Operation.JumpGreaterEqualUnInteger,
            _ => isDouble ? Operation.JumpGreaterEqualDouble : Operation.JumpGreaterEqualInteger,
        };
    }

    private bool DecodeConversion(Code code)
    {
        StackKind result;
        switch (code)
        {
            case Code.Conv_I1 or Code.Conv_U1 or Code.Conv_I2 or Code.Conv_U2 or Code.Conv_I4 or Code.Conv_I:
                result = StackKind.I4;
                break;
            case Code.Conv_U4 or Code.Conv_U:
                result = StackKind.U4;
                break;
            case Code.Conv_I8:
                result = StackKind.I8;
                break;
            case Code.Conv_U8:
                result = StackKind.U8;
                break;
            case Code.Conv_R8 or Code.Conv_R_Un:
                result = StackKind.R8;
                break;
            default:
                return false;
        }
        Operand from = Pop();
        var decoded = new DecodedInstruction { A = from.Slot };
        if (from.Kind == StackKind.R8)
        {
            decoded.Operation = result == StackKind.R8 ? Operation.MoveBits : Operation.IntegerFromDouble;
            decoded.Immediate = (long)code;
        }
        else
        {
            decoded.Operation = IntegerConversion(code, from.Kind);
        }
        EmitResult(result, decoded);
        return true;
    }

    private Operation IntegerConversion(Code code, StackKind from)
    {
        bool unsigned = from is StackKind.U4 or StackKind.U8 && Deviates(Deviations.UnsignedSurvivesCasts);
        switch (code)
        {
            case Code.Conv_I1:
                return Operation.ToSigned8;
            case Code.Conv_U1:
                return Operation.ToUnsigned8;
            case Code.Conv_I2:
                return Operation.ToSigned16;
            case Code.Conv_U2:
                return Operation.ToUnsigned16;
            case Code.Conv_I4 or Code.Conv_U4 or Code.Conv_I or Code.Conv_U:
                return Operation.To32;
            case Code.Conv_I8:
                return unsigned && !Is64(from) ? Operation.ZeroExtend32 : Operation.MoveBits;
            case Code.Conv_U8:
                return Is64(from) ? Operation.MoveBits : Operation.ZeroExtend32;
            case Code.Conv_R_Un:
                return Is64(from) ? Operation.DoubleFromUnsigned64 : Operation.DoubleFromUnsigned32;
            default:
                return !unsigned ? Operation.DoubleFromSigned : Is64(from) ? Operation.DoubleFromUnsigned64 : Operation.DoubleFromUnsigned32;
        }
    }

    private static bool Is64(StackKind kind)
    {
        return kind is StackKind.I8 or StackKind.U8;
    }
}
