using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Tables;

/// <summary>The C# table in calibration-tables, compiled: against the equation it was made from.</summary>
public class WrittenTableTests(ITestOutputHelper output)
{
    [Fact]
    public void OxygenFresh_KeepsToTheErrorInItsHeader()
    {
        double worst = 0.0;
        for (double celsius = 0.0; celsius <= 40.0; celsius += 0.0625)
        {
            for (double hectopascal = 600.0; hectopascal <= 1100.0; hectopascal += 3.90625)
            {
                Assert.Equal(Status.Ok, OxygenFresh.MilligramsPerLitre(celsius, hectopascal, out double value));
                BensonKrause1984.MilligramsPerLitre(celsius, 0.0, hectopascal, RangeRule.Refuse, out double truth);
                worst = Math.Max(worst, Math.Abs(value - truth));
            }
        }

        output.WriteLine("worst " + worst.ToString("E3", System.Globalization.CultureInfo.InvariantCulture) + " mg/L, stated 0.00987");
        Assert.InRange(worst, 0.009, 0.00987);
        Assert.Equal(Status.TemperatureJustAboveRange, OxygenFresh.MilligramsPerLitre(40.1, 900.0, out double outside));
        Assert.True(double.IsNaN(outside));
    }
}
