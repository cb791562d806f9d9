using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The fit through any number of points: response = zero + g·(slope·x + curvature·x²), g the gain times the flow factor. The reference's own uncertainty counts; what is common to
/// several points (a barometer, a cylinder, a titrant) goes into the covariance of the result, not into the weights; the thermometer's offset and the temperature coefficient
/// stay apart, because readings share them.
/// </summary>
internal static class SeveralPoints
{
    internal const string Line = "line";
    internal const string Quadratic = "quadratic";

    private const string WeightedLeastSquares = "weighted-least-squares";
    private const string ErrorsInBoth = "errors-in-both";

    /// <summary>Points are taken at the surface, or in a bath: no water stands above the probe, dbar.</summary>
    private const double Surface = 0;

    /// <summary>Rounds in which the weights follow the slope; the third changes them by less than a thousandth.</summary>
    private const int Rounds = 6;

    private const double LnTen = 2.302585092994046;

    /// <summary>Models whose response may fall as the partial pressure rises.</summary>
    private static readonly string[] EitherSign = [ModelNames.Severinghaus, ModelNames.Linear, ModelNames.Quadratic];

    /// <summary>Fits, or says in one line why not.</summary>
    /// <param name="probe">The probe.</param>
    /// <param name="gas">The gas it answers to.</param>
    /// <param name="points">The points, each with its reference.</param>
    /// <param name="form"><see cref="Line"/> or <see cref="Quadratic"/>.</param>
    internal static (RecordedFit? Fit, string? Why) Of(RecordedProbe probe, Gas gas, IReadOnlyList<RecordedPoint> points, string form)
    {
        int degree = form switch
        {
            Line => 1,
            Quadratic => 2,
            _ => throw Wrong.Input("form of the fit", form, "there are line and quadratic" + NearestName.DidYouMean(form, [Line, Quadratic])),
        };
        if (points.Count < degree + 1)
        {
            return (null, string.Create(CultureInfo.InvariantCulture, $"a {form} has {degree + 1} unknowns and {(points.Count == 1 ? "there is 1 point" : $"there are {points.Count} points")}; take at least {degree + 1} at different levels"));
        }

        IProbeModel model = RecordConversion.Model(probe);
        bool logarithmic = model.IsLogarithmic;
        Point[] made = new Point[points.Count];
        for (int i = 0; i < made.Length; i++)
        {
            if (Point.Of(model, points[i], logarithmic, out made[i]) is string problem)
            {
                return (null, $"point '{points[i].Role}': {problem}");
            }
        }

        double[] parameters = new double[3];
        if (Solve(made, degree, parameters, out FitResult? fit) is string why)
        {
            return (null, why);
        }

        if (parameters[1] <= 0 && !EitherSign.Contains(probe.Model))
        {
            return (null, $"the response falls as the partial pressure rises (slope {Number.Significant(parameters[1], 4)}): a zero above the 100 % point, or points that were exchanged");
        }

        double low = made.Min(static point => point.Hectopascal);
        double high = made.Max(static point => point.Hectopascal);
        if (made.Any(point => 1 + (2 * parameters[2] / parameters[1] * point.X) <= 0))
        {
            return (null, $"the quadratic turns round between {Number.Significant(low, 4)} and {Number.Significant(high, 4)} hPa, so that one response would have two answers; fit a line, or look at the points");
        }

        return (Record(model, gas, points, made, parameters, fit!, degree, low, high), null);
    }

