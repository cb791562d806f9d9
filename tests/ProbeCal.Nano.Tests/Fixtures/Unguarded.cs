namespace ProbeCal.Nano.Tests.Fixtures;

/// <summary>Functions as they would stand in Core if somebody forgot the device.</summary>
public static class Unguarded
{
    public static double Quotient(double x, double y)
    {
        return x / y;
    }

    public static double Selected(double x, double y)
    {
        return x > y ? x : y;
    }

    public static double Equality(double x, double y)
    {
        return x == y ? 1.0 : 2.0;
    }

    public static double Whole(double x)
    {
        return (long)x;
    }

    public static int Cast(double x)
    {
        if (double.IsNaN(x) || x < 0.0 || 4294967295.0 < x)
        {
            return 0;
        }
        uint whole = (uint)x;
        return (int)(whole * 2654435761u) >> 3;
    }
}
