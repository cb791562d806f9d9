using System;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The hot path allocates nothing: on the device every object costs.</summary>
public class AllocationTests
{
    [Fact]
    public void OxygenPath_AllocatesNothing()
    {
        double sum = Run(1);
        long before = GC.GetAllocatedBytesForCurrentThread();
        sum += Run(1000);
        long after = GC.GetAllocatedBytesForCurrentThread();
        Assert.True(double.IsFinite(sum));
        Assert.Equal(0, after - before);
    }

    /// <summary>Every gas, every equation, every function of the general room.</summary>
    [Fact]
    public void EveryGas_AllocatesNothing()
    {
        (Gas Gas, SolubilityEquation Equation)[] pairs = [.. CoreFunctions.Pairs()];
        double sum = RunGases(pairs, 1);
        long before = GC.GetAllocatedBytesForCurrentThread();
        sum += RunGases(pairs, 20);
        long after = GC.GetAllocatedBytesForCurrentThread();
        Assert.True(double.IsFinite(sum));
        Assert.Equal(0, after - before);
    }

    private static double RunGases((Gas Gas, SolubilityEquation Equation)[] pairs, int count)
    {
        double sum = 0.0;
        for (int i = 0; i < count; i++)
        {
            foreach ((Gas gas, SolubilityEquation equation) in pairs)
            {
                double celsius = 12.0 + (15.0 * i / count);
                double high = GasEquilibrium.HighestHectopascal(gas);
                GasEquilibrium.PartialPressure(gas, celsius, 0.0, high, 0.2, 70.0, RangeRule.Refuse, out double partial);
                GasEquilibrium.MilligramsPerLitre(gas, equation, celsius, 0.0, high, 0.2, 70.0, RangeRule.Refuse, out double milligrams);
                GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, celsius, 0.0, high, partial, RangeRule.Refuse, out double given);
                GasEquilibrium.PartialPressureFromConcentration(gas, equation, celsius, 0.0, high, milligrams, RangeRule.Refuse, out double back);
                GasEquilibrium.MilligramsPerLitreSensitivities(
                    gas, equation, celsius, 0.0, high, 0.2, 70.0, RangeRule.Refuse, out double a, out double b, out double c, out double d, out double e);
                GasUncertainty.EquationRelative(gas, equation, celsius, 0.0, high, RangeRule.Refuse, out double relative);
                HenryLaw.Constant(gas, equation, celsius, 0.0, RangeRule.Refuse, out double constant);
                HenryConversion.Convert(HenryForm.Hcp, HenryForm.Kpx, constant, celsius, 998.0, out double volatility);
                sum += partial + milligrams + given + back + a + b + c + d + e + relative + constant + volatility
                    + GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, milligrams);
            }
        }

        return sum;
    }

    private static double Run(int count)
    {
        double sum = 0.0;
        for (int i = 0; i < count; i++)
        {
            double celsius = 40.0 * i / count;
            foreach (SolubilityEquation equation in stackalloc[] { SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992 })
            {
                OxygenEquilibrium.PartialPressure(celsius, 980.0, RangeRule.Refuse, out double partial);
                OxygenEquilibrium.ConcentrationFromPartialPressure(equation, celsius, 20.0, 980.0, partial, RangeRule.Refuse, out double milligrams);
                OxygenEquilibrium.PartialPressureFromConcentration(equation, celsius, 20.0, 980.0, milligrams, RangeRule.Refuse, out double back);
                OxygenEquilibrium.ConcentrationSensitivities(
                    equation, celsius, 20.0, 980.0, partial, RangeRule.Refuse, out double dT, out double dS, out double dP, out double dC);
                OxygenUncertainty.MilligramsPerLitre(equation, celsius, 20.0, 980.0, 0.1, 0.1, 1.0, RangeRule.Refuse, out double uncertainty);
                Saturation.PercentLocal(partial, celsius, 980.0, RangeRule.Refuse, out double percent);
                sum += milligrams + back + dT + dS + dP + dC + uncertainty + percent;
            }
        }

        return sum;
    }
}
