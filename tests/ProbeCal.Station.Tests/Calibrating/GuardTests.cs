using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Each guard tripped, and not tripped by what lies just inside.</summary>
public class GuardTests
{
    private static readonly DateTimeOffset Now = new(2026, 6, 2, 9, 0, 0, TimeSpan.Zero);

    // ICAO standard atmosphere: 1050 hPa at sea level is 972.8 hPa at 640 m, 1035 is 958.9, 950 is 880.2, 870 is 806.0.
    [Theory]
    [InlineData(976, "Refuse")]
    [InlineData(965, "NeedsReason")]
    [InlineData(957, null)]
    [InlineData(884, null)]
    [InlineData(876, "NeedsReason")]
    [InlineData(800, "Refuse")]
    public void PressureAtAltitude_IsJudgedReducedToSeaLevel(double hectopascal, string? severity)
    {
        Finding? finding = Look(GuardNames.PressureAtAltitude, At(20, hectopascal));
        Assert.Equal(severity, finding?.Severity.ToString());
    }

    [Fact]
    public void SeaLevelPressureAtAltitude_IsRefused_AndSaysWhy()
    {
        Finding finding = Look(GuardNames.PressureAtAltitude, At(20, 1015))!;
        Assert.Equal(FindingSeverity.Refuse, finding.Severity);
        Assert.Contains("hPa at sea level, higher than weather makes it", finding.Sentence, StringComparison.Ordinal);
        Assert.Contains("enter the absolute pressure of the station", finding.Sentence, StringComparison.Ordinal);
        // Taken at face value the reference would be about 7.9 % high: 0.67 mg/L at 20 °C.
        Assert.InRange(finding.Error.Later!.Value, 0.6, 0.75);
    }

