using System;
using System.Collections.Generic;
using System.Threading;

namespace ProbeCal.Station.Uncertainty;

/// <summary>The full model of a value: the inputs of its budget, in the budget's order, to the value. NaN where the model has none.</summary>
/// <param name="inputs">The inputs.</param>
internal delegate double MonteCarloModel(ReadOnlySpan<double> inputs);

/// <summary>What the trials gave.</summary>
/// <param name="Trials">How many were drawn.</param>
/// <param name="Refused">Trials in which the model had no value; they are left out of the rest.</param>
/// <param name="Mean">Mean of the values.</param>
/// <param name="StandardDeviation">Their standard deviation, an estimate of the standard uncertainty.</param>
/// <param name="Low">Low end of the probabilistically symmetric interval that holds 95 % of them.</param>
/// <param name="High">High end of it.</param>
internal sealed record MonteCarloResult(int Trials, int Refused, double Mean, double StandardDeviation, double Low, double High);

/// <summary>
/// Propagation of distributions (JCGM 101:2008): draws the inputs from the distributions that a budget states, evaluates the full model, and reads the interval off
/// the sorted values. It knows no sensitivity, so that it judges the analytic budget. A seed gives the same figures on every machine.
/// </summary>
internal static class MonteCarlo
{
    /// <summary>The trials that JCGM 101 (7.2.2) advises for 95 % to one or two digits.</summary>
    public const int UsualTrials = 1_000_000;

    /// <summary>Fewest trials that still have a 2.5 % tail worth the name.</summary>
    public const int FewestTrials = 1_000;

    private const int ReportEvery = 10_000;
    private const double Level = 0.95;
    private const double SqrtOfThree = 1.7320508075688772;

    /// <summary>Draws and evaluates.</summary>
    /// <param name="budget">States the inputs and their distributions.</param>
    /// <param name="model">The full model.</param>
    /// <param name="trials">How many, from <see cref="FewestTrials"/>.</param>
    /// <param name="random">The seeded source of randomness.</param>
    /// <param name="progress">Told now and then how many trials are done; may be null.</param>
    /// <param name="cancellation">Ends the run.</param>
    /// <exception cref="ArgumentOutOfRangeException">Fewer trials than <see cref="FewestTrials"/>.</exception>
    /// <exception cref="InvalidOperationException">The model had a value in fewer than half of the trials.</exception>
    /// <exception cref="OperationCanceledException">The run was ended.</exception>
    public static MonteCarloResult Run(
        UncertaintyBudget budget, MonteCarloModel model, int trials, Random random, Action<int>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(trials, FewestTrials);
        IReadOnlyList<UncertaintyContribution> inputs = budget.Contributions;
        double[] drawn = new double[inputs.Count];
        double[] values = new double[trials];
        Gaussian gaussian = new(random);
        int count = 0;
        for (int trial = 1; trial <= trials; trial++)
        {
            for (int i = 0; i < drawn.Length; i++)
            {
                drawn[i] = inputs[i].Estimate + (inputs[i].StandardUncertainty * Deviate(inputs[i], gaussian, random));
            }

            double value = model(drawn);
            if (double.IsFinite(value))
            {
                values[count++] = value;
            }

            if (trial % ReportEvery == 0)
            {
                cancellation.ThrowIfCancellationRequested();
                progress?.Invoke(trial);
            }
        }

        if (2 * (long)count < trials)
        {
            throw new InvalidOperationException($"the model had no value in {trials - count} of {trials} trials");
        }

        return Summary(values.AsSpan(0, count), trials);
    }

    private static MonteCarloResult Summary(Span<double> values, int trials)
    {
        values.Sort();
        int count = values.Length;
        // Sums of differences from the middle value: nothing cancels where the spread is small beside the value.
        double middle = values[count / 2];
        double sum = 0.0;
        double squares = 0.0;
        foreach (double value in values)
        {
            double difference = value - middle;
            sum += difference;
            squares += difference * difference;
        }

        double mean = sum / count;
        double variance = (squares - (sum * mean)) / (count - 1);
        // JCGM 101, 7.7.2, which counts from 1: q of the values lie between y(r) and y(r + q), as many below as above.
        int q = (int)((Level * count) + 0.5);
        int r = (count - q + 1) / 2;
        return new MonteCarloResult(
            trials, trials - count, middle + mean, Numerics.Sqrt(Math.Max(0.0, variance)), values[r - 1], values[r + q - 1]);
    }

    private static double Deviate(UncertaintyContribution input, Gaussian gaussian, Random random)
    {
        if (input.StandardUncertainty == 0.0)
        {
            return 0.0;
        }

        return input.Distribution == Distribution.Normal ? gaussian.Next() : SqrtOfThree * ((2.0 * random.NextDouble()) - 1.0);
    }

    /// <summary>Normal numbers by the polar method, two at a time, with Core's own logarithm and root: the same bits everywhere.</summary>
    private sealed class Gaussian(Random random)
    {
        private double _second;
        private bool _hasSecond;

        internal double Next()
        {
            if (_hasSecond)
            {
                _hasSecond = false;
                return _second;
            }

            double x;
            double y;
            double square;
            do
            {
                x = (2.0 * random.NextDouble()) - 1.0;
                y = (2.0 * random.NextDouble()) - 1.0;
                square = (x * x) + (y * y);
            }
            while (1.0 <= square || square == 0.0);

            double factor = Numerics.Sqrt(-2.0 * Numerics.Ln(square) / square);
            _second = y * factor;
            _hasSecond = true;
            return x * factor;
        }
    }
}
