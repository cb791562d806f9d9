using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Reports;

/// <summary>
/// A straight line through the values of one membrane, weighted by their uncertainties. Where they scatter more than their
/// uncertainties say, the covariance is widened by chi-squared over its degrees of freedom (Birge ratio); it is never made
/// narrower. Intervals are 95 % by Student's t.
/// </summary>
internal sealed class HistoryTrend
{
    /// <summary>Two points always lie on a line; the third is the first to say anything about it.</summary>
    internal const int FewestPoints = 3;

    /// <summary>Farther off nothing is said: no membrane lasts so long.</summary>
    internal const double FarthestDays = 50 * 365.25;

    private const double Level = 0.95;

    private readonly PolynomialFit _fit;
    private readonly double _widening;
    private readonly double _newVariance;
    private readonly double _coverage;

    private HistoryTrend(PolynomialFit fit, double newVariance, IReadOnlyList<(double Day, HistoryValue Value)> points)
    {
        _fit = fit;
        FitResult result = fit.Result;
        _widening = result.IsWeighted ? Math.Max(1, result.ChiSquared / result.DegreesOfFreedom) : 1;
        _newVariance = newVariance * _widening;
        _coverage = Quantiles.StudentHalfWidth(Level, result.DegreesOfFreedom);
        FirstDay = points.Min(static point => point.Day);
        LastDay = points.Max(static point => point.Day);
        PerDay = fit.SlopeAt(LastDay);
        PerDayUncertainty = Math.Sqrt(_widening * result.Covariance(1, 1));
    }

    /// <summary>Day of the first value.</summary>
    internal double FirstDay { get; }

    /// <summary>Day of the last value.</summary>
    internal double LastDay { get; }

    /// <summary>Change a day.</summary>
    internal double PerDay { get; }

    /// <summary>Its standard uncertainty.</summary>
    internal double PerDayUncertainty { get; }

    /// <summary>Half the width of its 95 % interval.</summary>
    internal double PerDayHalfWidth => _coverage * PerDayUncertainty;

    /// <summary>True when the 95 % interval of the change does not hold zero.</summary>
    internal bool IsSignificant => PerDayHalfWidth < Math.Abs(PerDay);

    /// <summary>Fits the line; null for fewer than three values or all of one time.</summary>
    internal static HistoryTrend? Of(IReadOnlyList<(double Day, HistoryValue Value)> points)
    {
        if (points.Count < FewestPoints)
        {
            return null;
        }

        double[] days = [.. points.Select(static point => point.Day)];
        double[] values = [.. points.Select(static point => point.Value.Value)];
        double[]? uncertainties = points.All(static point => 0 < point.Value.StandardUncertainty) ? [.. points.Select(static point => point.Value.StandardUncertainty)] : null;
        if (LeastSquares.Polynomial(days, values, uncertainties, 1, out PolynomialFit? fit) != Status.Ok || fit is null)
        {
            return null;
        }

        double spread = fit.Result.ResidualStandardDeviation;
        double newVariance = uncertainties is null ? spread * spread : uncertainties.Average(static u => u * u);
        return new HistoryTrend(fit, newVariance, points);
    }

    /// <summary>The line on a day.</summary>
    internal double At(double day)
    {
        return _fit.Value(day);
    }

    /// <summary>Half the width of the interval that holds a new calibration on a day with 95 %.</summary>
    internal double PredictionHalfWidth(double day)
    {
        return _coverage * Math.Sqrt((_widening * _fit.Variance(day)) + _newVariance);
    }

    /// <summary>When the line leaves a window, and between which days a calibration will be the first to find it outside.</summary>
    /// <returns>Null when the change is not significant: then nothing can be said.</returns>
    internal HistoryLeaving? Leaves(HistoryWindow window)
    {
        if (!IsSignificant)
        {
            return null;
        }

        double bound = 0 < PerDay ? window.High : window.Low;
        double sign = Math.Sign(PerDay);
        return new HistoryLeaving(
            bound,
            FirstBeyond(day => sign * (At(day) - bound)),
            FirstBeyond(day => (sign * (At(day) - bound)) + PredictionHalfWidth(day)),
            FirstBeyond(day => (sign * (At(day) - bound)) - PredictionHalfWidth(day)));
    }

    /// <summary>
    /// The first day from the last value on at which a growing function is not below zero: all three grow once the change is
    /// significant. Infinity when it is farther off than anything is said about.
    /// </summary>
    private double FirstBeyond(Func<double, double> beyond)
    {
        double low = LastDay;
        double high = LastDay + FarthestDays;
        if (0 <= beyond(low))
        {
            return low;
        }

        if (beyond(high) < 0)
        {
            return double.PositiveInfinity;
        }

        // Fifty halvings of fifty years leave far less than a second.
        for (int i = 0; i < 50; i++)
        {
            double middle = 0.5 * (low + high);
            if (beyond(middle) < 0)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return high;
    }
}

/// <summary>When a trend leaves its window, in days since 1970; infinity for later than is said.</summary>
/// <param name="Bound">The end of the window that it goes to.</param>
/// <param name="Expected">When the line is there; the day of the last value when it is there already.</param>
/// <param name="Earliest">From when on a new calibration may find it outside (2.5 % of them).</param>
/// <param name="Latest">From when on nearly every one will (97.5 %).</param>
internal sealed record HistoryLeaving(double Bound, double Expected, double Earliest, double Latest);
