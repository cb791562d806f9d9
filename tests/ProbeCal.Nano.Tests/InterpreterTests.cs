using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Reflection;
using Mono.Cecil;
using ProbeCal.Nano.Tests.Campaign;
using ProbeCal.Nano.Tests.Fixtures;
using ProbeCal.Nano.Tests.Interpreter;
using Xunit;

namespace ProbeCal.Nano.Tests;

/// <summary>The interpreter is the desktop when nothing deviates, and each deviation changes a result.</summary>
public class InterpreterTests
{
    private const Deviations Unsigned = Deviations.UnsignedSurvivesCasts;
    private const Deviations NaNOrder = Deviations.NaNOrdersAsGreater;
    private const Deviations Infinities = Deviations.InfinitiesCompareEqual;

    [Theory]
    [InlineData(nameof(Subset.Arithmetic))]
    [InlineData(nameof(Subset.Comparisons))]
    [InlineData(nameof(Subset.Bits))]
    [InlineData(nameof(Subset.Classified))]
    [InlineData(nameof(Subset.Conversions))]
    [InlineData(nameof(Subset.Loops))]
    [InlineData(nameof(Subset.Outputs))]
    [InlineData(nameof(Subset.Objects))]
    [InlineData(nameof(Subset.Choices))]
    [InlineData(nameof(Subset.Counts))]
    [InlineData(nameof(Subset.Order))]
    public void Without_deviations_it_gives_what_the_desktop_gives(string name)
    {
        MethodInfo desktop = typeof(Subset).GetMethod(name)!;
        MethodDefinition interpreted = Fixture(nameof(Subset), name);
        var machine = new Machine(DeviceAssembly.Tests.MainModule.Types, Deviations.None);
        var random = new Random(Seed.Value);
        double[] special = [double.NaN, double.PositiveInfinity, double.NegativeInfinity, 0.0, -0.0, 1.0, -1.0, 0.5, double.Epsilon, double.MaxValue, 2147483648.0, -2147483649.0, 1e19];
        for (int n = 0; n < 3000; n++)
        {
            double a = n < 169 ? special[n / 13] : Numbers.Wide(random);
            double b = n < 169 ? special[n % 13] : Numbers.Wide(random);
            object expected = desktop.Invoke(null, [a, b])!;
            Value found = machine.Call(interpreted, [Value.OfDouble(a), Value.OfDouble(b)]);
            long bits = expected is double d ? BitConverter.DoubleToInt64Bits(d) : Convert.ToInt64(expected, CultureInfo.InvariantCulture);
            Assert.True(bits == found.I, $"{name}({a:R}, {b:R}): desktop {expected}, interpreted {(expected is double ? found.D : found.I)}");
        }
    }

    public static TheoryData<Deviations, string, object[], string, string> Changes => new()
    {
        { Deviations.ZeroDivisorThrows, nameof(Deviating.Quotient), [1.0, 0.0], "Infinity", "DeviceException" },
        { Deviations.ZeroDivisorThrows, nameof(Deviating.Quotient), [1.0, -0.0], "-Infinity", "DeviceException" },
        { Deviations.ZeroDivisorThrows, nameof(Deviating.Remainder), [1.0, 0.0], "NaN", "DeviceException" },
        { Deviations.ZeroDivisorThrows, nameof(Deviating.IntegerQuotient), [1, 0], "DivideByZeroException", "DeviceException" },
        { NaNOrder, nameof(Deviating.Greater), [double.NaN, 1.0], "0", "1" },
        { NaNOrder, nameof(Deviating.Greater), [1.0, double.NaN], "0", "1" },
        { NaNOrder, nameof(Deviating.GreaterOrEqual), [double.NaN, 1.0], "0", "1" },
        { NaNOrder, nameof(Deviating.GreaterAsBranch), [double.NaN, 1.0], "2", "1" },
        { NaNOrder, nameof(Deviating.CountWhileGreater), [double.NaN], "0", "10" },
        { Infinities, nameof(Deviating.Equal), [double.PositiveInfinity, double.NegativeInfinity], "0", "1" },
        { Infinities, nameof(Deviating.NotEqual), [double.PositiveInfinity, double.NegativeInfinity], "1", "0" },
        { Infinities, nameof(Deviating.Less), [double.NegativeInfinity, double.PositiveInfinity], "1", "0" },
        { Infinities, nameof(Deviating.LessAsBranch), [double.NegativeInfinity, double.PositiveInfinity], "1", "2" },
        { Infinities, nameof(Deviating.Greater), [double.PositiveInfinity, double.NegativeInfinity], "1", "0" },
        { Deviations.EagerInitialisers, nameof(Deviating.ReadsALaterClass), [], "42", "-1" },
        { Unsigned, nameof(Deviating.ShiftOfCast), [0xF0000000u], "-16777216", "251658240" },
        { Unsigned, nameof(Deviating.RemainderOfCast), [ulong.MaxValue], "-1", "5" },
        { Unsigned, nameof(Deviating.WideningOfCast), [0xFFFFFFFFu], "-1", "4294967295" },
        { Unsigned, nameof(Deviating.DoubleOfCast), [0xFFFFFFFFu], "-1", "4294967295" },
        { Deviations.ConversionsOutOfRangeRefused, nameof(Deviating.ToInteger), [2147483648.0], "2147483647", "UnspecifiedException" },
        { Deviations.ConversionsOutOfRangeRefused, nameof(Deviating.ToLong), [double.NaN], "0", "UnspecifiedException" },
        { Deviations.CheckedNeverThrows, nameof(Deviating.CheckedProduct), [65536, 65536], "OverflowException", "0" },
    };

