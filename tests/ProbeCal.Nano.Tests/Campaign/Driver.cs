using System;
using System.Collections.Generic;
using System.Linq;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>What the campaign found out about one member.</summary>
internal sealed class MemberReport(string name)
{
    public string Name { get; } = name;

    public int Inputs { get; set; }

    public int Mismatches { get; set; }

    public string? FirstMismatch { get; set; }

    /// <summary>The first call whose status and values contradict each other, on the desktop.</summary>
    public string? FirstContradiction { get; set; }

    /// <summary>Calls that answered: a number that is not NaN, or the status Ok.</summary>
    public int Answered { get; set; }

    /// <summary>Calls that refused: NaN, another status, an exception.</summary>
    public int Refused { get; set; }
}

/// <summary>Calls members on the desktop and in the interpreter with the same inputs and compares what comes of it.</summary>
internal sealed class Driver(Machine machine)
{
    private readonly Generator generator = new(machine);
    private readonly Invoker invoker = new(machine);
    private readonly Comparison comparison = new();

    /// <summary>Calls a member with <paramref name="inputs"/> inputs; one that takes none is called once.</summary>
    public MemberReport Drive(Member member, int inputs)
    {
        var report = new MemberReport(member.Name);
        MethodDefinition method = member.Device;
        generator.Prepare(method);
        var random = new Random(Seed.Value ^ StableHash(member.Name));
        int count = method.Parameters.Count == 0 && method.IsStatic ? 1 : inputs;
        foreach (Pair[] arguments in Inputs(method, random).Take(count))
        {
            Pair target = method.HasThis && !method.IsConstructor ? generator.ObjectOf(method.DeclaringType, random) : default;
            Outcome outcome = invoker.Invoke(member, target, arguments);
            Judge(report, member, target, arguments, outcome);
        }
        return report;
    }

    /// <summary>First each special value of each parameter beside ordinary others, then mixtures.</summary>
    private IEnumerable<Pair[]> Inputs(MethodDefinition method, Random random)
    {
        int parameters = method.Parameters.Count;
        for (int p = 0; p < parameters; p++)
        {
            int count = method.Parameters[p].IsOut ? 0 : generator.SpecialCount(method.Parameters[p]);
            for (int special = 0; special < count; special++)
            {
                yield return method.Parameters.Select((each, i) =>
                    generator.Make(each, i == p ? Strangeness.Special : Strangeness.Ordinary, random, i == p ? special : -1)).ToArray();
            }
        }
        while (true)
        {
            int dice = random.Next(100);
            int odd = parameters == 0 ? 0 : random.Next(parameters);
            yield return method.Parameters.Select((each, i) => generator.Make(each, StrangenessFor(dice, i == odd, random), random)).ToArray();
        }
    }

    private static Strangeness StrangenessFor(int dice, bool isOdd, Random random)
    {
        return dice switch
        {
            < 50 => Strangeness.Ordinary,
            < 65 => isOdd ? Strangeness.Special : Strangeness.Ordinary,
            < 80 => isOdd ? Strangeness.Wide : Strangeness.Ordinary,
            _ => random.Next(2) == 0 ? Strangeness.Special : (Strangeness)random.Next(3),
        };
    }

    private void Judge(MemberReport report, Member member, Pair target, Pair[] arguments, Outcome outcome)
    {
        report.Inputs++;
        string? difference = Difference(member, target, outcome);
        if (difference != null)
        {
            report.Mismatches++;
            report.FirstMismatch ??= $"{Describe(member, arguments)}: {difference}";
        }
        if (report.FirstContradiction == null && Contradiction(member, arguments, outcome) is { } contradiction)
        {
            report.FirstContradiction = $"{Describe(member, arguments)}: {contradiction}";
        }
        if (IsAnswer(outcome))
        {
            report.Answered++;
        }
        else
        {
            report.Refused++;
        }
    }

    private string? Difference(Member member, Pair target, Outcome outcome)
    {
        if (outcome.DesktopRefusal != null || outcome.DeviceRefusal != null)
        {
            return outcome.DesktopRefusal == outcome.DeviceRefusal ? null
                : $"desktop {outcome.DesktopRefusal ?? "answered"}, device {outcome.DeviceRefusal ?? "answered"}";
        }
        MethodDefinition method = member.Device;
        string? difference = method.IsConstructor
            ? comparison.Difference("object", method.DeclaringType, outcome.Result.Desktop, outcome.Result.Device)
            : method.ReturnType.MetadataType == MetadataType.Void ? null
            : comparison.Difference("result", method.ReturnType, outcome.Result.Desktop, outcome.Result.Device);
        for (int i = 0; i < outcome.Arguments.Length && difference == null; i++)
        {
            ParameterDefinition parameter = method.Parameters[i];
            if (parameter.ParameterType is ByReferenceType || !(parameter.ParameterType.IsPrimitive || parameter.ParameterType.IsValueType))
            {
                difference = comparison.Difference(parameter.Name, parameter.ParameterType, outcome.Arguments[i].Desktop, outcome.Arguments[i].Device);
            }
        }
        if (difference == null && target.Desktop != null && !member.IsGetter)
        {
            difference = comparison.Difference("this", method.DeclaringType, target.Desktop, target.Device);
        }
        return difference;
    }

    /// <summary>
    /// A value is NaN unless the status is Ok, or unless extrapolation was asked for; with Ok every value is finite.
    /// </summary>
    private static string? Contradiction(Member member, Pair[] arguments, Outcome outcome)
    {
        if (outcome.Result.Desktop is not Status status)
        {
            return null;
        }
        bool extrapolates = arguments.Any(a => a.Desktop is RangeRule rule && rule != RangeRule.Refuse);
        for (int i = 0; i < arguments.Length; i++)
        {
            if (!member.Device.Parameters[i].IsOut || outcome.Arguments[i].Desktop is not double value)
            {
                continue;
            }
            if (status == Status.Ok ? !double.IsFinite(value) : !double.IsNaN(value) && !extrapolates)
            {
                return $"{status}, yet {member.Device.Parameters[i].Name} is {Comparison.Print(value)}";
            }
        }
        return null;
    }

    private static string Describe(Member member, Pair[] arguments)
    {
        IEnumerable<string> inputs = arguments.Select((a, i) => (Argument: a, Parameter: member.Device.Parameters[i])).Where(x => !x.Parameter.IsOut)
            .Select(x => x.Parameter.Name + " = " + (x.Argument.Desktop is double d ? Comparison.Print(d) : x.Argument.Desktop));
        return member.Name + "(" + string.Join(", ", inputs) + ")";
    }

    private static bool IsAnswer(Outcome outcome)
    {
        return outcome.DesktopRefusal == null && outcome.Result.Desktop switch
        {
            Status status => status == Status.Ok,
            double value => !double.IsNaN(value),
            _ => true,
        };
    }

    private static int StableHash(string text)
    {
        return text.Aggregate(17, (hash, c) => unchecked((hash * 31) + c));
    }
}
