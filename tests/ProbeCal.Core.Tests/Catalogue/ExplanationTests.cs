using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.CatalogueOfCore;

/// <summary>
/// The explanation is checked as a person would: every step is computed again from its formula text by an evaluator of its own, and the last step is
/// the value of the public function.
/// </summary>
public class ExplanationTests(ITestOutputHelper output)
{
    /// <summary>
    /// A step may differ from its text by twice the rounding bound of the text: Core adds up in another order (nested polynomials), with functions of its
    /// own that are within one unit in the last place, and its bound is no larger than that of the written-out sum.
    /// </summary>
    private const double Bounds = 2;

    /// <summary>What iteration leaves of a mole fraction: it goes on until nothing moves but the last digits.</summary>
    private const double OfIteration = 1e-13;

    private double _worst;
    private string _worstStep = "";
    private int _steps;
    private int _chains;

    [Fact]
    public void Every_step_of_every_equation_follows_from_its_formula()
    {
        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            int before = _chains;
            foreach (Conditions at in Grid(entry))
            {
                Explanation forward = Explanation.OfEquilibrium(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, at.Fraction, at.Humidity, RangeRule.Refuse);
                Status status = GasEquilibrium.MilligramsPerLitre(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, at.Fraction, at.Humidity, RangeRule.Refuse, out double value);
                Check(entry, at, forward, status, value);

                Explanation given = Explanation.OfPartialPressure(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, 0.7 * at.Hectopascal, RangeRule.Refuse);
                status = GasEquilibrium.ConcentrationFromPartialPressure(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, 0.7 * at.Hectopascal, RangeRule.Refuse, out double concentration);
                Check(entry, at, given, status, concentration);

                Explanation back = Explanation.OfConcentration(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, 0.9 * value, RangeRule.Refuse);
                status = GasEquilibrium.PartialPressureFromConcentration(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, 0.9 * value, RangeRule.Refuse, out double pressure);
                Check(entry, at, back, status, pressure);

                Explanation saturation = Explanation.OfSaturation(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, 0.9 * value, at.Fraction, at.Humidity, RangeRule.Refuse);
                GasEquilibrium.PartialPressure(entry.Gas, at.Celsius, at.Salinity, at.Hectopascal, at.Fraction, at.Humidity, RangeRule.Refuse, out double inGasPhase);
                Check(entry, at, saturation, status, 100.0 * pressure / inGasPhase);
            }

            Assert.True(before < _chains, entry.Source.Name + " of " + entry.Gas + ": no chain was made");
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{_chains} chains, {_steps} computed steps, worst {_worst:F2} rounding bounds ({_worstStep})"));
    }

    /// <summary>What the program tells people: ten digits at every step are enough for seven of the result.</summary>
    [Fact]
    public void Ten_digits_at_every_step_give_seven_of_the_result()
    {
        double worst = 0;
        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            foreach (Conditions at in Grid(entry))
            {
                Explanation explanation = Explanation.OfEquilibrium(entry.Gas, entry.Equation, at.Celsius, at.Salinity, at.Hectopascal, at.Fraction, at.Humidity, RangeRule.Refuse);
                Dictionary<string, double> symbols = [];
                foreach (ExplainedStep step in explanation.Steps)
                {
                    double value = step.Kind == StepKind.Computed ? FormulaEvaluator.Evaluate(step.Formula, symbols).Value : step.Value;
                    symbols[step.Symbol] = double.Parse(value.ToString("E9", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
                }

                ExplainedStep last = explanation.Steps[^1];
                worst = Math.Max(worst, Math.Abs((symbols[last.Symbol] / last.Value) - 1));
            }
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"ten digits at every step: {worst:E1} of the result at most"));
        Assert.True(worst < 0.5e-7, worst.ToString("E2", CultureInfo.InvariantCulture));
    }

