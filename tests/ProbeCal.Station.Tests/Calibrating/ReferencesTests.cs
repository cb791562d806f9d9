using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>What is true at a point, by every method: values by hand, budgets by Monte Carlo, and one clear line for what cannot be.</summary>
public class ReferencesTests(ITestOutputHelper output)
{
    private const double Celsius = 20.0;
    private const double Hectopascal = 950.0;
    private const string Titres = "8.02mL,8.05mL,8.03mL,8.04mL flask 300.2mL u 0.1mL titrant 0.02501mol/L u 0.00005mol/L drawn 19.6C blank 0.01mL u 0.005mL";

    private static readonly Conditions At = new(Celsius, "line", Hectopascal);

    private static CalibrationSetup Setup => Bench.Setup with { Salinity = new RecordedQuantity { Value = 5, Unit = "1", StandardUncertainty = 0.2, Source = "typed" } };

    /// <summary>The two methods that there were before give what they gave: Core's own functions for oxygen, squares added.</summary>
    [Theory]
    [InlineData(MethodIds.AirSaturatedWater, 0.0075)]
    [InlineData(MethodIds.WaterSaturatedAir, 0.00035)]
    public void AirInEquilibrium_IsCoresOwnReference(string method, double state)
    {
        CalibrationSetup setup = Setup with { Method = method, ReferenceStateRelative = state };
        PointReference reference = References.Of(new PlannedPoint { Role = "span", Method = method }, setup, At, 0.03);

        OxygenEquilibrium.PartialPressure(Celsius, Hectopascal, RangeRule.Refuse, out double p);
        OxygenEquilibrium.MilligramsPerLitre(setup.Equation, Celsius, 5, Hectopascal, RangeRule.Refuse, out double c);
        double kelvin = Math.Sqrt((0.03 * 0.03) + (0.1 * 0.1));
        OxygenUncertainty.PartialPressure(Celsius, Hectopascal, kelvin, 0.77, RangeRule.Refuse, out double ofP);
        OxygenUncertainty.MilligramsPerLitre(setup.Equation, Celsius, 5, Hectopascal, kelvin, 0.2, 0.77, RangeRule.Refuse, out double ofC);
        Assert.Equal(p, reference.Hectopascal);
        Assert.Equal(c, reference.MilligramsPerLitre);
        Assert.Equal(Math.Sqrt((ofP * ofP) + (p * state * p * state)), reference.StandardUncertaintyHectopascal, 12);
        Assert.Equal(Math.Sqrt((ofC * ofC) + (c * state * c * state)), reference.StandardUncertaintyMilligramsPerLitre!.Value, 12);
        Assert.Equal(["B-12"], reference.Recorded!.Equipment);
    }

