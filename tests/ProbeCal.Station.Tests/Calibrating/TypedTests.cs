using System;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>A meter that shows only mg/L or %, read by a person.</summary>
public class TypedTests
{
    [Fact]
    public async Task ValueToSet_IsTheFieldManualsSaturation()
    {
        using Bench bench = new();
        ScriptedDialogue answers = Reads(8.61, 8.97);
        CalibrationRecord record = await bench.TypedAsync(Meter("mg/L"), answers);

        // USGS TM 9-A6.2, worked example: 20.0 °C, 750 mmHg gives 8.97 mg/L.
        Assert.Contains(answers.Shown, line => line.StartsWith("Set the meter to 8.97 mg/L (standard uncertainty 0.0", StringComparison.Ordinal));
        Assert.Equal(8.61 - 8.97, record.Points[0].ErrorMilligramsPerLitre!.Value, 0.005);
        Assert.Equal(0, record.Points[1].ErrorMilligramsPerLitre!.Value, 0.005);
        Assert.Equal("meter", record.Points[1].ReadBy);
        Assert.True(record.Result.Pass);
    }

    [Fact]
    public async Task CorrectionMadeInTheMeter_IsNotAppliedAgain()
    {
        using Bench bench = new();
        CalibrationRecord record = await bench.TypedAsync(Meter("mg/L"), Reads(8.10, 8.97));

        // The slope rests on what the meter shows after it was set: within its last digit of 1, not 8.10/8.97.
        Assert.Equal("as-left", record.SlopeFrom);
        Assert.Equal(1, record.Result.Slope, 0.001);
        Assert.Equal(record.Result.Slope, record.ToProbeCalibration().Slope);
    }

    [Theory]
    [InlineData("%local", 100.0, "% of local saturation")]
    // 750 mmHg is 98.68 % of 1 atm; without the water vapour at 20 °C, 98.65 %.
    [InlineData("%1atm", 98.65, "% of saturation at 1 atm")]
    public async Task PercentMeters_AreSetToTheirOwnHundred(string shows, double set, string words)
    {
        using Bench bench = new();
        ScriptedDialogue answers = Reads(96, set);
        CalibrationRecord record = await bench.TypedAsync(Meter(shows), answers);
        Assert.Contains(answers.Shown, line => line.StartsWith($"Set the meter to {Number.Fixed(set, 2)} {words}", StringComparison.Ordinal));
        Assert.Equal(1, record.Result.Slope, 0.001);
    }

    [Fact]
    public async Task SalinitySetInTheMeter_IsTakenOutAgain()
    {
        using Bench bench = new();
        CalibrationSetup setup = Meter("mg/L");
        setup = setup with
        {
            Probe = setup.Probe with { MeterSettings = setup.Probe.MeterSettings! with { Salinity = 35 } },
            Reasons = new() { [GuardNames.SalinityLeftOver] = "the meter is set for the bay, the bath is tap water" },
        };
        ScriptedDialogue answers = Reads(7.2, 7.29);
        CalibrationRecord record = await bench.TypedAsync(setup, answers);

        // Fresh water, but the meter computes for salinity 35: at 20 °C it has to show 0.813 times the fresh value
        // (ratio to three digits, computed from the field manual's equations).
        string line = answers.Shown.Single(shown => shown.StartsWith("Set the meter to", StringComparison.Ordinal));
        double toSet = Number.Parse("value", line.Split(' ')[4]);
        Assert.Equal(0.813 * 8.97, toSet, (0.0005 * 8.97) + 0.005);
        Assert.Equal(1, record.Result.Slope, 0.002);
    }

    [Fact]
    public async Task MissingReading_KeepsWhatWasTyped()
    {
        using Bench bench = new();
        WorkFailedException unfinished = await Assert.ThrowsAsync<WorkFailedException>(() => bench.TypedAsync(Meter("mg/L"), Reads(8.61)));
        Assert.StartsWith("unfinished: the as-left reading of the meter is missing", unfinished.Message, StringComparison.Ordinal);

        CalibrationRecord record = await bench.TypedAsync(Meter("mg/L"), Reads(8.97));
        Assert.Equal(8.61, record.Points[0].Signal.Mean);
        Assert.Equal(8.97, record.Points[1].Signal.Mean);
    }

    [Fact]
    public async Task MeterThatWasNotSetRight_Fails()
    {
        using Bench bench = new();
        CalibrationRecord record = await bench.TypedAsync(Meter("mg/L"), Reads(8.61, 8.70));
        Assert.False(record.Result.Pass);
        Assert.Contains("as-left -0.2", record.Result.Reasons.Single(), StringComparison.Ordinal);
    }

    private static ScriptedDialogue Reads(params double[] readings)
    {
        ScriptedDialogue answers = new();
        foreach (double reading in readings)
        {
            answers.Readings.Enqueue(reading);
        }

        return answers;
    }

    private static CalibrationSetup Meter(string shows)
    {
        return Bench.Setup with
        {
            Readings = CalibrationIds.Typed,
            TypedTemperatureCelsius = 20.0,
            Altitude = null,
            Pressure = Bench.Setup.Pressure with { Hectopascal = 750 * 1013.25 / 760 },
            Probe = Bench.Setup.Probe with
            {
                Model = "meter-display",
                SignalUnit = shows,
                MeterSettings = new RecordedMeterSettings { Shows = shows, Equation = "benson-krause-1984", Salinity = 0, Resolution = 0.01 },
            },
        };
    }
}
