using System;
using System.Collections.Generic;
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
        Line($"  water at {c.TemperatureCelsius} °C, salinity {c.Salinity}, under {c.PressureHectopascal:F2} hPa ({PressureUnits.MillimetresOfMercuryFromHectopascal(c.PressureHectopascal):F1} mmHg) of moist air");
        if (c.PressureSource == "altitude")
        {
            Line($"  pressure from the altitude alone: second best, taken as ± {c.PressureUncertaintyHectopascal} hPa; a barometer is better");
        }

        Line($"");
        Line($"  concentration      {r.MilligramsPerLitre,9:F3} mg/L   ± {r.MilligramsPerLitreUncertainty:F3} mg/L (standard uncertainty, k = 1)");
        Line($"                     {r.MicromolesPerLitre,9:F2} µmol/L");
        Line($"                     {r.MicromolesPerKilogram,9:F2} µmol/kg");
        Line($"                     {r.MillilitresPerLitre,9:F3} mL/L");
        // Where every input was taken as exact, 0.00 would claim more than anybody knows.
        string sure = r.PartialPressureUncertaintyHectopascal == 0 ? "" : "± " + Number.Fixed(r.PartialPressureUncertaintyHectopascal, 2) + " hPa";
        Line($"  partial pressure   {r.PartialPressureHectopascal,9:F2} hPa    {sure,-12} ({kilopascal:F3} kPa, {millimetres:F2} mmHg)");
        Line($"  vapour pressure    {r.VapourPressureHectopascal,9:F2} hPa");
        Line($"  saturation            100 % local = {r.PercentOfOneAtmosphere:F1} % of the value at 1 atm");
        Line($"");
        Line($"  one step more of   1 °C: {r.MilligramsPerLitrePerKelvin:+0.000;-0.000} mg/L   1 hPa: {r.MilligramsPerLitrePerHectopascal:+0.0000;-0.0000} mg/L   1 of salinity: {r.MilligramsPerLitrePerSalinity:+0.000;-0.000} mg/L");
        Line($"  uncertainty from   the equation{Part("temperature", c.TemperatureUncertaintyKelvin, "K")}{Part("pressure", c.PressureUncertaintyHectopascal, "hPa")}{Part("salinity", c.SalinityUncertainty, "")}");
        if (Exact(c) is string exact)
        {
            Line($"                     {exact}");
        }
    }

    private static string Part(string name, double uncertainty, string unit)
    {
        return uncertainty == 0 ? "" : string.Create(CultureInfo.InvariantCulture, $", {name} ± {uncertainty:G3} {unit}").TrimEnd();
    }

    private static string? Exact(WaterConditions c)
    {
        List<string> names = [];
        if (c.TemperatureUncertaintyKelvin == 0)
        {
            names.Add("temperature");
        }

        if (c.PressureUncertaintyHectopascal == 0)
        {
            names.Add("pressure");
        }

        if (c.SalinityUncertainty == 0)
        {
            names.Add("salinity");
        }

        return names.Count == 0 ? null : $"{string.Join(", ", names)} taken as exact (--{names[0]}-uncertainty{(names.Count == 1 ? "" : " and so on")})";
    }
}
