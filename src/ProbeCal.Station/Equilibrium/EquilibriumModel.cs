using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// The full model from inputs to values, by Core alone and without any sensitivity: it yields the values themselves and, with drawn inputs, the trials of
/// the Monte Carlo check.
/// </summary>
internal sealed class EquilibriumModel(EquilibriumCase asked)
{
    private const double OneAtmosphere = PressureUnits.HectopascalPerAtmosphere;

    /// <summary>One value of given inputs.</summary>
    /// <param name="quantity">Which value.</param>
    /// <param name="inputs">The inputs by their place in <see cref="EquilibriumInput"/>.</param>
    /// <param name="rule">Near edge for the value itself; extrapolate for trials, which may fall outside a range.</param>
    /// <param name="status">The gravest finding on the way.</param>
    /// <returns>The value; NaN where there is none.</returns>
    internal double Value(EquilibriumQuantity quantity, ReadOnlySpan<double> inputs, RangeRule rule, out Status status)
    {
        double salinity = Salinity(asked, inputs);
        if (0 <= salinity || rule != RangeRule.Extrapolate)
        {
            return ValueAt(quantity, salinity, inputs, rule, out status);
        }

        // A trial about fresh water draws salinities below 0, where the density has no value: what salt takes away on the one side it adds on the other.
        double fresh = ValueAt(quantity, 0, inputs, rule, out status);
        return (2 * fresh) - ValueAt(quantity, -salinity, inputs, rule, out status);
    }

    /// <summary>The salinity of the water by what it is got from.</summary>
    internal static double Salinity(EquilibriumCase asked, ReadOnlySpan<double> inputs)
    {
        double celsius = inputs[(int)(asked.Water.ConductivityTemperature is null ? EquilibriumInput.Temperature : EquilibriumInput.ConductivityTemperature)];
        return asked.Water.SalinityOf(inputs[(int)EquilibriumInput.Water], celsius) + inputs[(int)EquilibriumInput.SalinityRelation];
    }

    private double ValueAt(EquilibriumQuantity quantity, double salinity, ReadOnlySpan<double> inputs, RangeRule rule, out Status status)
    {
        Point at = new(asked, salinity, inputs, rule);
        double value = quantity switch
        {
            EquilibriumQuantity.VapourPressure => at.Vapour(),
            EquilibriumQuantity.PartialPressure => at.PartialPressure(inputs[(int)EquilibriumInput.Pressure]),
            EquilibriumQuantity.MilligramsPerLitre => at.Milligrams(),
            EquilibriumQuantity.MicromolesPerLitre => GasUnits.MicromolesPerLitreFromMilligramsPerLitre(asked.Gas, at.Milligrams()),
            EquilibriumQuantity.MicromolesPerKilogram => at.PerKilogram(at.Milligrams()),
            EquilibriumQuantity.MillilitresPerLitre => GasUnits.MillilitresPerLitreFromMilligramsPerLitre(asked.Gas, at.Milligrams()),
            EquilibriumQuantity.PercentOfOneAtmosphere => 100 * at.PartialPressure(inputs[(int)EquilibriumInput.Pressure]) / at.PartialPressure(OneAtmosphere),
            EquilibriumQuantity.MeasuredMilligramsPerLitre => at.Measured(),
            EquilibriumQuantity.MeasuredMicromolesPerLitre => GasUnits.MicromolesPerLitreFromMilligramsPerLitre(asked.Gas, at.Measured()),
            EquilibriumQuantity.MeasuredMicromolesPerKilogram => at.PerKilogram(at.Measured()),
            EquilibriumQuantity.MeasuredMillilitresPerLitre => GasUnits.MillilitresPerLitreFromMilligramsPerLitre(asked.Gas, at.Measured()),
            EquilibriumQuantity.MeasuredPartialPressure => at.MeasuredPartialPressure(),
            EquilibriumQuantity.PercentLocal => 100 * at.MeasuredPartialPressure() / at.PartialPressure(inputs[(int)EquilibriumInput.Pressure]),
            EquilibriumQuantity.PercentOneAtmosphere => 100 * at.MeasuredPartialPressure() / at.PartialPressure(OneAtmosphere),
            EquilibriumQuantity.ExcessMilligramsPerLitre => at.Measured() - at.Milligrams(),
            _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
        };
        status = at.Status;
        return value;
    }

