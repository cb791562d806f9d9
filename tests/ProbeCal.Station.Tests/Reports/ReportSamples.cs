using System;
using System.Linq;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Tests.Reports;

/// <summary>Records with made-up figures that together have every field a certificate can print; nothing in them was measured.</summary>
internal static class ReportSamples
{
    internal static readonly DateTimeOffset Noon = new(2026, 6, 1, 12, 0, 0, TimeSpan.Zero);

    /// <summary>A calibration in water-saturated air with everything that a usual one has, and two guards overridden.</summary>
    internal static CalibrationRecord Usual(string probe = "P-17", DateTimeOffset? completed = null, double slope = 0.62, double error = -0.212)
    {
        DateTimeOffset end = completed ?? Noon;
        return new CalibrationRecord
        {
            Simulated = false,
            StartedUtc = end.AddMinutes(-42),
            CompletedUtc = end,
            By = "R. Example",
            Site = "Fern Pool (invented)",
            Altitude = Quantity(640, "m", 5, "typed"),
            Gas = "O2",
            Probe = Probe(probe),
            Method = "water-saturated-air",
            Readings = "live",
            Source = "serial line at 9600 Bd",
            Equipment = ["B-12", "T-3", "Z-9"],
            Steps = [new RecordedStep("rinse", end.AddMinutes(-40), null), new RecordedStep("wait", end.AddMinutes(-20), "steady")],
            AirToWaterRatio = Quantity(1.01, "1", 0.005, "typed"),
            ReferenceState = Quantity(1, "1", 0.0075, "vented cup"),
            Equation = "benson-krause-1984",
            Formulas = ["vapour pressure: Benson and Krause 1984"],
            SlopeFrom = "span",
            Zero = new RecordedZero { IsMeasured = true, Signal = 0.4, SignalStandardUncertainty = 0.2, TemperatureCelsius = 20, PressureHectopascal = 939.3, Source = "measured" },
            Points = [Point("span", end.AddMinutes(-30), 191.9, error), Point("zero", end.AddMinutes(-15), 0.1, 0.04), Point("as-left", end, 191.7, 0.012)],
            PreviousCalibration = "c3a41f09b2e7-0000",
            DropletCheck = "none-seen",
            Result = new RecordedResult
            {
                Slope = slope,
                SlopeStandardUncertainty = 0.0053,
                Zero = 0.4,
                ZeroStandardUncertainty = 0.2,
                Pass = true,
                Reasons = [],
                DecisionRule = "simple acceptance: an error within its limit passes, whatever its uncertainty",
            },
            Limits =
            [
                Limit("as-found", error, "pass", false), Limit("as-left", 0.012, "pass", true), Limit("zero", 0.04, "pass", true),
                new RecordedLimit { Check = "slope", Limit = "0.4 to 0.8 nA/hPa", Source = "entered for this calibration", Found = slope, Unit = "nA/hPa", Verdict = "pass", Decides = true },
            ],
            Findings =
            [
                new RecordedFinding
                {
                    Guard = "pressure-against-last-here", Severity = "overridden", Saw = "939.3 hPa is 24.1 hPa below the last pressure here, 963.4 hPa, 6 days ago",
                    ErrorAsFoundMilligramsPerLitre = 0.22, ErrorLaterMilligramsPerLitre = -0.22, WhatToDo = "Compare the barometer with another one at the same place.",
                    Reason = "a front went through; the weather service has the same fall",
                },
                new RecordedFinding { Guard = "stirring", Severity = "note", Saw = "still water, flow factor 0.97" },
            ],
            Budget =
            [
                Line("thermometer offset", 0.1, "K", 20.01, 0.31, 44.2), Line("temperature at the point", 0.05, "K", 20.01, 0.15, 10.4), Line("pressure", 0.8, "hPa", 939.3, 0.09, 3.7),
                Line("signal at the point", 0.02, "nA", 113.25, 0.02, 0.2), Line("zero", 0.2, "nA", 0.4, 0.18, 14.9), Line("temperature coefficient", 0.001, "1/K", 0.03, 0.05, 1.1),
                Line("state of the reference", 0.75, "%", 100, 0.21, 20.2), Line("air-to-water ratio", 0.005, "1", 1.01, 0.1, 5.3),
            ],
            Software = "probecal 0.1.0",
        };
    }

