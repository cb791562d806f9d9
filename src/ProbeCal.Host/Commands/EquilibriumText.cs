using System;
using System.Globalization;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An equilibrium value printed for people.</summary>
internal static class EquilibriumText
{
    internal static void Write(TextWriter output, OxygenAtEquilibrium r)
    {
        WaterConditions c = r.Conditions;
        double kilopascal = PressureUnits.KilopascalFromHectopascal(r.PartialPressureHectopascal);
        double millimetres = PressureUnits.MillimetresOfMercuryFromHectopascal(r.PartialPressureHectopascal);
        void Line(FormattableString text)
        {
            output.WriteLine(text.ToString(CultureInfo.InvariantCulture));
        }

        Line($"Oxygen in water in equilibrium with air, by {EquationNames.NameOf(r.Equation)}");
        Line($"  water at {c.TemperatureCelsius} °C, salinity {c.Salinity}, under {c.PressureHectopascal:F2} hPa of moist air");
        if (c.PressureSource == "altitude")
        {
            Line($"  pressure from the altitude alone: second best, taken as ± {c.PressureUncertaintyHectopascal} hPa; a barometer is better");
        }

        Line($"");
        Line($"  concentration      {r.MilligramsPerLitre,9:F3} mg/L   ± {r.MilligramsPerLitreUncertainty:F3} mg/L (standard uncertainty, k = 1)");
        Line($"                     {r.MicromolesPerLitre,9:F2} µmol/L");
        Line($"                     {r.MicromolesPerKilogram,9:F2} µmol/kg");
        Line($"                     {r.MillilitresPerLitre,9:F3} mL/L");
        Line($"  partial pressure   {r.PartialPressureHectopascal,9:F2} hPa    ± {r.PartialPressureUncertaintyHectopascal:F2} hPa   ({kilopascal:F3} kPa, {millimetres:F2} mmHg)");
        Line($"  vapour pressure    {r.VapourPressureHectopascal,9:F2} hPa");
        Line($"  saturation            100 % local = {r.PercentOfOneAtmosphere:F1} % of the value at 1 atm");
        Line($"");
        Line($"  one step more of   1 °C: {r.MilligramsPerLitrePerKelvin:+0.000;-0.000} mg/L   1 hPa: {r.MilligramsPerLitrePerHectopascal:+0.0000;-0.0000} mg/L   1 of salinity: {r.MilligramsPerLitrePerSalinity:+0.000;-0.000} mg/L");
        Line($"  uncertainty from   the equation{Part("temperature", c.TemperatureUncertaintyKelvin, "K")}{Part("pressure", c.PressureUncertaintyHectopascal, "hPa")}{Part("salinity", c.SalinityUncertainty, "")}{Missing(c)}");
    }

    private static string Part(string name, double uncertainty, string unit)
    {
        return uncertainty == 0 ? "" : string.Create(CultureInfo.InvariantCulture, $", {name} ± {uncertainty} {unit}").TrimEnd();
    }

    private static string Missing(WaterConditions c)
    {
        return c.TemperatureUncertaintyKelvin == 0 || c.PressureUncertaintyHectopascal == 0
            ? "; what is not named here was taken as exact (--temperature-uncertainty, --pressure-uncertainty, --salinity-uncertainty)"
            : "";
    }
}
