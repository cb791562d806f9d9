using System;
using System.Collections.Generic;
using System.Globalization;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// What water in equilibrium with a gas phase holds of one gas, in every unit, and, where something was measured in it, how far it is from there: each value
/// with its uncertainty.
/// </summary>
public sealed class GasAtEquilibrium
{
    /// <summary>
    /// The vapour formula's own relative standard uncertainty: the two behind the chain stay within 0.14 % of the reference formulation (docs/methods.md),
    /// taken as one standard uncertainty (our choice, on the safe side).
    /// </summary>
    public const double VapourRelative = 0.0014;

    private static readonly EquilibriumQuantity[] Equilibrium =
    [
        EquilibriumQuantity.MilligramsPerLitre, EquilibriumQuantity.MicromolesPerLitre, EquilibriumQuantity.MicromolesPerKilogram,
        EquilibriumQuantity.MillilitresPerLitre, EquilibriumQuantity.PartialPressure, EquilibriumQuantity.VapourPressure, EquilibriumQuantity.PercentOfOneAtmosphere,
    ];

    private static readonly EquilibriumQuantity[] Measurement =
    [
        EquilibriumQuantity.MeasuredMilligramsPerLitre, EquilibriumQuantity.MeasuredMicromolesPerLitre, EquilibriumQuantity.MeasuredMicromolesPerKilogram,
        EquilibriumQuantity.MeasuredMillilitresPerLitre, EquilibriumQuantity.MeasuredPartialPressure, EquilibriumQuantity.PercentLocal,
        EquilibriumQuantity.PercentOneAtmosphere, EquilibriumQuantity.ExcessMilligramsPerLitre,
    ];

    private readonly double[] _inputs;

    /// <summary>The inputs by their place in <see cref="EquilibriumInput"/>; NaN for those that the case has not.</summary>
    internal ReadOnlySpan<double> Inputs => _inputs;

    private readonly EquilibriumModel _model;
    private readonly Dictionary<EquilibriumQuantity, (EquilibriumResult Result, UncertaintyBudget Budget, EquilibriumInput[] Order)> _results = [];
    private readonly List<EquilibriumFlag> _flags = [];

    private GasAtEquilibrium(EquilibriumCase asked)
    {
        Asked = asked;
        _inputs = new double[(int)EquilibriumInput.Count];
        _inputs[(int)EquilibriumInput.Temperature] = asked.Temperature.Value;
        _inputs[(int)EquilibriumInput.Water] = asked.Water.Given.Value;
        _inputs[(int)EquilibriumInput.Pressure] = asked.Pressure.Value;
        _inputs[(int)EquilibriumInput.MoleFraction] = asked.Phase.MoleFraction.Value;
        _inputs[(int)EquilibriumInput.Humidity] = asked.Phase.HumidityPercent.Value;
        _inputs[(int)EquilibriumInput.PartialPressure] = asked.Phase.PartialPressureHectopascal.Value;
        _inputs[(int)EquilibriumInput.Concentration] = asked.Measured?.Given.Value ?? double.NaN;
        _inputs[(int)EquilibriumInput.ConductivityTemperature] = asked.Water.ConductivityTemperature?.Value ?? double.NaN;
        _inputs[(int)EquilibriumInput.SalinityRelation] = 0;
        _inputs[(int)EquilibriumInput.SaltingOut] = 1;
        _inputs[(int)EquilibriumInput.Equation] = 1;
        _inputs[(int)EquilibriumInput.Vapour] = 1;
        _model = new EquilibriumModel(asked);
    }

    /// <summary>What it was computed for.</summary>
    public EquilibriumCase Asked { get; }

    /// <summary>The equation's own relative standard uncertainty, a fraction, with what the edge of its range or a high pressure adds.</summary>
    public double EquationRelative { get; private set; }

    /// <summary>What was let pass.</summary>
    public IReadOnlyList<EquilibriumFlag> Flags => _flags;

    /// <summary>How the concentration at equilibrium (mg/L) answers to its conditions.</summary>
    public required EquilibriumSensitivities ConcentrationSensitivities { get; init; }

    /// <summary>How the partial pressure in the gas phase (hPa) answers to its conditions.</summary>
    public required EquilibriumSensitivities PartialPressureSensitivities { get; init; }

    /// <summary>What depth does to a probe; null when it is not asked for.</summary>
    public ProbeDepth? AtDepth { get; private init; }

