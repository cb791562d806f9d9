using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>A Henry's-law constant in one form.</summary>
/// <param name="Form">Name of the form.</param>
/// <param name="Unit">Its unit; 1 for a ratio.</param>
/// <param name="Meaning">What is divided by what.</param>
/// <param name="Value">The constant.</param>
/// <param name="StandardUncertainty">Its standard uncertainty, the same unit.</param>
public readonly record struct HenryValue(string Form, string Unit, string Meaning, double Value, double StandardUncertainty);

/// <summary>A Henry's-law constant in every form it is written in: of a gas by its equation, or one that was given.</summary>
public sealed record HenryConstant
{
    /// <summary>Half the step of the slopes, K: the third derivatives do not show over it, nor does rounding.</summary>
    private const double HalfStep = 0.01;

    /// <summary>Relative slopes below it, 1/K, are the rounding of a form that does not depend on the temperature: some 1e-16 over the step.</summary>
    private const double Rounding = 1e-12;

    private const RangeRule NearEdge = RangeRule.NearEdge;

    private HenryConstant() { }

    /// <summary>The gas; null for a given constant.</summary>
    public Gas? Gas { get; private init; }

    /// <summary>The equation; null for a given constant.</summary>
    public SolubilityEquation? Equation { get; private init; }

    /// <summary>What the equation adds to the uncertainty, a fraction; null for a given constant.</summary>
    public double? EquationRelative { get; private init; }

    /// <summary>Name of the form that was given; null where a gas was.</summary>
    public string? GivenForm { get; private init; }

    /// <summary>The constant that was given, in the unit of its form; null where a gas was.</summary>
    public double? GivenValue { get; private init; }

    /// <summary>Temperature, °C.</summary>
    public required UncertainQuantity Temperature { get; init; }

    /// <summary>Practical salinity, taken as exact.</summary>
    public required double Salinity { get; init; }

    /// <summary>Density of the water by EOS-80, kg/m³.</summary>
    public required double DensityKilogramsPerCubicMetre { get; init; }

    /// <summary>The constant in every form.</summary>
    public required IReadOnlyList<HenryValue> Forms { get; init; }

    /// <summary>What lies near the edge of a range, one line each.</summary>
    public required IReadOnlyList<string> Notes { get; init; }

    internal static HenryConstant Of(Gas gas, SolubilityEquation equation, UncertainQuantity temperature, double salinity)
    {
        List<string> notes = [];
        double density = DensityOf(temperature.Value, salinity, notes);
        Status status = HenryLaw.Constant(gas, equation, temperature.Value, salinity, NearEdge, out double hcp);
        if (double.IsNaN(hcp))
        {
            throw new InputException(Refusal(status, gas, equation, temperature.Value, salinity));
        }

        if (status != Status.Ok)
        {
            notes.Add("the temperature is just outside the range of " + EquationNames.NameOf(equation) + ", which its uncertainty counts");
        }

        // No pressure of the gas comes in; what is stated for an equation holds at 1 atm.
        GasUncertainty.EquationRelative(gas, equation, temperature.Value, salinity, PressureUnits.HectopascalPerAtmosphere, NearEdge, out double relative);
        return new HenryConstant
        {
            Gas = gas,
            Equation = equation,
            EquationRelative = relative,
            Temperature = temperature,
            Salinity = salinity,
            DensityKilogramsPerCubicMetre = density,
            Forms = Write(HenryForm.Hcp, ConstantAt, temperature, salinity, relative, "--gas " + GasNames.NameOf(gas)),
            Notes = notes,
        };

        double ConstantAt(double celsius)
        {
            HenryLaw.Constant(gas, equation, celsius, salinity, RangeRule.Extrapolate, out double value);
            return value;
        }
    }

