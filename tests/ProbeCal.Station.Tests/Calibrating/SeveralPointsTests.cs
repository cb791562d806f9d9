using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Fits over several points: the truth is found, the covariance holds it as often as it says, and what cannot be fitted is said in one line.</summary>
public class SeveralPointsTests(ITestOutputHelper output)
{
    private const double Zero = 0.4;
    private const double Slope = 0.31;
    private const double Coefficient = 0.03;

    private static readonly (double Hectopascal, double Celsius)[] Levels = [(0.0, 20.0), (60.0, 10.0), (110.0, 15.0), (160.0, 22.0), (205.0, 25.0), (205.0, 24.0)];

    [Theory]
    [InlineData("line", 0.0)]
    [InlineData("quadratic", -4e-5)]
    public void WithoutNoise_TheTruthIsFound(string form, double curvature)
    {
        RecordedPoint[] points = [.. Levels.Select((level, i) => Point(i, level.Hectopascal, level.Celsius, Truth(level.Hectopascal, level.Celsius, curvature)))];
        (RecordedFit? fit, string? why) = SeveralPoints.Of(Probe(), Gas.Oxygen, points, form);
        Assert.Null(why);
        Assert.Equal(Zero, fit!.Zero, 1e-9);
        Assert.Equal(Slope, fit.Slope, 1e-9);
        Assert.Equal(curvature, fit.Curvature, 1e-11);
        Assert.Equal((form, "errors-in-both", 0.0, 205.0), (fit.Form, fit.Method, fit.LowestHectopascal, fit.HighestHectopascal));
        Assert.Equal(form == "line" ? (3, 4) : (6, 3), (fit.Covariance.Length, fit.DegreesOfFreedom));
        Assert.All(fit.Residuals, static residual => Assert.Equal(0.0, residual.ResidualHectopascal, 1e-7));
        Assert.Equal(points.Select(static point => point.Role), fit.Residuals.Select(static residual => residual.Role));
        Assert.InRange(fit.ChiSquared, 0.0, 1e-12);
    }

    /// <summary>
    /// 2,000 calibrations with errors of signal, reference, temperature at the point, one barometer for all points: the squared distance of the fit from the truth, in units of the
    /// stated covariance, is chi-squared with two degrees of freedom, so that its mean is 2 and 95 % lie below 5.99. Allowance: 4 standard errors of each, 4·2/√2000 and 4·√(0.95·0.05/2000).
    /// </summary>
    [Fact]
    public void TheCovariance_HoldsTheTruth()
    {
        Campaign campaign = new(output, "several points", 2_000, 20_000);
        Random random = new(campaign.Seed);
        double sum = 0.0;
        double chi = 0.0;
        int inside = 0;
        for (int run = 0; run < campaign.Count; run++)
        {
            double barometer = Normal(random);
            RecordedPoint[] points = [.. Levels.Select((level, i) =>
            {
                RecordedPoint plain = Point(i, level.Hectopascal, level.Celsius, 0.0);
                double celsius = level.Celsius + (plain.Temperature.StandardUncertainty * Normal(random));
                RecordedReferenceContribution[] budget = plain.Reference!.Budget;
                double truth = level.Hectopascal - (budget[0].Hectopascal * barometer) - (budget[1].Hectopascal * Normal(random))
                    + ((celsius - level.Celsius) * budget[2].Hectopascal / budget[2].StandardUncertainty);
                double signal = Truth(truth, celsius, 0.0) + (plain.SignalStandardUncertainty * Normal(random));
                return plain with { Signal = plain.Signal with { Mean = signal } };
            })];
            (RecordedFit? fit, string? why) = SeveralPoints.Of(Probe(), Gas.Oxygen, points, "line");
            Assert.Null(why);
            double a = fit!.Zero - Zero;
            double b = fit.Slope - Slope;
            (double aa, double ab, double bb) = (fit.Covariance[0], fit.Covariance[1], fit.Covariance[2]);
            double distance = ((a * a * bb) - (2.0 * a * b * ab) + (b * b * aa)) / ((aa * bb) - (ab * ab));
            sum += distance;
            chi += fit.ChiSquared;
            inside += distance < 5.991 ? 1 : 0;
        }

        double count = campaign.Count;
        output.WriteLine($"mean {sum / count:F3} (2), below 5.99 {100.0 * inside / count:F2} % (95), chi-squared {chi / count:F3} (4)");
        Assert.Equal(2.0, sum / count, 8.0 / Math.Sqrt(count));
        Assert.Equal(0.95, inside / count, 4.0 * Math.Sqrt(0.95 * 0.05 / count));
        Assert.Equal(4.0, chi / count, 4.0 * Math.Sqrt(8.0 / count));
    }

