using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>The double constants in a method and in all it may call: the ends of the ranges it tests are among them.</summary>
internal static class CodeConstants
{
    public static double[] Of(MethodDefinition start)
    {
        var constants = new HashSet<double>();
        var seen = new HashSet<MethodDefinition> { start };
        var waiting = new Queue<MethodDefinition>([start]);
        while (waiting.TryDequeue(out MethodDefinition? method))
        {
            foreach (Instruction at in method.Body.Instructions)
            {
                if (at.OpCode.Code == Code.Ldc_R8)
                {
                    constants.Add((double)at.Operand);
                }
                else if (at.Operand is MethodDefinition { HasBody: true } callee && seen.Add(callee))
                {
                    waiting.Enqueue(callee);
                }
            }
        }
        return constants.Order().ToArray();
    }
}
