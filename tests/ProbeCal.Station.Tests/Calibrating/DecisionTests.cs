using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Simulation;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>The decision rule, the uncertainty of an error, and the budget with its check by drawing.</summary>
public class DecisionTests
{
    private static readonly DateTimeOffset Now = new(2026, 6, 2, 9, 0, 0, TimeSpan.Zero);

    [Theory]
    // Error, standard uncertainty, guard band, verdict; the limit is 0.2 mg/L.
    [InlineData(0.19, 0.09, false, "pass")]
    [InlineData(-0.2, 0.09, false, "pass")]
    [InlineData(0.21, 0.01, false, "fail")]
    [InlineData(0.01, 0.3, false, "pass")]
    [InlineData(0.11, 0.04, true, "pass")]
    [InlineData(-0.11, 0.04, true, "pass")]
    [InlineData(0.13, 0.04, true, "inconclusive")]
    [InlineData(-0.19, 0.04, true, "inconclusive")]
    [InlineData(0.21, 0.04, true, "fail")]
    [InlineData(0.01, 0.11, true, "inconclusive")]
    public void Verdict_FollowsTheRule(double error, double standard, bool band, string verdict)
    {
        RecordedLimit limit = Decision.Judged(Blank(error), 0.2, standard, band);
        Assert.Equal(verdict, limit.Verdict);
        Assert.Equal(2 * standard, limit.ExpandedUncertainty!.Value, 1e-12);
        Assert.Equal(2, limit.CoverageFactor);
        Assert.Equal(0.2 / (2 * standard), limit.LimitToUncertainty!.Value, 1e-9);
        Assert.Equal(band && 2 * standard < 0.2 && Math.Abs(error) <= 0.2 ? 2 * standard : null, limit.GuardBand);
    }

    [Fact]
    public void GuardBand_WhereUIsNotBelowTheLimit_IsRefusedInOneLineWithBothFigures()
    {
        RecordedLimit limit = Decision.Judged(Blank(0.01), 0.2, 0.11, guardBand: true);
        Assert.Equal("no guard band: U 0.220 mg/L (k = 2) is not below the limit 0.200 mg/L, so that nothing could pass", limit.Applied);
        Assert.Contains("inconclusive: no guard band: U 0.220 mg/L", Assert.Single(Judgement.Reasons([limit])), StringComparison.Ordinal);
    }

    [Fact]
    public void NothingFound_IsNotJudged()
    {
        Assert.Equal("not-judged", Decision.Judged(Blank(null), 0.2, 0.01, guardBand: false).Verdict);
    }

    [Theory]
    [InlineData("pass", "pass", "pass")]
    [InlineData("pass", "inconclusive", "inconclusive")]
    [InlineData("inconclusive", "fail", "fail")]
    [InlineData("pass", "not-judged", "fail")]
    public void WholeRecord_IsAsItsWorstDecidingLimit(string first, string second, string whole)
    {
        RecordedLimit[] limits = [Blank(0) with { Verdict = first }, Blank(0) with { Verdict = second }, Blank(0) with { Verdict = "fail", Decides = false }];
        Assert.Equal(whole, Decision.Of(limits));
    }

    [Fact]
    public async Task Record_StatesTheRule_U_AndWhichOfTheTwoLimitsApplied()
    {
        using Bench bench = new();
        await using SimulatedSource source = bench.Source();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup, source);
        RecordedLimit left = record.Limits.Single(static limit => limit.Check == "as-left");
        Assert.StartsWith("simple acceptance", record.Result.DecisionRule, StringComparison.Ordinal);
        Assert.Equal("0.200 mg/L, the mg/L limit", left.Applied);
        Assert.Equal("pass", left.Verdict);
        Assert.True(left.Decides);