    /// <summary>Where the equation holds.</summary>
    public EquationRange Range => EquationRange.Of(Asked.Gas, Asked.Equation, Asked.Water.Salinity);

    /// <summary>What the ions of a brine leave of the value of fresh water; null for any other water.</summary>
    public double? SaltingOutFactor
    {
        get
        {
            if (Asked.Water.Brine is not Brine brine)
            {
                return null;
            }

            brine.Factor(Asked.Gas, Asked.Temperature.Value, RangeRule.NearEdge, out double factor, out _);
            return factor;
        }
    }

    /// <summary>Relative standard uncertainty of <see cref="SaltingOutFactor"/>; 0 for any other water.</summary>
    public double SaltingOutRelative => Asked.Water.Brine?.RelativeUncertainty ?? 0;

    /// <summary>The quantities that there are, in the order in which they are printed.</summary>
    public IReadOnlyCollection<EquilibriumQuantity> Quantities => _results.Keys;

    /// <summary>A value, or null where the case has none of that kind.</summary>
    public EquilibriumResult? Find(EquilibriumQuantity quantity)
    {
        return _results.TryGetValue(quantity, out (EquilibriumResult Result, UncertaintyBudget, EquilibriumInput[]) found) ? found.Result : null;
    }

    /// <summary>A value that the case has.</summary>
    /// <exception cref="KeyNotFoundException">The case has none of that kind.</exception>
    public EquilibriumResult Value(EquilibriumQuantity quantity)
    {
        return _results[quantity].Result;
    }

    /// <summary>Computes it.</summary>
    /// <exception cref="InputException">A condition is outside the range of the equation by more than a near edge; nothing is extrapolated further.</exception>
    public static GasAtEquilibrium Compute(EquilibriumCase asked)
    {
        GasAtEquilibrium result = new(asked)
        {
            ConcentrationSensitivities = CoreSensitivities.OfConcentration(asked),
            PartialPressureSensitivities = CoreSensitivities.OfPartialPressure(asked),
            AtDepth = asked.DepthMetres is double metres ? ProbeDepth.Compute(asked.Gas, asked.Temperature.Value, asked.Water.Salinity, metres) : null,
        };
        Status edge = result.ComputeEquationUncertainty();
        EquilibriumGradients gradients = new(asked, result._inputs);
        foreach (EquilibriumQuantity quantity in Equilibrium)
        {
            if (result.Has(quantity))
            {
                result.Add(quantity, gradients);
            }
        }

        if (asked.Measured is not null)
        {
            foreach (EquilibriumQuantity quantity in Measurement)
            {
                if (result.Has(quantity))
                {
                    result.Add(quantity, gradients);
                }
            }
        }

        result.AddFlags(edge);
        return result;
    }

    /// <summary>Draws the inputs from the distributions of the budget and evaluates the full model (JCGM 101:2008).</summary>
    /// <param name="quantity">Which value.</param>
    /// <param name="trials">How many, from 1000.</param>
    /// <param name="seed">The same seed gives the same figures on every machine.</param>
    /// <param name="progress">Told now and then how many trials are done; may be null.</param>
    /// <param name="stop">Ends the run.</param>
    /// <exception cref="WorkFailedException">The model had a value in fewer than half of the trials.</exception>
    public EquilibriumCheck Check(EquilibriumQuantity quantity, int trials, int seed, Action<int>? progress, CancellationToken stop)
    {
        (_, UncertaintyBudget budget, EquilibriumInput[] order) = _results[quantity];
        double[] inputs = [.. _inputs];
        try
        {
            MonteCarloResult r = MonteCarlo.Run(
                budget,
                drawn =>
                {
                    for (int i = 0; i < order.Length; i++)
                    {
                        inputs[(int)order[i]] = drawn[i];
                    }

                    return _model.Value(quantity, inputs, RangeRule.Extrapolate, out Status _);
                },
                trials, new Random(seed), progress, stop);
            return new EquilibriumCheck(quantity, r.Trials, r.Refused, r.Mean, r.StandardDeviation, r.Low, r.High);
        }
        catch (InvalidOperationException none)
        {
            throw new WorkFailedException("the Monte Carlo check found no value in most of its trials: the stated uncertainties reach far outside what the equation takes (" + none.Message + ")", none);
        }
    }

