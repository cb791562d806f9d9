using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Characterising;

/// <summary>
/// The temperature coefficient from signals at known partial pressures: ln[(signal − zero)/p] = ln S + ln f(T), fitted in logarithms because a membrane's scatter grows with its signal.
/// </summary>
internal static class TemperaturePart
{
    internal const string Name = "temperature";

    /// <summary>Temperatures nearer than this are one level, K.</summary>
    private const double OneLevelKelvin = 1;

    private static readonly (string Name, TemperatureCoefficientForm? Form, int Terms)[] Forms =
    [
        ("exponential", TemperatureCoefficientForm.Exponential, 1), ("compound", TemperatureCoefficientForm.Compound, 1), ("linear", TemperatureCoefficientForm.Linear, 1),
        ("arrhenius", TemperatureCoefficientForm.Arrhenius, 1), ("polynomial-2", null, 2), ("polynomial-3", null, 3),
    ];

    /// <summary>The form of that name.</summary>
    /// <exception cref="InputException">There is none.</exception>
    internal static (string Name, TemperatureCoefficientForm? Form, int Terms) FormOf(string text)
    {
        string[] names = [.. Forms.Select(static each => each.Name)];
        int at = Array.IndexOf(names, text.ToLowerInvariant());
        return 0 <= at ? Forms[at] : throw Wrong.Input("--form", text, $"there is no such form{NearestName.DidYouMean(text, names)}; there are {string.Join(", ", names)}");
    }

    internal static CharacterisedPart Fit(LabRun run, string formText, double reference, ZeroSignal zero, out ProbeGain gain)
    {
        (string name, TemperatureCoefficientForm? form, int terms) = FormOf(formText);
        IReadOnlyList<LabRow> points = run.Points();
        int levels = Levels(points.Select(static point => point.Celsius));
        int least = terms + 2;
        if (levels < least)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: the {name} form needs at least {least} temperatures more than {OneLevelKelvin} K apart, and there {(levels == 1 ? "is 1" : $"are {levels}")}; add temperatures{(terms == 1 ? "" : " or fit a form with fewer coefficients")}"));
        }

        double[] parameters = Solve(run, points, form, terms, reference, zero.Value, out FitResult fit);
        double[] moved = zero.StandardUncertainty == 0 ? parameters : Solve(run, points, form, terms, reference, zero.Value + zero.StandardUncertainty, out _);
        int unknowns = terms + 1;
        double sensitivity = Math.Exp(parameters[0]);
        double[] covariance = new double[unknowns * unknowns];
        for (int i = 0; i < unknowns; i++)
        {
            for (int j = 0; j < unknowns; j++)
            {
                double ofZero = (moved[i] - parameters[i]) * (moved[j] - parameters[j]);
                covariance[(i * unknowns) + j] = (fit.Covariance(i, j) + ofZero) * (i == 0 ? sensitivity : 1) * (j == 0 ? sensitivity : 1);
            }
        }

        string perHectopascal = (run.SignalUnit.Length == 0 ? "1" : run.SignalUnit) + "/hPa";
        List<Estimate> estimates = [new("sensitivity", sensitivity, Math.Sqrt(covariance[0]), perHectopascal)];
        for (int k = 1; k < unknowns; k++)
        {
            string unit = form == TemperatureCoefficientForm.Arrhenius ? "J/mol" : k == 1 ? "1/K" : string.Create(CultureInfo.InvariantCulture, $"1/K{k}");
            estimates.Add(new(k == 1 ? "temperature-coefficient" : string.Create(CultureInfo.InvariantCulture, $"temperature-coefficient-{k}"), parameters[k], Math.Sqrt(covariance[(k * unknowns) + k]), unit));
        }

