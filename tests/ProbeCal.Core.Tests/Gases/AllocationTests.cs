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
