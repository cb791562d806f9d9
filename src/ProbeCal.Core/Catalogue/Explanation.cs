using System;
using System.Collections.Generic;

namespace ProbeCal;

/// <summary>
/// The whole chain of one equilibrium value as a person would check it by hand. It is made by the very functions that give the value: they fill in their
/// steps, and the catalogue adds symbols, words, formulas and citations.
/// </summary>
public sealed class Explanation
{
    private readonly List<ExplainedStep> _steps = [];
    private readonly List<ExplanationSource> _sources = [];
    private readonly StepFormulas _formulas;
    private readonly Dictionary<string, double> _symbols = [];

    private Explanation(Gas gas, SolubilityEquation equation)
    {
        Gas = gas;
        Equation = equation;
        _formulas = new StepFormulas(gas, equation);
    }

    /// <summary>The gas.</summary>
    public Gas Gas { get; }

    /// <summary>The solubility equation.</summary>
    public SolubilityEquation Equation { get; }

    /// <summary>What became of the computation; where it is refused there are no steps.</summary>
    public Status Status { get; private set; }

    /// <summary>Everything on the way, in the order of computing; the last step is the result.</summary>
    public IReadOnlyList<ExplainedStep> Steps => _steps;

    /// <summary>The published sources that the steps name, in the order of their first use.</summary>
    public IReadOnlyList<ExplanationSource> Sources => _sources;

    /// <summary>Concentration in equilibrium with a gas phase: <c>GasEquilibrium.MilligramsPerLitre</c>.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    public static Explanation OfEquilibrium(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent,
        RangeRule rule)
    {
        Explanation explanation = new(gas, equation);
        CalculationSteps steps = new();
        explanation.Status = GasEquilibrium.MilligramsPerLitre(
            gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, rule, steps, out double value);
        explanation.Take(steps, value);
        return explanation;
    }

    /// <summary>Concentration from a given partial pressure: <c>GasEquilibrium.ConcentrationFromPartialPressure</c>.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of the gas, hPa.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    public static Explanation OfPartialPressure(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal, RangeRule rule)
    {
        Explanation explanation = new(gas, equation);
        CalculationSteps steps = new();
        explanation.Status = GasEquilibrium.ConcentrationFromPartialPressureSteps(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, steps, out double value);
        explanation.Take(steps, value);
        return explanation;
    }

    /// <summary>Partial pressure of the gas in water of a given concentration: <c>GasEquilibrium.PartialPressureFromConcentration</c>.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    public static Explanation OfConcentration(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double milligramsPerLitre, RangeRule rule)
    {
        Explanation explanation = new(gas, equation);
        CalculationSteps steps = new();
        explanation.Status = GasEquilibrium.PartialPressureFromConcentration(
            gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, steps, out double value);
        explanation.Take(steps, value);
        return explanation;
    }

    /// <summary>
    /// The same, and the saturation against a gas phase at the same pressure: 100 times the partial pressure in the water over that of the gas phase.
    /// </summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature (ITS-90), °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute total pressure, hPa.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    public static Explanation OfSaturation(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double milligramsPerLitre,
        double moleFraction, double humidityPercent, RangeRule rule)
    {
        Explanation explanation = OfConcentration(gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, rule);
        if (explanation._steps.Count == 0) { return explanation; }
        double inWater = explanation._steps[explanation._steps.Count - 1].Value;
        CalculationSteps steps = new();
        Status status = GasEquilibrium.PartialPressureSteps(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, rule, steps, out double inGasPhase);
        explanation.Status = InputCheck.Graver(explanation.Status, status);
        if (double.IsNaN(inGasPhase) || inGasPhase <= 0.0)
        {
            explanation._steps.Clear();
            explanation._sources.Clear();
            return explanation;
        }

        steps.Add(StepQuantity.PercentLocal, 100.0 * inWater / inGasPhase);
        explanation.Take(steps, inGasPhase);
        return explanation;
    }

    private void Take(CalculationSteps steps, double value)
    {
        if (double.IsNaN(value)) { return; }
        if (steps.Overflowed) { throw new InvalidOperationException("the chain has more steps than CalculationSteps.Capacity"); }
        for (int i = 0; i < steps.Count; i++)
        {
            Take(steps.QuantityAt(i), steps.ValueAt(i));
        }
    }

    private void Take(StepQuantity quantity, double value)
    {
        // The gas phase of a saturation has a partial pressure of its own, beside that of the water.
        bool ofGasPhase = quantity == StepQuantity.PartialPressureHectopascal && _symbols.ContainsKey("p");
        StepSymbols.Describe(quantity, out string symbol, out string name, out string unit);
        StepKind kind = StepSymbols.Kind(quantity);
        string formula = _formulas.Of(quantity);
        if (ofGasPhase)
        {
            symbol = "pe";
            name = "partial pressure in the gas phase";
            formula = StepFormulas.OfGasPhase;
        }

        // Two terms that need the same number each hand it out.
        if (_symbols.TryGetValue(symbol, out double known) && known.Equals(value)) { return; }
        // A power that an equation does without.
        bool isVoid = StepQuantity.CoefficientA0 <= quantity && value == 0.0;
        _formulas.Add(quantity, value);
        _symbols[symbol] = value;
        if (isVoid) { return; }
        if (quantity == StepQuantity.EquationValue) { unit = Catalogue.Solubility(Gas, Equation)?.Unit ?? ""; }
        if (quantity == StepQuantity.WetMoleFraction && !_symbols.ContainsKey("p")) { kind = StepKind.Iterated; }
        string source = SourceOf(quantity, kind);
        _steps.Add(new ExplainedStep(quantity, kind, symbol, name, unit, value, formula, kind == StepKind.Iterated ? formula : WithNumbers(formula), source));
    }

    private string SourceOf(StepQuantity quantity, StepKind kind)
    {
        if (kind == StepKind.Input) { return ""; }
        ExplanationSource? source = ExplanationSource.Of(quantity, Gas, Equation);
        if (source is null) { return ""; }
        foreach (ExplanationSource known in _sources)
        {
            if (known.Name == source.Name) { return source.Name; }
        }

        _sources.Add(source);
        return source.Name;
    }

    /// <summary>The formula with each symbol replaced by its number; a negative one in brackets.</summary>
    private string WithNumbers(string formula)
    {
        string text = "";
        int at = 0;
        while (at < formula.Length)
        {
            if (!char.IsLetter(formula[at]))
            {
                text += formula[at];
                at++;
                continue;
            }

            int end = at;
            while (end < formula.Length && (char.IsLetterOrDigit(formula[end]))) { end++; }
            string word = formula.Substring(at, end - at);
            // A minus may stand bare at the beginning of a sum, but not before a power.
            bool bare = (at == 0 || formula[at - 1] == '(') && (end == formula.Length || formula[end] != '^');
            text += _symbols.TryGetValue(word, out double value) ? Number(value, bare) : word;
            at = end;
        }

        return text;
    }

    private static string Number(double value, bool bare)
    {
        string number = CatalogueText.Number(value);
        return number[0] != '-' || bare ? number : "(" + number + ")";
    }
}