    private static string? Solve(Point[] points, int degree, double[] parameters, out FitResult? fit)
    {
        fit = null;
        double[] x = Each(points, static point => point.X);
        double[] ux = Each(points, static point => point.OwnX);
        double[] gain = Each(points, static point => point.Gain);
        double[] y = Each(points, static point => point.Response);
        // A first slope from the ends, so that what it weighs is of the right size from the start.
        Point lowest = points.MinBy(static point => point.X)!;
        Point highest = points.MaxBy(static point => point.X)!;
        if (lowest.X == highest.X)
        {
            return "all points have the same reference; take them at different levels";
        }

        parameters[1] = ((highest.Response / highest.Gain) - (lowest.Response / lowest.Gain)) / (highest.X - lowest.X);
        for (int round = 0; round < Rounds; round++)
        {
            double[] uy = Each(points, point => point.OwnResponse(parameters));
            for (int i = 0; i < points.Length; i++)
            {
                if (uy[i] == 0 && ux[i] == 0)
                {
                    return $"point '{points[i].Role}' has no uncertainty at all, neither of the signal nor of the reference, so that it cannot be weighed; state the resolution of the signal";
                }
            }

            Status status;
            if (degree == 1)
            {
                double[] scaled = [.. x.Zip(gain, static (value, g) => value * g)];
                double[] scaledU = [.. ux.Zip(gain, static (value, g) => value * g)];
                status = ProbeCal.ErrorsInBoth.Line(scaled, scaledU, y, uy, null, out PolynomialFit? line);
                fit = line?.Result;
            }
            else
            {
                status = ResponseFit.Fit(x, ux, gain, y, uy, degree, out fit);
            }

            if (status != Status.Ok)
            {
                return status == Status.PointsDegenerate
                    ? string.Create(CultureInfo.InvariantCulture, $"the points do not determine the fit: {degree + 1} different levels are needed, further apart than their uncertainties")
                    : $"the points cannot be fitted ({status})";
            }

            for (int k = 0; k <= degree; k++)
            {
                parameters[k] = fit!.Parameter(k);
            }
        }

        return null;
    }

    private static RecordedFit Record(
        IProbeModel model, Gas gas, IReadOnlyList<RecordedPoint> recorded, Point[] points, double[] parameters, FitResult fit, int degree, double low, double high)
    {
        int unknowns = degree + 1;
        Influence influence = new(points, parameters, fit);
        double[,] covariance = new double[3, 3];
        for (int i = 0; i < unknowns; i++)
        {
            for (int j = 0; j < unknowns; j++)
            {
                covariance[i, j] = fit.Covariance(i, j);
            }
        }

        foreach (double[] shift in influence.OfCommonInputs())
        {
            for (int i = 0; i < unknowns; i++)
            {
                for (int j = 0; j < unknowns; j++)
                {
                    covariance[i, j] += shift[i] * shift[j];
                }
            }
        }

        double squares = 0;
        for (int i = 0; i < points.Length; i++)
        {
            squares += fit.Residual(i) * fit.Residual(i);
        }

        int free = fit.DegreesOfFreedom;
        double[] ofLine = [covariance[0, 0], covariance[0, 1], covariance[1, 1]];
        return new RecordedFit
        {
            Form = degree == 1 ? Line : Quadratic,
            Method = points.Any(static point => point.OwnX != 0) ? ErrorsInBoth : WeightedLeastSquares,
            Zero = parameters[0],
            Slope = parameters[1],
            Curvature = parameters[2],
            Covariance = degree == 1 ? ofLine : [.. ofLine, covariance[0, 2], covariance[1, 2], covariance[2, 2]],
            PerThermometerKelvin = influence.Of(point => point.PerKelvin(parameters)),
            PerTemperatureCoefficient = influence.Of(point => point.PerCoefficient(parameters)),
            DegreesOfFreedom = free,
            ChiSquared = fit.ChiSquared,
            ResidualStandardDeviation = free == 0 ? null : Math.Sqrt(squares / free),
            ChiSquaredProbability = free == 0 ? null : Quantiles.ChiSquaredAbove(fit.ChiSquared, free),
            LackOfFit = LackOf(points, parameters, fit),
            LowestHectopascal = low,
            HighestHectopascal = high,
            Residuals = [.. points.Select((point, i) => Residual(model, gas, recorded[i], point, parameters, fit, i))],
        };
    }

    /// <summary>Points are repeats of one level when their references agree within twice their uncertainty.</summary>
    private static RecordedLackOfFit? LackOf(Point[] points, double[] parameters, FitResult fit)
    {
        int[] level = new int[points.Length];
        int number = 0;
        Point? first = null;
        foreach (int i in Enumerable.Range(0, points.Length).OrderBy(i => points[i].X))
        {
            if (first is null || 2 * Math.Sqrt((first.OwnX * first.OwnX) + (points[i].OwnX * points[i].OwnX)) < points[i].X - first.X)
            {
                first = points[i];
                number++;
            }

            level[i] = number;
        }

        double[] uncertainty = Each(points, point => point.Effective(parameters));
        return LackOfFit.Test(fit, level, uncertainty, out double f, out int lack, out int pure) == Status.Ok
            ? new RecordedLackOfFit(f, lack, pure, Quantiles.FisherAbove(f, lack, pure))
            : null;
    }

