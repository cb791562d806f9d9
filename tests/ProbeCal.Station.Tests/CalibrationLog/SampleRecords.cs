using System;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>Records with made-up figures for tests of the log; nothing in them was measured.</summary>
internal static class SampleRecords
{
    internal static readonly DateTimeOffset Noon = new(2026, 6, 1, 12, 0, 0, TimeSpan.Zero);

    internal static CalibrationRecord Of(string probe, DateTimeOffset completed, bool pass = true, double slope = 0.62)
    {
        return new CalibrationRecord
        {
            Simulated = true,
            StartedUtc = completed.AddMinutes(-12),
            CompletedUtc = completed,
            Site = "Invented Tarn",
            Altitude = Quantity(640, "m", 5, "typed"),
            Gas = "O2",
            Probe = Probe(probe),
            Method = "air-saturated-water",
            Readings = "live",
            Source = "simulated probe",
            ReferenceState = Quantity(1, "1", 0.0075, "equilibrium taken as reached"),
            Equation = "benson-krause-1984",
            Formulas = [],
            SlopeFrom = "span",
            Zero = new RecordedZero { IsMeasured = false, Signal = 0.4, SignalStandardUncertainty = 0.2, TemperatureCelsius = 20, PressureHectopascal = 939.3, Source = "assumed" },
            Points = [Point("span", completed.AddMinutes(-6)), Point("as-left", completed)],
            DropletCheck = "not-needed",
            Result = new RecordedResult
            {
                Slope = slope,
                SlopeStandardUncertainty = 0.005,
                Zero = 0.4,
                ZeroStandardUncertainty = 0.2,
                Pass = pass,
                Reasons = pass ? [] : ["as-left error 0.31 mg/L is above 0.2 mg/L"],
                DecisionRule = "simple acceptance",
            },
            Limits = [new RecordedLimit { Check = "as-left", Limit = "0.2 mg/L or 2 %", Source = "TM 9-A6.2", Found = 0.01, Unit = "mg/L", Verdict = "pass", Decides = true }],
            Findings = [],
            Budget = [new RecordedContribution { Input = "pressure", StandardUncertainty = 0.8, Unit = "hPa", SlopePercent = 0.09, Source = "entered" }],
            Software = "probecal 0.1.0",
        };
    }

    private static RecordedProbe Probe(string id)
    {
        return new RecordedProbe
        {
            Id = id,
            Model = "amperometric",
            SignalUnit = "nA",
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
            Thermometer = new RecordedThermometer { Id = id, CommonStandardUncertaintyCelsius = 0.1, Source = "entered" },
        };
    }

    private static RecordedPoint Point(string role, DateTimeOffset end)
    {
        return new RecordedPoint
        {
            Role = role,
            FirstUtc = end.AddMinutes(-3),
            LastUtc = end,
            Typed = false,
            Signal = new RecordedStatistics { Count = 181, Mean = 113.25, StandardDeviation = 0.12, SlopePerMinute = 0.01, SlopeStandardErrorPerMinute = 0.01, Minimum = 112.9, Maximum = 113.6, WindowSeconds = 180 },
            SignalStandardUncertainty = 0.02,
            Temperature = Quantity(20.01, "degC", 0.1, "line"),
            Pressure = Quantity(939.3, "hPa", 0.8, "barometer:B-12"),
            Salinity = Quantity(0, "1", 0.1, "typed"),
            Stirring = "stirred",
            FlowFactor = 1,
            ReferencePartialPressureHectopascal = 191.9,
            ReferencePartialPressureUncertaintyHectopascal = 0.6,
            ReferenceMilligramsPerLitre = 8.41,
            ReferenceUncertaintyMilligramsPerLitre = 0.03,
        };
    }

    private static RecordedQuantity Quantity(double value, string unit, double uncertainty, string source)
    {
        return new RecordedQuantity { Value = value, Unit = unit, StandardUncertainty = uncertainty, Source = source };
    }
}
