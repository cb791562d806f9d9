namespace ProbeCal.Nano.Tests.Interpreter;

/// <summary>What a call cost, in the operations that take time on the device.</summary>
/// <param name="DoubleOperations">Additions, subtractions, multiplications, divisions, remainders and negations of doubles.</param>
/// <param name="Divisions">Those of them that divide.</param>
/// <param name="Calls">Calls of Core's own methods.</param>
/// <param name="Instructions">Instructions of the interpreter's decoded form, all of the above among them.</param>
internal readonly record struct OperationCount(long DoubleOperations, long Divisions, long Calls, long Instructions);
