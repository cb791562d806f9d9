using System;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Analytic derivatives against central differences of the values, over a grid of the whole range.</summary>
public class SensitivityTests(ITestOutputHelper output)
{
    private const double Step = 1.0e-3;

    // Value and sensitivities by name; a sensitivity function gives one derivative for each input, in the order told.
    public static TheoryData<string, string, int[]> Pairs => new()
    {
        { "DensityEos80.Density", "DensityEos80.Sensitivities", new[] { 0, 1 } },
        { "BensonKrause1984.MilligramsPerLitre", "BensonKrause1984.Sensitivities", new[] { 0, 1, 2 } },
        { "GarciaGordon1992.MicromolesPerKilogram", "GarciaGordon1992.Sensitivities", new[] { 0, 1, 2 } },
        { "OxygenEquilibrium.PartialPressure", "OxygenEquilibrium.PartialPressureSensitivities", new[] { 0, 1 } },
        { "OxygenEquilibrium.MilligramsPerLitre, BensonKrause1984", "OxygenEquilibrium.MilligramsPerLitreSensitivities, BensonKrause1984", new[] { 0, 1, 2 } },
        { "OxygenEquilibrium.MilligramsPerLitre, GarciaGordon1992", "OxygenEquilibrium.MilligramsPerLitreSensitivities, GarciaGordon1992", new[] { 0, 1, 2 } },
        { "OxygenEquilibrium.ConcentrationFromPartialPressure, BensonKrause1984", "OxygenEquilibrium.ConcentrationSensitivities, BensonKrause1984", new[] { 0, 1, 2, 3 } },
        { "OxygenEquilibrium.ConcentrationFromPartialPressure, GarciaGordon1992", "OxygenEquilibrium.ConcentrationSensitivities, GarciaGordon1992", new[] { 0, 1, 2, 3 } },
        { "OxygenEquilibrium.PartialPressureFromConcentration, BensonKrause1984", "OxygenEquilibrium.PartialPressureFromConcentrationSensitivities, BensonKrause1984", new[] { 0, 1, 2, 3 } },
        { "OxygenEquilibrium.PartialPressureFromConcentration, GarciaGordon1992", "OxygenEquilibrium.PartialPressureFromConcentrationSensitivities, GarciaGordon1992", new[] { 0, 1, 2, 3 } },
        { "Saturation.PercentLocal", "Saturation.PercentLocalSensitivities", new[] { 0, 1, 2 } },
        { "Saturation.PercentOneAtmosphere", "Saturation.PercentOneAtmosphereSensitivities", new[] { 0, 1 } },
    };

    [Theory]
    [MemberData(nameof(Pairs))]
    public void Derivative_AgreesWithCentralDifference(string valueName, string slopeName, int[] order)
    {
        CoreFunction value = CoreFunctions.Find(valueName);
        CoreFunction slope = CoreFunctions.Find(slopeName);
        double worst = 0.0;
        int count = 0;
        foreach (double celsius in new[] { 0.5, 4.0, 11.0, 18.5, 25.0, 33.0, 39.5 })
        {
            foreach (double salinity in new[] { 0.1, 8.0, 21.0, 35.0, 39.5 })
            {
                foreach (double pressure in new[] { 510.0, 730.0, 1013.25, 1110.0 })
                {
                    foreach (double amount in new[] { -2.0, 0.0, 9.0, 210.0, 1000.0 })
                    {
                        double[] inputs = value.Inputs.Select(i => i.Quantity switch
                        {
                            InputQuantity.Temperature => celsius,
                            InputQuantity.Salinity => salinity,
                            InputQuantity.Pressure => pressure,
                            InputQuantity.Concentration => amount * 0.02,
                            _ => amount,
                        }).ToArray();
                        (Status status, double[] slopes) = slope.Call(inputs, RangeRule.Refuse);
                        Assert.Equal(Status.Ok, status);
                        double size = Math.Abs(value.Call(inputs, RangeRule.Refuse).Values[0]);
                        for (int i = 0; i < order.Length; i++)
                        {
                            // The difference itself errs by step²/6 of the third derivative (about 1e-8 of the slope) and by rounding over the step (1e-12 of the value).
                            double difference = CentralDifference(value, inputs, order[i], Step);
                            double allowed = (2.0e-8 * Math.Abs(difference)) + (2.0e-11 * size) + 1.0e-13;
                            double miss = Math.Abs(slopes[i] - difference);
                            Assert.True(miss <= allowed, $"{slope.Name}[{i}] at {string.Join(' ', inputs)}: {slopes[i]} for {difference}");
                            worst = Math.Max(worst, miss / allowed);
                            count++;
                        }
                    }
                }
            }
        }

        output.WriteLine($"{slopeName}: {count} derivatives, worst {worst:F3} of what is allowed");
    }

