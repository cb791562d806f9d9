namespace ProbeCal.Nano.Tests.Fixtures;

/// <summary>Divisions for the tests of the reviewed list.</summary>
public static class Divisions
{
    public static double ByConstant(double a)
    {
        return a / 3.0;
    }

    public static double ByArgument(double a, double b, double c)
    {
        return (a / b) + (a % c);
    }

    public static double ByZero(double a)
    {
        return a / 0.0;
    }
}