    private static RecordedResidual Residual(IProbeModel model, Gas gas, RecordedPoint recorded, Point point, double[] parameters, FitResult fit, int index)
    {
        double u = (point.Response - parameters[0]) / (point.Gain * parameters[1]);
        double bend = 1 + (4 * u * parameters[2] / parameters[1]);
        // Beyond the turning point of a quadratic there is no answer; the point then lies as far off as its residual says at the slope there.
        double x = 0 <= bend
            ? 2 * u / (1 + Math.Sqrt(bend))
            : point.X + (fit.Residual(index) / (point.Gain * point.SlopeAt(parameters)));
        double hectopascal = model.IsLogarithmic ? Math.Exp(x * LnTen) : x;
        double off = hectopascal - point.Hectopascal;
        double? milligrams = null;
        const double Some = 100;
        if (!model.IsTotalPressure && GasEquilibrium.ConcentrationFromPartialPressure(
            gas, GasDefaults.Equation(gas), recorded.Temperature.Value, recorded.Salinity.Value, recorded.Pressure.Value, Some, RangeRule.Refuse, out double concentration) == Status.Ok)
        {
            milligrams = off * concentration / Some;
        }

        double standardised = fit.StandardisedResidual(index);
        return new RecordedResidual(recorded.Role, point.Hectopascal, point.Response / point.Gain, off, milligrams, double.IsNaN(standardised) ? 0 : standardised);
    }

    private static double[] Each(Point[] points, Func<Point, double> of)
    {
        return [.. points.Select(of)];
    }

    /// <summary>What a change of the points does to the parameters: covariance · designᵀ · weights · change.</summary>
    private sealed class Influence(Point[] points, double[] parameters, FitResult fit)
    {
        /// <summary>Change of zero, slope and curvature for a change of each response.</summary>
        internal double[] Of(Func<Point, double> responseChange)
        {
            double[] sums = new double[3];
            foreach (Point point in points)
            {
                double weight = 1 / (point.Effective(parameters) * point.Effective(parameters));
                double change = responseChange(point) * weight;
                sums[0] += change;
                sums[1] += change * point.Gain * point.X;
                sums[2] += change * point.Gain * point.X * point.X;
            }

            double[] shift = new double[3];
            for (int i = 0; i < fit.ParameterCount; i++)
            {
                for (int j = 0; j < fit.ParameterCount; j++)
                {
                    shift[i] += fit.Covariance(i, j) * sums[j];
                }
            }

            return shift;
        }

        /// <summary>For one standard uncertainty of each input that several points may share.</summary>
        internal IEnumerable<double[]> OfCommonInputs()
        {
            foreach (string key in points.SelectMany(static point => point.Common.Keys).Distinct())
            {
                yield return Of(point => point.Common.TryGetValue(key, out double x) ? -point.Gain * point.SlopeAt(parameters) * x : 0);
            }
        }
    }

    /// <summary>One point brought onto the scale of the fit, its uncertainties sorted by what they are common to.</summary>
    private sealed class Point
    {
        private double _responsePerKelvin;
        private double _perKelvinGain;
        private double _perCoefficientGain;
        private double _referencePerKelvin;
        private double _temperature;
        private double _signal;

        internal required string Role { get; init; }

        internal double Hectopascal { get; private init; }

        /// <summary>The partial pressure, or log10 of it.</summary>
        internal double X { get; private init; }

        internal double Gain { get; private init; }

        internal double Response { get; private init; }

        /// <summary>What the reference is uncertain by at this point alone, temperature apart.</summary>
        internal double OwnX { get; private set; }

        /// <summary>Contributions to X that other points may share, by what they come from.</summary>
        internal Dictionary<string, double> Common { get; } = [];

