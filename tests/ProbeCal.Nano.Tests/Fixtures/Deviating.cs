using System;

namespace ProbeCal.Nano.Tests.Fixtures;

/// <summary>
/// One method for each way in which the device computes otherwise. They break the gate's rules on purpose: the interpreter
/// must show what would come of it.
/// </summary>
public static class Deviating
{
    public static double Quotient(double a, double b)
    {
        return a / b;
    }

    public static double Remainder(double a, double b)
    {
        return a % b;
    }

    public static int IntegerQuotient(int a, int b)
    {
        return a / b;
    }

    public static bool Greater(double a, double b)
    {
        return a > b;
    }

    public static bool GreaterOrEqual(double a, double b)
    {
        return a >= b;
    }

    public static int GreaterAsBranch(double a, double b)
    {
        if (a > b)
        {
            return 1;
        }
        return 2;
    }

    public static int CountWhileGreater(double a)
    {
        int count = 0;
        while (a > 1.0 && count < 10)
        {
            a *= 0.5;
            count++;
        }
        return count;
    }

    public static bool Less(double a, double b)
    {
        return a < b;
    }

    public static bool LessOrEqual(double a, double b)
    {
        return a <= b;
    }

    public static int LessAsBranch(double a, double b)
    {
        if (a < b)
        {
            return 1;
        }
        return 2;
    }

    public static bool Equal(double a, double b)
    {
        return a == b;
    }

    public static bool NotEqual(double a, double b)
    {
        return a != b;
    }

    public static int ShiftOfCast(uint x)
    {
        return (int)x >> 4;
    }

    public static long RemainderOfCast(ulong x)
    {
        return (long)x % 10L;
    }

    public static long WideningOfCast(uint x)
    {
        return (int)x;
    }

    public static double DoubleOfCast(uint x)
    {
        return (int)x;
    }

    public static long ShiftOfBits(double x)
    {
        return BitConverter.DoubleToInt64Bits(x) >> 52;
    }

    public static int ToInteger(double x)
    {
        return (int)x;
    }

    public static long ToLong(double x)
    {
        return (long)x;
    }

    public static int CheckedProduct(int a, int b)
    {
        return checked(a * b);
    }

    public static double ReadsALaterClass()
    {
        return BeforeTable.First;
    }

    public static double ReadsAnEarlierClass()
    {
        return ZAfterTable.First;
    }
}

/// <summary>Its initialiser reads a class whose name comes later: on the device that one is not ready yet.</summary>
public static class BeforeTable
{
    public static readonly double First = ReadFirst();

    private static double ReadFirst()
    {
        double[]? table = TheTable.Values;
        return table == null ? -1.0 : table[0];
    }
}

/// <summary>A table that other classes read.</summary>
public static class TheTable
{
    public static readonly double[] Values = [42.0, 43.0];
}

/// <summary>Its initialiser reads a class whose name comes earlier, which is ready.</summary>
public static class ZAfterTable
{
    public static readonly double First = TheTable.Values[0];
}

/// <summary>Its initialiser throws: the device goes on with the default.</summary>
public static class Throwing
{
    public static readonly double Value = First(null!);

    public static double Read()
    {
        return Value;
    }

    private static double First(double[] values)
    {
        return values[0];
    }
}
