using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>
/// Each paper that prints its fit per litre and per kilogram gives a check from outside: the set that the library does not use, times or over the density, must meet the one it
/// uses. The coefficients here are the other set, seen second-hand like those of the library.
/// </summary>
public class OtherPublishedSetTests(ITestOutputHelper output)
{
    // The two sets are separate fits to the same data, rounded by their authors: 0.1 % is the allowance of the literature for going from one to the other (from memory).
    private const double Allowed = 0.001;

    [Theory]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, -58.0931, 90.5069, 22.294, 0.0, false, 0.027766, -0.025888, 0.0050578)]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.WeissPrice1980, -160.7333, 215.4152, 89.892, -1.47759, true, 0.029941, -0.027455, 0.0053407)]
    [InlineData(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980, -62.7062, 97.3066, 24.1406, 0.0, false, -0.05842, 0.033193, -0.0051313)]
    [InlineData(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980MoistAir, -165.8806, 222.8743, 92.0792, -1.48425, true, -0.056235, 0.031619, -0.0048472)]
    [InlineData(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979, -415.2807, 596.8104, 379.2599, -62.0757, false, -0.05916, 0.032174, -0.0048198)]
    [InlineData(Gas.Helium, SolubilityEquation.Weiss1971, -152.9405, 196.884, 126.8015, -20.6767, false, -0.040543, 0.021315, -0.0030732)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002, -98.7264, 142.803, 38.8746, 0.0, false, 0.0268696, -0.0334407, 0.0070843)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002MoistAir, -82.1639, 120.152, 30.6372, 0.0, false, 0.0293201, -0.0351974, 0.00740056)]
    [InlineData(Gas.Cfc11, SolubilityEquation.WarnerWeiss1985, -232.0411, 322.5546, 120.4956, -1.39165, true, -0.146531, 0.093621, -0.0160693)]
    [InlineData(Gas.Cfc12, SolubilityEquation.WarnerWeiss1985, -220.212, 301.8695, 114.8533, -1.39165, true, -0.147718, 0.093175, -0.015734)]
    public void HundredKelvinForm_OtherSet(
        Gas gas, SolubilityEquation equation, double a1, double a2, double a3, double a4, bool squared, double b1, double b2, double b3)
    {
        double worst = 0.0;
        double highest = GasSolubility.HighestCelsius(equation);
        for (double celsius = 0.0; celsius <= highest; celsius += highest / 10.0)
        {
            for (double salinity = 0.0; salinity <= 40.0; salinity += 10.0)
            {
                double h = (TemperatureScale.Ipts68FromIts90(celsius) + 273.15) / 100.0;
                double other = Math.Exp(a1 + (a2 / h) + (a3 * Math.Log(h)) + (a4 * (squared ? h * h : h)) + (salinity * (b1 + (b2 * h) + (b3 * h * h))));
                double used = GasSolubility.EquationValue(gas, equation, celsius, salinity, null, out _, out _);
                double density = DensityEos80.Value(celsius, salinity) / 1000.0;
                double perLitre = GasSolubility.IsPerKilogram(equation) ? used * density : used;
                double otherPerLitre = GasSolubility.IsPerKilogram(equation) ? other : other * density;
                worst = Math.Max(worst, Math.Abs((perLitre / otherPerLitre) - 1.0));
            }
        }

        output.WriteLine($"{gas} {equation}: the two sets differ by at most {100.0 * worst:F4} %");
        Assert.True(worst < Allowed, $"{worst:E3}");
    }

    /// <summary>Garcia and Gordon 1992 in cm³/dm³, with 22.3916 L/mol: 0.017 % between the Benson–Krause sets (found when they were compared before); 0.05 % is allowed for both columns.</summary>
    [Theory]
    [InlineData(SolubilityEquation.GarciaGordon1992, new[] { 2.00907, 3.22014, 4.0501, 4.94457, -0.256847, 3.88767 }, new[] { -0.00624523, -0.00737614, -0.010341, -0.00817083 }, -4.88682e-07)]
    [InlineData(SolubilityEquation.GarciaGordon1992Combined, new[] { 2.00856, 3.224, 3.99063, 4.80299, 0.978188, 1.71069 }, new[] { -0.00624097, -0.00693498, -0.00690358, -0.00429155 }, -3.1168e-07)]
    public void GarciaGordon_OtherSet(SolubilityEquation equation, double[] a, double[] b, double c0)
    {
        double worst = 0.0;
        for (double celsius = 0.0; celsius <= 40.0; celsius += 4.0)
        {
            for (double salinity = 0.0; salinity <= 42.0; salinity += 7.0)
            {
                double t = TemperatureScale.Ipts68FromIts90(celsius);
                double ts = Math.Log((298.15 - t) / (273.15 + t));
                double sum = c0 * salinity * salinity;
                for (int i = 5; 0 <= i; i--) { sum += a[i] * Math.Pow(ts, i); }
                for (int i = 3; 0 <= i; i--) { sum += salinity * b[i] * Math.Pow(ts, i); }
                double used = GasSolubility.EquationValue(Gas.Oxygen, equation, celsius, salinity, null, out _, out _);
                double perLitre = used * DensityEos80.Value(celsius, salinity) * 1.0e-6 * 22.3916;
                worst = Math.Max(worst, Math.Abs((perLitre / Math.Exp(sum)) - 1.0));
            }
        }

        output.WriteLine($"{equation}: the two sets differ by at most {100.0 * worst:F4} %");
        Assert.True(worst < 0.0005, $"{worst:E3}");
    }

    /// <summary>
    /// Bunsen coefficients against the moist-air fit of the same paper, by way of vapour, air and molar volume. Allowed is what the paper states for either fit; Weiss 1970 states none
    /// for nitrogen, whose two forms are known to differ by 0.36 %.
    /// </summary>
    [Theory]
    [InlineData(Gas.Oxygen, SolubilityEquation.Weiss1970, SolubilityEquation.Weiss1970Bunsen, 0.003)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.Weiss1970, SolubilityEquation.Weiss1970Bunsen, 0.004)]
    [InlineData(Gas.Argon, SolubilityEquation.Weiss1970, SolubilityEquation.Weiss1970Bunsen, 0.003)]
    [InlineData(Gas.Helium, SolubilityEquation.Weiss1971, SolubilityEquation.Weiss1971Bunsen, 0.005)]
    [InlineData(Gas.Neon, SolubilityEquation.Weiss1971, SolubilityEquation.Weiss1971Bunsen, 0.005)]
    [InlineData(Gas.Krypton, SolubilityEquation.WeissKyser1978, SolubilityEquation.WeissKyser1978Bunsen, 0.004)]
    [InlineData(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979, SolubilityEquation.WiesenburgGuinasso1979Bunsen, 0.01)]
    [InlineData(Gas.CarbonMonoxide, SolubilityEquation.WiesenburgGuinasso1979, SolubilityEquation.WiesenburgGuinasso1979Bunsen, 0.01)]
    [InlineData(Gas.Hydrogen, SolubilityEquation.WiesenburgGuinasso1979, SolubilityEquation.WiesenburgGuinasso1979Bunsen, 0.01)]
    public void Bunsen_AgreesWithMoistAir(Gas gas, SolubilityEquation moistAir, SolubilityEquation bunsen, double stated)
    {
        double worst = 0.0;
        for (double celsius = 0.0; celsius <= 30.0; celsius += 5.0)
        {
            for (double salinity = 0.0; salinity <= 40.0; salinity += 10.0)
            {
                HenryLaw.Constant(gas, moistAir, celsius, salinity, RangeRule.Refuse, out double one);
                HenryLaw.Constant(gas, bunsen, celsius, salinity, RangeRule.Refuse, out double other);
                worst = Math.Max(worst, Math.Abs((one / other) - 1.0));
            }
        }

        output.WriteLine($"{gas}: {moistAir} and {bunsen} differ by at most {100.0 * worst:F4} %");
        Assert.True(worst < stated, $"{worst:E3}");
    }
}
