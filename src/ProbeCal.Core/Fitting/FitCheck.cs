namespace ProbeCal;

/// <summary>What every fit asks of its points before it begins.</summary>
internal static class FitCheck
{
    internal static double Size(double value)
    {
        return value < 0.0 ? -value : value;
    }

    /// <summary>All finite.</summary>
    internal static Status Finite(double[] values)
    {
        for (int i = 0; i < values.Length; i++)
        {
            if (InputCheck.NotFinite(values[i])) { return Status.PointsNotFinite; }
        }

        return Status.Ok;
    }

    /// <summary>Observations and, where there are any, their uncertainties: as many, finite, above zero.</summary>
    internal static Status Observed(double[] observed, double[]? standardUncertainty, int parameters)
    {
        Status status = Finite(observed);
        if (status != Status.Ok) { return status; }
        if (standardUncertainty != null)
        {
            if (standardUncertainty.Length != observed.Length) { return Status.PointsAboveRange; }
            for (int i = 0; i < observed.Length; i++)
            {
                if (InputCheck.NotFinite(standardUncertainty[i])) { return Status.UncertaintyNotFinite; }
                if (standardUncertainty[i] <= 0.0) { return Status.UncertaintyBelowRange; }
            }
        }

        return observed.Length < parameters ? Status.PointsBelowRange : Status.Ok;
    }

    /// <summary>
    /// Uncertainties of both coordinates: not negative, not both zero, the correlation between −1 and 1; at ±1 the two would move together along a line
    /// of no width.
    /// </summary>
    internal static Status Both(double[] x, double[] xUncertainty, double[] y, double[] yUncertainty, double[]? correlation, int parameters)
    {
        Status status = Finite(x);
        if (status == Status.Ok) { status = Finite(y); }
        if (status != Status.Ok) { return status; }
        int count = x.Length;
        if (y.Length != count || xUncertainty.Length != count || yUncertainty.Length != count || (correlation != null && correlation.Length != count)) { return Status.PointsAboveRange; }
        for (int i = 0; i < count; i++)
        {
            double r = correlation == null ? 0.0 : correlation[i];
            if (InputCheck.NotFinite(xUncertainty[i]) || InputCheck.NotFinite(yUncertainty[i]) || InputCheck.NotFinite(r)) { return Status.UncertaintyNotFinite; }
            if (xUncertainty[i] < 0.0 || yUncertainty[i] < 0.0 || (xUncertainty[i] == 0.0 && yUncertainty[i] == 0.0)) { return Status.UncertaintyBelowRange; }
            if (r <= -1.0 || 1.0 <= r) { return Status.UncertaintyAboveRange; }
        }

        return count < parameters ? Status.PointsBelowRange : Status.Ok;
    }

    /// <summary>True when there are at least so many different values.</summary>
    internal static bool HasDifferent(double[] values, int wanted)
    {
        int found = 0;
        for (int i = 0; i < values.Length && found < wanted; i++)
        {
            bool seen = false;
            for (int j = 0; j < i && !seen; j++) { seen = values[j] == values[i]; }
            if (!seen) { found++; }
        }

        return wanted <= found;
    }
}