    /// <summary>One ratio of air to water for every point in air: repeats do not make it better known.</summary>
    [Fact]
    public void TheRatioOfAirToWater_IsCommonToPointsInAir()
    {
        RecordedPoint[] points = [.. new[] { 0.0, 205.0, 205.0, 205.0, 205.0 }.Select((hectopascal, i) =>
        {
            RecordedPoint point = Point(i, hectopascal, 20, Truth(hectopascal, 20, 0.0)) with { SignalStandardUncertainty = 1e-3 };
            return point with
            {
                Temperature = point.Temperature with { StandardUncertainty = 0 },
                Reference = new RecordedReference { Budget = i == 0 ? [] : [Part(ReferenceInputs.AirToWaterRatio, 0.01, -0.01 * hectopascal, "entered")] },
                ReferencePartialPressureUncertaintyHectopascal = i == 0 ? 0 : 0.01 * hectopascal,
            };
        })];
        RecordedFit fit = SeveralPoints.Of(Probe(), Gas.Oxygen, points, "line").Fit!;
        Assert.Equal(0.01, Math.Sqrt(fit.Covariance[2]) / fit.Slope, 1e-4);
    }

    /// <summary>The sensitivities that readings share, against fits to points whose thermometer, or whose probe's coefficient, is off.</summary>
    [Fact]
    public void SharedInputs_MoveTheFitAsStated()
    {
        RecordedPoint[] points = [.. Levels.Select((level, i) => Point(i, level.Hectopascal, level.Celsius, Truth(level.Hectopascal, level.Celsius, 0.0)))];
        RecordedFit fit = SeveralPoints.Of(Probe(), Gas.Oxygen, points, "line").Fit!;
        const double Kelvin = 1e-3;
        RecordedPoint[] warmer = [.. points.Select(static point => point with
        {
            Temperature = point.Temperature with { Value = point.Temperature.Value + Kelvin },
            ReferencePartialPressureHectopascal = point.ReferencePartialPressureHectopascal + (Kelvin * point.Reference!.Budget[2].Hectopascal / point.Reference.Budget[2].StandardUncertainty),
        })];
        RecordedFit off = SeveralPoints.Of(Probe(), Gas.Oxygen, warmer, "line").Fit!;
        Assert.Equal((off.Slope - fit.Slope) / Kelvin, fit.PerThermometerKelvin[1], 2e-3 * Math.Abs(fit.PerThermometerKelvin[1]));
        Assert.Equal((off.Zero - fit.Zero) / Kelvin, fit.PerThermometerKelvin[0], 2e-3 * Math.Abs(fit.PerThermometerKelvin[0]));
        Assert.InRange(fit.PerThermometerKelvin[1], -0.02, -0.005);
        const double Change = 1e-6;
        RecordedFit steeper = SeveralPoints.Of(Probe(Coefficient + Change), Gas.Oxygen, points, "line").Fit!;
        Assert.Equal((steeper.Slope - fit.Slope) / Change, fit.PerTemperatureCoefficient[1], 2e-3 * Math.Abs(fit.PerTemperatureCoefficient[1]));
        Assert.Equal((steeper.Zero - fit.Zero) / Change, fit.PerTemperatureCoefficient[0], 2e-3 * Math.Abs(fit.PerTemperatureCoefficient[0]));
    }

    /// <summary>A bent probe through a line: the repeats at 205 hPa show the lack of fit, the residuals their pattern.</summary>
    [Fact]
    public void ABentProbe_ShowsInTheFit()
    {
        RecordedPoint[] points = [.. Levels.Select((level, i) => Point(i, level.Hectopascal, level.Celsius, Truth(level.Hectopascal, level.Celsius, -2e-4) + (i == 5 ? 0.02 : 0.0)))];
        RecordedFit fit = SeveralPoints.Of(Probe(), Gas.Oxygen, points, "line").Fit!;
        Assert.InRange(fit.ChiSquaredProbability!.Value, 0.0, 0.01);
        Assert.Equal((3, 1), (fit.LackOfFit!.DegreesOfFreedomLack, fit.LackOfFit.DegreesOfFreedomPure));
        Assert.True(10.0 < fit.LackOfFit.F);
        Assert.True(fit.Residuals[2].ResidualHectopascal * fit.Residuals[0].ResidualHectopascal < 0.0);
        Assert.InRange(fit.Residuals[2].ResidualMilligramsPerLitre!.Value / fit.Residuals[2].ResidualHectopascal, 0.04, 0.06);
    }

