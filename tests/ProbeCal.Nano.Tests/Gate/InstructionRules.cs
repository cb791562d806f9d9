using System;
using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>Instructions that the device lacks, that fail there, or that give another result there.</summary>
internal static class InstructionRules
{
    /// <summary>Branch offsets are 16 bits wide in the device's format.</summary>
    private const int LongestMethod = 32767;

    /// <summary>The count of a switch's cases is one byte wide in the device's format.</summary>
    private const int MostSwitchCases = 255;

    public static IEnumerable<Breach> Check(TypeDefinition type)
    {
        return type.Methods.Where(m => m.HasBody).SelectMany(Check);
    }

    private static IEnumerable<Breach> Check(MethodDefinition method)
    {
        if (method.Body.CodeSize > LongestMethod)
        {
            yield return Breach.At("size", method, null, $"{method.Body.CodeSize} bytes of IL; the device branches over {LongestMethod} at most");
        }
        if (method.Body.HasExceptionHandlers)
        {
            yield return Breach.At("exception-handler", method, null, "Core says by Status what went wrong: it neither catches nor needs finally");
        }
        StackKinds? kinds = null;
        Breach? cannotFollow = null;
        try
        {
            kinds = StackKinds.Of(method);
        }
        catch (NotSupportedException unsupported)
        {
            cannotFollow = Breach.At("unknown", method, null, "the gate does not know " + unsupported.Message);
        }
        if (cannotFollow != null)
        {
            yield return cannotFollow;
        }
        foreach (Instruction at in method.Body.Instructions)
        {
            string? refusal = Refusal(at);
            if (refusal != null)
            {
                yield return Breach.At("opcode", method, at, at.OpCode.Name + ": " + refusal);
            }
            StackKind[]? stack = kinds?.Before(at);
            if (stack != null)
            {
                foreach (Breach breach in CheckTyped(method, at, stack))
                {
                    yield return breach;
                }
            }
        }
    }

    private static string? Refusal(Instruction at)
    {
        switch (at.OpCode.Code)
        {
            case Code.Add_Ovf or Code.Add_Ovf_Un or Code.Sub_Ovf or Code.Sub_Ovf_Un or Code.Mul_Ovf or Code.Mul_Ovf_Un:
            case >= Code.Conv_Ovf_I1_Un and <= Code.Conv_Ovf_U_Un:
            case >= Code.Conv_Ovf_I1 and <= Code.Conv_Ovf_U8:
            case Code.Conv_Ovf_I or Code.Conv_Ovf_U:
                return "checked arithmetic never throws on the device: test the range";
            case Code.Calli:
                return "function pointers fail on the device";
            case Code.Localloc or Code.Cpblk or Code.Initblk or Code.Cpobj or Code.Mkrefany or Code.Refanyval or Code.Refanytype or Code.Arglist or Code.Jmp:
                return "raw memory is refused when the assembly is converted";
            case Code.Box or Code.Unbox or Code.Unbox_Any or Code.Initobj or Code.Ldobj or Code.Stobj or Code.Constrained or Code.Sizeof:
                return "a structure or a boxed value takes heap on the device";
            case Code.Conv_R4 or Code.Ldc_R4 or Code.Ldelem_R4 or Code.Stelem_R4 or Code.Ldind_R4 or Code.Stind_R4:
                return "float keeps 7 digits: use double";
            case Code.Throw:
                return "Core throws nothing on the device: return a Status";
            case Code.Ldvirtftn or Code.Volatile or Code.Tail or Code.Rethrow or Code.Endfilter or Code.Endfinally or Code.Leave or Code.Leave_S:
                return "not used in Core and not modelled";
            case Code.Switch when ((Instruction[])at.Operand).Length > MostSwitchCases:
                return $"more than {MostSwitchCases} cases";
            default:
                return null;
        }
    }

    private static IEnumerable<Breach> CheckTyped(MethodDefinition method, Instruction at, StackKind[] stack)
    {
        Code code = at.OpCode.Code;
        if (IsWrongWithNaN(code) && stack[^1] == StackKind.R8)
        {
            yield return Breach.At("greater-than", method, at, $"{at.OpCode.Name} on doubles: with NaN `a > b` and `a >= b` hold on the device; write `b < a` or `b <= a`");
        }
        if (code is Code.Ceq or Code.Beq or Code.Beq_S or Code.Bne_Un or Code.Bne_Un_S && IsInfiniteConstant(at.Previous))
        {
            yield return Breach.At("infinite-constant", method, at, "both infinities compare equal on the device: ask double.IsPositiveInfinity");
        }
        foreach (string cast in SignCasts(method, at, stack))
        {
            yield return Breach.At("sign-cast", method, at, cast);
        }
    }

    /// <summary>
    /// The device orders two doubles as -1, 0 or +1 and says +1 when either is NaN. So the instructions that ask for less,
    /// or for not-greater-or-unordered, are right; those that ask for greater, or for less-or-unordered, are wrong.
    /// </summary>
    private static bool IsWrongWithNaN(Code code)
    {
        return code is Code.Cgt or Code.Clt_Un or Code.Bgt or Code.Bgt_S or Code.Bge or Code.Bge_S
            or Code.Blt_Un or Code.Blt_Un_S or Code.Ble_Un or Code.Ble_Un_S;
    }

    private static bool IsInfiniteConstant(Instruction? at)
    {
        return at?.OpCode.Code == Code.Ldc_R8 && double.IsInfinity((double)at.Operand);
    }

    /// <summary>Where a value that the device still holds as unsigned is taken for a signed one.</summary>
    private static IEnumerable<string> SignCasts(MethodDefinition method, Instruction at, StackKind[] stack)
    {
        Code code = at.OpCode.Code;
        switch (code)
        {
            case Code.Shr when IsUnsigned(stack[^2]):
                yield return "a signed >> of a value that is still unsigned on the device";
                break;
            case Code.Rem when IsUnsigned(stack[^2]):
                yield return "a signed % of a value that is still unsigned on the device";
                break;
            case Code.Conv_I8 or Code.Conv_R8 when IsUnsigned(stack[^1]):
                yield return "a signed widening of a value that is still unsigned on the device";
                break;
            case Code.Stind_I4 or Code.Stind_I8 when IsUnsigned(stack[^1]) && !HasUnsignedOutput(method):
            case Code.Ret when stack.Length == 1 && IsUnsigned(stack[0]) && !IsUnsigned(StackKinds.KindOf(method.ReturnType)):
                yield return "an unsigned value leaves as a signed one and keeps its type on the device";
                break;
            case Code.Call or Code.Callvirt or Code.Newobj:
                var callee = (MethodReference)at.Operand;
                int first = stack.Length - callee.Parameters.Count;
                for (int i = 0; i < callee.Parameters.Count; i++)
                {
                    if (IsUnsigned(stack[first + i]) && !IsUnsigned(StackKinds.KindOf(callee.Parameters[i].ParameterType)))
                    {
                        yield return $"an unsigned value is passed as the signed {callee.Parameters[i].Name} and keeps its type on the device";
                    }
                }
                break;
        }
    }

    private static bool HasUnsignedOutput(MethodDefinition method)
    {
        return method.Parameters.Any(p => p.ParameterType is ByReferenceType reference && IsUnsigned(StackKinds.KindOf(reference.ElementType)));
    }

    private static bool IsUnsigned(StackKind kind)
    {
        return kind is StackKind.U4 or StackKind.U8;
    }
}
