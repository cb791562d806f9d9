namespace ProbeCal;

/// <summary>An axis brought to −1…1 over its points: z = (x − centre)/half.</summary>
internal readonly struct CentredAxis
{
    private CentredAxis(double centre, double half)
    {
        Centre = centre;
        Half = half;
    }

    /// <summary>The middle of the points.</summary>
    internal double Centre { get; }

    /// <summary>Half their width; 1 for points at one place.</summary>
    internal double Half { get; }

    internal static Status Of(double[] x, out CentredAxis axis)
    {
        double low = x[0];
        double high = x[0];
        for (int i = 1; i < x.Length; i++)
        {
            if (x[i] < low) { low = x[i]; }
            if (high < x[i]) { high = x[i]; }
        }

        double half = (0.5 * high) - (0.5 * low);
        axis = new CentredAxis(low + half, half == 0.0 ? 1.0 : half);
        return InputCheck.NotFinite(axis.Centre) ? Status.PointsAboveRange : Status.Ok;
    }

    internal double At(double x)
    {
        return (x - Centre) / Half;
    }

    /// <summary>1, z, z² … of each point, row by row.</summary>
    internal double[] Powers(double[] x, int degree)
    {
        double[] rows = new double[x.Length * (degree + 1)];
        for (int i = 0; i < x.Length; i++)
        {
            double z = At(x[i]);
            double power = 1.0;
            for (int k = 0; k <= degree; k++)
            {
                rows[(i * (degree + 1)) + k] = power;
                power *= z;
            }
        }

        return rows;
    }
}
