using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// How every value answers to every input, from Core's analytic sensitivities and the rules of differentiation. A test holds it against
/// differences of <see cref="EquilibriumModel"/>.
/// </summary>
internal sealed class EquilibriumGradients
{
    private const double OneAtmosphere = PressureUnits.HectopascalPerAtmosphere;
    private const int Inputs = (int)EquilibriumInput.Count;
    private const RangeRule NearEdge = RangeRule.NearEdge;

    private readonly EquilibriumCase _asked;
    private readonly double[] _inputs;
    private readonly double _celsius;
    private readonly double _salinity;
    private readonly double _pressure;

    internal EquilibriumGradients(EquilibriumCase asked, double[] inputs)
    {
        _asked = asked;
        _inputs = inputs;
        _celsius = inputs[(int)EquilibriumInput.Temperature];
        _salinity = EquilibriumModel.Salinity(asked, inputs);
        _pressure = inputs[(int)EquilibriumInput.Pressure];
    }

    /// <summary>The derivatives of one value by the inputs, each at its place.</summary>
    internal double[] Of(EquilibriumQuantity quantity)
    {
        return quantity switch
        {
            EquilibriumQuantity.VapourPressure => Vapour().Slopes,
            EquilibriumQuantity.PartialPressure => PartialPressure(_pressure, true).Slopes,
            EquilibriumQuantity.MilligramsPerLitre => Milligrams().Slopes,
            EquilibriumQuantity.MicromolesPerLitre => Times(Milligrams(), GasUnits.MicromolesPerLitreFromMilligramsPerLitre(_asked.Gas, 1)).Slopes,
            EquilibriumQuantity.MicromolesPerKilogram => PerKilogram(Milligrams()).Slopes,
            EquilibriumQuantity.MillilitresPerLitre => Times(Milligrams(), GasUnits.MillilitresPerLitreFromMilligramsPerLitre(_asked.Gas, 1)).Slopes,
            EquilibriumQuantity.PercentOfOneAtmosphere => Times(Over(PartialPressure(_pressure, true), PartialPressure(OneAtmosphere, false)), 100).Slopes,
            EquilibriumQuantity.MeasuredMilligramsPerLitre => Measured().Slopes,
            EquilibriumQuantity.MeasuredMicromolesPerLitre => Times(Measured(), GasUnits.MicromolesPerLitreFromMilligramsPerLitre(_asked.Gas, 1)).Slopes,
            EquilibriumQuantity.MeasuredMicromolesPerKilogram => PerKilogram(Measured()).Slopes,
            EquilibriumQuantity.MeasuredMillilitresPerLitre => Times(Measured(), GasUnits.MillilitresPerLitreFromMilligramsPerLitre(_asked.Gas, 1)).Slopes,
            EquilibriumQuantity.MeasuredPartialPressure => MeasuredPartialPressure().Slopes,
            EquilibriumQuantity.PercentLocal => Times(Over(MeasuredPartialPressure(), PartialPressure(_pressure, true)), 100).Slopes,
            EquilibriumQuantity.PercentOneAtmosphere => Times(Over(MeasuredPartialPressure(), PartialPressure(OneAtmosphere, false)), 100).Slopes,
            EquilibriumQuantity.ExcessMilligramsPerLitre => Less(Measured(), Milligrams()).Slopes,
            _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
        };
    }

    /// <summary>A value with its derivatives by all inputs.</summary>
    private readonly record struct Sloped(double Value, double[] Slopes);

