using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Equilibrium;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Uncertainty;

/// <summary>
/// The same question as in <see cref="CoverageTests"/>, put to the command's own budgets: conditions as a person types them, truths drawn from the distributions that the answer lists.
/// </summary>
/// <remarks>Statistical allowance: none, as there; the limits lie six standard errors of the ordinary figure away.</remarks>
public class EquilibriumCoverageTests(ITestOutputHelper output)
{
    private const int OrdinaryTruths = 4_000;
    private const int FullTruths = 100_000;

    private static readonly Dictionary<string, EquilibriumInput> Inputs = new()
    {
        ["temperature"] = EquilibriumInput.Temperature,
        ["salinity"] = EquilibriumInput.Water,
        ["conductivity"] = EquilibriumInput.Water,
        ["specific conductance"] = EquilibriumInput.Water,
        ["salinity relation"] = EquilibriumInput.SalinityRelation,
        ["pressure"] = EquilibriumInput.Pressure,
        ["partial pressure"] = EquilibriumInput.PartialPressure,
        ["mole fraction"] = EquilibriumInput.MoleFraction,
        ["humidity"] = EquilibriumInput.Humidity,
        ["concentration"] = EquilibriumInput.Concentration,
        ["equation"] = EquilibriumInput.Equation,
        ["vapour formula"] = EquilibriumInput.Vapour,
    };