    [Theory]
    [InlineData(100, "barometer:B-1", "Note")]
    [InlineData(100, "weather-service:NAME", "NeedsReason")]
    [InlineData(100, "telephone", "NeedsReason")]
    [InlineData(20, "weather-service:NAME", "Note")]
    public void LowAltitude_CannotTellASeaLevelValue_SoTheErrorIsShownAndTheSourceAsked(double altitude, string source, string severity)
    {
        Finding finding = Look(GuardNames.PressureReduced, At(20, 1005, altitude, source))!;
        Assert.Equal(severity, finding.Severity.ToString());
        // Published: a sea-level value costs +1.2 % at 100 m (0.11 mg/L at 20 °C).
        if (altitude == 100)
        {
            Assert.InRange(finding.Error.Later!.Value, 0.10, 0.12);
            Assert.Contains("if so, the probe looks 0.11 mg/L too low as found, and once adjusted here its later readings are 0.11 mg/L too high", finding.Sentence, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void HighStation_WithAPressureThatFitsOnlyThere_IsNotAskedAbout()
    {
        Assert.Null(Look(GuardNames.PressureReduced, At(20, 840, 1500, "weather-service:NAME")));
    }

    [Fact]
    public void ReportedPressureWithoutAltitude_WantsAReason_ABarometersDoesNot()
    {
        Assert.Equal(FindingSeverity.NeedsReason, Look(GuardNames.PressureReduced, At(20, 1000, null, "airport:NAME"))!.Severity);
        Assert.Null(Look(GuardNames.PressureReduced, At(20, 1000, null, "barometer:B-1")));
    }

    [Theory]
    [InlineData(-31, true)]
    [InlineData(31, true)]
    [InlineData(29, false)]
    [InlineData(0, false)]
    public void PressureHere_IsComparedWithTheLastOne(double change, bool trips)
    {
        CalibrationRecord last = SampleRecords.Of("P-9", Now.AddDays(-9));
        Situation now = At(20, last.Points[0].Pressure.Value + change) with { LastHere = last };
        Finding? finding = Look(GuardNames.PressureHere, now);
        Assert.Equal(trips, finding != null);
        if (finding != null)
        {
            Assert.Equal(FindingSeverity.NeedsReason, finding.Severity);
            Assert.Equal(Math.Sign(change), Math.Sign(finding.Error.Later!.Value));
        }
    }

    [Fact]
    public void FahrenheitTypedAsCelsius_IsCaughtByTheRange()
    {
        Finding finding = Look(GuardNames.TemperatureRange, At(68, 940))!;
        Assert.Equal(FindingSeverity.Refuse, finding.Severity);
        Assert.Contains("write 68F (20.0 C)", finding.Sentence, StringComparison.Ordinal);
        Assert.Null(Look(GuardNames.TemperatureRange, At(38, 940)));
        Assert.Equal(FindingSeverity.Refuse, Look(GuardNames.TemperatureRange, At(-1, 940))?.Severity);
    }

    [Theory]
    // 39 °F is 3.9 °C: inside the equation's range as °C, so only the probe's own thermometer can tell.
    [InlineData(39, 4.0, true, "39 degrees Fahrenheit would be 3.9 C")]
    [InlineData(20.5, 20.0, true, "check both against a third")]
    [InlineData(20.1, 20.0, false, "")]
    public void TypedTemperature_IsComparedWithTheProbes(double typed, double own, bool trips, string says)
    {
        Situation now = At(typed, 940) with { ProbeTemperatureCelsius = own, Setup = Bench.Setup with { TypedTemperatureCelsius = typed } };
        Finding? finding = Look(GuardNames.TemperatureTwice, now);
        Assert.Equal(trips, finding != null);
        Assert.Contains(says, finding?.Sentence ?? "", StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(1.9, true)]
    [InlineData(2, false)]
    [InlineData(38.1, true)]
    public void TemperatureOutsideTheFittedRange_IsRefused(double celsius, bool trips)
    {
        Assert.Equal(trips, Look(GuardNames.CoefficientRange, At(celsius, 940)) != null);
    }

    [Fact]
    public void ClockBehindTheLastCalibration_IsRefused()
    {
        Situation behind = At(20, 940) with { Previous = SampleRecords.Of("P-1", Now.AddHours(1)) };
        Assert.Equal(FindingSeverity.Refuse, Look(GuardNames.Clock, behind)!.Severity);
        Assert.Null(Look(GuardNames.Clock, behind with { Previous = SampleRecords.Of("P-1", Now.AddHours(-1)) }));
    }

    [Fact]
    public void StillWater_IsNoted_StillAirAndStirredWaterAreNot()
    {
        Assert.Equal(FindingSeverity.Note, Look(GuardNames.StirringStill, At(20, 940) with { Setup = Bench.Setup with { Stirring = Stirring.Still } })!.Severity);
        Assert.Null(Look(GuardNames.StirringStill, At(20, 940)));
        Assert.Null(Look(GuardNames.StirringStill, At(20, 940) with { Setup = Bench.Setup with { Stirring = Stirring.Still, Method = CalibrationIds.WaterSaturatedAir } }));
    }

    [Theory]
    [InlineData(0.65, true)]
    [InlineData(0.58, false)]
    [InlineData(0.38, false)]
    [InlineData(0.35, true)]
    public void SlopeFarFromTheLast_WantsAReason(double slopeBefore, bool trips)
    {
        Situation now = Fitted(75, 0.35) with { Previous = SampleRecords.Of("P-1", Now.AddDays(-30), slope: slopeBefore) };
        Assert.Equal(0.452, now.Fit!.Slope, 0.001);
        Assert.Equal(trips, FitGuards.All.Single(guard => guard.Name == GuardNames.Slope).Look(now) != null);
    }

    [Theory]
    [InlineData(75, 0.35, Status.Ok)]
    [InlineData(75, 80, Status.ZeroAboveRange)]
    [InlineData(75, 75, Status.PointsDegenerate)]
    public void ZeroAboveTheSpan_IsRefused(double span, double zero, Status status)
    {
        Situation now = Fitted(span, zero);
        Assert.Equal(status, now.FitStatus);
        Finding? finding = FitGuards.All.Single(guard => guard.Name == GuardNames.Zero).Look(now);
        Assert.Equal(status != Status.Ok, finding?.Severity == FindingSeverity.Refuse);
    }

    [Theory]
    [InlineData(-6, true)]
    [InlineData(-4, false)]
    [InlineData(6, true)]
    public void ReadingFarFromSaturationBeforeAdjustment_IsNoted(double percent, bool trips)
    {
        RecordedPoint point = SampleRecords.Of("P-1", Now).Points[0];
        Situation now = At(20, 940) with { Span = point with { ErrorMilligramsPerLitre = point.ReferenceMilligramsPerLitre * percent / 100 } };
        Assert.Equal(trips, FitGuards.All.Single(guard => guard.Name == GuardNames.AsFound).Look(now) != null);
    }

    [Fact]
    public void EveryGuard_SaysWhatItWatches_AndKeepsQuietWhileNothingIsKnown()
    {
        Situation nothing = new() { Setup = Bench.Setup, NowUtc = Now };
        foreach (Guard guard in Guards.All)
        {
            Assert.NotEmpty(guard.Watches);
            Assert.Null(guard.Look(nothing));
        }
    }

    private static Finding? Look(string name, Situation now)
    {
        return ConditionGuards.All.Single(guard => guard.Name == name).Look(now);
    }

    private static Situation At(double celsius, double hectopascal, double? altitude = 640, string source = "barometer:B-1")
    {
        CalibrationSetup setup = Bench.Setup with
        {
            Pressure = new EnteredPressure { Hectopascal = hectopascal, Source = source, StandardUncertaintyHectopascal = 1 },
            Altitude = altitude is double metres ? new RecordedQuantity { Value = metres, Unit = "m", StandardUncertainty = 5, Source = "typed" } : null,
        };
        return new Situation { Setup = setup, NowUtc = Now, TemperatureCelsius = celsius, PressureHectopascal = hectopascal };
    }

    private static Situation Fitted(double spanSignal, double zeroSignal)
    {
        CalibrationRecord record = SampleRecords.Of("P-1", Now);
        RecordedPoint span = record.Points[0] with { Signal = record.Points[0].Signal with { Mean = spanSignal } };
        RecordedPoint zero = span with { Role = CalibrationIds.ZeroPoint, Signal = span.Signal with { Mean = zeroSignal } };
        CalibrationSetup setup = Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust };
        Fit fit = Fitting.Of(setup, new List<RecordedPoint> { span, zero }, null);
        return At(20, 940) with { Setup = setup, Span = span, Fit = fit.Calibration, FitStatus = fit.Status };
    }
}