    /// <summary>Makes a value of the slopes that Core gives: those by temperature and salinity reach on to what the salinity comes from.</summary>
    private Sloped Of(double value, double perKelvin, double perSalinity, double perHectopascal)
    {
        double[] slopes = new double[Inputs];
        slopes[(int)EquilibriumInput.Temperature] = perKelvin;
        slopes[(int)EquilibriumInput.Water] = perSalinity * _asked.Water.PerGiven;
        slopes[(int)EquilibriumInput.SalinityRelation] = perSalinity;
        // One thermometer for the water and the conductivity errs in both together.
        slopes[(int)(_asked.Water.ConductivityTemperature is null ? EquilibriumInput.Temperature : EquilibriumInput.ConductivityTemperature)] += perSalinity * _asked.Water.PerKelvin;
        slopes[(int)EquilibriumInput.Pressure] = perHectopascal;
        return new Sloped(value, slopes);
    }

    private Sloped Vapour()
    {
        GasEquilibrium.PartialPressure(_asked.Gas, _celsius, _salinity, _pressure, 1, 100, NearEdge, out double pure);
        GasEquilibrium.PartialPressureSensitivities(
            _asked.Gas, _celsius, _salinity, _pressure, 1, 100, NearEdge, out double perKelvin, out double perSalinity, out _, out _, out _);
        Sloped vapour = Of(_pressure - pure, -perKelvin, -perSalinity, 0);
        vapour.Slopes[(int)EquilibriumInput.Vapour] = vapour.Value;
        return vapour;
    }

    private Sloped PartialPressure(double pressure, bool local)
    {
        if (_asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            Sloped given = Of(_inputs[(int)EquilibriumInput.PartialPressure], 0, 0, 0);
            given.Slopes[(int)EquilibriumInput.PartialPressure] = 1;
            return given;
        }

        double fraction = _inputs[(int)EquilibriumInput.MoleFraction];
        double humidity = _inputs[(int)EquilibriumInput.Humidity];
        GasEquilibrium.PartialPressure(_asked.Gas, _celsius, _salinity, pressure, fraction, humidity, NearEdge, out double value);
        GasEquilibrium.PartialPressureSensitivities(
            _asked.Gas, _celsius, _salinity, pressure, fraction, humidity, NearEdge,
            out double perKelvin, out double perSalinity, out double perHectopascal, out double perFraction, out double perHumidity);
        Sloped partial = Of(value, perKelvin, perSalinity, local ? perHectopascal : 0);
        partial.Slopes[(int)EquilibriumInput.MoleFraction] = perFraction;
        partial.Slopes[(int)EquilibriumInput.Humidity] = perHumidity;
        partial.Slopes[(int)EquilibriumInput.Vapour] = value - (fraction * pressure);
        return partial;
    }

    private Sloped Milligrams()
    {
        Sloped milligrams;
        if (_asked.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            double given = _inputs[(int)EquilibriumInput.PartialPressure];
            GasEquilibrium.ConcentrationFromPartialPressure(_asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, given, NearEdge, out double value);
            GasEquilibrium.ConcentrationSensitivities(
                _asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, given, NearEdge,
                out double perKelvin, out double perSalinity, out double perHectopascal, out double perPartialPressure);
            milligrams = Of(value, perKelvin, perSalinity, perHectopascal);
            milligrams.Slopes[(int)EquilibriumInput.PartialPressure] = perPartialPressure;
        }
        else
        {
            double fraction = _inputs[(int)EquilibriumInput.MoleFraction];
            double humidity = _inputs[(int)EquilibriumInput.Humidity];
            GasEquilibrium.MilligramsPerLitre(_asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, fraction, humidity, NearEdge, out double value);
            GasEquilibrium.MilligramsPerLitreSensitivities(
                _asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, fraction, humidity, NearEdge,
                out double perKelvin, out double perSalinity, out double perHectopascal, out double perFraction, out double perHumidity);
            milligrams = Of(value, perKelvin, perSalinity, perHectopascal);
            milligrams.Slopes[(int)EquilibriumInput.MoleFraction] = perFraction;
            milligrams.Slopes[(int)EquilibriumInput.Humidity] = perHumidity;
        }

        milligrams.Slopes[(int)EquilibriumInput.Equation] = milligrams.Value;
        return _asked.Water.Brine is Brine brine ? By(milligrams, SaltingOut(brine)) : milligrams;
    }