    [Theory]
    [InlineData("line", 1, "a line has 2 unknowns and there is 1 point; take at least 2 at different levels")]
    [InlineData("quadratic", 2, "a quadratic has 3 unknowns and there are 2 points; take at least 3 at different levels")]
    public void TooFewPoints_AreSaid(string form, int count, string expected)
    {
        RecordedPoint[] points = [.. Levels.Take(count).Select((level, i) => Point(i, level.Hectopascal, level.Celsius, Truth(level.Hectopascal, level.Celsius, 0.0)))];
        Assert.Equal((null, expected), SeveralPoints.Of(Probe(), Gas.Oxygen, points, form));
    }

    [Fact]
    public void UselessPoints_AreSaid()
    {
        string? Why(string form, params (double Hectopascal, double Signal)[] given)
        {
            (RecordedFit? fit, string? why) = SeveralPoints.Of(Probe(), Gas.Oxygen, [.. given.Select((at, i) => Point(i, at.Hectopascal, 20.0, at.Signal))], form);
            Assert.Null(fit);
            return why;
        }

        Assert.Equal("all points have the same reference; take them at different levels", Why("line", (200.0, 60.0), (200.0, 61.0)));
        Assert.StartsWith("the points do not determine the fit: 3 different levels", Why("quadratic", (0.0, 1.0), (200.0, 60.0), (200.0, 61.0)), StringComparison.Ordinal);
        Assert.StartsWith("the response falls as the partial pressure rises", Why("line", (0.0, 60.0), (200.0, 0.4)), StringComparison.Ordinal);
        Assert.StartsWith("the quadratic turns round between 0", Why("quadratic", (0.0, 0.0), (100.0, 50.0), (200.0, 10.0)), StringComparison.Ordinal);
        Assert.Contains("SignalNotFinite", Why("line", (0.0, double.NaN), (200.0, 60.0)), StringComparison.Ordinal);
    }

    private static double Truth(double hectopascal, double celsius, double curvature)
    {
        return Zero + (Math.Exp(Coefficient * (celsius - 25.0)) * ((Slope * hectopascal) + (curvature * hectopascal * hectopascal)));
    }

    private static RecordedProbe Probe(double coefficient = Coefficient)
    {
        return new RecordedProbe
        {
            Id = "P-17",
            Model = "amperometric",
            SignalUnit = "nA",
            TemperatureCoefficient = new RecordedTemperatureCoefficient
            {
                Form = "exponential",
                Value = coefficient,
                Unit = "1/K",
                StandardUncertainty = 0.0005,
                ReferenceCelsius = 25,
                FittedLowCelsius = 0,
                FittedHighCelsius = 40,
            },
            Thermometer = new RecordedThermometer { Id = "P-17", CommonStandardUncertaintyCelsius = 0.1, Source = "entered" },
        };
    }

    private static RecordedPoint Point(int index, double hectopascal, double celsius, double signal)
    {
        DateTimeOffset at = new(2026, 5, 4, 9, index, 0, TimeSpan.Zero);
        return new RecordedPoint
        {
            Role = "level-" + (index + 1),
            FirstUtc = at,
            LastUtc = at,
            Typed = false,
            Signal = new RecordedStatistics { Count = 60, Mean = signal, StandardDeviation = 0.1, SlopePerMinute = 0, SlopeStandardErrorPerMinute = 0.01, Minimum = signal, Maximum = signal, WindowSeconds = 60 },
            SignalStandardUncertainty = 0.1,
            Temperature = new RecordedQuantity { Value = celsius, Unit = "degC", StandardUncertainty = 0.05, Source = "line" },
            Pressure = new RecordedQuantity { Value = 1000, Unit = "hPa", StandardUncertainty = 0.8, Source = "barometer:B-12" },
            Salinity = new RecordedQuantity { Value = 0, Unit = "1", StandardUncertainty = 0, Source = "typed" },
            Stirring = "stirred",
            FlowFactor = 1,
            ReferencePartialPressureHectopascal = hectopascal,
            ReferencePartialPressureUncertaintyHectopascal = 0.5,
            ReferenceMilligramsPerLitre = hectopascal * 0.045,
            ReferenceUncertaintyMilligramsPerLitre = 0.03,
            Reference = new RecordedReference
            {
                Budget =
                [
                    Part("pressure", 0.8, 0.002 * hectopascal, "barometer:B-12"),
                    Part("state of the reference", 0.01, 0.3, "our choice"),
                    Part("thermometer offset", 0.1, -0.0003 * hectopascal, "entered"),
                ],
            },
        };
    }

    private static RecordedReferenceContribution Part(string input, double uncertainty, double hectopascal, string source)
    {
        return new RecordedReferenceContribution { Input = input, Value = 1, StandardUncertainty = uncertainty, Unit = "", Distribution = "normal", Hectopascal = hectopascal, Source = source };
    }

    private static double Normal(Random random)
    {
        return Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }
}
