using System.Globalization;
using Xunit;

namespace ProbeCal.Core.Tests.Probes;

/// <summary>The potentiometric probe and its ideal slope.</summary>
public class SeveringhausTests
{
    /// <summary>Values from memory: 59.16 mV per decade at 25 °C and 61.54 at 37 °C stand in every textbook of electrochemistry.</summary>
    [Theory]
    [InlineData(25.0, 59.16)]
    [InlineData(37.0, 61.54)]
    public void Ideal_slope(double temperature, double millivolt)
    {
        Assert.Equal(Status.Ok, SeveringhausProbe.IdealSlope(temperature, out double slope));
        Assert.Equal(millivolt, slope, 0.005);
    }

    [Fact]
    public void Faraday_constant_is_the_product_of_the_defining_constants()
    {
        // e and N_A, exact by the 2019 definition of the SI.
        decimal exact = 1.602176634m * 6.02214076m * 10000m;
        Assert.Equal(SeveringhausProbe.FaradayConstant, double.Parse(exact.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture));
    }

    [Fact]
    public void Percent_of_ideal_does_not_look_at_the_sign()
    {
        SeveringhausProbe.IdealSlope(25, out double ideal);
        Assert.Equal(Status.Ok, SeveringhausProbe.PercentOfIdeal(-0.97 * ideal, 25, out double percent));
        Assert.Equal(97.0, percent, 1e-12);
        Assert.Equal(Status.SlopeNotFinite, SeveringhausProbe.PercentOfIdeal(double.NaN, 25, out _));
        Assert.Equal(Status.TemperatureBelowRange, SeveringhausProbe.PercentOfIdeal(59, -300, out _));
    }
}