        // The reference alone: 0.75 % of the bath, 0.77 hPa of 917 hPa without vapour, 0.1 K of vapour (1.45 hPa/K at 20 °C, from memory), k = 2.
        double bath = 0.0075;
        double barometer = 0.77 / (940 - GuardCases.Vapour(20));
        double vapour = 0.1 * 1.45 / (940 - GuardCases.Vapour(20));
        double reference = 2 * GuardCases.Saturation(20, 940) * Math.Sqrt((bath * bath) + (barometer * barometer) + (vapour * vapour));
        Assert.InRange(left.ExpandedUncertainty!.Value, reference * 0.99, reference * 1.05);
        Assert.Contains(record.Formulas, static line => line.Contains("20000 trials, seed 101", StringComparison.Ordinal));
        Assert.DoesNotContain(record.Findings, static finding => finding.Guard == GuardNames.UncertaintyCheck);
    }

    [Fact]
    public async Task GuardBand_DrawsTheLimitIn_AndColdWaterIsJudgedByTheTwoPercent()
    {
        using Bench bench = new();
        SimulationSettings cold = Bench.Water with { TemperatureCelsius = 4, PressureHectopascal = 1000 };
        await using SimulatedSource source = bench.Source(cold);
        CalibrationSetup setup = Bench.Setup with { Altitude = null, ReferenceStateRelative = 0.004, Limits = new CalibrationLimits { GuardBand = true } };
        CalibrationRecord record = await bench.CalibrateAsync(setup, source);
        RecordedLimit left = record.Limits.Single(static limit => limit.Check == "as-left");
        Assert.Equal($"{(0.02 * GuardCases.Saturation(4, 1000)).ToString("F3", System.Globalization.CultureInfo.InvariantCulture)} mg/L, the % limit", left.Applied);
        Assert.StartsWith("guard band w = U", record.Result.DecisionRule, StringComparison.Ordinal);
        Assert.Equal(left.ExpandedUncertainty, left.GuardBand);
        Assert.Equal("pass", left.Verdict);
        Assert.True(record.Result.Pass);
    }

    [Fact]
    public void Error_OfAZero_HasTheSolutionAndTheSignal()
    {
        RecordedPoint zero = Zero();
        ProbeCalibration calibration = Fitting.Of(Bench.Setup, [Span(20)], null).Calibration!;
        double standard = ErrorUncertainty.InMilligramsPerLitre(Bench.Setup, zero, calibration)!.Value;
        // 0.02 mg/L of oxygen in the solution, and 0.5 nA of 90 nA over 8.4 mg/L.
        double perSignal = Span(20).ReferenceMilligramsPerLitre / Span(20).Signal.Mean;
        Assert.Equal(Math.Sqrt((0.02 * 0.02) + (0.5 * perSignal * 0.5 * perSignal)), standard, 0.0005);
    }

    public static TheoryData<double, double, bool, double, double> Conditions()
    {
        TheoryData<double, double, bool, double, double> conditions = [];
        foreach (double celsius in new[] { 4.0, 15.0, 20.0, 33.0 })
        {
            foreach (bool measured in new[] { false, true })
            {
                conditions.Add(celsius, 0.1, measured, 0.0075, 0.77);
                conditions.Add(celsius, 0.4, measured, 0.002, 10);
                conditions.Add(celsius, 0, measured, 0.02, 0.3);
            }
        }

        return conditions;
    }

    [Theory]
    [MemberData(nameof(Conditions))]
    public void Budget_AgreesWithDrawing_AndItsSharesAddUp(double celsius, double offset, bool zeroMeasured, double state, double barometer)
    {
        CalibrationSetup setup = Bench.Setup with
        {
            ReferenceStateRelative = state,
            Pressure = Bench.Setup.Pressure with { StandardUncertaintyHectopascal = barometer },
            Probe = Bench.Setup.Probe with { Thermometer = Bench.Setup.Probe.Thermometer with { CommonStandardUncertaintyCelsius = offset } },
            ZeroPlan = zeroMeasured ? CalibrationIds.ZeroAdjust : CalibrationIds.ZeroKeep,
        };
        RecordedPoint span = Span(celsius) with { Pressure = Span(celsius).Pressure with { StandardUncertainty = barometer } };
        Fit fit = Fitting.Of(setup, zeroMeasured ? [span, Zero()] : [span], null);
        CheckedBudget budget = CheckedBudget.Of(setup, span, fit, fit.Calibration!, null);
        Assert.True(budget.Disagreement == null, budget.Text);
        AssertSorted(budget.Table, 100 * fit.Calibration!.SlopeRelativeUncertainty());
    }

    [Theory]
    [InlineData("mg/L")]
    [InlineData("%local")]
    public void Budget_OfAMeter_AgreesWithDrawing(string shows)
    {
        RecordedMeterSettings meter = new() { Shows = shows, Equation = "benson-krause-1984", Salinity = 0, Resolution = 0.01 };
        CalibrationSetup setup = Bench.Setup with { Readings = CalibrationIds.Typed, Probe = Bench.Setup.Probe with { Model = "meter-display", MeterSettings = meter } };
        RecordedPoint span = Span(12);
        span = span with { Typed = true, SignalStandardUncertainty = 0.006, Signal = span.Signal with { Mean = shows == "mg/L" ? span.ReferenceMilligramsPerLitre : 99.4 } };
        Fit fit = Fitting.Of(setup, [span], null);
        CheckedBudget budget = CheckedBudget.Of(setup, span, fit, fit.Calibration!, null);
        Assert.True(budget.Disagreement == null, budget.Text);
    }

    /// <summary>The response of a luminescence follows the temperature at the point and at the zero, by one thermometer; its offset is made to weigh more than all else.</summary>
    [Theory]
    [InlineData("stern-volmer signal-kind=phase lifetime-per-kelvin=-0.006", 0.6, 0.009)]
    [InlineData("stern-volmer signal-kind=lifetime lifetime-per-kelvin=-0.006", 0.02, 0.0003)]
    public void Budget_OfALuminescence_AgreesWithDrawing(string model, double zeroResponse, double slope)
    {
        RecordedProbe probe = ModelText.Apply("--model", model, Bench.Setup.Probe with
        {
            TemperatureCoefficient = CoefficientText.Parse("--temperature-coefficient", "exponential 0.01/K at 20C fitted 0..40C"),
            Thermometer = Bench.Setup.Probe.Thermometer with { CommonStandardUncertaintyCelsius = 0.8 },
        });
        CalibrationSetup setup = Bench.Setup with { Probe = probe, ReferenceStateRelative = 0.001, ZeroPlan = CalibrationIds.ZeroAdjust };
        RecordedPoint span = Span(24);
        IProbeModel core = RecordConversion.Model(probe);
        core.Gain(24, RangeRule.Refuse, out double gain);
        core.Signal(zeroResponse + (slope * gain * span.ReferencePartialPressureHectopascal), 24, 940, 0, RangeRule.Refuse, out double atSpan);
        core.Signal(zeroResponse, 20, 940, 0, RangeRule.Refuse, out double atZero);
        span = span with { Signal = span.Signal with { Mean = atSpan }, SignalStandardUncertainty = 1e-4 * atSpan };
        RecordedPoint zero = Zero();
        zero = zero with { Signal = zero.Signal with { Mean = atZero }, SignalStandardUncertainty = 1e-4 * atZero, ReferencePartialPressureUncertaintyHectopascal = 0.01, ReferenceUncertaintyMilligramsPerLitre = 0.0005 };
        Fit fit = Fitting.Of(setup, [span, zero], null);
        Assert.Equal(slope, fit.Calibration!.Slope, 1e-9);
        CheckedBudget budget = CheckedBudget.Of(setup, span, fit, fit.Calibration, null);
        Assert.Equal("thermometer offset", budget.Table[0].Input);
        Assert.True(90 < budget.Table[0].SharePercent, budget.Text);
        Assert.True(budget.Disagreement == null, budget.Text);
    }

    [Fact]
    public void Error_OfAnAirPointAmongSeveral_HasTheRatioOnce()
    {
        // Two levels: the air point carries its ratio in the flow factor, and how well the ratio is known in its reference.
        RecordedQuantity ratio = new() { Value = 1.1, Unit = "1", StandardUncertainty = 0.02, Source = "entered" };
        CalibrationSetup setup = Bench.Setup with
        {
            Method = MethodIds.WaterSaturatedAir,
            AirToWaterRatio = ratio,
            Plan = [new PlannedPoint { Role = "span", Method = MethodIds.WaterSaturatedAir }, new PlannedPoint { Role = "level-1", Method = MethodIds.TransferStandard }],
        };
        ProbeCalibration calibration = Fitting.Of(Bench.Setup, [Span(20)], null).Calibration!;
        RecordedPoint point = Span(20) with { Method = MethodIds.WaterSaturatedAir, FlowFactor = 1.1, ReadBy = "CAL-0001", SignalStandardUncertainty = 0.5 };
        point = point with { Temperature = point.Temperature with { StandardUncertainty = 0 }, ReferencePartialPressureUncertaintyHectopascal = 1.5 };
        double expected = Math.Sqrt((1.5 * 1.5) + Math.Pow(0.5 / (calibration.Slope * Gain(calibration) * 1.1), 2));
        Assert.Equal(expected, ErrorUncertainty.Of(setup, point, calibration, 1)!.Value, 1e-6);

        static double Gain(ProbeCalibration calibration)
        {
            Assert.Equal(Status.Ok, calibration.Model.Gain(20, RangeRule.Refuse, out double gain));
            return gain;
        }
    }

    [Fact]
    public void Budget_ThatDisagreesWithDrawing_BecomesAFinding()
    {
        Assert.Null(CheckedBudget.Judged([], 1.00, 1.02, 20_000, 3).Disagreement);
        Finding finding = CheckedBudget.Judged([], 1.00, 1.04, 20_000, 3).Disagreement!;
        Assert.Equal(GuardNames.UncertaintyCheck, finding.Guard);
        Assert.Contains("1.040 % in 20000 trials, seed 101, against 1.000 % by the budget", finding.Saw, StringComparison.Ordinal);
        Finding undrawn = CheckedBudget.Judged([], 1.00, null, 20_000, 3).Disagreement!;
        Assert.Contains("no value in 20000 trials, seed 101, against 1.000 % by the budget", undrawn.Saw, StringComparison.Ordinal);
    }

    [Fact]
    public void BudgetOfAFit_ListsWhatItsCovarianceIsMadeOf_AndAgreesWithDrawing()
    {
        CalibrationSetup setup = Bench.Setup;
        RecordedPoint full = Span(20);
        RecordedPoint half = full with
        {
            Role = "level-1",
            Method = MethodIds.TransferStandard,
            Signal = full.Signal with { Mean = 0.5 * full.Signal.Mean },
            ReferencePartialPressureHectopascal = 0.5 * full.ReferencePartialPressureHectopascal,
            ReferencePartialPressureUncertaintyHectopascal = 0.8,
        };
        RecordedPoint low = half with { Role = "level-2", Signal = full.Signal with { Mean = 0.1 * full.Signal.Mean }, ReferencePartialPressureHectopascal = 0.1 * full.ReferencePartialPressureHectopascal };
        RecordedPoint[] points = [full, half, low];
        (RecordedFit? fit, string? why) = SeveralPoints.Of(setup.Probe, Gas.Oxygen, points, "line");
        Assert.True(fit != null, why);
        RecordedContribution[] table = SeveralPointsBudget.Of(setup, points, fit);
        double whole = SeveralPointsBudget.TotalPercent(setup, fit);
        AssertSorted(table, whole, 0.03);
        Assert.Contains(table, static line => line.Input == "reference, span");
        Assert.Contains(table, static line => line.Input == "signal, level-1");
        Assert.Contains(table, static line => line.Input == "thermometer offset");
        double drawn = SeveralPointsBudget.DrawnPercent(setup, points, fit, SeveralPointsBudget.Trials, new Random(CheckedBudget.Seed))!.Value;
        Assert.InRange(drawn / whole, 0.92, 1.08);
    }

    private static void AssertSorted(RecordedContribution[] table, double whole, double tolerance = 1e-6)
    {
        Assert.Equal(table.OrderByDescending(static line => line.SlopePercent), table);
        Assert.Equal(100, table.Sum(static line => line.SharePercent!.Value), 1e-6);
        Assert.Equal(whole, Math.Sqrt(table.Sum(static line => line.SlopePercent * line.SlopePercent)), tolerance * whole);
        foreach (RecordedContribution line in table.Where(static line => line.SensitivityPercent != null))
        {
            Assert.Equal(line.SlopePercent, Math.Abs(line.SensitivityPercent!.Value) * line.StandardUncertainty, 1e-9 * (1 + line.SlopePercent));
            Assert.True(line.Value is double value && double.IsFinite(value), line.Input);
            Assert.Contains(line.Distribution, new[] { "normal", "rectangular", "triangular" });
        }
    }

    private static RecordedLimit Blank(double? found)
    {
        return new RecordedLimit { Check = "as-left", Limit = "0.2 mg/L", Source = "TM 9-A6.2", Found = found, Unit = "mg/L", Verdict = "", Decides = true };
    }

    /// <summary>A 100 % point at 940 hPa of the bench's probe: 90 nA at 20 °C, and less in the cold.</summary>
    private static RecordedPoint Span(double celsius)
    {
        double hectopascal = 0.20946 * (940 - GuardCases.Vapour(celsius));
        double gain = Math.Exp(22000 / 8.314462618 * ((1 / 293.15) - (1 / (celsius + 273.15))));
        double signal = 0.47 * hectopascal * gain;
        RecordedPoint point = SampleRecordsPoint();
        return point with
        {
            Signal = point.Signal with { Mean = signal },
            SignalStandardUncertainty = 0.02,
            Temperature = point.Temperature with { Value = celsius, StandardUncertainty = 0.03 },
            Pressure = point.Pressure with { Value = 940 },
            ReferencePartialPressureHectopascal = hectopascal,
            ReferencePartialPressureUncertaintyHectopascal = 0.0075 * hectopascal,
            ReferenceMilligramsPerLitre = GuardCases.Saturation(celsius, 940),
        };
    }

    private static RecordedPoint Zero()
    {
        RecordedPoint span = Span(20);
        double perMilligram = span.ReferencePartialPressureHectopascal / span.ReferenceMilligramsPerLitre;
        return span with
        {
            Role = CalibrationIds.ZeroPoint,
            Signal = span.Signal with { Mean = 0.4 },
            SignalStandardUncertainty = 0.5,
            ReferencePartialPressureHectopascal = 0,
            ReferencePartialPressureUncertaintyHectopascal = 0.02 * perMilligram,
            ReferenceMilligramsPerLitre = 0,
            ReferenceUncertaintyMilligramsPerLitre = 0.02,
        };
    }

    private static RecordedPoint SampleRecordsPoint()
    {
        return Station.Tests.CalibrationLog.SampleRecords.Of("P-1", Now).Points[0];
    }
}
