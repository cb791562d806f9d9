using System;
using System.Collections.Generic;
using System.Reflection;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Interpreter;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>What a call gave on both sides.</summary>
/// <param name="DesktopRefusal">Name of the exception thrown on the desktop, or null.</param>
/// <param name="DeviceRefusal">Name of the exception thrown on the device, or null.</param>
/// <param name="Result">What was returned or created.</param>
/// <param name="Arguments">The arguments afterwards, with what was given out by them.</param>
internal readonly record struct Outcome(string? DesktopRefusal, string? DeviceRefusal, Pair Result, Pair[] Arguments)
{
    /// <summary>The objects that came out: the result, and what was given out by an argument.</summary>
    public IEnumerable<Pair> Objects
    {
        get
        {
            if (DesktopRefusal != null || DeviceRefusal != null)
            {
                yield break;
            }
            yield return Result;
            foreach (Pair argument in Arguments)
            {
                if (argument.Device.R is Value[] slots)
                {
                    yield return new Pair(argument.Desktop, slots[argument.Device.I]);
                }
            }
        }
    }
}

/// <summary>Calls a member on the desktop and in the interpreter with the same arguments.</summary>
internal sealed class Invoker(Machine machine)
{
    private readonly Dictionary<MethodBase, Func<object?, object?[], object?>> desktopCalls = [];

    public Outcome Invoke(Member member, Pair target, Pair[] arguments)
    {
        MethodDefinition method = member.Device;
        object?[] desktopArguments = new object?[arguments.Length];
        int shift = method.HasThis && !method.IsConstructor ? 1 : 0;
        var deviceArguments = new Value[arguments.Length + shift];
        if (shift == 1)
        {
            deviceArguments[0] = target.Device;
        }
        var after = new Pair[arguments.Length];
        for (int i = 0; i < arguments.Length; i++)
        {
            desktopArguments[i] = arguments[i].Desktop;
            deviceArguments[i + shift] = method.Parameters[i].ParameterType is ByReferenceType
                ? Value.OfAddress([arguments[i].Device], 0)
                : arguments[i].Device;
        }
        string? desktopRefusal = null;
        object? desktopResult = null;
        try
        {
            desktopResult = Desktop(member.Desktop)(target.Desktop, desktopArguments);
        }
        catch (Exception thrown)
        {
            desktopRefusal = (thrown is TargetInvocationException ? thrown.InnerException! : thrown).GetType().Name;
        }
        string? deviceRefusal = null;
        Value deviceResult = default;
        try
        {
            deviceResult = method.IsConstructor ? machine.Create(method, deviceArguments) : machine.Call(method, deviceArguments);
        }
        catch (Exception thrown) when (thrown is not NotSupportedException)
        {
            deviceRefusal = thrown.GetType().Name;
        }
        for (int i = 0; i < arguments.Length; i++)
        {
            after[i] = new Pair(desktopArguments[i], deviceArguments[i + shift]);
        }
        return new Outcome(desktopRefusal, deviceRefusal, new Pair(desktopResult, deviceResult), after);
    }

    private Func<object?, object?[], object?> Desktop(MethodBase method)
    {
        if (!desktopCalls.TryGetValue(method, out Func<object?, object?[], object?>? call))
        {
            if (method is ConstructorInfo constructor)
            {
                var creator = ConstructorInvoker.Create(constructor);
                call = (_, arguments) => creator.Invoke(arguments.AsSpan());
            }
            else
            {
                var invoker = MethodInvoker.Create(method);
                call = (target, arguments) => invoker.Invoke(target, arguments.AsSpan());
            }
            desktopCalls.Add(method, call);
        }
        return call;
    }
}