    internal static HenryConstant OfGiven(HenryFormEntry form, double constant, string text, UncertainQuantity temperature, double salinity)
    {
        if (!(0 < constant))
        {
            throw Wrong.Input("--given", text, "a Henry's-law constant is above zero");
        }

        List<string> notes = [];
        double density = DensityOf(temperature.Value, salinity, notes);
        return new HenryConstant
        {
            GivenForm = form.Name,
            GivenValue = constant,
            Temperature = temperature,
            Salinity = salinity,
            DensityKilogramsPerCubicMetre = density,
            Forms = Write(form.Form, _ => constant / form.PerSi, temperature, salinity, 0, "--given " + Wrong.Shown(text)),
            Notes = notes,
        };
    }

    /// <summary>Every form with its uncertainty: the temperature's part by the slope of that very form, the equation's the same in all.</summary>
    private static HenryValue[] Write(
        HenryForm from, Func<double, double> constantAt, UncertainQuantity temperature, double salinity, double equationRelative, string asked)
    {
        double celsius = temperature.Value;
        return [.. HenryForms.All.Select(form =>
        {
            double value = At(form, celsius);
            if (double.IsNaN(value))
            {
                throw new InputException(asked + ": the constant is too large or too small to be written in every form; look at its unit");
            }

            // Relative, for the squares of the smallest forms.
            double perKelvin = temperature.IsExact ? 0 : (At(form, celsius + HalfStep) - At(form, celsius - HalfStep)) / (2 * HalfStep) / value;
            double fromTemperature = Math.Abs(perKelvin) < Rounding ? 0 : perKelvin * temperature.StandardUncertainty;
            GasUncertainty.Combined(fromTemperature, 0, 0, 0, 0, equationRelative, out double relative);
            double uncertainty = relative * value;
            return double.IsFinite(uncertainty)
                ? new HenryValue(form.Name, form.Unit, form.Meaning, value, uncertainty)
                : throw new InputException(UncertainQuantity.TooLarge);
        })];

        double At(HenryFormEntry to, double t)
        {
            DensityEos80.Density(t, salinity, RangeRule.Extrapolate, out double density);
            HenryConversion.Convert(from, to.Form, constantAt(t), t, density, out double converted);
            double value = converted * to.PerSi;
            return double.IsFinite(value) ? value : double.NaN;
        }
    }

    private static double DensityOf(double celsius, double salinity, List<string> notes)
    {
        Status status = DensityEos80.Density(celsius, salinity, NearEdge, out double density);
        if (double.IsNaN(density))
        {
            throw new InputException(StatusParts.Input(status) == InputQuantity.Salinity
                ? Invariant($"--salinity {salinity}: the forms are converted with the density of the water by EOS-80, which holds from 0 to {DensityEos80.HighestSalinity}")
                : Invariant($"--temperature {celsius} °C: the forms are converted with the density of the water by EOS-80, which holds from {DensityEos80.LowestCelsius} to {DensityEos80.HighestCelsius} °C"));
        }

        if (status != Status.Ok)
        {
            notes.Add("the temperature is just outside the range of the density by EOS-80");
        }

        return density;
    }

    private static string Refusal(Status status, Gas gas, SolubilityEquation equation, double celsius, double salinity)
    {
        EquationRange range = EquationRange.Of(gas, equation, salinity);
        string[] others = [.. Catalogue.SolubilitiesOf(gas)
            .Where(entry => HenryLaw.Constant(gas, entry.Equation, celsius, salinity, RangeRule.Refuse, out _) == Status.Ok)
            .Select(static entry => entry.Source.Name)];
        string holds = EquationNames.NameOf(equation) + ", which holds for " + GasNames.NameOf(gas);
        return (StatusParts.Input(status) != InputQuantity.Salinity ? Invariant($"--temperature {celsius} °C is outside {holds} from {range.Temperatures}")
                : range.HighestSalinity == 0 ? Invariant($"--salinity {salinity} is outside {holds} in fresh water alone, --salinity 0")
                : Invariant($"--salinity {salinity} is outside {holds} from 0 to {range.HighestSalinity}"))
            + (others.Length == 0 ? "" : "; --equation " + string.Join(" or ", others) + " takes it");
    }

    private static string Invariant(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
