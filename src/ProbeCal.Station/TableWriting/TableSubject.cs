using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>What a table tells: the quantity, where it comes from and what was held fixed. One call evaluates it.</summary>
internal abstract class TableSubject
{
    /// <summary>As in the command line: concentration, salinity-factor or vapour-pressure.</summary>
    internal abstract string Quantity { get; }

    /// <summary>One line of words.</summary>
    internal abstract string Title { get; }

    /// <summary>Unit of the values; empty for a factor.</summary>
    internal abstract string Unit { get; }

    /// <summary>The unit inside a C name: <c>mg_per_l</c>.</summary>
    internal abstract string CUnit { get; }

    /// <summary>The name of the look-up in C#.</summary>
    internal abstract string CSharpName { get; }

    /// <summary>Symbol of the gas; null where no gas is concerned.</summary>
    internal abstract string? Gas { get; }

    internal abstract string Equation { get; }

    internal abstract string Citation { get; }

    /// <summary>Practical salinity where it is fixed.</summary>
    internal double? Salinity { get; init; }

    /// <summary>Absolute pressure where it is fixed, hPa.</summary>
    internal double? Hectopascal { get; init; }

    /// <summary>Mole fraction of the gas in dry air; null where it does not enter.</summary>
    internal double? MoleFraction { get; init; }

    /// <summary>The value at a temperature and at a place on the other axis, whichever that is; NaN unless Ok.</summary>
    internal abstract Status Evaluate(double celsius, AxisQuantity across, double at, out double value);

    /// <summary>The value where every point is known to be inside the ranges.</summary>
    internal double Value(double celsius, AxisQuantity across, double at)
    {
        return Evaluate(celsius, across, at, out double value) == Status.Ok ? value : throw Refused(celsius, across, at);
    }

    /// <summary>The line that says which input is outside, and the range that it must be in.</summary>
    internal InputException Refused(double celsius, AxisQuantity across, double at)
    {
        Status status = Evaluate(celsius, across, at, out _);
        double salinity = across == AxisQuantity.Salinity ? at : Salinity ?? 0;
        double hectopascal = across == AxisQuantity.Pressure ? at : Hectopascal ?? PressureUnits.HectopascalPerAtmosphere;
        return StatusParts.Input(status) switch
        {
            InputQuantity.Temperature => Outside("--temperature", celsius, "°C", t => Evaluate(t, across, at, out _), InputQuantity.Temperature, [20, 10, 1]),
            InputQuantity.Salinity when across == AxisQuantity.Salinity =>
                Outside("--salinity", salinity, "", s => Evaluate(celsius, across, s, out _), InputQuantity.Salinity, [0, 30]),
            InputQuantity.Pressure when across == AxisQuantity.Pressure =>
                Outside("--pressure", hectopascal, "hPa", p => Evaluate(celsius, across, p, out _), InputQuantity.Pressure, [PressureUnits.HectopascalPerAtmosphere]),
            InputQuantity.Salinity => new InputException(Line($"--salinity {salinity} is outside the range of {Equation}")),
            InputQuantity.Pressure => new InputException(Line($"--pressure {hectopascal} hPa is outside the range of {Equation}")),
            InputQuantity.MoleFraction => new InputException(Line($"--mole-fraction {MoleFraction} is no share of a gas; write a number from 0 to 1")),
            _ => new InputException($"{Equation} gives no {Quantity} of {Gas}: {status}"),
        };
    }

    /// <summary>Finds the end of the range by halving between what the equation takes and what it refused, so that no range stands here twice.</summary>
    private InputException Outside(string option, double given, string unit, Func<double, Status> evaluate, InputQuantity input, double[] likely)
    {
        foreach (double inside in likely)
        {
            if (StatusParts.Input(evaluate(inside)) == input)
            {
                continue;
            }

            double good = inside;
            double bad = given;
            for (int i = 0; i < 60; i++)
            {
                double half = 0.5 * (good + bad);
                if (StatusParts.Input(evaluate(half)) == input) { bad = half; } else { good = half; }
            }

            string end = Number.Print(Math.Round(good, 6) + 0.0);
            string ending = given < inside ? "begins" : "ends";
            return new InputException(Line($"{option} {Number.Significant(given, 10)}{(unit.Length == 0 ? "" : " " + unit)}: {Equation} {ending} at {end}{(unit.Length == 0 ? "" : " " + unit)}; a table extrapolates nothing"));
        }

        return new InputException(Line($"{option} {given} {unit} is outside the range of {Equation}"));
    }

