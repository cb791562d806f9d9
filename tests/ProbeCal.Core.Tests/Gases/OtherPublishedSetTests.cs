using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>
/// Garcia and Gordon print their fits per litre too: the set that the library does not use, over the density, must meet the one it uses. The coefficients here are the other set, seen
/// second-hand like those of the library. The papers with Weiss's form are held so by <see cref="SecondFormTests"/>.
/// </summary>
public class OtherPublishedSetTests(ITestOutputHelper output)
{
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
}