    /// <summary>A given partial pressure knows of no other pressure, and of nothing there is no percentage.</summary>
    private bool HasPercentages => Asked.Phase.Kind != GasPhaseKind.PartialPressure && Value(EquilibriumQuantity.PartialPressure).Value != 0;

    private bool Has(EquilibriumQuantity quantity)
    {
        return quantity switch
        {
            EquilibriumQuantity.PercentLocal => Value(EquilibriumQuantity.PartialPressure).Value != 0,
            EquilibriumQuantity.PercentOneAtmosphere or EquilibriumQuantity.PercentOfOneAtmosphere => HasPercentages,
            EquilibriumQuantity.MicromolesPerKilogram or EquilibriumQuantity.MeasuredMicromolesPerKilogram => Asked.Water.Brine is null,
            _ => true,
        };
    }

    private Status ComputeEquationUncertainty()
    {
        Status status = GasUncertainty.EquationRelative(
            Asked.Gas, Asked.Equation, Asked.Temperature.Value, Asked.Water.Salinity, Asked.Pressure.Value, RangeRule.NearEdge, out double relative);
        EquilibriumRefusal.Expect(status, Asked);
        EquationRelative = relative;
        return status;
    }

    private void Add(EquilibriumQuantity quantity, EquilibriumGradients gradients)
    {
        double value = _model.Value(quantity, _inputs, RangeRule.NearEdge, out Status status);
        EquilibriumRefusal.Expect(status, Asked);
        if (!double.IsFinite(value))
        {
            throw new InputException($"there is no {EquilibriumUnits.Of(quantity)} of {GasNames.NameOf(Asked.Gas)} at these conditions: a number on the way is too large");
        }

        double[] slopes = gradients.Of(quantity);
        List<UncertaintyContribution> contributions = [];
        List<EquilibriumInput> order = [];
        foreach ((EquilibriumInput input, string name, string unit, UncertainQuantity known) in Known())
        {
            double slope = slopes[(int)input];
            if (slope != 0 && double.IsFinite(slope))
            {
                order.Add(input);
                contributions.Add(new UncertaintyContribution(
                    name, unit, known.Value, known.StandardUncertainty, known.IsRectangular ? Distribution.Rectangular : Distribution.Normal, slope));
            }
        }

        if (contributions.Count == 0)
        {
            // A value of nothing, such as 0 mg/L of a gas that is not there: it still has a budget, with nothing in it.
            order.Add(EquilibriumInput.Equation);
            contributions.Add(new UncertaintyContribution("equation", "", 1, EquationRelative, Distribution.Normal, 0));
        }

        UncertaintyBudget budget = BudgetOf(value, EquilibriumUnits.Of(quantity), contributions);
        List<EquilibriumPart> parts = [];
        foreach (UncertaintyContribution c in budget.Contributions)
        {
            parts.Add(new EquilibriumPart(c.Name, c.Unit, c.StandardUncertainty, c.Distribution == Distribution.Rectangular, c.Sensitivity, c.Part, c.Share));
        }

        EquilibriumResult result = new(
            quantity, value, budget.StandardUncertainty, budget.CoverageFactor, budget.Low, budget.High, parts, budget.Note);
        _results.Add(quantity, (result, budget, [.. order]));
    }

    private static UncertaintyBudget BudgetOf(double value, string unit, List<UncertaintyContribution> contributions)
    {
        try
        {
            return UncertaintyBudget.Of(value, unit, contributions);
        }
        catch (ArgumentException none)
        {
            throw new InputException(UncertainQuantity.TooLarge + " (" + none.Message + ")", none);
        }
    }

