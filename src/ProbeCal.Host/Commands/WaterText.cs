using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>The properties of a water printed for people.</summary>
internal static class WaterText
{
    internal static void Write(TextWriter output, WaterProperties w)
    {
        void Line(FormattableString text)
        {
            output.WriteLine(text.ToString(CultureInfo.InvariantCulture));
        }

        WaterSalt salt = w.Salt;
        Line($"Water at {WaterWords.Celsius(w.TemperatureCelsius)}, practical salinity {Number.Fixed(salt.Salinity, 4)}{From(salt.Source)}, at the surface");
        Line($"");
        Row("salinity", salt.Salinity, salt.Uncertainty, 4, "", salt.Source == SalinitySource.Given ? "" : $"chlorinity {Number.Fixed(salt.ChlorinityGramsPerKilogram, 4)} g/kg");
        if (salt.ConductivityMillisiemensPerCentimetre is double raw)
        {
            Line($"  conductivity       {raw * 1000,11:F1} µS/cm as measured");
        }

        if (salt.LinearAt25MicrosiemensPerCentimetre is double linear)
        {
            Line($"  at 25 °C           {linear,11:F1} µS/cm {(salt.Source == SalinitySource.Conductivity ? "linear, 1.91 % per °C" : "as given")}");
        }

        if (salt.Source == SalinitySource.Conductivity)
        {
            if (salt.NaturalAt25MicrosiemensPerCentimetre is double natural)
            {
                Line($"                     {natural,11:F1} µS/cm natural water (ISO 7888)");
            }
            else
            {
                Line($"                            none by ISO 7888: for natural waters of 60 to 1000 µS/cm, 0 to 35 °C");
            }
        }

        if (salt.FieldRelationSalinity is double field)
        {
            Line($"  (the field manual's relation from the linear value gives a salinity of {field:F4})");
        }

        Of("density", w.Density, 4, "kg/m³", "EOS-80");
        Of("pure water", w.PureWaterDensity, 4, "kg/m³", "Tanaka 2001");
        Of("freezing point", w.FreezingPoint, 3, "°C", "Millero and Leung 1976");
        Of("vapour pressure", w.VapourPressure, 4, "hPa", w.VapourEquation);
        Line($"");
        List<string[]> rows = [["vapour pressure by", "fresh, hPa", "against wagner-pruss-1993", salt.Salinity == 0 ? "" : "this water, hPa"]];
        foreach (VapourByForm form in w.VapourForms)
        {
            rows.Add([form.Equation, Fixed(form.FreshHectopascal, 4), form.DeviationPercent is double d ? Signed(d) : "none", salt.Salinity == 0 ? "" : form.TakesSalt ? Fixed(form.SaltHectopascal, 4) : "no term for salt"]);
        }

        TextTable.Write(output, rows, "  ");
        Line($"");
        foreach (string note in w.Notes)
        {
            Line($"  note: {note}");
        }

        Line($"  ± is a standard uncertainty (k = 1){(w.TemperatureUncertaintyKelvin == 0 ? "; the temperature is taken as exact (--temperature-uncertainty)" : "")}");

        void Of(string name, WaterValue value, int decimals, string unit, string by)
        {
            if (value.Value is double known)
            {
                Row(name, known, value.Uncertainty!.Value, decimals, unit, by);
            }
            else
            {
                output.WriteLine($"  {name,-17}  {"none",11}");
            }
        }

        void Row(string name, double value, double uncertainty, int decimals, string unit, string by)
        {
            string sure = uncertainty == 0 ? "" : "± " + Number.Significant(uncertainty, 2);
            output.WriteLine($"  {name,-17}  {Number.Fixed(value, decimals),11} {unit,-6} {sure,-11} {by}".TrimEnd());
        }
    }

    private static string From(SalinitySource source)
    {
        return source switch
        {
            SalinitySource.Conductivity => " (PSS-78 from the conductivity)",
            SalinitySource.SpecificConductance => " (field manual, from the specific conductance)",
            SalinitySource.Chlorinity => " (from the chlorinity)",
            _ => "",
        };
    }

    private static string Signed(double percent)
    {
        string text = Number.Fixed(percent, 3);
        return (text.StartsWith('-') || text == "0.000" ? "" : "+") + text + " %";
    }

    private static string Fixed(double? value, int decimals)
    {
        return value is double known ? Number.Fixed(known, decimals) : "none";
    }
}