    /// <summary>The water and the gas phase of one evaluation, and what Core found wrong with them.</summary>
    private ref struct Point(EquilibriumCase asked, double salinity, ReadOnlySpan<double> inputs, RangeRule rule)
    {
        private readonly double _celsius = inputs[(int)EquilibriumInput.Temperature];
        private readonly double _pressure = inputs[(int)EquilibriumInput.Pressure];
        private readonly ReadOnlySpan<double> _inputs = inputs;

        internal Status Status { get; private set; }

        /// <summary>
        /// Of the two a person would want to hear about: the first that is more than a near edge. A NaN from any of them travels with the value.
        /// </summary>
        private double Noted(Status found, double value)
        {
            if (Status == Status.Ok || (IsNearEdge(Status) && found != Status.Ok && !IsNearEdge(found)))
            {
                Status = found;
            }

            return value;
        }

        /// <summary>
        /// The vapour that Core's chain takes: over fresh water for oxygen, over the salt water for the others. What is out of its range at a cold edge is
        /// continued as the chain does; the equation has judged the water before.
        /// </summary>
        internal double Vapour()
        {
            double vapour;
            if (asked.Gas == Gas.Oxygen)
            {
                VapourBensonKrause1980.Pressure(_celsius, RangeRule.Extrapolate, out vapour);
            }
            else
            {
                VapourWeissPrice1980.Pressure(_celsius, salinity, RangeRule.Extrapolate, out vapour);
            }

            return vapour * _inputs[(int)EquilibriumInput.Vapour];
        }

        internal double PartialPressure(double pressure)
        {
            if (asked.Phase.Kind == GasPhaseKind.PartialPressure)
            {
                return _inputs[(int)EquilibriumInput.PartialPressure];
            }

            double fraction = _inputs[(int)EquilibriumInput.MoleFraction];
            double humidity = _inputs[(int)EquilibriumInput.Humidity];
            Status found = GasEquilibrium.PartialPressure(asked.Gas, _celsius, salinity, pressure, fraction, humidity, rule, out double value);
            double error = _inputs[(int)EquilibriumInput.Vapour] - 1;
            return error == 0 ? Noted(found, value) : Noted(found, value) - (((fraction * pressure) - value) * error);
        }

        internal double Milligrams()
        {
            Status found = asked.Phase.Kind == GasPhaseKind.PartialPressure
                ? GasEquilibrium.ConcentrationFromPartialPressure(
                    asked.Gas, asked.Equation, _celsius, salinity, _pressure, _inputs[(int)EquilibriumInput.PartialPressure], rule, out double value)
                : GasEquilibrium.MilligramsPerLitre(
                    asked.Gas, asked.Equation, _celsius, salinity, _pressure, _inputs[(int)EquilibriumInput.MoleFraction],
                    _inputs[(int)EquilibriumInput.Humidity], rule, out value);
            return Noted(found, value * _inputs[(int)EquilibriumInput.Equation] * SaltingOut());
        }

        /// <summary>What the ions of a brine leave of the value of fresh water; 1 for any other water.</summary>
        private double SaltingOut()
        {
            if (asked.Water.Brine is not Brine brine)
            {
                return 1;
            }

            Status found = brine.Factor(asked.Gas, _celsius, rule, out double factor, out _);
            return Noted(found, factor) * _inputs[(int)EquilibriumInput.SaltingOut];
        }

        internal double Measured()
        {
            double given = _inputs[(int)EquilibriumInput.Concentration];
            QuantityKind kind = asked.Measured!.Kind;
            return MeasuredConcentration.MilligramsPerLitre(asked.Gas, kind, given, kind == QuantityKind.AmountPerKilogram ? Density() : double.NaN);
        }

        internal double MeasuredPartialPressure()
        {
            Status found = GasEquilibrium.PartialPressureFromConcentration(
                asked.Gas, asked.Equation, _celsius, salinity, _pressure, Measured() / _inputs[(int)EquilibriumInput.Equation] / SaltingOut(), rule, out double value);
            return Noted(found, value);
        }

        internal double PerKilogram(double milligrams)
        {
            // Core divides in this order for oxygen; the same bits matter to those who compare.
            return GasUnits.MicromolesPerLitreFromMilligramsPerLitre(asked.Gas, milligrams) * 1000 / Density();
        }

        private double Density()
        {
            return Noted(DensityEos80.Density(_celsius, salinity, rule, out double density), density);
        }
    }

    /// <summary>True for a temperature just outside a range.</summary>
    internal static bool IsNearEdge(Status status)
    {
        return StatusParts.Reason(status) is RefusalReason.JustBelowRange or RefusalReason.JustAboveRange;
    }
}