    /// <summary>Every input of the case with its name and how well it is known, in the order of the budgets.</summary>
    private IEnumerable<(EquilibriumInput Input, string Name, string Unit, UncertainQuantity Known)> Known()
    {
        yield return (EquilibriumInput.Temperature, "temperature", "K", Asked.Temperature);
        if (Asked.Water.Brine is Brine brine)
        {
            yield return (EquilibriumInput.SaltingOut, "salting-out constants", "", new UncertainQuantity(1, brine.RelativeUncertainty));
        }
        else
        {
            yield return (EquilibriumInput.Water, Asked.Water.GivenName, Asked.Water.GivenUnit, Asked.Water.Given);
        }

        if (Asked.Water.ConductivityTemperature is UncertainQuantity cell)
        {
            yield return (EquilibriumInput.ConductivityTemperature, "temperature of the conductivity", "K", cell);
        }

        if (Asked.Water.RelationUncertainty != 0)
        {
            yield return (EquilibriumInput.SalinityRelation, "salinity relation", "", new UncertainQuantity(0, Asked.Water.RelationUncertainty));
        }

        yield return (EquilibriumInput.Pressure, "pressure", "hPa", Asked.Pressure);
        if (Asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            yield return (EquilibriumInput.PartialPressure, "partial pressure", "hPa", Asked.Phase.PartialPressureHectopascal);
        }
        else
        {
            yield return (EquilibriumInput.MoleFraction, "mole fraction", "", Asked.Phase.MoleFraction);
            yield return (EquilibriumInput.Humidity, "humidity", "%", Asked.Phase.HumidityPercent);
        }

        if (Asked.Measured is MeasuredConcentration measured)
        {
            yield return (EquilibriumInput.Concentration, "concentration", measured.Kind.CanonicalUnit.Name, measured.Given);
        }

        yield return (EquilibriumInput.Equation, "equation", "", new UncertainQuantity(1, EquationRelative));
        yield return (EquilibriumInput.Vapour, "vapour formula", "", new UncertainQuantity(1, VapourRelative));
    }

    private void AddFlags(Status edge)
    {
        if (EquilibriumModel.IsNearEdge(edge))
        {
            _flags.Add(NearEdgeFlag(StatusParts.Reason(edge) == RefusalReason.JustBelowRange));
        }

        if (EquationRange.HighestMoistAirHectopascal < Asked.Pressure.Value)
        {
            _flags.Add(new EquilibriumFlag("fugacity", string.Create(CultureInfo.InvariantCulture,
                $"above {EquationRange.HighestMoistAirHectopascal} hPa (1.1 atm): computed with the fugacity of the gas and what the pressure does to the dissolved gas (Enns 1965)")));
        }

        if (Asked.Water.Brine is not null)
        {
            _flags.Add(new EquilibriumFlag("brine",
                "brine: the value of fresh water with what the ions drive out (Weisenberger and Schumpe 1996); vapour as over fresh water, density unknown, so nothing per kilogram"));
        }

        if (Asked.Gas == Gas.CarbonDioxide && Asked.Phase.FractionAssumed)
        {
            _flags.Add(new EquilibriumFlag("usual-fraction", string.Create(CultureInfo.InvariantCulture,
                $"the usual {Asked.Phase.MoleFraction.Value * 1e6:0.#} ppm of CO2 may be off by 50 ppm near the ground and the shore (from memory): --mole-fraction and --mole-fraction-uncertainty")));
        }

        if (Asked.PressureSource == "sea-level")
        {
            _flags.Add(new EquilibriumFlag("pressure-from-sea-level", string.Create(CultureInfo.InvariantCulture,
                $"pressure recovered from one reduced to sea level: second best, taken as ± {Asked.Pressure.StandardUncertainty:F1} hPa; a barometer is better")));
        }

        if (Asked.PressureSource == "altitude")
        {
            _flags.Add(new EquilibriumFlag("pressure-from-altitude", string.Create(CultureInfo.InvariantCulture,
                $"pressure from the altitude alone: second best, taken as ± {Asked.Pressure.StandardUncertainty} hPa; a barometer is better")));
        }
    }

    private EquilibriumFlag NearEdgeFlag(bool below)
    {
        EquationRange range = Range;
        double limit = below ? range.LowestCelsius : range.HighestCelsius;
        double outside = Math.Abs(Asked.Temperature.Value - limit);
        GasUncertainty.EquationRelative(
            Asked.Gas, Asked.Equation, limit, Asked.Water.Salinity, Asked.Pressure.Value, RangeRule.NearEdge, out double within);
        double added = Math.Sqrt(Math.Max(0, (EquationRelative * EquationRelative) - (within * within)));
        return new EquilibriumFlag(
            below ? "temperature-just-below-range" : "temperature-just-above-range",
            string.Create(CultureInfo.InvariantCulture,
                $"{outside:F2} K {(below ? "below" : "above")} the range of {EquationNames.NameOf(Asked.Equation)} ({range.Temperatures}); uncertainty enlarged by {100 * added:G2} %"));
    }
}