        gain = new ProbeGain(reference, form, parameters[1..]);
        return new CharacterisedPart
        {
            Part = Name,
            Model = string.Create(CultureInfo.InvariantCulture, $"signal = {Number.Significant(zero.Value, 5)} + S · f(T) · p, f {name}, 1 at {reference:R} C"),
            Parameters = estimates,
            Covariance = covariance,
            Rows = run.Rows.Count,
            Points = points.Count,
            DegreesOfFreedom = fit.DegreesOfFreedom,
            ResidualStandardDeviation = fit.ResidualStandardDeviation,
            ResidualUnit = "relative",
            CoverageFactor = Quantiles.StudentHalfWidth(0.95, fit.DegreesOfFreedom),
            LackOfFitProbability = LackOf(points, fit),
            Notes = ["zero: " + zero.Source],
        };
    }

    /// <summary>How many values are further apart than one level.</summary>
    internal static int Levels(IEnumerable<double> celsius)
    {
        return Grouped([.. celsius], OneLevelKelvin).Max();
    }

    /// <summary>Numbers the levels, from 1: a value that lies further than the width above the first of its level begins the next.</summary>
    internal static int[] Grouped(double[] values, double width)
    {
        int[] level = new int[values.Length];
        int number = 0;
        double first = double.NegativeInfinity;
        foreach (int i in Enumerable.Range(0, values.Length).OrderBy(i => values[i]))
        {
            if (!(values[i] <= first + width))
            {
                first = values[i];
                number++;
            }

            level[i] = number;
        }

        return level;
    }

    private static double? LackOf(IReadOnlyList<LabRow> points, FitResult fit)
    {
        int[] level = Grouped([.. points.Select(static point => point.Celsius)], OneLevelKelvin);
        return LackOfFit.Test(fit, level, null, out double f, out int lack, out int pure) == Status.Ok ? Quantiles.FisherAbove(f, lack, pure) : null;
    }

    private static double[] Solve(LabRun run, IReadOnlyList<LabRow> points, TemperatureCoefficientForm? form, int terms, double reference, double zero, out FitResult fit)
    {
        double[] y = new double[points.Count];
        double[] powers = new double[points.Count * (terms + 1)];
        for (int i = 0; i < y.Length; i++)
        {
            double net = (points[i].Signal - zero) / points[i].Hectopascal;
            if (!(0 < net) || double.IsInfinity(net))
            {
                throw new InputException($"{run.Name}: signal {Number.Print(points[i].Signal)} at {Number.Print(points[i].Celsius)} C and {Number.Significant(points[i].Hectopascal, 5)} hPa is not above the zero of {Number.Significant(zero, 5)}; check the zero, its unit and the partial pressure");
            }

            y[i] = Math.Log(net);
            double power = 1;
            for (int k = 0; k <= terms; k++)
            {
                powers[(i * (terms + 1)) + k] = power;
                power *= points[i].Celsius - reference;
            }
        }

        Require(run, LeastSquares.Linear(powers, terms + 1, y, null, out FitResult? straight));
        FitResult? found = straight;
        if (form is TemperatureCoefficientForm curved && curved != TemperatureCoefficientForm.Exponential)
        {
            Require(run, TemperatureCoefficient.FromRate(curved, straight!.Parameter(1), reference, out double start));
            Require(run, LevenbergMarquardt.Fit(Model(points, curved, reference), y, null, [straight.Parameter(0), start], out found));
        }

        fit = found!;
        double[] parameters = new double[terms + 1];
        for (int k = 0; k <= terms; k++)
        {
            parameters[k] = fit.Parameter(k);
        }

        return parameters;
    }

    private static FitModel Model(IReadOnlyList<LabRow> points, TemperatureCoefficientForm form, double reference)
    {
        return (parameters, values, jacobian) =>
        {
            for (int i = 0; i < values.Length; i++)
            {
                double celsius = points[i].Celsius;
                if (TemperatureCoefficient.Factor(form, parameters[1], reference, celsius, celsius, celsius, RangeRule.Refuse, out double factor) != Status.Ok
                    || TemperatureCoefficient.CoefficientDerivative(form, parameters[1], reference, celsius, out double per) != Status.Ok)
                {
                    return false;
                }

                values[i] = parameters[0] + Math.Log(factor);
                jacobian[2 * i] = 1;
                jacobian[(2 * i) + 1] = per;
            }

            return true;
        };
    }

    private static void Require(LabRun run, Status status)
    {
        if (status != Status.Ok)
        {
            throw new InputException($"{run.Name}: the temperature coefficient cannot be fitted ({status}); look at the signals, the temperatures and the partial pressures");
        }
    }
}
