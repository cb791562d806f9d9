using System;
using System.Globalization;

namespace ProbeCal;

/// <summary>
/// The oxygen functions for desktop callers: the value is returned, a refused input throws <see cref="InputRefusedException"/>.
/// Units, ranges and sources are those of the functions named.
/// </summary>
public static class OxygenOrThrow
{
    /// <summary><see cref="OxygenEquilibrium.MilligramsPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double MilligramsPerLitre(SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal)
    {
        Status status = OxygenEquilibrium.MilligramsPerLitre(
            equation, celsius, salinity, pressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw Refusal(status, equation, celsius, salinity, pressureHectopascal);
    }

    /// <summary><see cref="GarciaGordon1992.MicromolesPerKilogram"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double MicromolesPerKilogram(double celsius, double salinity, double pressureHectopascal)
    {
        Status status = GarciaGordon1992.MicromolesPerKilogram(
            celsius, salinity, pressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, SolubilityEquation.GarciaGordon1992, celsius, salinity, pressureHectopascal);
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressure"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double PartialPressure(double celsius, double pressureHectopascal)
    {
        Status status = OxygenEquilibrium.PartialPressure(celsius, pressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw AirRefusal(status, celsius, pressureHectopascal, double.NaN);
    }

    /// <summary><see cref="OxygenEquilibrium.ConcentrationFromPartialPressure"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double ConcentrationFromPartialPressure(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double partialPressureHectopascal)
    {
        Status status = OxygenEquilibrium.ConcentrationFromPartialPressure(
            equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, equation, celsius, salinity, pressureHectopascal, partialPressureHectopascal);
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressureFromConcentration"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double PartialPressureFromConcentration(
        SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double milligramsPerLitre)
    {
        Status status = OxygenEquilibrium.PartialPressureFromConcentration(
            equation, celsius, salinity, pressureHectopascal, milligramsPerLitre, RangeRule.Refuse, out double value);
        return status == Status.Ok
            ? value
            : throw Refusal(status, equation, celsius, salinity, pressureHectopascal, milligramsPerLitre);
    }

    /// <summary><see cref="Saturation.PercentLocal"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double PercentLocal(double partialPressureHectopascal, double celsius, double pressureHectopascal)
    {
        Status status = Saturation.PercentLocal(
            partialPressureHectopascal, celsius, pressureHectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw AirRefusal(status, celsius, pressureHectopascal, partialPressureHectopascal);
    }

    /// <summary><see cref="Saturation.PercentOneAtmosphere"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite or out of range.</exception>
    public static double PercentOneAtmosphere(double partialPressureHectopascal, double celsius)
    {
        Status status = Saturation.PercentOneAtmosphere(partialPressureHectopascal, celsius, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw AirRefusal(status, celsius, double.NaN, partialPressureHectopascal);
    }

    /// <summary><see cref="HenryLaw.MolesPerLitre"/>.</summary>
    /// <exception cref="InputRefusedException">An input is not finite, or the constant is not positive.</exception>
    public static double HenryMolesPerLitre(double molesPerLitreAtmosphere, double partialPressureHectopascal)
    {
        Status status = HenryLaw.MolesPerLitre(molesPerLitreAtmosphere, partialPressureHectopascal, out double value);
        if (status == Status.Ok) { return value; }
        double fault = StatusParts.Input(status) == InputQuantity.Coefficient ? molesPerLitreAtmosphere : partialPressureHectopascal;
        throw new InputRefusedException(status, fault, "a positive constant in mol/(L·atm) and a finite partial pressure in hPa");
    }

    private static InputRefusedException Refusal(
        Status status, SolubilityEquation equation, double celsius, double salinity, double pressureHectopascal, double amount = double.NaN)
    {
        double fault = StatusParts.Input(status) switch
        {
            InputQuantity.Temperature => celsius,
            InputQuantity.Salinity => salinity,
            InputQuantity.Pressure => pressureHectopascal,
            InputQuantity.Equation => (double)equation,
            _ => amount,
        };
        FormattableString allowed = equation == SolubilityEquation.GarciaGordon1992
            ? (FormattableString)$"freezing point or {GarciaGordon1992.LowestCelsius} to {GarciaGordon1992.HighestCelsius} °C, salinity 0 to {GarciaGordon1992.HighestSalinity}, {AirPressures()}"
            : $"{BensonKrause1984.LowestCelsius} to {BensonKrause1984.HighestCelsius} °C, salinity 0 to {BensonKrause1984.HighestSalinity}, {AirPressures()}";
        string text = StatusParts.Input(status) == InputQuantity.Equation
            ? "1 (BensonKrause1984) or 2 (GarciaGordon1992)"
            : allowed.ToString(CultureInfo.InvariantCulture);
        return new InputRefusedException(status, fault, text);
    }

    private static InputRefusedException AirRefusal(Status status, double celsius, double pressureHectopascal, double partialPressure)
    {
        double fault = StatusParts.Input(status) switch
        {
            InputQuantity.Temperature => celsius,
            InputQuantity.Pressure => pressureHectopascal,
            _ => partialPressure,
        };
        FormattableString allowed =
            $"{OxygenEquilibrium.LowestCelsius} to {OxygenEquilibrium.HighestCelsius} °C, {AirPressures()}";
        return new InputRefusedException(status, fault, allowed.ToString(CultureInfo.InvariantCulture));
    }

    private static string AirPressures()
    {
        FormattableString text =
            $"total pressure {BensonKrause1984.LowestHectopascal} to {BensonKrause1984.HighestHectopascal} hPa, oxygen at most {OxygenEquilibrium.HighestPartialPressureHectopascal} hPa";
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
