using System;

namespace ProbeCal.Nano.Tests.Fixtures;

/// <summary>Everything of C# that Core uses, for the test that the interpreter without deviations is the desktop.</summary>
public static class Subset
{
    private static readonly double[] Doubles = [0.5, 1.5, 2.5, 3.5];
    private static readonly int[] Integers = [3, 1, 4, 1, 5];
    private static readonly byte[] Bytes = [200, 100, 50];
    private static int calls;

    public enum Shade
    {
        Dark = 1,
        Light = 2,
        None = 0,
    }

    public static double Arithmetic(double a, double b)
    {
        return ((a + b) * (a - b)) - (-a / (1.0 + (b * b))) + (a % 7.0);
    }

    public static double Comparisons(double a, double b)
    {
        double sum = 0.0;
        if (a < b) { sum += 1.0; }
        if (a <= b) { sum += 2.0; }
        if (a > b) { sum += 4.0; }
        if (a >= b) { sum += 8.0; }
        if (a == b) { sum += 16.0; }
        if (a != b) { sum += 32.0; }
        sum += !(a < b) ? 64.0 : 0.0;
        sum += !(a > b) ? 128.0 : 0.0;
        bool less = a < b;
        bool atLeast = a >= b;
        return sum + (less ? 256.0 : 0.0) + (atLeast ? 512.0 : 0.0) + (a > 0.0 && b > 0.0 || a < -1.0 ? 1024.0 : 0.0);
    }

    public static long Bits(double a, double b)
    {
        long x = BitConverter.DoubleToInt64Bits(a);
        ulong y = (ulong)BitConverter.DoubleToInt64Bits(b);
        uint low = (uint)y;
        long mixed = (x >> 3) ^ (long)(y >> 5) ^ (x << 7) ^ ~x;
        return mixed + (low >> 2) + ((low * 2654435761u) & 0xffffu) + (x & 0x7ff) + (int)(x % 1000L) + (long)(y % 77UL) + (sbyte)x + (short)x + (byte)x + (ushort)x;
    }

    public static double Classified(double a, double b)
    {
        double sum = double.IsNaN(a) ? 1.0 : 0.0;
        sum += double.IsInfinity(b) ? 2.0 : 0.0;
        sum += double.IsPositiveInfinity(a) ? 4.0 : 0.0;
        return sum + (double.IsNegativeInfinity(b) ? 8.0 : 0.0);
    }

    public static int Conversions(double a, double b)
    {
        return (int)a + (int)(long)b + (byte)(int)a + (short)(long)b + (int)(uint)a;
    }

    public static double Loops(double a, double b)
    {
        double sum = a;
        for (int i = 0; i < Doubles.Length; i++)
        {
            sum = (sum * 0.5) + (Doubles[i] * b);
        }
        foreach (int n in Integers)
        {
            sum += n / 2;
            sum -= n % 2;
        }
        return sum + Bytes[0] + Integers.Length;
    }

    public static double Outputs(double a, double b)
    {
        double total = a;
        Status status = Divide(a, b, out double quotient);
        AddTo(ref total, quotient);
        double[] values = new double[3];
        values[1] = a;
        AddTo(ref values[1], b);
        return status == Status.Ok ? total + values[1] : -values[1];
    }

    public static double Objects(double a, double b)
    {
        IShape square = new Square(a);
        IShape scaled = new Scaled(square, b);
        double area = scaled.Area() + square.Area();
        scaled.Grow(2.0);
        return area + scaled.Area() + (scaled is Scaled s ? s.Factor : 0.0) + (square as Scaled == null ? 0.25 : 0.0);
    }

    public static int Choices(double a, double b)
    {
        Shade shade = a < b ? Shade.Dark : b < a ? Shade.Light : Shade.None;
        int first = shade switch
        {
            Shade.Dark => 10,
            Shade.Light => 20,
            _ => 30,
        };
        switch ((int)shade + Integers[1])
        {
            case 1: return first + 1;
            case 2: return first + 2;
            case 3: return first + 3;
            case 7: return 7;
            default: return -1;
        }
    }

    public static int Counts(double a, double b)
    {
        int before = calls;
        calls = a < b ? 5 : 6;
        int during = calls++;
        calls += during;
        int after = calls;
        calls = before;
        return after + Recurse((int)(BitConverter.DoubleToInt64Bits(a) & 7));
    }

    public static double Order(double a, double b)
    {
        double x = a;
        double y = x + (x = b) + x;
        (x, y) = (y, x);
        int i = 1;
        i = i++ + ++i;
        return (x * i) - y;
    }

    private static int Recurse(int n)
    {
        return n <= 1 ? 1 : n * Recurse(n - 1);
    }

    private static Status Divide(double a, double b, out double quotient)
    {
        quotient = double.NaN;
        if (b == 0.0 || double.IsNaN(b))
        {
            return Status.CoefficientNotFinite;
        }
        quotient = a / b;
        return Status.Ok;
    }

    private static void AddTo(ref double target, double value)
    {
        target += value;
    }

    private interface IShape
    {
        double Area();

        void Grow(double by);
    }

    private sealed class Square(double side) : IShape
    {
        private double side = side;

        public double Area()
        {
            return side * side;
        }

        public void Grow(double by)
        {
            side *= by;
        }
    }

    private class Base
    {
        protected double Extra = 0.125;

        public virtual double More()
        {
            return Extra;
        }
    }

    private sealed class Scaled : Base, IShape
    {
        private readonly IShape inner;

        public Scaled(IShape inner, double factor)
        {
            this.inner = inner;
            Factor = factor;
        }

        public double Factor { get; private set; }

        public double Area()
        {
            return (inner.Area() * Factor) + More();
        }

        public void Grow(double by)
        {
            Factor *= by;
            inner.Grow(by);
        }

        public override double More()
        {
            return base.More() + 1.0;
        }
    }
}
