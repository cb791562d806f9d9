using System;

// Each class breaks one rule of the gate on purpose; none of it is ever executed.
namespace ProbeCal.Nano.Tests.Fixtures.Breaking;

public sealed class GenericClass<T>
{
    public T? Value;
}

public static class InvokesFunc
{
    public static double Run(Func<double, double> f, double x)
    {
        return f(x);
    }
}

public static class InvokesAction
{
    public static void Run(Action f)
    {
        f();
    }
}

public static class GenericMethod
{
    public static T Same<T>(T value)
    {
        return value;
    }
}

public static class CallsGenericMethod
{
    public static int Run(int x)
    {
        return GenericMethod.Same(x);
    }
}

public interface IWithBody
{
    double Value()
    {
        return 1.0;
    }
}

public static unsafe class FunctionPointer
{
    public static double Run(delegate*<double, double> f, double x)
    {
        return f(x);
    }
}

public static class MatrixField
{
    public static double[,]? Matrix;
}

public static class MatrixLocal
{
    public static double Run(int i)
    {
        var matrix = new double[2, 2];
        return matrix[i, i];
    }
}

public static unsafe class PointerLocal
{
    public static double Run(double[] values)
    {
        fixed (double* first = values)
        {
            return *first;
        }
    }
}

public struct Structure
{
    public double Value;
}

public static class FloatField
{
    public static float Value;
}

public static class CallsMath
{
    public static double Run(double x)
    {
        return Math.Exp(x);
    }
}

public static class HoldsDecimal
{
    public static decimal Value;
}

public static class UsesParse
{
    public static double Run(string text)
    {
        return double.Parse(text, System.Globalization.CultureInfo.InvariantCulture) + text.IndexOf('1');
    }
}

public static class CheckedAdd
{
    public static int Run(int a, int b)
    {
        return checked(a + b);
    }
}

public static class Boxes
{
    public static object Run(double x)
    {
        return x;
    }
}

public static class Float
{
    public static double Run(double x)
    {
        return (float)x;
    }
}

public static class Throws
{
    public static double Run(double x)
    {
        return x < 0.0 ? throw new ArgumentException("negative") : x;
    }
}

public static class Catches
{
    public static int Run(int[] values)
    {
        try
        {
            return values[0];
        }
        finally
        {
            values[0] = 0;
        }
    }
}

public static class Greater
{
    public static bool Run(double a, double b)
    {
        return a > b;
    }
}

public static class GreaterOrEqual
{
    public static double Run(double a, double b)
    {
        return a >= b ? a : b;
    }
}

public static class GreaterInLoop
{
    public static int Run(double a)
    {
        int count = 0;
        while (a > 1.0)
        {
            a *= 0.5;
            count++;
        }
        return count;
    }
}

public static class EqualsInfinity
{
    public static bool Run(double a)
    {
        return a == double.PositiveInfinity;
    }
}

public static class ShiftAfterCast
{
    public static int Run(uint x)
    {
        return (int)x >> 3;
    }
}

public static class RemainderAfterCast
{
    public static long Run(ulong x)
    {
        return (long)x % 10L;
    }
}

public static class WideningAfterCast
{
    public static long Run(uint x)
    {
        return (int)x;
    }
}

public static class ReturnAfterCast
{
    public static int Run(uint x)
    {
        return (int)x;
    }
}

public static class PassAfterCast
{
    public static int Run(uint x)
    {
        return Half((int)x);
    }

    private static int Half(int value)
    {
        return value >> 1;
    }
}

public static class OutAfterCast
{
    public static bool Run(uint x, out int y)
    {
        y = (int)x;
        return true;
    }
}

public static class HoldsTable
{
    public static readonly double[] Table = [1.0, 2.0];

    public static double First()
    {
        return Table[0];
    }
}

public static class ReadsAnother
{
    public static readonly double First = HoldsTable.Table[0];
}

public static class ReadsThroughACall
{
    public static readonly double First = HoldsTable.First();
}

public static class Allocates
{
    public static double Run(double x)
    {
        double[] pair = [x, x];
        return pair[0];
    }
}

public static class AllocatesThroughACall
{
    public static double Run(double x)
    {
        return Sum(x);
    }

    private static double Sum(double x)
    {
        double[] pair = [x, x];
        return pair[0];
    }
}