    private Sloped Measured()
    {
        double given = _inputs[(int)EquilibriumInput.Concentration];
        QuantityKind kind = _asked.Measured!.Kind;
        double factor = kind == QuantityKind.MassConcentration ? 1
            : kind == QuantityKind.VolumeConcentration ? GasUnits.MilligramsPerLitreFromMillilitresPerLitre(_asked.Gas, 1)
            : GasUnits.MilligramsPerLitreFromMicromolesPerLitre(_asked.Gas, 1);
        Sloped plain = Of(given * factor, 0, 0, 0);
        plain.Slopes[(int)EquilibriumInput.Concentration] = factor;
        return kind == QuantityKind.AmountPerKilogram ? Times(By(plain, Density()), 0.001) : plain;
    }

    private Sloped MeasuredPartialPressure()
    {
        // Against fresh water: what the ions leave divides what was measured.
        Sloped measured = _asked.Water.Brine is Brine brine ? Over(Measured(), SaltingOut(brine)) : Measured();
        GasEquilibrium.PartialPressureFromConcentration(_asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, measured.Value, NearEdge, out double value);
        GasEquilibrium.PartialPressureFromConcentrationSensitivities(
            _asked.Gas, _asked.Equation, _celsius, _salinity, _pressure, measured.Value, NearEdge,
            out double perKelvin, out double perSalinity, out double perHectopascal, out double perMilligram);
        Sloped partial = Of(value, perKelvin, perSalinity, perHectopascal);
        for (int i = 0; i < Inputs; i++)
        {
            partial.Slopes[i] += perMilligram * measured.Slopes[i];
        }

        partial.Slopes[(int)EquilibriumInput.Equation] -= perMilligram * measured.Value;
        return partial;
    }

    private Sloped SaltingOut(Brine brine)
    {
        brine.Factor(_asked.Gas, _celsius, NearEdge, out double factor, out double perKelvin);
        Sloped left = Of(factor, perKelvin, 0, 0);
        left.Slopes[(int)EquilibriumInput.SaltingOut] = factor;
        return left;
    }

    private Sloped PerKilogram(Sloped milligrams)
    {
        return Times(Over(milligrams, Density()), 1000 * GasUnits.MicromolesPerLitreFromMilligramsPerLitre(_asked.Gas, 1));
    }

    private Sloped Density()
    {
        DensityEos80.Density(_celsius, _salinity, NearEdge, out double density);
        DensityEos80.Sensitivities(_celsius, _salinity, NearEdge, out double perKelvin, out double perSalinity);
        return Of(density, perKelvin, perSalinity, 0);
    }

    private static Sloped Times(Sloped a, double factor)
    {
        return new Sloped(a.Value * factor, Array.ConvertAll(a.Slopes, slope => slope * factor));
    }

    private static Sloped By(Sloped a, Sloped b)
    {
        double[] slopes = new double[Inputs];
        for (int i = 0; i < Inputs; i++)
        {
            slopes[i] = (a.Slopes[i] * b.Value) + (a.Value * b.Slopes[i]);
        }

        return new Sloped(a.Value * b.Value, slopes);
    }

    private static Sloped Over(Sloped a, Sloped b)
    {
        double[] slopes = new double[Inputs];
        for (int i = 0; i < Inputs; i++)
        {
            slopes[i] = (a.Slopes[i] - (a.Value / b.Value * b.Slopes[i])) / b.Value;
        }

        return new Sloped(a.Value / b.Value, slopes);
    }

    private static Sloped Less(Sloped a, Sloped b)
    {
        double[] slopes = new double[Inputs];
        for (int i = 0; i < Inputs; i++)
        {
            slopes[i] = a.Slopes[i] - b.Slopes[i];
        }

        return new Sloped(a.Value - b.Value, slopes);
    }
}