    [Theory]
    [MemberData(nameof(Changes))]
    public void Each_deviation_changes_a_result(Deviations deviation, string name, object[] arguments, string without, string with)
    {
        Assert.Equal(without, Outcome(Deviations.None, name, arguments));
        Assert.Equal(without, OnTheDesktop(name, arguments));
        Assert.Equal(with, Outcome(deviation, name, arguments));
        Assert.Equal(with, Outcome(Deviations.All, name, arguments));
    }

    /// <summary>What the device does right, by measurement, stays right with all deviations on.</summary>
    [Theory]
    [InlineData(nameof(Deviating.Less), double.NaN, 1.0)]
    [InlineData(nameof(Deviating.Less), 1.0, double.NaN)]
    [InlineData(nameof(Deviating.LessOrEqual), double.NaN, 1.0)]
    [InlineData(nameof(Deviating.LessOrEqual), 1.0, double.NaN)]
    [InlineData(nameof(Deviating.LessAsBranch), double.NaN, double.NaN)]
    [InlineData(nameof(Deviating.Equal), double.NaN, double.NaN)]
    [InlineData(nameof(Deviating.NotEqual), double.NaN, double.NaN)]
    [InlineData(nameof(Deviating.Equal), double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(nameof(Deviating.Greater), double.PositiveInfinity, 1.0)]
    [InlineData(nameof(Deviating.Quotient), 1.0, double.PositiveInfinity)]
    [InlineData(nameof(Deviating.Quotient), 1e-300, 1e300)]
    public void What_is_right_on_the_device_stays_right(string name, double a, double b)
    {
        Assert.Equal(OnTheDesktop(name, [a, b]), Outcome(Deviations.All, name, [a, b]));
    }

    [Fact]
    public void Bits_taken_as_a_signed_number_shift_right_on_the_device()
    {
        Assert.Equal(OnTheDesktop(nameof(Deviating.ShiftOfBits), [-2.5]), Outcome(Deviations.All, nameof(Deviating.ShiftOfBits), [-2.5]));
        Assert.Equal(OnTheDesktop(nameof(Deviating.ReadsAnEarlierClass), []), Outcome(Deviations.All, nameof(Deviating.ReadsAnEarlierClass), []));
    }

    [Fact]
    public void An_initialiser_that_throws_leaves_the_default_and_the_program_goes_on()
    {
        TypeDefinition type = DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Throwing");
        var machine = new Machine([type], Deviations.EagerInitialisers);
        Assert.Equal(0.0, machine.Call(type.Methods.Single(m => m.Name == nameof(Throwing.Read)), []).D);
        Assert.Single(machine.FailedInitialisers);
    }

    [Fact]
    public void Every_method_of_the_device_assembly_is_understood_and_no_initialiser_fails()
    {
        List<TypeDefinition> types = DeviceAssembly.Nano.MainModule.GetTypes().ToList();
        var machine = new Machine(types, Deviations.All);
        Assert.Empty(machine.FailedInitialisers);
        foreach (MethodDefinition method in types.Where(t => t.BaseType?.FullName != "System.Attribute").SelectMany(t => t.Methods).Where(m => m.HasBody))
        {
            Assert.NotEmpty(machine.Decoded(method));
        }
    }

    private static string Outcome(Deviations deviations, string name, object[] arguments)
    {
        TypeDefinition[] program = DeviceAssembly.Tests.MainModule.Types.Where(t => t.Namespace == typeof(Deviating).Namespace).ToArray();
        MethodDefinition method = Fixture(nameof(Deviating), name);
        try
        {
            Value found = new Machine(program, deviations).Call(method, arguments.Select(Slot).ToArray());
            return method.ReturnType.MetadataType == MetadataType.Double ? Print(found.D) : found.I.ToString(CultureInfo.InvariantCulture);
        }
        catch (Exception thrown) when (thrown is DeviceException or UnspecifiedException or ArithmeticException)
        {
            return thrown.GetType().Name;
        }
    }

    private static string OnTheDesktop(string name, object[] arguments)
    {
        try
        {
            object found = typeof(Deviating).GetMethod(name)!.Invoke(null, arguments)!;
            return found switch
            {
                double d => Print(d),
                bool b => b ? "1" : "0",
                _ => Convert.ToString(found, CultureInfo.InvariantCulture)!,
            };
        }
        catch (TargetInvocationException thrown)
        {
            return thrown.InnerException!.GetType().Name;
        }
    }

    private static Value Slot(object argument)
    {
        return argument switch
        {
            double d => Value.OfDouble(d),
            uint u => Value.OfInteger(unchecked((int)u)),
            ulong u => Value.OfInteger(unchecked((long)u)),
            _ => Value.OfInteger(Convert.ToInt64(argument, CultureInfo.InvariantCulture)),
        };
    }

    private static string Print(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture);
    }

    private static MethodDefinition Fixture(string type, string name)
    {
        return DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures." + type).Methods.Single(m => m.Name == name);
    }
}