    /// <summary>A line through several points with a reference of each kind, failed, replacing another; with the rarer fields.</summary>
    internal static CalibrationRecord Fitted(int points)
    {
        CalibrationRecord usual = Usual();
        string[] roles = [.. Enumerable.Range(1, points).Select(static i => "level-" + i.ToString(System.Globalization.CultureInfo.InvariantCulture))];
        RecordedPoint[] taken = [.. roles.Select((role, i) => Point(role, Noon.AddMinutes(i - points), 20.0 * (i + 1), 0.01 * (i % 3)) with { Method = "gas-mixture" })];
        taken[0] = taken[0] with { Method = "titration", Reference = Titrated() };
        taken[1] = taken[1] with { Reference = Mixed() };
        taken[2] = taken[2] with { Method = "transfer-standard", Reference = Transferred() };
        return usual with
        {
            Method = "gas-mixture",
            AirToWaterRatio = null,
            Points = taken,
            SlopeFrom = "fit",
            CheckKind = null,
            Replaces = "c3a41f09b2e7-0001",
            ReplacesReason = "the cylinder's fraction had been typed wrong",
            ImportedFrom = "old-log.csv row 12",
            Remarks = "second attempt of the day",
            Probe = usual.Probe with { Coefficients = [new RecordedCoefficient { Name = "flow-factor", Value = 0.97, Unit = "1", StandardUncertainty = 0.01, Source = "entered" }] },
            Fit = new RecordedFit
            {
                Form = "quadratic",
                Method = "errors-in-both",
                Zero = 0.4,
                Slope = 0.62,
                Curvature = -0.00012,
                Covariance = [0.04, -0.0001, 0.00001, 0, 0, 0],
                PerThermometerKelvin = [0, 0.01, 0],
                PerTemperatureCoefficient = [0, 0.1, 0],
                DegreesOfFreedom = points - 3,
                ChiSquared = 1.8,
                ResidualStandardDeviation = 0.11,
                ChiSquaredProbability = 0.62,
                LackOfFit = new RecordedLackOfFit(1.4, 2, 3, 0.37),
                LowestHectopascal = 20,
                HighestHectopascal = 20.0 * points,
                Residuals = [.. roles.Select(static (role, i) => new RecordedResidual(role, 20.0 * (i + 1), 12.4 * (i + 1), 0.05 * ((i % 5) - 2), null, 0.5 * ((i % 5) - 2)))],
            },
            Result = usual.Result with { Pass = false, Reasons = ["residual of level-2 is 3.1 of its standard deviation"] },
            Limits = [Limit("as-left", 0.31, "fail", true) with { GuardBand = 0.05 }],
        };
    }

    /// <summary>The end-of-day check of a meter, typed in.</summary>
    internal static CalibrationRecord MeterCheck()
    {
        CalibrationRecord usual = Usual("M-5");
        return usual with
        {
            Simulated = true,
            Purpose = CalibrationRecord.CheckPurpose,
            CheckKind = "end-of-day",
            Readings = "typed",
            Source = "display",
            DropletCheck = "not-needed",
            Method = "air-saturated-water",
            AirToWaterRatio = null,
            Equipment = [],
            Findings = [],
            Points = [usual.Points[0] with { Typed = true, ReadBy = "c3a41f09b2e7-0001" }],
            Probe = usual.Probe with
            {
                Model = "meter-display",
                SignalUnit = "",
                Membrane = null,
                MeterSettings = new RecordedMeterSettings { Shows = "mg/L", Equation = "benson-krause-1984", Salinity = 0, Resolution = 0.01 },
            },
        };
    }

    /// <summary>As a record of version 1 was: no uncertainty beside a limit, no values in the budget, no steps, no equipment.</summary>
    internal static CalibrationRecord OfVersion1()
    {
        CalibrationRecord usual = Usual();
        return usual with
        {
            Version = 1,
            Equipment = [],
            Steps = [],
            Limits = [.. usual.Limits.Select(static limit => limit with { ExpandedUncertainty = null, CoverageFactor = null, LimitToUncertainty = null })],
            Budget = [.. usual.Budget.Select(static line => line with { Value = null, Distribution = null, SensitivityPercent = null, SharePercent = null })],
            Findings = [.. usual.Findings.Select(static finding => finding with { ErrorAsFoundMilligramsPerLitre = null, ErrorLaterMilligramsPerLitre = null, WhatToDo = null, PossibleErrorMilligramsPerLitre = 0.2 })],
        };
    }

    /// <summary>Names and remarks as somebody might write them who wants the page to break or to say something else.</summary>
    internal static CalibrationRecord Hostile()
    {
        CalibrationRecord usual = Usual();
        return usual with
        {
            By = "<script>alert(1)</script>",
            Site = "A & B \"Quarry\" \u202Etluser eht si SSAP\u202C \u05D0\u05D2\u05DD " + new string('W', 300),
            Remarks = "first line\nsecond line \u0000\u001B[31mred\u001B[0m \U0001F4A7 </dd></dl><img src=x onerror=alert(2)> \uD83D half",
            Software = "probecal ]]> -- %PDF",
        };
    }

