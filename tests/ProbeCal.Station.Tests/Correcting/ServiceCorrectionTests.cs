using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>Deployments with a known truth: the probe's slope and zero move, growth takes its share, visits see it, and the truth must come back.</summary>
public class ServiceCorrectionTests
{
    private static readonly DateTimeOffset Calibrated = SampleRecords.Noon;
    private static readonly DateTimeOffset VisitBefore = new(2026, 6, 21, 12, 0, 0, TimeSpan.Zero);
    private static readonly DateTimeOffset VisitAfter = new(2026, 6, 21, 12, 30, 0, TimeSpan.Zero);

    // Every shortest column, so that nothing is lost to rounding.
    private static readonly string[] Full = ["mg/L:shortest", "drift:shortest", "fouling:shortest", "corrected:shortest", "rating"];

    private static string Milligrams(double value)
    {
        return Number.Print(value) + "mg/L";
    }

    [Fact]
    public void Drift_of_slope_and_zero_comes_back_to_the_truth()
    {
        using Deployment deployment = new();
        CalibrationInUse calibration = InUse(deployment);
        // At the visit the probe gives 0.94 of its slope and 1.5 nA more in oxygen-free water; the water has its own course.
        const double Slope = 0.94, Zero = 1.5;
        List<(DateTimeOffset Time, double Temperature, double Truth)> water = Water(calibration);
        deployment.Write("raw.csv", [Deployment.Header, .. water.Select(each =>
        {
            double share = (each.Time - Calibrated) / (VisitAfter - Calibrated);
            return Deployment.Row(each.Time, Signal(calibration, each.Temperature, each.Truth, 1 + (share * (Slope - 1)), share * Zero), each.Temperature, salinity: 0);
        })]);
        // Both standards are read at the end, by the calibration in force: at 20.1 and at 12 degC.
        double high = Read(calibration, 20.1, 8.97, Slope, Zero);
        double low = Read(calibration, 12, 0, Slope, Zero);
        deployment.Visit(entry => entry with
        {
            Standards = [$"8.97mg/L read {Milligrams(high)} from air-saturated-water at 20.1C salinity 0", $"0mg/L read {Milligrams(low)} from zero-solution at 12C salinity 0"],
        });

        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full });
        double largest = 0;
        for (int i = 0; i < water.Count; i++)
        {
            double truth = Concentration(calibration, water[i].Temperature, water[i].Truth);
            largest = Math.Max(largest, Math.Abs(Deployment.Value(rows[i], "O2 corrected [mg/L]") - truth));
        }

        // Rounding only: the standards stand at 1 atm and the water at 941.5 hPa, which costs the 1e-4 of a pressure's part in a concentration.
        Assert.True(largest < 5e-4, $"the truth is missed by {largest} mg/L");
        Assert.True(0.3 < Math.Abs(Deployment.Value(rows[^1], "drift correction [mg/L]")));
        Assert.Equal(("slope-and-zero", "visits"), (deployment.RevisionOf().Service.DriftForm, deployment.RevisionOf().Service.DriftFrom));
    }

    [Fact]
    public void Fouling_that_takes_a_share_comes_back_to_the_truth()
    {
        using Deployment deployment = new();
        CalibrationInUse calibration = InUse(deployment);
        const double Share = 0.90;
        List<(DateTimeOffset Time, double Temperature, double Truth)> water = Water(calibration);
        deployment.Write("raw.csv", [Deployment.Header, .. water.Select(each =>
        {
            double grown = (each.Time - Calibrated) / (VisitBefore - Calibrated);
            return Deployment.Row(each.Time, Signal(calibration, each.Temperature, each.Truth, 1 + (grown * (Share - 1)), 0), each.Temperature, salinity: 0);
        })]);
        // The water rises by 0.125 mg/L while the probe is cleaned; the field meter is 0.75 mg/L off, which must not matter.
        deployment.Visit(static entry => entry with
        {
            MonitorBefore = [Milligrams(8 * Share)],
            MonitorAfter = ["8.125mg/L"],
            FieldBefore = ["8.75mg/L"],
            FieldAfter = ["8.875mg/L"],
            FieldMeter = "FM-2",
        });

        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full });
        double largest = 0;
        for (int i = 0; i < water.Count; i++)
        {
            double truth = Concentration(calibration, water[i].Temperature, water[i].Truth);
            largest = Math.Max(largest, Math.Abs(Deployment.Value(rows[i], "O2 corrected [mg/L]") - truth));
        }

        Assert.True(largest < 1e-9, $"the truth is missed by {largest} mg/L");
        RevisionFinding finding = Assert.Single(deployment.RevisionOf().Service.Findings);
        Assert.Equal(0.8, finding.FoulingMilligramsPerLitre!.Value, 1e-12);
    }

    [Fact]
    public void Published_forms_add_the_prorated_error()
    {
        using Deployment deployment = new();
        deployment.Visit(static entry => entry with
        {
            MonitorBefore = ["7.90mg/L"],
            MonitorAfter = ["8.25mg/L"],
            FieldBefore = ["8.31mg/L"],
            FieldAfter = ["8.35mg/L"],
            FieldMeter = "FM-2",
            Standards = ["8.97mg/L read 8.61mg/L from air-saturated-water"],
        });
        DateTimeOffset quarter = Calibrated + ((VisitBefore - Calibrated) / 4);
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(quarter, 80));
        double driftShare = (quarter - Calibrated) / (VisitAfter - Calibrated);

        Dictionary<string, string> constant = deployment.Correct("c.csv", static request => request with { Write = Full, Drift = "constant", Fouling = "constant" })[0];
        Assert.Equal(0.36 * driftShare, Deployment.Value(constant, "drift correction [mg/L]"), 1e-12);
        Assert.Equal(0.31 * 0.25, Deployment.Value(constant, "fouling correction [mg/L]"), 1e-12);

        Dictionary<string, string> percent = deployment.Correct("p.csv", static request => request with { Write = Full, Drift = "percent", Fouling = "percent" })[0];
        double reading = Deployment.Value(percent, "O2 [mg/L]");
        Assert.Equal(reading * 0.36 / 8.61 * driftShare, Deployment.Value(percent, "drift correction [mg/L]"), 1e-12);
        Assert.Equal(reading * 0.31 / 7.90 * 0.25, Deployment.Value(percent, "fouling correction [mg/L]"), 1e-12);
        Assert.Equal(
            reading + Deployment.Value(percent, "drift correction [mg/L]") + Deployment.Value(percent, "fouling correction [mg/L]"),
            Deployment.Value(percent, "O2 corrected [mg/L]"), 1e-12);
        Assert.Equal(("percent", "percent"), (deployment.RevisionOf("p.csv").Service.DriftForm, deployment.RevisionOf("p.csv").Service.FoulingForm));
    }

    [Fact]
    public void Errors_whose_sum_is_not_above_the_limit_are_left_and_told()
    {
        using Deployment deployment = new();
        deployment.Visit(static entry => entry with
        {
            MonitorBefore = ["8.00mg/L"],
            MonitorAfter = ["8.125mg/L"],
            InBucket = true,
            Standards = ["9.0mg/L read 8.875mg/L from air-saturated-water"],
        });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(VisitBefore.AddDays(-1), 80));
        Dictionary<string, string> left = deployment.Correct("left.csv", static request => request with { Write = Full })[0];
        Assert.Equal((0.0, 0.0), (Deployment.Value(left, "drift correction [mg/L]"), Deployment.Value(left, "fouling correction [mg/L]")));
        Assert.Contains(deployment.Said, static line => line.Contains("not taken back, 0.250 mg/L is not above 0.3 mg/L", StringComparison.Ordinal));

        Dictionary<string, string> taken = deployment.Correct("taken.csv", static request => request with { Write = Full, Limits = new ServiceLimits { ApplyAbove = 0.2, Source = "entered" } })[0];
        Assert.True(0.05 < Deployment.Value(taken, "drift correction [mg/L]"));
        Assert.Equal(0.2, deployment.RevisionOf("taken.csv").Service.Limits.ApplyAbove);
    }

    [Fact]
    public void Drift_between_two_calibrations_moves_slope_and_zero()
    {
        using Deployment deployment = new();
        CalibrationRecord later = SampleRecords.Of(Deployment.Probe, Calibrated.AddDays(20));
        later = later with { Points = [.. later.Points.Select(static point => point with { Signal = point.Signal with { Mean = 105 } })], Zero = later.Zero with { Signal = 0.9 } };
        deployment.Log.Append(later);
        CalibrationInUse before = InUse(deployment);
        CalibrationInUse after = CalibrationInUse.Find(deployment.Log, Deployment.Asked)[1];
        DateTimeOffset half = Calibrated.AddDays(10);
        // A probe half way between the two, in water at 17 degC with 180 hPa.
        double signal = before.Core.ZeroResponse + (0.5 * (after.Core.ZeroResponse - before.Core.ZeroResponse))
            + ((before.Core.Slope + (0.5 * (after.Core.Slope - before.Core.Slope))) * Gain(before, 17) * 180);
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(half, signal, 17, salinity: 0));
        Dictionary<string, string> row = deployment.Correct(change: static request => request with { Write = Full, DriftFrom = "calibrations" })[0];
        Assert.Equal(Concentration(before, 17, 180), Deployment.Value(row, "O2 corrected [mg/L]"), 1e-9);
        Assert.NotEqual(0, Deployment.Value(row, "drift correction [mg/L]"));
    }

    [Fact]
    public void A_new_membrane_ends_the_line_between_two_calibrations()
    {
        using Deployment deployment = new();
        CalibrationRecord later = SampleRecords.Of(Deployment.Probe, Calibrated.AddDays(20));
        deployment.Log.Append(new ServiceRecord { Probe = Deployment.Probe, Event = ServiceRecord.MembraneChanged, At = Calibrated.AddDays(19), Software = "probecal 9.9.9" });
        deployment.Log.Append(later with { Points = [.. later.Points.Select(static point => point with { Signal = point.Signal with { Mean = 90 } })] });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(Calibrated.AddDays(10), 80));
        deployment.Correct(change: static request => request with { DriftFrom = "calibrations" });
        Assert.Empty(deployment.RevisionOf().Service.Findings);
    }

    [Fact]
    public void Bad_calibration_is_a_shift_of_the_whole_interval()
    {
        using Deployment deployment = new();
        deployment.Visit(static entry => entry with { Standards = ["9.0mg/L read 8.5mg/L from air-saturated-water"], BadCalibration = true });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(Calibrated.AddMinutes(1), 80), Deployment.Row(VisitBefore, 80));
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full, Drift = "constant" });
        Assert.All(rows, static row => Assert.Equal(0.5, Deployment.Value(row, "drift correction [mg/L]"), 1e-12));
    }

    [Fact]
    public void An_event_that_was_identified_begins_the_error()
    {
        using Deployment deployment = new();
        DateTimeOffset storm = Calibrated.AddDays(15);
        deployment.Visit(static entry => entry with
        {
            MonitorBefore = ["7.0mg/L"],
            MonitorAfter = ["7.5mg/L"],
            InBucket = true,
            FoulingOnset = "2026-06-16T12:00Z",
            Remarks = "storm, silt on the membrane",
        });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(storm.AddDays(-1), 80), Deployment.Row(storm + ((VisitBefore - storm) / 2), 80));
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full, Fouling = "constant" });
        Assert.Equal(0, Deployment.Value(rows[0], "fouling correction [mg/L]"));
        Assert.Equal(0.25, Deployment.Value(rows[1], "fouling correction [mg/L]"), 1e-12);
    }

    [Fact]
    public void Behind_the_last_visit_drift_is_held_and_fouling_said_to_be_unknown()
    {
        using Deployment deployment = new();
        deployment.Visit(static entry => entry with { MonitorBefore = ["8mg/L"], MonitorAfter = ["8.5mg/L"], InBucket = true, Standards = ["9.0mg/L read 8.5mg/L from air-saturated-water"] });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(VisitBefore.AddMinutes(10), 80), Deployment.Row(VisitAfter.AddDays(3), 80));
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full, Drift = "constant", Fouling = "constant" });
        Assert.Contains("somebody was at the probe", rows[0]["status"], StringComparison.Ordinal);
        Assert.Equal((0.5, 0.0), (Deployment.Value(rows[1], "drift correction [mg/L]"), Deployment.Value(rows[1], "fouling correction [mg/L]")));
        Assert.Contains("drift held as it was last found", rows[1]["status"], StringComparison.Ordinal);
        Assert.Contains("after the last visit so fouling is not known", rows[1]["status"], StringComparison.Ordinal);
    }

    [Fact]
    public void A_day_takes_its_lowest_rating()
    {
        using Deployment deployment = new();
        // 2.5 mg/L in twenty days: 0.0625 mg/L every twelve hours.
        deployment.Visit(static entry => entry with { Standards = ["9.0mg/L read 6.5mg/L from air-saturated-water"], After = "2026-06-21T12:00Z" });
        deployment.Write("raw.csv", [Deployment.Header, .. Enumerable.Range(1, 40).Select(static i => Deployment.Row(Calibrated.AddHours(12 * i), 80))]);
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = Full, Drift = "constant", TimeOffset = "UTC" });
        string[] expected = [.. Enumerable.Range(1, 40).Select(static i => (i * 0.0625) switch
        {
            <= 0.3 => "excellent", <= 0.5 => "good", <= 0.8 => "fair", <= 2.0 => "poor", _ => "consider deletion",
        })];
        Assert.Equal(expected, rows.Select(static row => row["rating"]));
        Assert.Contains("corrected by more than is allowed", rows[^1]["status"], StringComparison.Ordinal);
        // 2 June has 00:00 and 12:00, rows 1 and 2; 4 June has rows 5 (0.3125) and 6; 3 June 3 and 4: excellent.
        RevisionDay[] days = deployment.RevisionOf().Days;
        Assert.Equal(("excellent", "excellent", "good"), (days[0].Rating, days[1].Rating, days[2].Rating));
        Assert.Equal("consider deletion", days[^1].Rating);
        Assert.Equal(40, days.Sum(static day => day.Rows));
    }

    [Theory]
    [InlineData("-7.9mg/L", "2026-06-21T12:30Z", "--monitor-before -7.9mg/L: no probe reads so far below nothing")]
    [InlineData("7.9mg/L", "2026-06-22T12:30Z", "--after 2026-06-22T12:30Z: this lies in the future of this computer's clock")]
    [InlineData("-0.3mg/L", "2026-06-21T12:30Z", "")]
    public void A_visit_that_cannot_be_is_one_line(string monitor, string after, string says)
    {
        VisitEntry entry = new()
        {
            Probe = "do-1",
            Before = "2026-06-21T12:00Z",
            After = after,
            MonitorBefore = [monitor],
            MonitorAfter = ["8.25mg/L"],
            InBucket = true,
            Software = "x",
        };
        DateTimeOffset now = new(2026, 6, 21, 13, 0, 0, TimeSpan.Zero);
        if (says.Length == 0)
        {
            Assert.Equal(-0.3, entry.Read(now).Cleaning[0].MonitorBefore);
            return;
        }

        Assert.StartsWith(says, Assert.Throws<InputException>(() => entry.Read(now)).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(-940.0)]
    [InlineData(29.9)]
    [InlineData(2000.0)]
    public void A_pressure_that_is_none_is_flagged_and_not_used_also_without_an_altitude(double pressure)
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(Calibrated.AddDays(1), 80, pressure: pressure), Deployment.Row(Calibrated.AddDays(1), 80));
        List<Dictionary<string, string>> rows = deployment.Correct();
        Assert.Contains("pressure is no air pressure", rows[0]["status"], StringComparison.Ordinal);
        Assert.Equal("", rows[0]["O2 [% local]"]);
        Assert.Equal(rows[1]["O2 [mg/L]"], rows[0]["O2 [mg/L]"]);
        Assert.NotEqual("", rows[1]["O2 [% local]"]);
        Assert.DoesNotContain("no air pressure", rows[1]["status"], StringComparison.Ordinal);
    }

    [Fact]
    public void The_field_meter_is_never_the_standard()
    {
        // No words and no id make one of it.
        foreach (string standard in new[] { "8.97mg/L read 8.61mg/L from field meter", "8.97mg/L read 8.61mg/L from Field-Meter", "8.97mg/L read 8.61mg/L from fm-2" })
        {
            InputException wrong = Assert.Throws<InputException>(() => new VisitEntry
            {
                Probe = "do-1",
                Before = "2026-06-21T12:00Z",
                After = "2026-06-21T12:30Z",
                FieldMeter = "FM-2",
                Standards = [standard],
                Software = "x",
            }.Read(DateTimeOffset.MaxValue));
            Assert.Contains("the field meter is never the standard", wrong.Message, StringComparison.Ordinal);
        }

        // And nothing that it reads moves a value: only its change between two moments counts. Whole eighths, so that no rounding hides anything.
        List<string> outcomes = [];
        foreach (double meter in new[] { 0.0, 4.5, 8.25, 19.0 })
        {
            using Deployment deployment = new();
            deployment.Visit(entry => entry with
            {
                MonitorBefore = ["8mg/L"],
                MonitorAfter = ["8.625mg/L"],
                FieldBefore = [Milligrams(meter)],
                FieldAfter = [Milligrams(meter + 0.125)],
                FieldMeter = "FM-2",
            });
            deployment.Write("raw.csv", [Deployment.Header, .. Enumerable.Range(0, 20).Select(static i => Deployment.Row(Calibrated.AddDays(i), 80 + i))]);
            outcomes.Add(string.Join('\n', deployment.Correct(change: static request => request with { Write = Full }).Select(static row => string.Join(';', row.Values))));
            RevisionFinding finding = Assert.Single(deployment.RevisionOf().Service.Findings);
            Assert.Equal((0.5, null), (finding.FoulingMilligramsPerLitre, finding.DriftMilligramsPerLitre));
            Assert.Empty(deployment.RevisionOf().Service.Drift);
        }

        Assert.Single(outcomes.Distinct());
    }

    [Theory]
    [InlineData("nothing", "a visit says something about the probe")]
    [InlineData("no field", "without them cleaning cannot be told from a change of the water")]
    [InlineData("one side", "each level has both")]
    [InlineData("backward", "this is before --before")]
    [InlineData("no offset", "does not say its offset from UTC")]
    [InlineData("standard", "write for example \"8.97mg/L read 8.61mg/L from air-saturated-water at 20.1C salinity 0\"")]
    [InlineData("late onset", "an error begins before the visit that finds it")]
    [InlineData("unit", "carries its unit")]
    public void A_visit_that_makes_no_sense_is_refused_in_one_line(string what, string expected)
    {
        VisitEntry entry = new() { Probe = "do-1", Before = "2026-06-21T12:00Z", After = "2026-06-21T12:30Z", Software = "x" };
        VisitEntry cleaned = entry with { MonitorBefore = ["8mg/L"], MonitorAfter = ["8.5mg/L"], InBucket = true };
        VisitEntry wrong = what switch
        {
            "no field" => cleaned with { InBucket = false },
            "one side" => cleaned with { MonitorAfter = [] },
            "backward" => cleaned with { After = "2026-06-21T11:30Z" },
            "no offset" => cleaned with { After = "2026-06-21T12:30" },
            "standard" => entry with { Standards = ["8.97mg/L 8.61mg/L"] },
            "late onset" => cleaned with { FoulingOnset = "2026-06-22T12:30Z" },
            "unit" => cleaned with { MonitorBefore = ["8"] },
            _ => entry,
        };
        InputException refused = Assert.Throws<InputException>(() => wrong.Read(DateTimeOffset.MaxValue));
        Assert.Contains(expected, refused.Message, StringComparison.Ordinal);
    }

    private static CalibrationInUse InUse(Deployment deployment)
    {
        return CalibrationInUse.Find(deployment.Log, Deployment.Asked)[0];
    }

    /// <summary>Twenty days of water that warms, cools and loses oxygen: time, °C, hPa.</summary>
    private static List<(DateTimeOffset Time, double Temperature, double Truth)> Water(CalibrationInUse calibration)
    {
        List<(DateTimeOffset, double, double)> water = [];
        for (DateTimeOffset time = Calibrated.AddHours(1); time < VisitBefore; time = time.AddHours(3))
        {
            double days = (time - calibration.Record.CompletedUtc).TotalDays;
            water.Add((time, 16 + (4 * Math.Sin(days * 2 * Math.PI)), 150 + (60 * Math.Cos(days / 3))));
        }

        return water;
    }

    private static double Gain(CalibrationInUse calibration, double temperature)
    {
        Assert.Equal(Status.Ok, calibration.Core.Model.Gain(temperature, RangeRule.Refuse, out double gain));
        return gain;
    }

    /// <summary>The signal of a probe whose slope and zero have moved; its response is its signal.</summary>
    private static double Signal(CalibrationInUse calibration, double temperature, double hectopascal, double slope, double zero)
    {
        return calibration.Core.ZeroResponse + zero + (calibration.Core.Slope * slope * Gain(calibration, temperature) * hectopascal);
    }

    /// <summary>What such a probe shows in a standard by the old calibration, mg/L at 1 atm.</summary>
    private static double Read(CalibrationInUse calibration, double temperature, double milligrams, double slope, double zero)
    {
        double perHectopascal = PerHectopascal(temperature, PressureUnits.HectopascalPerAtmosphere);
        double signal = Signal(calibration, temperature, milligrams / perHectopascal, slope, zero);
        return (signal - calibration.Core.ZeroResponse) / (calibration.Core.Slope * Gain(calibration, temperature)) * perHectopascal;
    }

    private static double Concentration(CalibrationInUse calibration, double temperature, double hectopascal)
    {
        _ = calibration;
        return hectopascal * PerHectopascal(temperature, 941.5);
    }

    private static double PerHectopascal(double temperature, double pressure)
    {
        Assert.Equal(Status.Ok, OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, temperature, 0, pressure, 100, RangeRule.Refuse, out double hundred));
        return hundred / 100;
    }
}
