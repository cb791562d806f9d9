using System;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Runtime.InteropServices;
using System.Text;
using System.Threading;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;

namespace ProbeCal.Benchmarks;

/// <summary>How fast recorded readings are corrected: in memory, and from a CSV file to a CSV file with ten more columns. For correct.sh, on one pinned core.</summary>
internal static class Corrections
{
    private const int Seed = 20260620;
    private const double AskedInMemory = 1_000_000;
    private const double AskedOfFiles = 150_000;
    private static readonly DateTimeOffset Calibrated = new(2026, 6, 1, 12, 0, 0, TimeSpan.Zero);

    internal static int Run(int runs, int rows)
    {
        string folder = Directory.CreateTempSubdirectory("probecal-").FullName;
        try
        {
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{RuntimeInformation.FrameworkDescription}, {RuntimeInformation.ProcessArchitecture}: {rows} rows, seed {Seed}, fastest of {runs} runs"));
            InMemory(runs, rows);
            Files(runs, rows, folder);
            return 0;
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static void InMemory(int runs, int rows)
    {
        (ProbeCalibration calibration, ReadingConditions conditions) = Probe();
        Water water = new(rows);
        Reading reading = new();
        double sum = 0;
        TimeSpan best = TimeSpan.MaxValue;
        for (int run = 0; run < runs; run++)
        {
            long start = Stopwatch.GetTimestamp();
            for (int i = 0; i < rows; i++)
            {
                Correction.Correct(
                    calibration, conditions, 20 + water.Celsius[i], 5 + (water.Celsius[i] * 0.7), 900 + (water.PressureHectopascal[i] * 0.1), water.Salinity[i], 0.0,
                    RangeRule.NearEdge, reading);
                sum += reading.Value(ReadingQuantity.MilligramsPerLitre);
            }

            best = Faster(best, Stopwatch.GetElapsedTime(start));
        }

        Line("corrections in memory, six quantities with uncertainty", rows, best, AskedInMemory);
        if (double.IsNaN(sum)) { throw new InvalidOperationException("a correction gave no value"); }
    }

    private static void Files(int runs, int rows, string folder)
    {
        string input = Path.Combine(folder, "raw.csv");
        Write(input, rows);
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(Path.Combine(folder, "calibrations.db"), TimeProvider.System, Guid.NewGuid);
        log.Append(Record());
        foreach ((string name, string[] columns) in new[]
        {
            ("CSV to CSV, ten columns: six values, four uncertainties", new[] { "partial-pressure,mg/L,umol/L,umol/kg,percent-local,percent-1atm,u(partial-pressure),u(mg/L),u(percent-local),u(percent-1atm)" }),
            ("the same, shortest texts", ["partial-pressure:shortest,mg/L:shortest,umol/L:shortest,umol/kg:shortest,percent-local:shortest,percent-1atm:shortest,u(partial-pressure):shortest,u(mg/L):shortest,u(percent-local):shortest,u(percent-1atm):shortest"]),
            ("the usual four columns", []),
        })
        {
            TimeSpan best = TimeSpan.MaxValue;
            double bytes = 0;
            for (int run = 0; run < runs; run++)
            {
                string output = Path.Combine(folder, "out.csv");
                CorrectionRequest request = new()
                {
                    Input = input,
                    Output = output,
                    Probe = "do-1",
                    TimeOffset = "+02:00",
                    Write = columns,
                    Columns = ["time=Time", "signal=Raw [nA]", "temperature=Water temp [C]", "pressure=Baro [hPa]", "salinity=Salinity"],
                };
                long allocated = GC.GetAllocatedBytesForCurrentThread();
                long start = Stopwatch.GetTimestamp();
                string revision = CorrectionRun.Run(request, log, new CorrectionSurroundings(TimeProvider.System, "benchmark", static _ => { }, static _ => { }), CancellationToken.None);
                best = Faster(best, Stopwatch.GetElapsedTime(start));
                bytes = (GC.GetAllocatedBytesForCurrentThread() - allocated) / (double)rows;
                if (run == 0 && File.ReadLines(output).Count() != rows + 1) { throw new InvalidOperationException("rows are missing"); }
                File.Delete(output);
                File.Delete(revision);
            }

            Line(name + string.Create(CultureInfo.InvariantCulture, $", {bytes:0.0} bytes/row"), rows, best, AskedOfFiles);
        }
    }

    private static void Write(string path, int rows)
    {
        Random random = new(Seed);
        using StreamWriter writer = new(path, append: false, Encoding.ASCII);
        writer.Write("Time,Battery,Raw [nA],Water temp,Baro,Salinity,Remark\n");
        for (int i = 0; i < rows; i++)
        {
            DateTime time = Calibrated.UtcDateTime.AddDays(1).AddSeconds(10.0 * i);
            writer.Write(string.Create(
                CultureInfo.InvariantCulture,
                $"{time:yyyy-MM-dd HH:mm:ss},12.{random.Next(10, 99)},{70 + (40 * random.NextDouble()):F3},{8 + (14 * random.NextDouble()):F2},{930 + (20 * random.NextDouble()):F1},{0.3 * random.NextDouble():F2},\n"));
        }
    }

    private static (ProbeCalibration Calibration, ReadingConditions Conditions) Probe()
    {
        Status status = ProbeCalibration.Create(
            new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 25, 5, 35),
            new CalibrationPoint(CalibrationMethod.AirSaturatedWater, 113.25, 0.02, 20.01, 0.1, 939.3, 0.8, Stirring.Stirred, 1, 1, 0, 0.0075),
            new ZeroPoint(false, 0.4, 0.2, 20, 939.3), 0.1, 0.001, out ProbeCalibration? calibration);
        if (calibration is null) { throw new InvalidOperationException(status.ToString()); }
        return (calibration, new ReadingConditions(SolubilityEquation.BensonKrause1984, 0.12, true, 0.1, 0.03, 0.8, 0.1, Stirring.Stirred, 1, UncertaintyDefaults.StirredRelative));
    }

    /// <summary>The record of that calibration; its figures are made up.</summary>
    private static CalibrationRecord Record()
    {
        RecordedQuantity Quantity(double value, string unit, double uncertainty) => new() { Value = value, Unit = unit, StandardUncertainty = uncertainty, Source = "made up" };
        RecordedPoint span = new()
        {
            Role = "span",
            FirstUtc = Calibrated.AddMinutes(-3),
            LastUtc = Calibrated,
            Typed = false,
            Signal = new RecordedStatistics { Count = 181, Mean = 113.25, StandardDeviation = 0.12, SlopePerMinute = 0.01, SlopeStandardErrorPerMinute = 0.01, Minimum = 112.9, Maximum = 113.6, WindowSeconds = 180 },
            SignalStandardUncertainty = 0.02,
            Temperature = Quantity(20.01, "degC", 0.1),
            Pressure = Quantity(939.3, "hPa", 0.8),
            Salinity = Quantity(0, "1", 0.1),
            Stirring = "stirred",
            FlowFactor = 1,
            ReferencePartialPressureHectopascal = 191.9,
            ReferencePartialPressureUncertaintyHectopascal = 0.3,
            ReferenceMilligramsPerLitre = 8.42,
            ReferenceUncertaintyMilligramsPerLitre = 0.02,
        };
        return new CalibrationRecord
        {
            Simulated = true,
            StartedUtc = Calibrated.AddMinutes(-10),
            CompletedUtc = Calibrated,
            Gas = "O2",
            Method = "air-saturated-water",
            Readings = "live",
            Source = "made up",
            Probe = new RecordedProbe
            {
                Id = "do-1",
                Model = "amperometric",
                SignalUnit = "nA",
                TemperatureCoefficient = new RecordedTemperatureCoefficient { Form = "exponential", Value = 0.03, Unit = "1/K", StandardUncertainty = 0.001, ReferenceCelsius = 25, FittedLowCelsius = 5, FittedHighCelsius = 35 },
                Thermometer = new RecordedThermometer { Id = "do-1", CommonStandardUncertaintyCelsius = 0.1, Source = "made up" },
            },
            ReferenceState = Quantity(1, "1", 0.0075),
            Equation = "benson-krause-1984",
            Formulas = [],
            Points = [span],
            SlopeFrom = "span",
            Zero = new RecordedZero { IsMeasured = false, Signal = 0.4, SignalStandardUncertainty = 0.2, TemperatureCelsius = 20, PressureHectopascal = 939.3, Source = "assumed" },
            DropletCheck = "not-needed",
            Result = new RecordedResult { Slope = 0.7, SlopeStandardUncertainty = 0.005, Zero = 0.4, ZeroStandardUncertainty = 0.2, Pass = true, Reasons = [], DecisionRule = "made up" },
            Limits = [],
            Findings = [],
            Budget = [],
            Software = "benchmark",
        };
    }

    private static TimeSpan Faster(TimeSpan one, TimeSpan other)
    {
        return other < one ? other : one;
    }

    private static void Line(string name, int rows, TimeSpan time, double asked)
    {
        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {name,-56} {rows / time.TotalSeconds,11:0} /s (asked {asked:0})"));
    }
}