    protected static string Line(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}

/// <summary>Concentration of a gas in water in equilibrium with water-saturated air, mg/L.</summary>
internal sealed class ConcentrationSubject(Gas gas, SolubilityEquation equation) : TableSubject
{
    internal const string Name = "concentration";

    internal override string Quantity => Name;

    internal override string Title => GasName + " in water in equilibrium with water-saturated air";

    /// <summary>mg/L, or for a card of a trace gas a smaller unit.</summary>
    internal override string Unit => UnitName;

    internal string UnitName { get; init; } = "mg/L";

    /// <summary>How many of the unit a milligram per litre is.</summary>
    internal double PerMilligram { get; init; } = 1;

    internal override string CUnit => "mg_per_l";

    internal override string CSharpName => "MilligramsPerLitre";

    internal override string? Gas => GasNames.NameOf(gas);

    internal override string Equation => EquationNames.NameOf(equation);

    internal override string Citation => Catalogue.Equation(equation).Citation;

    private string GasName => Catalogue.Gas(gas).Name;

    internal override Status Evaluate(double celsius, AxisQuantity across, double at, out double value)
    {
        double salinity = across == AxisQuantity.Salinity ? at : Salinity!.Value;
        double hectopascal = across == AxisQuantity.Pressure ? at : Hectopascal!.Value;
        Status status = GasEquilibrium.MilligramsPerLitre(
            gas, equation, celsius, salinity, hectopascal, MoleFraction!.Value, 100.0, RangeRule.Refuse, out value);
        value *= PerMilligram;
        return status;
    }
}

/// <summary>The factor by which salt lowers the concentration: that at a salinity over that in fresh water, both at 1 atm.</summary>
internal sealed class SalinityFactorSubject(Gas gas, SolubilityEquation equation) : TableSubject
{
    internal const string Name = "salinity-factor";

    internal override string Quantity => Name;

    internal override string Title => "factor from fresh to saline water for " + Catalogue.Gas(gas).Name + " in mg/L at equal temperature and pressure";

    internal override string Unit => "";

    internal override string CUnit => "factor";

    internal override string CSharpName => "SalinityFactor";

    internal override string? Gas => GasNames.NameOf(gas);

    internal override string Equation => EquationNames.NameOf(equation);

    internal override string Citation => Catalogue.Equation(equation).Citation;

    internal override Status Evaluate(double celsius, AxisQuantity across, double at, out double value)
    {
        value = double.NaN;
        Status status = At(celsius, 0.0, out double fresh);
        if (status != Status.Ok) { return status; }
        status = At(celsius, at, out double saline);
        if (status == Status.Ok) { value = saline / fresh; }
        return status;
    }

    private Status At(double celsius, double salinity, out double value)
    {
        return GasEquilibrium.MilligramsPerLitre(
            gas, equation, celsius, salinity, PressureUnits.HectopascalPerAtmosphere, MoleFraction!.Value, 100.0, RangeRule.Refuse, out value);
    }
}

/// <summary>Saturation vapour pressure of pure water, hPa.</summary>
internal sealed class VapourPressureSubject : TableSubject
{
    internal const string Name = "vapour-pressure";

    internal override string Quantity => Name;

    internal override string Title => "saturation vapour pressure of pure water";

    internal override string Unit => "hPa";

    internal override string CUnit => "hectopascal";

    internal override string CSharpName => "VapourHectopascal";

    internal override string? Gas => null;

    internal override string Equation => "wagner-pruss-1993";

    internal override string Citation => "Wagner, W., Pruss, A. (1993) J. Phys. Chem. Ref. Data 22, 783–787, Eq. 1 (IAPWS SR1-86(1992))";

    internal override Status Evaluate(double celsius, AxisQuantity across, double at, out double value)
    {
        return VapourWagnerPruss1993.Pressure(celsius, RangeRule.Refuse, out value);
    }
}
