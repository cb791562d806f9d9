using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>
/// The default equation by another road: the Henry coefficient that the same laboratory published as a fit of its own, the reference vapour pressure, and the
/// density of water. Nothing of Eq. 32 and not its vapour formula enter, so this checks the form of the pressure factor, the oxygen fraction and the units.
/// </summary>
public class IndependentRouteTests(ITestOutputHelper output)
{
    // Benson, B.B., Krause, D., Peterson, M.A. (1979) J. Solution Chem. 8, 655-690: ln k = 3.71814 + 5596.17/T - 1049668/T², k in atm per mole fraction; 0-60 °C.
    // Coefficients seen in two second-hand places; stated accuracy 0.02 % (from memory).
    private const double K0 = 3.71814;
    private const double K1 = 5596.17;
    private const double K2 = -1049668.0;
    private const double WaterGramsPerMole = 18.01528;

    [Fact]
    public void HenryCoefficientOf1979_GivesTheSameConcentration()
    {
        double lowest = 1.0;
        double highest = -1.0;
        for (int t = 0; t <= 40; t++)
        {
            for (int millimetres = 600; millimetres <= 800; millimetres += 20)
            {
                double pressure = PressureUnits.HectopascalFromMillimetresOfMercury(millimetres);
                Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(t, 0.0, pressure, RangeRule.Refuse, out double direct));
                double deviation = (OtherRoad(t, pressure) / direct) - 1.0;
                lowest = Math.Min(lowest, deviation);
                highest = Math.Max(highest, deviation);
            }
        }

        output.WriteLine($"Henry 1979 over Eq. 32, 0-40 °C, 600-800 mmHg: {100.0 * lowest:F4} % to {100.0 * highest:F4} %");
        Assert.InRange(lowest, -0.00025, 0.0);
        Assert.InRange(highest, 0.0, 0.00005);
    }

    private static double OtherRoad(double celsius, double pressure)
    {
        Assert.Equal(Status.Ok, VapourWagnerPruss1993.Pressure(celsius, RangeRule.Refuse, out double vapour));
        Assert.Equal(Status.Ok, DensityEos80.Density(celsius, 0.0, RangeRule.Refuse, out double density));
        double kelvin = celsius + 273.15;
        double coefficient = Math.Exp(K0 + (K1 / kelvin) + (K2 / kelvin / kelvin));
        double theta = 0.000975 - (1.426e-5 * celsius) + (6.436e-8 * celsius * celsius);
        double fugacity = 0.20946 * (pressure - vapour) / 1013.25 * (1.0 - (theta * pressure / 1013.25));
        double moleFraction = fugacity / coefficient;
        return moleFraction / (1.0 - moleFraction) * density / WaterGramsPerMole * OxygenUnits.GramsPerMole * 1000.0;
    }
}
