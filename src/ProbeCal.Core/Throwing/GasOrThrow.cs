using System;
using System.Globalization;

namespace ProbeCal;

/// <summary>
/// The functions of <see cref="GasEquilibrium"/> and <see cref="GasUnits"/> for desktop callers: the value is returned, a refused input throws <see cref="InputRefusedException"/>.
/// Units, ranges and sources are those of the functions named.
/// </summary>
public static class GasOrThrow
{
    /// <summary><see cref="GasEquilibrium.PartialPressure"/>.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="celsius">Temperature, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase, hPa.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, a fraction.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, %.</param>
    /// <exception cref="InputRefusedException">An input is not finite or out of range, or the gas is not known.</exception>
    public static double PartialPressure(
        Gas gas, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent)
    {
        Status status = GasEquilibrium.PartialPressure(
            gas, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, RangeRule.Refuse, out double value);
        if (status == Status.Ok) { return value; }
        FormattableString allowed =
            $"{GasEquilibrium.LowestCelsius} to {GasEquilibrium.HighestCelsius} °C, salinity 0 to {GasEquilibrium.HighestSalinity}, {Mixture(gas)}";
        throw Refusal(status, gas, default, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, double.NaN, Text(allowed));
    }

    /// <summary>Concentration of water in equilibrium with the gas phase, mg/L.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperature, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">Absolute pressure of the gas phase, hPa.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, a fraction.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, %.</param>
    /// <exception cref="InputRefusedException">An input is not finite or out of range, or the gas or the pair is not known.</exception>
    public static double MilligramsPerLitre(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double moleFraction, double humidityPercent)
    {
        Status status = GasEquilibrium.MilligramsPerLitre(
            gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(
                status, gas, equation, celsius, salinity, pressureHectopascal, moleFraction, humidityPercent, double.NaN,
                Text($"{Water(gas, equation, salinity)}, {Mixture(gas)}"));
    }

    /// <summary><see cref="GasEquilibrium.ConcentrationFromPartialPressure"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range, or the gas or the pair is not known.</exception>
    public static double ConcentrationFromPartialPressure(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal)
    {
        Status status = GasEquilibrium.ConcentrationFromPartialPressure(
            gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw AmountRefusal(status, gas, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal);
    }

    /// <summary>Partial pressure of the gas in water of a given concentration, hPa.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range, or the gas or the pair is not known.</exception>
    public static double PartialPressureFromConcentration(
        Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double milligramsPerLitre)
    {
        Status status = GasEquilibrium.PartialPressureFromConcentration(
            gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw AmountRefusal(status, gas, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre);
    }

    /// <summary><see cref="GasUnits.MicromolesPerLitreFromMilligramsPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">The value is not finite or the gas is not known.</exception>
    public static double MicromolesPerLitreFromMilligramsPerLitre(Gas gas, double milligramsPerLitre)
    {
        return Finite(gas, milligramsPerLitre, GasUnits.MicromolesPerLitreFromMilligramsPerLitre(gas, milligramsPerLitre));
    }

    /// <summary><see cref="GasUnits.MilligramsPerLitreFromMicromolesPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">The value is not finite or the gas is not known.</exception>
    public static double MilligramsPerLitreFromMicromolesPerLitre(Gas gas, double micromolesPerLitre)
    {
        return Finite(gas, micromolesPerLitre, GasUnits.MilligramsPerLitreFromMicromolesPerLitre(gas, micromolesPerLitre));
    }

    /// <summary><see cref="GasUnits.MillilitresPerLitreFromMilligramsPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">The value is not finite or the gas is not known.</exception>
    public static double MillilitresPerLitreFromMilligramsPerLitre(Gas gas, double milligramsPerLitre)
    {
        return Finite(gas, milligramsPerLitre, GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, milligramsPerLitre));
    }

    /// <summary><see cref="GasUnits.MilligramsPerLitreFromMillilitresPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">The value is not finite or the gas is not known.</exception>
    public static double MilligramsPerLitreFromMillilitresPerLitre(Gas gas, double millilitresPerLitre)
    {
        return Finite(gas, millilitresPerLitre, GasUnits.MilligramsPerLitreFromMillilitresPerLitre(gas, millilitresPerLitre));
    }

    private static double Finite(Gas gas, double given, double value)
    {
        if (!GasSolubility.Known(gas)) { throw new InputRefusedException(Status.GasUnknown, (double)gas, Gases()); }
        if (InputCheck.NotFinite(value)) { throw new InputRefusedException(Status.ConcentrationNotFinite, given, "a finite concentration"); }
        return value;
    }

    private static InputRefusedException AmountRefusal(
        Status status, Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double amount)
    {
        double highest = GasEquilibrium.HighestHectopascal(gas);
        return Refusal(
            status, gas, equation, celsius, salinity, pressureHectopascal, double.NaN, double.NaN, amount,
            Text($"{Water(gas, equation, salinity)}, total pressure {GasEquilibrium.LowestHectopascal} to {highest} hPa, the gas at most {highest} hPa"));
    }

    private static InputRefusedException Refusal(
        Status status, Gas gas, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal,
        double moleFraction, double humidityPercent, double amount, string allowed)
    {
        InputQuantity input = StatusParts.Input(status);
        double fault = input switch
        {
            InputQuantity.Gas => (double)gas,
            InputQuantity.Equation => (double)equation,
            InputQuantity.Temperature => celsius,
            InputQuantity.Salinity => salinity,
            InputQuantity.Pressure => pressureHectopascal,
            InputQuantity.MoleFraction => moleFraction,
            InputQuantity.Humidity => humidityPercent,
            _ => amount,
        };
        string text = input switch
        {
            InputQuantity.Gas => Gases(),
            InputQuantity.Equation => Equations(gas),
            _ => allowed,
        };
        return new InputRefusedException(status, fault, text);
    }

    private static string Water(Gas gas, SolubilityEquation equation, double salinity)
    {
        double lowest = GasSolubility.LowestCelsius(gas, equation, salinity);
        return Text($"{lowest} to {GasSolubility.HighestCelsius(equation)} °C, salinity 0 to {GasSolubility.HighestSalinity(equation)}");
    }

    private static string Mixture(Gas gas)
    {
        return Text($"total pressure {GasEquilibrium.LowestHectopascal} to {GasEquilibrium.HighestHectopascal(gas)} hPa, mole fraction 0 to 1, humidity 0 to 100 %");
    }

    private static string Gases()
    {
        return Text($"1 ({Gas.Oxygen}) to {(int)Gas.Ethane} ({Gas.Ethane})");
    }

    /// <summary>The equations that cover the gas.</summary>
    private static string Equations(Gas gas)
    {
        string text = string.Empty;
        for (SolubilityEquation equation = SolubilityEquation.BensonKrause1984; equation <= SolubilityEquation.Sander2023; equation++)
        {
            if (!GasSolubility.Covers(gas, equation)) { continue; }
            if (text.Length != 0) { text += ", "; }
            text += Text($"{(int)equation} ({equation})");
        }

        return text;
    }

    private static string Text(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
