using System;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Gate;

/// <summary>Reads operands that the short forms of instructions carry in their operation code.</summary>
internal static class IlOperands
{
    /// <summary>The argument an instruction refers to, <c>this</c> being number 0.</summary>
    public static int ArgumentIndex(MethodDefinition method, Instruction at)
    {
        switch (at.OpCode.Code)
        {
            case Code.Ldarg_0:
                return 0;
            case Code.Ldarg_1:
                return 1;
            case Code.Ldarg_2:
                return 2;
            case Code.Ldarg_3:
                return 3;
            default:
                var parameter = (ParameterDefinition)at.Operand;
                return parameter == method.Body.ThisParameter ? 0 : parameter.Index + (method.HasThis ? 1 : 0);
        }
    }

    /// <summary>The local an instruction refers to.</summary>
    public static int LocalIndex(Instruction at)
    {
        switch (at.OpCode.Code)
        {
            case Code.Ldloc_0 or Code.Stloc_0:
                return 0;
            case Code.Ldloc_1 or Code.Stloc_1:
                return 1;
            case Code.Ldloc_2 or Code.Stloc_2:
                return 2;
            case Code.Ldloc_3 or Code.Stloc_3:
                return 3;
            default:
                return ((VariableDefinition)at.Operand).Index;
        }
    }

    /// <summary>Whether the instruction loads an integer constant, and which.</summary>
    public static bool IsIntegerConstant(Instruction at, out long value)
    {
        Code code = at.OpCode.Code;
        if (code is >= Code.Ldc_I4_M1 and <= Code.Ldc_I4_8)
        {
            value = code - Code.Ldc_I4_0;
            return true;
        }
        if (code is Code.Ldc_I4_S or Code.Ldc_I4 or Code.Ldc_I8)
        {
            value = Convert.ToInt64(at.Operand, System.Globalization.CultureInfo.InvariantCulture);
            return true;
        }
        value = 0;
        return false;
    }
}