        internal static string? Of(IProbeModel model, RecordedPoint recorded, bool logarithmic, out Point point)
        {
            point = null!;
            double celsius = recorded.Temperature.Value;
            Status status = model.Response(recorded.Signal.Mean, celsius, recorded.Pressure.Value, Surface, RangeRule.Refuse, out double response);
            double perSignal = double.NaN;
            double gain = double.NaN;
            if (status == Status.Ok) { status = model.ResponsePerSignal(recorded.Signal.Mean, celsius, recorded.Pressure.Value, Surface, RangeRule.Refuse, out perSignal); }
            if (status == Status.Ok) { status = model.Gain(celsius, RangeRule.Refuse, out gain); }
            double perKelvin = double.NaN;
            double perCoefficient = double.NaN;
            double responsePerKelvin = double.NaN;
            if (status == Status.Ok) { status = model.ResponsePerKelvin(recorded.Signal.Mean, celsius, Surface, out responsePerKelvin); }
            if (status == Status.Ok) { status = model.GainPerKelvin(celsius, out perKelvin); }
            if (status == Status.Ok) { status = model.GainPerCoefficient(celsius, out perCoefficient); }
            if (status != Status.Ok)
            {
                return $"its signal {Number.Print(recorded.Signal.Mean)} at {Number.Print(celsius)} C makes no response ({status})";
            }

            double hectopascal = recorded.ReferencePartialPressureHectopascal;
            if (logarithmic && hectopascal <= 0)
            {
                return $"its reference of {Number.Print(hectopascal)} hPa has no logarithm; this probe needs points above 0";
            }

            // The flow factor of a point in air has the ratio of air to water in it.
            double scale = gain * recorded.FlowFactor;
            double perX = logarithmic ? 1 / (hectopascal * LnTen) : 1;
            point = new Point
            {
                Role = recorded.Role,
                Hectopascal = hectopascal,
                X = logarithmic ? Math.Log10(hectopascal) : hectopascal,
                Gain = scale,
                Response = response,
                _signal = perSignal * recorded.SignalStandardUncertainty,
                _responsePerKelvin = responsePerKelvin,
                _perKelvinGain = perKelvin,
                _perCoefficientGain = model.CompensatesTemperature ? 0 : perCoefficient,
                _temperature = recorded.Temperature.StandardUncertainty,
            };
            point.Sort(recorded, perX);
            return null;
        }

        /// <summary>slope + 2·curvature·x.</summary>
        internal double SlopeAt(double[] parameters)
        {
            return parameters[1] + (2 * parameters[2] * X);
        }

        /// <summary>Response that the fit would miss by for one kelvin of the thermometer: through the response itself, the gain, and the reference.</summary>
        internal double PerKelvin(double[] parameters)
        {
            return _responsePerKelvin - (Gain * ((_perKelvinGain * ((parameters[1] * X) + (parameters[2] * X * X))) + (SlopeAt(parameters) * _referencePerKelvin)));
        }

        internal double PerCoefficient(double[] parameters)
        {
            return -Gain * _perCoefficientGain * ((parameters[1] * X) + (parameters[2] * X * X));
        }

        /// <summary>Standard uncertainty of the response at this point alone, its own temperature counted in.</summary>
        internal double OwnResponse(double[] parameters)
        {
            double warm = PerKelvin(parameters) * _temperature;
            return Math.Sqrt((_signal * _signal) + (warm * warm));
        }

        /// <summary>The same with that of the reference.</summary>
        internal double Effective(double[] parameters)
        {
            double along = Gain * SlopeAt(parameters) * OwnX;
            double across = OwnResponse(parameters);
            return Math.Sqrt((along * along) + (across * across));
        }

        /// <summary>Sorts the budget of the reference. Without one all of it is taken as the point's own, which is so for points of different methods.</summary>
        private void Sort(RecordedPoint recorded, double perX)
        {
            RecordedReferenceContribution[] budget = recorded.Reference?.Budget ?? [];
            if (budget.Length == 0)
            {
                OwnX = recorded.ReferencePartialPressureUncertaintyHectopascal * perX;
                return;
            }

            double squares = 0;
            foreach (RecordedReferenceContribution input in budget)
            {
                double part = input.Hectopascal * perX;
                if (input.Input is ReferenceInputs.ThermometerOffset or ReferenceInputs.Temperature)
                {
                    _referencePerKelvin = part / input.StandardUncertainty;
                }
                else if (ReferenceInputs.IsCommon(input.Input))
                {
                    string key = input.Input + "|" + input.Source;
                    Common[key] = Common.GetValueOrDefault(key) + part;
                }
                else
                {
                    squares += part * part;
                }
            }

            OwnX = Math.Sqrt(squares);
        }
    }
}