    [Fact]
    public void Saturation_of_oxygen_is_the_percentage_of_the_probe()
    {
        Explanation explanation = Explanation.OfSaturation(
            Gas.Oxygen, SolubilityEquation.BensonKrause1984, 14.2, 0.0, 961.0, 8.1, DryAir.OxygenMoleFraction, 100.0, RangeRule.Refuse);
        OxygenEquilibrium.PartialPressureFromConcentration(SolubilityEquation.BensonKrause1984, 14.2, 0.0, 961.0, 8.1, RangeRule.Refuse, out double pressure);
        Saturation.PercentLocal(pressure, 14.2, 961.0, RangeRule.Refuse, out double percent);
        Assert.Equal(percent, explanation.Steps[^1].Value);
        Assert.Equal("sat", explanation.Steps[^1].Symbol);
    }

    [Fact]
    public void Numbers_put_in_give_the_same_as_symbols()
    {
        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            foreach (ExplainedStep step in Usual(entry, RangeRule.NearEdge).Steps.Where(static step => step.Kind == StepKind.Computed))
            {
                FormulaEvaluator.Bounded put = FormulaEvaluator.Evaluate(step.WithNumbers, new Dictionary<string, double>());
                Assert.True(Math.Abs(put.Value - step.Value) <= Bounds * put.Error, entry.Source.Name + ": " + step.Symbol + " = " + step.WithNumbers);
            }
        }
    }

    [Fact]
    public void Every_step_has_its_words_and_every_symbol_one_meaning()
    {
        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            Explanation explanation = Usual(entry, RangeRule.NearEdge);
            Assert.Equal(explanation.Steps.Count, explanation.Steps.Select(static step => step.Symbol).Distinct().Count());
            Assert.Contains(explanation.Sources, source => source.Name == entry.Source.Name);
            Assert.All(explanation.Steps, step =>
            {
                Assert.NotEqual("", step.Name);
                Assert.Matches("^\\p{L}+[0-9]*$", step.Symbol);
                Assert.Equal(step.Kind is StepKind.Computed or StepKind.Iterated, step.Formula.Length != 0);
                Assert.True(step.Source.Length == 0 || explanation.Sources.Any(source => source.Name == step.Source), step.Symbol);
            });
        }
    }

    [Fact]
    public void Refused_input_has_a_status_and_no_steps()
    {
        Explanation refused = Explanation.OfEquilibrium(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, 31.0, 0.0, 1013.25, 0.78, 100.0, RangeRule.NearEdge);
        Assert.Equal(Status.TemperatureAboveRange, refused.Status);
        Assert.Empty(refused.Steps);
        Explanation pair = Explanation.OfConcentration(Gas.Nitrogen, SolubilityEquation.Weiss1974, 20.0, 0.0, 1013.25, 1.0, RangeRule.Refuse);
        Assert.Equal(Status.EquationUnknown, pair.Status);
        Assert.Empty(pair.Steps);
    }

    /// <summary>A wrong text must not pass: each coefficient, sign and constant of a formula is changed in turn, and the step no longer follows.</summary>
    [Fact]
    public void A_formula_with_another_number_is_noticed()
    {
        ExplainedStep[] steps = [.. Usual(Catalogue.Solubility(Gas.CarbonDioxide, SolubilityEquation.Weiss1974)!, RangeRule.Refuse).Steps];
        ExplainedStep fugacity = steps.Single(static step => step.Quantity == StepQuantity.FugacityCoefficient);
        Dictionary<string, double> symbols = steps.ToDictionary(static step => step.Symbol, static step => step.Value);
        Assert.True(Misses(fugacity, fugacity.Formula, symbols) <= Bounds);
        foreach ((string right, string wrong) in new[] { ("2*", "1*"), ("82.05746", "82.057"), ("^2", "^1"), ("1 - y", "1 + y") })
        {
            Assert.Contains(right, fugacity.Formula, StringComparison.Ordinal);
            Assert.True(Bounds < Misses(fugacity, fugacity.Formula.Replace(right, wrong, StringComparison.Ordinal), symbols), wrong);
        }
    }

    private static Explanation Usual(SolubilityEntry entry, RangeRule rule)
    {
        double fraction = Catalogue.Gas(entry.Gas).DryAirMoleFraction;
        return Explanation.OfEquilibrium(
            entry.Gas, entry.Equation, 20.0, Math.Min(12.0, entry.HighestSalinity), 990.0, double.IsNaN(fraction) ? 1e-6 : fraction, 100.0, rule);
    }

    private void Check(SolubilityEntry entry, Conditions at, Explanation explanation, Status status, double value)
    {
        Assert.Equal(status, explanation.Status);
        if (double.IsNaN(value))
        {
            Assert.Empty(explanation.Steps);
            return;
        }

        _chains++;
        Assert.Equal(value, explanation.Steps[^1].Value);
        // Coefficients that are zero are not written, and no formula may miss them.
        Dictionary<string, double> symbols = [];
        Dictionary<string, double> all = explanation.Steps.ToDictionary(static step => step.Symbol, static step => step.Value);
        foreach (ExplainedStep step in explanation.Steps)
        {
            if (step.Kind == StepKind.Iterated)
            {
                double later = FormulaEvaluator.Evaluate(step.Formula, all).Value;
                Assert.True(Math.Abs(later - step.Value) <= OfIteration * Math.Abs(later), $"{entry.Source.Name} at {at}: {step.Symbol}");
            }
            else if (step.Kind == StepKind.Computed)
            {
                double misses = Misses(step, step.Formula, symbols);
                Assert.True(misses <= Bounds, string.Create(CultureInfo.InvariantCulture, $"{entry.Gas} {entry.Source.Name} at {at}: {step.Symbol} = {step.Formula} = {step.WithNumbers} is {step.Value:R}, off by {misses:G3} bounds"));
                _steps++;
                if (_worst < misses)
                {
                    _worst = misses;
                    _worstStep = entry.Source.Name + " " + step.Symbol;
                }
            }

            symbols[step.Symbol] = step.Value;
        }
    }

    /// <summary>Distance of a step from its text in rounding bounds of the text.</summary>
    private static double Misses(ExplainedStep step, string formula, Dictionary<string, double> symbols)
    {
        FormulaEvaluator.Bounded text = FormulaEvaluator.Evaluate(formula, symbols);
        double difference = Math.Abs(text.Value - step.Value);
        return difference == 0 ? 0 : difference / text.Error;
    }

    private readonly record struct Conditions(double Celsius, double Salinity, double Hectopascal, double Fraction, double Humidity);

    private static IEnumerable<Conditions> Grid(SolubilityEntry entry)
    {
        double usual = Catalogue.Gas(entry.Gas).DryAirMoleFraction;
        double fraction = double.IsNaN(usual) ? 1e-6 : usual;
        double[] salinities = entry.HighestSalinity == 0.0 ? [0.0] : [0.0, 0.4 * entry.HighestSalinity, entry.HighestSalinity];
        // Humid and dry, below and above 1.1 atm where the gas goes that far, the usual fraction and another.
        double[] pressures = entry.HighestHectopascal < 2000.0 ? [GasEquilibrium.LowestHectopascal, 870.0, 1013.25, 1110.0] : [GasEquilibrium.LowestHectopascal, 1013.25, 1110.0, 2500.0, 10000.0];
        foreach (double salinity in salinities)
        {
            double lowest = entry.LowestCelsius(salinity);
            foreach (double part in new[] { 0.0, 0.3, 0.62, 1.0 })
            {
                foreach (double pressure in pressures)
                {
                    yield return new Conditions(lowest + (part * (entry.HighestCelsius - lowest)), salinity, pressure, fraction, 100.0);
                    yield return new Conditions(lowest + (part * (entry.HighestCelsius - lowest)), salinity, pressure, 0.35, 40.0);
                }
            }
        }
    }
}