    /// <summary>p = x·(P − h·pw), by hand with the vapour pressure of water at 20 °C, 23.39 hPa (Wagner and Pruss; 0.1 % from the formula used).</summary>
    [Theory]
    [InlineData("CYL-21 20.95% u 0.02% dry", 0.2095 * 950.0)]
    [InlineData("CYL-21 20.95% u 0.02% humid 100% u 1%", 0.2095 * (950.0 - 23.39))]
    [InlineData("CYL-21 10.02% within 0.02% humid 50% u 5%", 0.1002 * (950.0 - 11.695))]
    public void GasMixture_IsFractionOfWhatTheVapourLeaves(string mixture, double expected)
    {
        PointReference reference = Of(MethodIds.GasMixture, mixture);
        Assert.Equal(expected, reference.Hectopascal, 0.01);
        // What a litre of the water would hold: Core's equation at that partial pressure.
        OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, Celsius, 5, Hectopascal, reference.Hectopascal, RangeRule.Refuse, out double c);
        Assert.Equal(c, reference.MilligramsPerLitre!.Value, 10);
        Assert.Equal(["B-12", "CYL-21"], reference.Recorded!.Equipment);
    }

    /// <summary>A standard in whatever unit at the same truth gives the same partial pressure.</summary>
    [Fact]
    public void TransferStandard_GivesOneTruthInEveryUnit()
    {
        OxygenEquilibrium.PartialPressure(Celsius, Hectopascal, RangeRule.Refuse, out double air);
        double p = 0.8 * air;
        OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, Celsius, 5, Hectopascal, p, RangeRule.Refuse, out double c);
        OxygenEquilibrium.PartialPressure(Celsius, 1013.25, RangeRule.Refuse, out double oneAtmosphere);
        (string Unit, double Value)[] shown = [("hPa", p), ("mg/L", c), ("umol/L", c * 1000 / 31.9988), ("%local", 80), ("%1atm", 100 * p / oneAtmosphere)];
        foreach ((string unit, double value) in shown)
        {
            string text = FormattableString.Invariant($"STD-3 {value - 0.5:R}{unit} u 0.1{unit} correction 0.5{unit} u 0{unit}");
            PointReference reference = Of(MethodIds.TransferStandard, text);
            Assert.Equal(p, reference.Hectopascal, 9);
            Assert.Equal(c, reference.MilligramsPerLitre!.Value, 9);
            Assert.Equal(["B-12", "STD-3"], reference.Recorded!.Equipment);
        }
    }

    /// <summary>
    /// The titration by hand: mean titre 8.035 mL, less the blank, at 0.02501 mol/L and a quarter of 31.9988 g/mol, less 0.00243 mg of the reagents, in 298.2 mL: 5.3744 mg/L where the samples were drawn. The water
    /// warmed by 0.4 K since and its litre holds 0.0082 % less (water expands by 0.21 per mille per kelvin at 20 °C).
    /// </summary>
    [Fact]
    public void Titration_ByHand()
    {
        double found = (8.035 - 0.01) * 0.02501 * 31.9988 / 4.0;
        double drawn = (found - (0.0017 * 1.42905)) / 0.2982;
        PointReference reference = Of(MethodIds.Titration, Titres);
        Assert.Equal(drawn * (1 - 0.000082), reference.MilligramsPerLitre!.Value, 0.0001);
        OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, Celsius, 5, Hectopascal, reference.MilligramsPerLitre!.Value, RangeRule.Refuse, out double p);
        Assert.Equal(p, reference.Hectopascal, 9);

        // Scatter of 8.02, 8.05, 8.03, 8.04: s = 0.012910; t for three degrees of freedom 3.18 over 1.96; √4.
        RecordedReferenceContribution titre = reference.Recorded!.Budget.Single(static line => line.Input == ReferenceInputs.Titre);
        Assert.Equal(0.0129099 * 3.18 / 1.96 / 2.0, titre.StandardUncertainty, 0.000001);
    }

    /// <summary>Trap of the trade: the displaced sample is counted once, however the titration is written down.</summary>
    [Fact]
    public void Displacement_IsCountedOnce()
    {
        double whole = Of(MethodIds.Titration, "12.06mL,12.06mL flask 300mL titrant 0.025mol/L u 0.0001mol/L drawn 20C displaced 2mL reagents 0mg").MilligramsPerLitre!.Value;
        double aliquot = Of(MethodIds.Titration, "8.0802mL,8.0802mL flask 300mL aliquot 201mL titrant 0.025mol/L u 0.0001mol/L drawn 20C displaced 2mL reagents 0mg").MilligramsPerLitre!.Value;
        Assert.Equal(whole, aliquot, 9);
        Assert.Equal(12.06 * 0.025 * 31.9988 / 4.0 / 0.298, whole, 9);
    }

    /// <summary>The methods by Monte Carlo: the full formula on inputs drawn from the budget's own distributions gives the analytic uncertainty, in both quantities.</summary>
    [Theory]
    [InlineData(MethodIds.AirSaturatedWater, "")]
    [InlineData(MethodIds.WaterSaturatedAir, "")]
    [InlineData(MethodIds.WaterSaturatedAir, "air humid 97% u 1.5%")]
    [InlineData(MethodIds.GasMixture, "CYL-21 20.95% u 0.1% dry")]
    [InlineData(MethodIds.GasMixture, "CYL-21 10.02% within 0.05% humid")]
    [InlineData(MethodIds.ZeroGas, "CYL-2 0ppm u 5ppm dry")]
    [InlineData(MethodIds.ZeroSolution, "")]
    [InlineData(MethodIds.TransferStandard, "STD-3 7.41mg/L u 0.05mg/L correction 0.02mg/L u 0.03mg/L")]
    [InlineData(MethodIds.TransferStandard, "STD-3 231umol/L within 3umol/L")]
    [InlineData(MethodIds.TransferStandard, "STD-3 97.1%local u 0.6%local")]
    [InlineData(MethodIds.TransferStandard, "STD-3 91.1%1atm u 0.6%1atm")]
    [InlineData(MethodIds.TransferStandard, "STD-3 152.1hPa u 1.2hPa")]
    [InlineData(MethodIds.Titration, Titres)]
    [InlineData(MethodIds.Titration, "5.38mL,5.42mL flask 300mL aliquot 201mL titrant 0.025mol/L u 0.0002mol/L drawn 20C")]
    [InlineData(MethodIds.Titration, "0.7312mL,0.7323mL,0.7318mL flask 125.4mL standard 10mL normality 0.0118N against 0.6488mL 0.6491mL 0.6486mL drawn 21C burette u 0.0008mL")]
    public void MonteCarlo_AgreesWithTheBudget(string method, string text)
    {
        PlannedPoint plan = Plan("span", method, text);
        ReferenceSum sum = References.Sum(plan, Setup, At, UncertaintyDefaults.TemperatureKelvin);
        string[] names = [.. sum.Inputs.Select(static input => input.Name)];
        Campaign campaign = new(output, $"references-{method}-{text.Length}", 40_000, 1_000_000);
        bool dissolved = !double.IsNaN(sum.MilligramsPerLitre);
        foreach (bool concentration in dissolved ? new[] { false, true } : [false])
        {
            UncertaintyBudget budget = concentration ? sum.OfMilligramsPerLitre() : sum.OfHectopascal();
            MonteCarloResult trials = MonteCarlo.Run(budget, drawn => Model(plan, new Drawn(names, drawn), concentration), campaign.Count, campaign.Random);
            campaign.Say($"{budget.Unit}: value {budget.Value:F4}, analytic u {budget.StandardUncertainty:F5}, Monte Carlo mean {trials.Mean:F4}, u {trials.StandardDeviation:F5}, refused {trials.Refused}");
            Assert.Equal(0, trials.Refused);
            // Five standard errors of a deviation, and 1 % for what a straight line leaves of curved formulas.
            double tolerance = ((5.0 / Math.Sqrt(2.0 * campaign.Count)) + 0.01) * budget.StandardUncertainty;
            Assert.InRange(trials.StandardDeviation, budget.StandardUncertainty - tolerance, budget.StandardUncertainty + tolerance);
            Assert.InRange(trials.Mean, budget.Value - (0.05 * budget.StandardUncertainty), budget.Value + (0.05 * budget.StandardUncertainty));
        }

        campaign.Close();
    }

    [Fact]
    public void Budget_HasEveryInputWithItsSource_LargestFirst()
    {
        foreach ((string method, string text) in EveryMethod())
        {
            PointReference reference = References.Of(Plan("span", method, text), Setup, At, 0.03);
            RecordedReferenceContribution[] budget = reference.Recorded!.Budget;
            Assert.NotEmpty(budget);
            Assert.All(budget, static line => Assert.False(string.IsNullOrWhiteSpace(line.Source)));
            Assert.Equal(budget.OrderByDescending(static line => Math.Abs(line.Hectopascal)).Select(static line => line.Input), budget.Select(static line => line.Input));
            Assert.Equal(reference.StandardUncertaintyHectopascal, Math.Sqrt(budget.Sum(static line => line.Hectopascal * line.Hectopascal)), 1e-12);
            Assert.Equal(budget.Select(static line => line.Input).Distinct().Count(), budget.Length);
        }
    }

    /// <summary>One barometer, one cylinder, one titrant err alike at every point; the scatter of titres and what a standard showed do not.</summary>
    [Fact]
    public void CommonInputs_AreToldFromThoseOfOnePoint()
    {
        Assert.True(ReferenceInputs.IsCommon(ReferenceInputs.Pressure));
        Assert.True(ReferenceInputs.IsCommon(ReferenceInputs.Fraction("CYL-21")));
        Assert.True(ReferenceInputs.IsCommon(ReferenceInputs.Titrant));
        Assert.True(ReferenceInputs.IsCommon(ReferenceInputs.Correction("STD-3")));
        Assert.False(ReferenceInputs.IsCommon(ReferenceInputs.Titre));
        Assert.False(ReferenceInputs.IsCommon(ReferenceInputs.Shown("STD-3")));
        Assert.False(ReferenceInputs.IsCommon(ReferenceInputs.Temperature));
        Assert.False(ReferenceInputs.IsCommon(ReferenceInputs.ThermometerOffset));
    }

    /// <summary>A probe of total gas pressure feels the barometer's pressure in air, and more uncertainty in water that is only nearly saturated.</summary>
    [Fact]
    public void TotalGas_IsTheStationPressure()
    {
        CalibrationSetup setup = Setup with { Probe = Setup.Probe with { Model = "total-gas" } };
        PointReference air = References.Of(Plan("span", MethodIds.WaterSaturatedAir, ""), setup, At, 0.03);
        Assert.Equal(950.0, air.Hectopascal);
        Assert.Equal(0.77, air.StandardUncertaintyHectopascal, 12);
        Assert.Null(air.MilligramsPerLitre);
        PointReference water = References.Of(Plan("span", MethodIds.AirSaturatedWater, ""), setup, At, 0.03);
        Assert.Equal(Math.Sqrt((0.77 * 0.77) + (7.125 * 7.125)), water.StandardUncertaintyHectopascal, 12);
        Assert.Contains("total gas", Refused(Plan("span", MethodIds.Titration, Titres), setup), StringComparison.Ordinal);
        Assert.Contains("hPa", Refused(Plan("span", MethodIds.TransferStandard, "STD-3 8mg/L u 0.1mg/L"), setup), StringComparison.Ordinal);
        Assert.Equal(1012.0, References.Of(Plan("span", MethodIds.TransferStandard, "GAUGE 1012hPa u 1hPa"), setup, At, 0.03).Hectopascal, 9);
    }

    /// <summary>Carbon dioxide in air changes from place to place; from a cylinder it is what the certificate says.</summary>
    [Fact]
    public void OtherGases_HaveMixturesAndNoAir()
    {
        CalibrationSetup setup = Setup with { Gas = Gas.CarbonDioxide };
        Assert.Contains("gas-mixture", Refused(Plan("span", MethodIds.AirSaturatedWater, ""), setup), StringComparison.Ordinal);
        Assert.Contains("zero-gas", Refused(Plan("zero", MethodIds.ZeroSolution, ""), setup), StringComparison.Ordinal);
        Assert.Contains("0ppm", Refused(Plan("zero", MethodIds.ZeroGas, ""), setup), StringComparison.Ordinal);
        Assert.Contains("oxygen", Refused(Plan("span", MethodIds.Titration, Titres), setup), StringComparison.Ordinal);
        PlannedPoint mixture = new() { Role = "span", Method = MethodIds.GasMixture, Mixture = MixtureText.Parse("--mixture", "CYL-7 1000ppm u 5ppm dry", Gas.CarbonDioxide) };
        PointReference reference = References.Of(mixture, setup, At, 0.03);
        Assert.Equal(0.95, reference.Hectopascal, 12);
        Assert.Equal(0.95 * 0.005, reference.StandardUncertaintyHectopascal, 0.0001);
        // Weiss 1974: 0.0388 mol/(L·atm) at 20 °C and S 5 (0.0392 fresh), times 44.01 g/mol.
        Assert.Equal(0.95 / 1013.25 * 0.0382 * 44010, reference.MilligramsPerLitre!.Value, 0.03);
        Assert.Equal(231.0 * 1013.25 / 1e6 / 0.0382, References.Of(Plan("span", MethodIds.TransferStandard, "STD-3 231umol/L u 1umol/L"), setup, At, 0.03).Hectopascal, 0.15);
    }

    [Theory]
    [InlineData(MethodIds.GasMixture, "cylinder")]
    [InlineData(MethodIds.Titration, "titres are missing")]
    [InlineData(MethodIds.TransferStandard, "what did the standard show")]
    [InlineData("winkler", "there are air-saturated-water")]
    public void WhatIsMissing_IsTold(string method, string says)
    {
        Assert.Contains(says, Refused(new PlannedPoint { Role = "span", Method = method }, Setup), StringComparison.Ordinal);
    }

    [Fact]
    public void OutsideTheEquation_IsTold()
    {
        string said = Assert.Throws<InputException>(() => References.Of(
            Plan("span", MethodIds.AirSaturatedWater, ""), Setup, At with { TemperatureCelsius = 45 }, 0.03)).Message;
        Assert.Contains("temperature 45 C", said, StringComparison.Ordinal);
        Assert.Contains("0 to 40", said, StringComparison.Ordinal);
    }

    /// <summary>Titrations that were read from somewhere else than the text are refused as clearly.</summary>
    [Fact]
    public void TitrationThatCannotBe_IsRefusedInOneLine()
    {
        RecordedTitration good = TitrationText.Parse("--titration", Titres);
        (RecordedTitration Titration, string Says)[] bad =
        [
            (good with { TitreMillilitres = [-0.1, 8] }, "a titre of -0.1 mL cannot be"),
            (good with { TitreMillilitres = [0.005, 8] }, "below the blank of 0.01 mL"),
            (good with { TitreMillilitres = [8] }, "one titre"),
            (good with { TitreMillilitres = [] }, "no titre"),
            (good with { TitreMillilitres = [double.NaN, 8] }, "cannot be"),
            (good with { Flask = good.Flask with { Value = 0 } }, "a flask of 0 mL"),
            (good with { Flask = good.Flask with { Value = 2 } }, "holds no sample"),
            (good with { Aliquot = good.Flask with { Value = 301 } }, "more than the flask"),
            (good with { Titrant = good.Titrant with { Value = 0 } }, "titrates nothing"),
            (good with { TitreMillilitres = [0.011, 0.011] }, "not below 20 umol/kg"),
            (good with { DrawCelsius = 99 }, "drawn at 99 C"),
        ];
        foreach ((RecordedTitration titration, string says) in bad)
        {
            string said = Refused(new PlannedPoint { Role = "span", Method = MethodIds.Titration, Titration = titration }, Setup);
            Assert.Contains(says, said, StringComparison.Ordinal);
            Assert.DoesNotContain('\n', said);
        }
    }

    internal static IEnumerable<(string Method, string Text)> EveryMethod()
    {
        yield return (MethodIds.AirSaturatedWater, "");
        yield return (MethodIds.WaterSaturatedAir, "");
        yield return (MethodIds.WaterSaturatedAir, "air humid 97% u 1.5%");
        yield return (MethodIds.GasMixture, "CYL-21 20.95% u 0.1% dry");
        yield return (MethodIds.GasMixture, "CYL-21 20.95% u 0.1% humid");
        yield return (MethodIds.ZeroGas, "");
        yield return (MethodIds.ZeroSolution, "");
        yield return (MethodIds.TransferStandard, "STD-3 7.41mg/L u 0.05mg/L");
        yield return (MethodIds.Titration, Titres);
    }

    internal static PlannedPoint Plan(string role, string method, string text)
    {
        return new PlannedPoint
        {
            Role = role,
            Method = method,
            Mixture = text.Length != 0 && method is MethodIds.GasMixture or MethodIds.ZeroGas or MethodIds.WaterSaturatedAir && text.Length != 0 ? MixtureText.Parse("--mixture", text, Gas.Oxygen) : null,
            Transfer = method == MethodIds.TransferStandard ? TransferText.Parse("--transfer", text) : null,
            Titration = method == MethodIds.Titration ? TitrationText.Parse("--titration", text) : null,
        };
    }

    /// <summary>The full formulas, written down once more from drawn inputs with Core's value functions alone: it knows no slope.</summary>
    private static double Model(PlannedPoint plan, Drawn x, bool concentration)
    {
        const SolubilityEquation equation = SolubilityEquation.BensonKrause1984;
        double celsius = x.Of(ReferenceInputs.Temperature, Celsius) + x.Of(ReferenceInputs.ThermometerOffset, 0);
        double pressure = x.Of(ReferenceInputs.Pressure, Hectopascal);
        double salinity = x.Of(ReferenceInputs.Salinity, 5);
        double scale = x.Of(ReferenceInputs.Equation, 1);
        double p;
        switch (plan.Method)
        {
            case MethodIds.ZeroSolution:
                double left = x.Of(ReferenceInputs.ZeroOxygen, 0);
                return concentration ? left : Dissolved(left, 1);
            case MethodIds.AirSaturatedWater:
            case MethodIds.WaterSaturatedAir when plan.Mixture == null:
                GasEquilibrium.PartialPressure(Gas.Oxygen, celsius, 0, pressure, 0.20946, 100, RangeRule.Refuse, out p);
                p *= x.Of(ReferenceInputs.State, 1);
                break;
            case MethodIds.WaterSaturatedAir:
            case MethodIds.GasMixture:
            case MethodIds.ZeroGas:
                double fraction = x.Of(ReferenceInputs.Fraction(plan.Mixture!.Cylinder), 0);
                VapourBensonKrause1980.Pressure(celsius, RangeRule.Refuse, out double vapour);
                p = fraction * (pressure - (x.Of(ReferenceInputs.Humidity, 0) / 100 * vapour));
                break;
            case MethodIds.TransferStandard:
                double shown = x.Of(ReferenceInputs.Shown("STD-3"), 0) + x.Of(ReferenceInputs.Correction("STD-3"), 0);
                switch (plan.Transfer!.Shown.Unit)
                {
                    case "mg/L":
                        return concentration ? shown : Dissolved(shown, scale);
                    case "umol/L":
                        return concentration ? shown * 0.0319988 : Dissolved(shown * 0.0319988, scale);
                    case "hPa":
                        p = shown;
                        break;
                    default:
                        OxygenEquilibrium.PartialPressure(celsius, plan.Transfer.Shown.Unit == "%local" ? pressure : 1013.25, RangeRule.Refuse, out double full);
                        p = shown / 100 * full;
                        break;
                }

                break;
            default:
                RecordedTitration titration = plan.Titration!;
                double titre = x.Of(ReferenceInputs.Titre, 0) + x.Of(ReferenceInputs.Burette, 0);
                double found = 31.9988 / 4 * x.Of(ReferenceInputs.Titrant, 0) * (titre - x.Of(ReferenceInputs.Blank, 0));
                double flask = x.Of(ReferenceInputs.Flask, 0);
                found *= titration.Aliquot == null ? 1 : flask / x.Of(ReferenceInputs.Aliquot, 0);
                double drawn = 1000 * (found - x.Of(ReferenceInputs.ReagentOxygen, 0)) / (flask - x.Of(ReferenceInputs.Displaced, 0));
                DensityEos80.Density(celsius, 5, RangeRule.Refuse, out double now);
                DensityEos80.Density(titration.DrawCelsius, 5, RangeRule.Refuse, out double then);
                double milligrams = drawn * now / then;
                return concentration ? milligrams : Dissolved(milligrams, scale);
        }

        if (!concentration)
        {
            return p;
        }

        OxygenEquilibrium.ConcentrationFromPartialPressure(equation, celsius, salinity, pressure, p, RangeRule.Refuse, out double c);
        return c * scale;

        double Dissolved(double milligramsPerLitre, double ofEquation)
        {
            OxygenEquilibrium.PartialPressureFromConcentration(equation, celsius, salinity, pressure, milligramsPerLitre / ofEquation, RangeRule.Refuse, out double back);
            return back;
        }
    }

    private static PointReference Of(string method, string text)
    {
        return References.Of(Plan("span", method, text), Setup, At, 0.03);
    }

    private static string Refused(PlannedPoint plan, CalibrationSetup setup)
    {
        return Assert.Throws<InputException>(() => References.Of(plan, setup, At, 0.03)).Message;
    }

    private readonly ref struct Drawn(string[] names, ReadOnlySpan<double> values)
    {
        private readonly ReadOnlySpan<double> _values = values;

        internal double Of(string name, double otherwise)
        {
            int at = Array.IndexOf(names, name);
            return at < 0 ? otherwise : _values[at];
        }
    }
}
