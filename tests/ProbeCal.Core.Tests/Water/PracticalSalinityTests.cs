using System;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

/// <summary>Salinity from conductivity: the scale, its low-salinity extension, the seam between them and the derivatives.</summary>
public class PracticalSalinityTests(ITestOutputHelper output)
{
    [Fact]
    public void Salinity_MeetsCheckValues()
    {
        foreach (IGrouping<string, CheckRow> group in CheckRow.Read("practical-salinity.csv", 181).GroupBy(r => r["confidence"]))
        {
            Deviations deviations = new("practical salinity, " + group.Key, output);
            foreach (CheckRow row in group)
            {
                double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
                RangeRule rule = celsius <= 35.0 ? RangeRule.Refuse : RangeRule.Extrapolate;
                Status status = PracticalSalinity.FromConductivity(
                    row.Number("millisiemensPerCentimetre"), celsius, row.Number("decibar"), rule, out double salinity);
                Assert.Equal(rule == RangeRule.Refuse ? Status.Ok : Status.TemperatureAboveRange, status);
                deviations.Compare(salinity, row.Number("expected"), row.Number("tolerance"), row);
            }

            deviations.Finish();
        }
    }

    /// <summary>Both sides of S 2 meet: the jump is that of neighbouring doubles.</summary>
    [Fact]
    public void Extension_JoinsTheScaleAtTwo()
    {
        double worst = 0.0;
        for (double celsius = -2.0; celsius <= 35.0; celsius += 0.5)
        {
            double below = 1.0;
            double above = 6.0;
            while (Math.BitIncrement(below) < above)
            {
                double middle = below + ((above - below) / 2.0);
                Assert.Equal(Status.Ok, PracticalSalinity.FromConductivity(middle, celsius, 0.0, RangeRule.Refuse, out double s));
                if (s < 2.0) { below = middle; } else { above = middle; }
            }

            PracticalSalinity.FromConductivity(below, celsius, 0.0, RangeRule.Refuse, out double low);
            PracticalSalinity.FromConductivity(above, celsius, 0.0, RangeRule.Refuse, out double high);
            worst = Math.Max(worst, high - low);
        }

        output.WriteLine($"jump at S 2: {worst:E2} at most");
        Assert.InRange(worst, 0.0, 1.0e-14);
    }

    [Fact]
    public void Derivatives_AgreeWithCentralDifferences()
    {
        double worst = 0.0;
        int count = 0;
        foreach (double celsius in new[] { -1.5, 0.3, 7.0, 15.0, 22.0, 34.5 })
        {
            foreach (double conductivity in new[] { 0.01, 0.05, 0.3, 1.0, 2.2, 2.9, 5.0, 18.0, 27.0 })
            {
                foreach (double pressure in new[] { 0.0, 10.0, 1500.0 })
                {
                    Assert.Equal(Status.Ok, PracticalSalinity.Sensitivities(
                        conductivity, celsius, pressure, RangeRule.Refuse, out double perConductivity, out double perKelvin));
                    double h = 1.0e-5 * conductivity;
                    double difference = (Value(conductivity + h, celsius, pressure) - Value(conductivity - h, celsius, pressure)) / (2.0 * h);
                    Check(perConductivity, difference, Value(conductivity, celsius, pressure) / conductivity);
                    const double k = 1.0e-3;
                    difference = (Value(conductivity, celsius + k, pressure) - Value(conductivity, celsius - k, pressure)) / (2.0 * k);
                    Check(perKelvin, difference, Value(conductivity, celsius, pressure));
                }
            }
        }

        output.WriteLine($"{count} derivatives, worst {worst:F3} of what is allowed");

        // A difference errs by rounding over the step (1e-11 of the value) and by step²/6 of the third derivative.
        void Check(double slope, double difference, double size)
        {
            double allowed = (1.0e-8 * Math.Abs(difference)) + (1.0e-9 * size);
            worst = Math.Max(worst, Math.Abs(slope - difference) / allowed);
            Assert.True(Math.Abs(slope - difference) <= allowed, $"{slope} for {difference}");
            count++;
        }
    }

    [Fact]
    public void Refusals_NameTheInput()
    {
        Assert.Equal(Status.ConductanceAboveRange, PracticalSalinity.FromConductivity(52.0, 15.0, 0.0, RangeRule.Refuse, out double none));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.ConductanceAboveRange, PracticalSalinity.FromConductivity(52.0, 15.0, 0.0, RangeRule.Extrapolate, out double flagged));
        Assert.InRange(flagged, 43.0, 44.0);
        Assert.Equal(Status.ConductanceAboveRange, PracticalSalinity.FromConductivity(52.0, 15.0, 0.0, RangeRule.NearEdge, out none));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.TemperatureJustAboveRange, PracticalSalinity.FromConductivity(30.0, 35.1, 0.0, RangeRule.NearEdge, out double near));
        Assert.InRange(near, 15.0, 16.0);
    }

    /// <summary>Where the extension turns negative the salinity is 0 and does not answer; the gsw toolbox does the same.</summary>
    [Fact]
    public void PureWater_IsZero()
    {
        foreach (double conductivity in new[] { 0.0, 5.5e-5, 1.0e-3 })
        {
            Assert.Equal(Status.Ok, PracticalSalinity.FromConductivity(conductivity, 25.0, 0.0, RangeRule.Refuse, out double salinity));
            Assert.Equal(0.0, salinity);
            Assert.Equal(Status.Ok, PracticalSalinity.Sensitivities(conductivity, 25.0, 0.0, RangeRule.Refuse, out double a, out double b));
            Assert.Equal(0.0, a);
            Assert.Equal(0.0, b);
        }

        Assert.Equal(Status.Ok, PracticalSalinity.FromConductivity(2.0e-3, 25.0, 0.0, RangeRule.Refuse, out double rain));
        Assert.InRange(rain, 1.0e-5, 1.0e-3);
    }

    /// <summary>Sea salt of S 35 is chlorinity 19.374 (the definition's own number) and 35 the other way.</summary>
    [Fact]
    public void Chlorinity_GivesSalinity()
    {
        Assert.Equal(Status.Ok, Chlorinity.Salinity(19.374, RangeRule.Refuse, out double salinity));
        Assert.Equal(35.0, salinity, 1.0e-3);
        Assert.Equal(Status.Ok, Chlorinity.Salinity(0.0, RangeRule.Refuse, out double fresh));
        Assert.Equal(0.0, fresh);
    }

    private static double Value(double conductivity, double celsius, double pressure)
    {
        Assert.Equal(Status.Ok, PracticalSalinity.FromConductivity(conductivity, celsius, pressure, RangeRule.Refuse, out double salinity));
        return salinity;
    }
}