    /// <summary>Every gas with every equation: all derivatives of all three functions, over the range of the pair.</summary>
    [Fact]
    public void EveryPair_AgreesWithCentralDifference()
    {
        double worst = 0.0;
        int count = 0;
        string[][] functions =
        [
            ["GasEquilibrium.MilligramsPerLitre", "GasEquilibrium.MilligramsPerLitreSensitivities"],
            ["GasEquilibrium.ConcentrationFromPartialPressure", "GasEquilibrium.ConcentrationSensitivities"],
            ["GasEquilibrium.PartialPressureFromConcentration", "GasEquilibrium.PartialPressureFromConcentrationSensitivities"],
        ];
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            foreach (string[] names in functions)
            {
                count += Compare(CoreFunctions.Find($"{names[0]}, {gas} {equation}"), CoreFunctions.Find($"{names[1]}, {gas} {equation}"), ref worst);
            }
        }

        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            count += Compare(CoreFunctions.Find("GasEquilibrium.PartialPressure, " + gas), CoreFunctions.Find("GasEquilibrium.PartialPressureSensitivities, " + gas), ref worst);
        }

        Assert.True(20000 < count, "only " + count);
        output.WriteLine($"{count} derivatives, worst {worst:F3} of what is allowed");
    }

    private static int Compare(CoreFunction value, CoreFunction slope, ref double worst)
    {
        int count = 0;
        for (int point = 0; point < 48; point++)
        {
            // Each input at a place of its own: fractions of the range that repeat after 3, 4, 5, … points.
            double[] inputs = new double[value.Inputs.Length];
            double[] steps = new double[inputs.Length];
            for (int i = 0; i < inputs.Length; i++)
            {
                Input input = value.Inputs[i];
                double place = 0.05 + (0.9 * (point % (i + 4)) / (i + 3));
                bool open = double.IsNaN(input.Lowest) || double.IsNaN(input.Highest);
                inputs[i] = open ? input.Ordinary * ((2.0 * place) - 0.3) : input.Lowest + (place * (input.Highest - input.Lowest));
                steps[i] = input.Quantity switch
                {
                    InputQuantity.Concentration => 1.0e-4 * input.Ordinary,
                    InputQuantity.MoleFraction => 1.0e-4,
                    InputQuantity.Pressure or InputQuantity.PartialPressure => 1.0e-2,
                    _ => 1.0e-3,
                };
            }

            (Status status, double[] slopes) = slope.Call(inputs, RangeRule.Refuse);
            Assert.Equal(Status.Ok, status);
            double size = Math.Abs(value.Call(inputs, RangeRule.Refuse).Values[0]);
            for (int i = 0; i < inputs.Length; i++)
            {
                // Fresh water only: no salinity on either side.
                if (value.Inputs[i].Quantity == InputQuantity.Salinity && value.Inputs[i].Highest == 0.0) { continue; }
                double difference = CentralDifference(value, inputs, i, steps[i]);
                // step²/6 of the third derivative (below 1e-7 of the slope, or of the value per unit where the slope passes zero), and rounding over the step.
                double allowed = (1.0e-7 * Math.Abs(difference)) + (size * (1.0e-10 + (2.0e-14 / steps[i])));
                double miss = Math.Abs(slopes[i] - difference);
                Assert.True(miss <= allowed, $"{slope.Name}[{i}] at {string.Join(' ', inputs)}: {slopes[i]} for {difference}");
                worst = Math.Max(worst, miss / allowed);
                count++;
            }
        }

        return count;
    }

    /// <summary>At S = 0 the S^1.5 term has a one-sided slope; the functions give it.</summary>
    [Fact]
    public void FreshWater_HasTheOneSidedSlopeInSalinity()
    {
        Assert.Equal(Status.Ok, DensityEos80.Sensitivities(15.0, 0.0, RangeRule.Refuse, out _, out double slope));
        DensityEos80.Density(15.0, 0.0, RangeRule.Refuse, out double at);
        DensityEos80.Density(15.0, 1.0e-8, RangeRule.Refuse, out double beyond);
        Assert.Equal((beyond - at) / 1.0e-8, slope, 1.0e-4);
    }

    /// <summary>
    /// Sensitivities in % as a field practice table prints them, computed there from the same equations (760 mmHg, fresh water): % per K, % per mmHg
    /// and % per hPa. Not outside evidence for the equation, but for the derivatives.
    /// </summary>
    [Theory]
    [InlineData(0.0, 14.62, -2.8, 0.132, 0.099)]
    [InlineData(10.0, 11.29, -2.4, 0.133, 0.100)]
    [InlineData(20.0, 9.09, -2.0, 0.135, 0.101)]
    [InlineData(30.0, 7.56, -1.7, 0.137, 0.103)]
    public void DefaultEquation_PracticeTable(double celsius, double value, double perKelvin, double perMillimetre, double perHectopascal)
    {
        Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(celsius, 0.0, 1013.25, RangeRule.Refuse, out double fresh));
        Assert.Equal(Status.Ok, BensonKrause1984.Sensitivities(celsius, 0.0, 1013.25, RangeRule.Refuse, out double dT, out _, out double dP));
        Assert.Equal(value, Math.Round(fresh, 2));
        Assert.Equal(perKelvin, Math.Round(100.0 * dT / fresh, 1));
        Assert.Equal(perHectopascal, Math.Round(100.0 * dP / fresh, 3));
        Assert.Equal(perMillimetre, Math.Round(100.0 * dP / fresh * PressureUnits.HectopascalPerMillimetreOfMercury, 3));
    }

    private static double CentralDifference(CoreFunction function, double[] inputs, int index, double step)
    {
        double[] above = (double[])inputs.Clone();
        double[] below = (double[])inputs.Clone();
        above[index] += step;
        below[index] -= step;
        double up = function.Call(above, RangeRule.Extrapolate).Values[0];
        double down = function.Call(below, RangeRule.Extrapolate).Values[0];
        return (up - down) / (above[index] - below[index]);
    }
}
