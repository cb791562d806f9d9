using System;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

public class CoefficientTextTests
{
    [Theory]
    [InlineData("exponential 0.03/K at 25C fitted 5..35C", "exponential", 0.03, "1/K", 25, 5, 35)]
    [InlineData("compound 3%/K at 20degC fitted 0C..40C", "compound", 0.03, "1/K", 20, 0, 40)]
    [InlineData("compound 3%/°C at 25C fitted 0..40C", "compound", 0.03, "1/K", 25, 0, 40)]
    [InlineData("exponential 0.03/C at 25C fitted 0..40C", "exponential", 0.03, "1/K", 25, 0, 40)]
    [InlineData("linear 0.03/K fitted 5..35C at 25C", "linear", 0.03, "1/K", 25, 5, 35)]
    [InlineData("Arrhenius 22kJ/mol at 25 fitted 5..35C", "", 0, "", 0, 0, 0)]
    [InlineData("arrhenius 22kJ/mol at 25°C fitted 2.5..35.5C", "arrhenius", 22000, "J/mol", 25, 2.5, 35.5)]
    public void Forms_AreRead(string text, string form, double value, string unit, double reference, double low, double high)
    {
        if (form.Length == 0)
        {
            Assert.Throws<InputException>(() => CoefficientText.Parse("--coefficient", text));
            return;
        }

        RecordedTemperatureCoefficient read = CoefficientText.Parse("--coefficient", text);
        Assert.Equal(form, read.Form);
        Assert.Equal(value, read.Value, 1e-15);
        Assert.Equal(unit, read.Unit);
        Assert.Equal(reference, read.ReferenceCelsius);
        Assert.Equal(low, read.FittedLowCelsius);
        Assert.Equal(high, read.FittedHighCelsius);
        Assert.Equal(read, CoefficientText.Parse("again", CoefficientText.Print(read)));
    }

    [Fact]
    public void Uncertainty_IsTheEnteredOne_OrThePublishedDefault()
    {
        Assert.Equal(0.002, CoefficientText.Parse("c", "exponential 0.03/K at 25C fitted 5..35C u 0.002/K").StandardUncertainty);
        Assert.Equal(0.00024, CoefficientText.Parse("c", "exponential 0.03/K at 25C fitted 5..35C").StandardUncertainty, 1e-12);
        // 0.024 %/K at 25 °C is 0.00024·R·298.15² J/mol.
        Assert.Equal(0.00024 * 8.31446261815324 * 298.15 * 298.15, CoefficientText.Parse("c", "arrhenius 22kJ/mol at 25C fitted 5..35C").StandardUncertainty, 1e-6);
    }

    [Theory]
    [InlineData("3%/K")]
    [InlineData("0.03/K")]
    [InlineData("3 %/K")]
    public void BareRate_IsRefusedWithTheFormsAndHowFarTheyDiffer(string text)
    {
        InputException refused = Assert.Throws<InputException>(() => CoefficientText.Parse("--coefficient", text));
        Assert.StartsWith("--coefficient " + text + ": a rate alone does not say its form", refused.Message, StringComparison.Ordinal);
        foreach (string form in new[] { "exponential", "compound", "linear", "arrhenius" })
        {
            Assert.Contains(form, refused.Message, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void BareRate_ShowsTheFactorsFifteenKelvinAway()
    {
        // exp(-15·0.03) = 0.638, 1.03^-15 = 0.642, 1 - 15·0.03 = 0.550.
        InputException refused = Assert.Throws<InputException>(() => CoefficientText.Parse("--coefficient", "3%/K"));
        Assert.Contains("exponential 0.638, compound 0.642, linear 0.550, arrhenius 0.62", refused.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("", "write FORM VALUE")]
    [InlineData("exponential", "the value is missing")]
    [InlineData("exponental 0.03/K at 25C fitted 5..35C", "did you mean exponential")]
    [InlineData("exponential 0.03 at 25C fitted 5..35C", "takes a value per kelvin")]
    [InlineData("exponential 0,03/K at 25C fitted 5..35C", "a comma is no decimal mark here")]
    [InlineData("exponential 0.03/K fitted 5..35C", "the reference temperature is missing")]
    [InlineData("exponential 0.03/K at 25C", "the range it was fitted over is missing")]
    [InlineData("exponential 0.03/K at 25C fitted 35..5C", "runs from low to high")]
    [InlineData("exponential 0.03/K at 25C fitted 5-35C", "is no range")]
    [InlineData("exponential 0.03/K at 77F fitted 5..35C", "degrees Celsius")]
    [InlineData("exponential -0.03/K at 25C fitted 5..35C", "above 0")]
    [InlineData("exponential 0.03/K at 25C fitted 5..35C u", "nothing follows 'u'")]
    [InlineData("exponential 0.03/K near 25C fitted 5..35C", "'near' is not understood")]
    [InlineData("arrhenius 0.03/K at 25C fitted 5..35C", "activation energy")]
    [InlineData("linear 0.05/K at 25C fitted 0..40C", "no usable factor")]
    public void Nonsense_GetsOneLineThatSaysWhatIsRight(string text, string says)
    {
        InputException refused = Assert.Throws<InputException>(() => CoefficientText.Parse("--coefficient", text));
        Assert.Contains(says, refused.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', refused.Message);
    }

    [Theory]
    [InlineData("barometer:B-12", "barometer:B-12")]
    [InlineData("weather-service: Hill Office", "weather-service:Hill Office")]
    [InlineData("telephone", "telephone")]
    [InlineData("Altitude", "altitude")]
    public void PressureSources_AreRead(string text, string kept)
    {
        Assert.Equal(kept, PressureSource.Parse("--pressure-source", text).Text);
    }

    [Theory]
    [InlineData("barometer", "has an id")]
    [InlineData("barometr:B", "did you mean barometer")]
    [InlineData("", "barometer:ID")]
    public void OtherPressureSources_AreRefused(string text, string says)
    {
        Assert.Contains(says, Assert.Throws<InputException>(() => PressureSource.Parse("--pressure-source", text)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void AltitudeAlone_IsNeverBetterThanTenHectopascal()
    {
        Assert.Equal(10, PressureSource.Parse("s", "altitude").DefaultUncertaintyHectopascal);
    }
}