    private static readonly Dictionary<string, (EquilibriumQuantity Quantity, EquilibriumEntry Entry)> Scenarios = new()
    {
        ["lake"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Temperature = "15", TemperatureUncertainty = "0.1K", Salinity = "0", SalinityUncertainty = "0.25", Pressure = "1000hPa", PressureUncertainty = "1hPa" }),
        ["lake per kilogram"] = (EquilibriumQuantity.MicromolesPerKilogram, new() { Temperature = "15", TemperatureUncertainty = "0.1K", Salinity = "0", SalinityUncertainty = "0.25", Pressure = "1000hPa", PressureUncertainty = "1hPa" }),
        ["mountain without barometer"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Temperature = "6", TemperatureWithin = "0.2K", Salinity = "0", Altitude = "1800m" }),
        ["just below zero"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Temperature = "-0.1", TemperatureWithin = "0.05K", Salinity = "0", Pressure = "980hPa", PressureUncertainty = "1hPa" }),
        ["thermometer by its limits, hot"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Temperature = "38", TemperatureWithin = "0.5K", Salinity = "0", Pressure = "1013hPa", PressureUncertainty = "1hPa" }),
        ["sea by conductivity"] = (EquilibriumQuantity.MicromolesPerKilogram, new() { Gas = "O2", Equation = "garcia-gordon-1992", Temperature = "10", TemperatureUncertainty = "0.05K", Conductivity = "38 mS/cm", ConductivityUncertainty = "0.5 mS/cm", Pressure = "1015hPa", PressureUncertainty = "1hPa" }),
        ["cup of half-dry air"] = (EquilibriumQuantity.PartialPressure, new() { Temperature = "30", TemperatureUncertainty = "0.2K", Salinity = "0", Pressure = "1000hPa", PressureUncertainty = "1hPa", Humidity = "75%", HumidityWithin = "25%" }),
        ["carbon dioxide of the air"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Gas = "CO2", Temperature = "12", TemperatureUncertainty = "0.2K", Salinity = "30", SalinityUncertainty = "0.5", Pressure = "1000hPa", PressureUncertainty = "2hPa", MoleFraction = "420ppm", MoleFractionWithin = "50ppm" }),
        ["pCO2 of measured water"] = (EquilibriumQuantity.MeasuredPartialPressure, new() { Gas = "CO2", Temperature = "12", TemperatureUncertainty = "0.2K", Salinity = "0", Pressure = "1000hPa", PressureUncertainty = "2hPa", MoleFraction = "420ppm", Concentration = "2.1mg/L", ConcentrationUncertainty = "0.05mg/L" }),
        ["saturation of measured water"] = (EquilibriumQuantity.PercentLocal, new() { Temperature = "21", TemperatureUncertainty = "0.3K", Salinity = "0", Pressure = "940hPa", PressureUncertainty = "2hPa", Concentration = "7.4mg/L", ConcentrationUncertainty = "0.1mg/L" }),
        ["nitrogen, brackish"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Gas = "N2", Temperature = "18", TemperatureUncertainty = "0.2K", Salinity = "12", SalinityUncertainty = "1", Pressure = "1000hPa", PressureWithin = "5hPa" }),
        ["argon under 3 atm"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Gas = "Ar", Temperature = "20", TemperatureUncertainty = "0.2K", Salinity = "0", Pressure = "3atm", PressureUncertainty = "10hPa", MoleFraction = "1%" }),
        ["methane bubbles"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Gas = "CH4", Temperature = "8", TemperatureUncertainty = "0.3K", Salinity = "0", Pressure = "1000hPa", PressureUncertainty = "3hPa", Mixture = "CH4=60%, CO2=40%" }),
        ["hydrogen sulfide, two figures"] = (EquilibriumQuantity.MilligramsPerLitre, new() { Gas = "H2S", Temperature = "20", TemperatureUncertainty = "0.2K", Salinity = "0", Pressure = "1000hPa", PartialPressure = "2hPa", PartialPressureUncertainty = "0.02hPa" }),
        ["CFC-12 in cold water"] = (EquilibriumQuantity.MicromolesPerLitre, new() { Gas = "CFC-12", Temperature = "2", TemperatureUncertainty = "0.1K", Salinity = "34", SalinityUncertainty = "0.1", Pressure = "1010hPa", PressureUncertainty = "1hPa" }),
    };

    public static TheoryData<string> Names => [.. Scenarios.Keys];

    [Theory]
    [MemberData(nameof(Names))]
    public void Intervals_HoldTheTruthAsOftenAsTheySay(string name)
    {
        (EquilibriumQuantity quantity, EquilibriumEntry entry) = Scenarios[name];
        EquilibriumCase asked = entry.Read();
        GasAtEquilibrium answer = GasAtEquilibrium.Compute(asked);
        EquilibriumResult result = answer.Value(quantity);
        EquilibriumModel model = new(asked);
        Campaign campaign = new(output, "equilibrium coverage " + name, OrdinaryTruths, FullTruths);
        EquilibriumCheck check = answer.Check(quantity, campaign.Count == FullTruths ? 1_000_000 : 50_000, campaign.Seed + 1, null, CancellationToken.None);

        int inCheck = 0;
        int inAnalytic = 0;
        double[] truth = answer.Inputs.ToArray();
        double[] estimate = [.. truth];
        for (int i = 0; i < campaign.Count; i++)
        {
            foreach (EquilibriumPart part in result.Parts)
            {
                int input = (int)Inputs[part.Input];
                truth[input] = estimate[input] + (part.StandardUncertainty * Deviate(campaign.Random, part.IsRectangular));
            }

            double value = model.Value(quantity, truth, RangeRule.Extrapolate, out _);
            Assert.True(double.IsFinite(value));
            inCheck += check.Low <= value && value <= check.High ? 1 : 0;
            inAnalytic += result.Low <= value && value <= result.High ? 1 : 0;
        }

        double monteCarlo = (double)inCheck / campaign.Count;
        double analytic = (double)inAnalytic / campaign.Count;
        EquilibriumPart largest = result.Parts.MaxBy(static part => part.Share)!;
        campaign.Say($"{result.Value:G6}, u {result.StandardUncertainty:G4} (trials {check.StandardDeviation:G4}), k {result.CoverageFactor:F3}, most from {largest.Input} ({100.0 * largest.Share:F0} %); Monte Carlo [{check.Low:G6}, {check.High:G6}] holds {100.0 * monteCarlo:F2} %, analytic [{result.Low:G6}, {result.High:G6}] holds {100.0 * analytic:F2} %");
        campaign.Close();
        Assert.Equal(0, check.Refused);
        Assert.InRange(monteCarlo, 0.93, 0.97);
        Assert.InRange(analytic, 0.93, 1.0);
        // One rectangle that makes more than 70 % of the variance is named.
        Assert.Equal(0.70 < largest.Share && largest.IsRectangular, result.Note is not null);
    }

    private static double Deviate(Random random, bool rectangular)
    {
        // 1 − NextDouble keeps the logarithm away from zero.
        return rectangular
            ? Math.Sqrt(3.0) * ((2.0 * random.NextDouble()) - 1.0)
            : Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }
}
