using System;

namespace ProbeCal.Nano.Tests.Fixtures;

/// <summary>Comes close to every rule of the gate and breaks none.</summary>
public sealed class Keeping
{
    public enum Answer
    {
        Ok,
        NotFinite,
        OutOfRange,
    }

    private static readonly double[] Table = [1.0, 2.0, 3.0];
    private readonly double scale;

    public Keeping(double scale)
    {
        this.scale = 0.0 < scale ? scale : 1.0;
    }

    public static Answer Lookup(double x, int index, out double value)
    {
        value = double.NaN;
        if (double.IsNaN(x) || double.IsPositiveInfinity(x))
        {
            return Answer.NotFinite;
        }
        if (!(x <= 10.0) || x < 0.0 || index < 0 || index > 2)
        {
            return Answer.OutOfRange;
        }
        long bits = BitConverter.DoubleToInt64Bits(x);
        uint low = (uint)bits;
        value = x == 0.0 ? Table[index] : x * Table[index] * ((bits >> 52) & 0x7ff) * ((low >> 3) & 1u);
        return Answer.Ok;
    }

    public double Scale(double x)
    {
        return x * scale;
    }
}