    private static RecordedProbe Probe(string id)
    {
        return new RecordedProbe
        {
            Id = id,
            Model = "amperometric",
            SignalUnit = "nA",
            Membrane = new RecordedMembrane { Id = "M-204", InstalledOn = new DateOnly(2026, 4, 3) },
            TemperatureCoefficient = new RecordedTemperatureCoefficient
            {
                Form = "exponential",
                Value = 0.03,
                Unit = "1/K",
                StandardUncertainty = 0.001,
                ReferenceCelsius = 25,
                FittedLowCelsius = 5,
                FittedHighCelsius = 35,
            },
            Thermometer = new RecordedThermometer { Id = "T-3", CommonStandardUncertaintyCelsius = 0.1, Source = "entered" },
        };
    }

    private static RecordedPoint Point(string role, DateTimeOffset end, double hectopascal, double error)
    {
        double concentration = hectopascal * 0.0438;
        return new RecordedPoint
        {
            Role = role,
            FirstUtc = end.AddMinutes(-3),
            LastUtc = end,
            Typed = false,
            Signal = new RecordedStatistics { Count = 181, Mean = 0.4 + (0.62 * hectopascal), StandardDeviation = 0.12, SlopePerMinute = 0.01, SlopeStandardErrorPerMinute = 0.01, Minimum = 0, Maximum = 200, WindowSeconds = 180 },
            SignalStandardUncertainty = 0.02,
            Temperature = Quantity(20.01, "degC", 0.1, "line"),
            Pressure = Quantity(939.3, "hPa", 0.8, "barometer:B-12"),
            Salinity = Quantity(0, "1", 0.1, "typed"),
            Stirring = "stirred",
            FlowFactor = 1,
            ReferencePartialPressureHectopascal = hectopascal,
            ReferencePartialPressureUncertaintyHectopascal = 0.6,
            ReferenceMilligramsPerLitre = concentration,
            ReferenceUncertaintyMilligramsPerLitre = 0.03,
            ReadingMilligramsPerLitre = concentration + error,
            ErrorMilligramsPerLitre = error,
            ReadBy = role == "as-left" ? "this" : "c3a41f09b2e7-0000",
        };
    }

    private static RecordedLimit Limit(string check, double found, string verdict, bool decides)
    {
        return new RecordedLimit
        {
            Check = check,
            Limit = "0.2 mg/L or 2 %, the larger",
            Applied = "0.200 mg/L",
            Source = "USGS 2020, National Field Manual A6.2 (TM 9-A6.2)",
            Found = found,
            Unit = "mg/L",
            ExpandedUncertainty = 0.081,
            CoverageFactor = 1.96,
            LimitToUncertainty = 2.47,
            Verdict = verdict,
            Decides = decides,
        };
    }

    private static RecordedContribution Line(string input, double uncertainty, string unit, double value, double percent, double share)
    {
        return new RecordedContribution
        {
            Input = input,
            StandardUncertainty = uncertainty,
            Unit = unit,
            Value = value,
            Distribution = "normal",
            SensitivityPercent = percent / uncertainty,
            SlopePercent = percent,
            SharePercent = share,
            Source = "certificate and scatter over the window",
        };
    }

    private static RecordedReference Titrated()
    {
        return new RecordedReference
        {
            Equipment = ["TI-1"],
            Titration = new RecordedTitration
            {
                TitreMillilitres = [7.42, 7.44, 7.43],
                Blank = Quantity(0.01, "mL", 0.005, "typed"),
                Titrant = Quantity(0.0251, "mol/L", 0.00002, "standardised"),
                Flask = Quantity(300.1, "mL", 0.1, "typed"),
                Displaced = Quantity(2, "mL", 0.05, "typed"),
                ReagentOxygenMilligrams = Quantity(0.017, "mg", 0.003, "Murray et al. 1968"),
                BuretteStandardUncertaintyMillilitres = 0.01,
                DrawCelsius = 20,
            },
            Budget = [new RecordedReferenceContribution { Input = "titre", Value = 7.43, StandardUncertainty = 0.006, Unit = "mL", Distribution = "normal", Hectopascal = 0.16, Source = "three replicates" }],
        };
    }

    private static RecordedReference Mixed()
    {
        return new RecordedReference { Mixture = new RecordedMixture { Cylinder = "C-4", MoleFraction = Quantity(0.0998, "1", 0.0005, "certificate"), RelativeHumidityPercent = Quantity(0, "%", 1, "dry gas") } };
    }

    private static RecordedReference Transferred()
    {
        return new RecordedReference { Transfer = new RecordedTransfer { Standard = "S-1", Shown = Quantity(6.31, "mg/L", 0.05, "display"), Correction = Quantity(-0.02, "mg/L", 0.02, "certificate") } };
    }

    private static RecordedQuantity Quantity(double value, string unit, double uncertainty, string source)
    {
        return new RecordedQuantity { Value = value, Unit = unit, StandardUncertainty = uncertainty, Source = source };
    }
}
