using System;
using ProbeCal.Station.Correcting;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>
/// The arithmetic of a service visit. No text of TM 1-D3 with its tables of worked figures could be read, so the fouling and drift errors themselves are
/// checked by hand, labelled so; what a drift in time does to readings is checked on published corrected data.
/// </summary>
public class ServiceErrorsTests
{
    [Fact]
    public void Fouling_and_drift_errors_by_hand()
    {
        // By hand, with made-up readings: the probe rises by 0.35 when cleaned while the water rises by 0.04, so fouling took 0.31, which is 3.924 % of 7.90.
        Assert.Equal(0.31, ServiceErrors.Fouling(7.90, 8.25, 8.31, 8.35), 1e-12);
        Assert.Equal(3.9240506329, ServiceErrors.FoulingPercent(0.31, 7.90), 1e-9);
        // By hand: 8.97 in the standard, read as 8.61: 0.36 short, 4.181 % of the reading.
        Assert.Equal(0.36, ServiceErrors.Drift(8.97, 8.61), 1e-12);
        Assert.Equal(4.1811846690, ServiceErrors.DriftPercent(0.36, 8.61), 1e-9);
        // By hand: cleaning made the probe read less, as a bubble behind slime does: the error is negative.
        Assert.Equal(-0.25, ServiceErrors.Fouling(9.00, 8.80, 8.40, 8.45), 1e-12);
        Assert.True(double.IsNaN(ServiceErrors.FoulingPercent(0.1, 0)));
    }

    /// <summary>
    /// Corrected readings of a sonde in a river, September 2015, prorated linearly between two calibrations; method of Hasenmueller 2011
    /// (doi:10.7936/K7N014KS). Second-hand: figures of the files correctedData.csv (one standard) and sondeClean.csv (two) of the public repository
    /// shaughnessyar/driftR, files of its first and last version. The interval from 12:10:49 on the 18th is 461,100 s long, from the figures themselves.
    /// </summary>
    /// <remarks>
    /// Dissolved oxygen in %, standard 99, read 97.6; conductivity in mS/cm, standard 1, read 1.07; turbidity, standard 0, read 1.3. The figures are printed to
    /// 1e-8 or better, so that is the tolerance.
    /// </remarks>
    [Theory]
    [InlineData("12:15:50", 93.73, 99, 97.6, 93.7309139)]
    [InlineData("12:45:51", 94.16, 99, 97.6, 94.16638213)]
    [InlineData("16:10:53", 88, 99, 97.6, 88.04373368)]
    [InlineData("21:15:53", 80.55, 99, 97.6, 80.64929646)]
    [InlineData("12:15:50", 0.75, 1, 1.07, 0.749954305)]
    [InlineData("20:55:53", 0.751, 1, 1.07, 0.74621735)]
    [InlineData("13:30:52", -0.2, 0, 1.3, -0.213541314)]
    public void Constant_form_gives_the_published_figures(string time, double reading, double standard, double read, double expected)
    {
        double error = ServiceErrors.Drift(standard, read);
        Assert.Equal(expected, reading + RowCorrector.Between(0, error, Share(time)), 1e-8);
    }

    /// <summary>
    /// The same source with two standards: chloride 10 and 1000, the high one read as 1411; pH 7 and 10, the high one read as 11.8. For the low standard
    /// the source adds its error where it says that it takes it off (11.6 and 7.01 there), so its figures are those of a probe that read 8.4 and 6.99,
    /// which is what stands here. Printed to 1e-12.
    /// </summary>
    [Theory]
    [InlineData("12:15:50", 49.62, 10, 8.4, 1000, 1411, 49.6102680717859)]
    [InlineData("16:15:53", 50.58, 10, 8.4, 1000, 1411, 50.0981069377863)]
    [InlineData("20:30:52", 51.83, 10, 8.4, 1000, 1411, 50.8269489778606)]
    [InlineData("12:15:50", 7.14, 7, 6.99, 10, 11.8, 7.13995140827966)]
    [InlineData("18:15:53", 7.1, 7, 6.99, 10, 11.8, 7.09767559454671)]
    [InlineData("20:30:52", 7.09, 7, 6.99, 10, 11.8, 7.08722636085202)]
    public void Slope_and_zero_that_move_linearly_give_the_published_figures(string time, double reading, double low, double readLow, double high, double readHigh, double expected)
    {
        (double slope, double zero) = ServiceErrors.Line([(low, readLow), (high, readHigh)]);
        double share = Share(time);
        Assert.Equal(expected, ServiceErrors.Undo(reading, RowCorrector.Between(1, slope, share), RowCorrector.Between(0, zero, share)), 1e-11);
    }

    [Fact]
    public void Error_grows_from_the_onset_to_the_visit_and_no_further()
    {
        Assert.Equal(0, ServiceErrors.Prorated(50, 100, 200));
        Assert.Equal(0, ServiceErrors.Prorated(100, 100, 200));
        Assert.Equal(0.25, ServiceErrors.Prorated(125, 100, 200));
        Assert.Equal(1, ServiceErrors.Prorated(200, 100, 200));
        Assert.Equal(1, ServiceErrors.Prorated(900, 100, 200));
    }

    [Theory]
    // Ends of the classes as TM 1-D3 is known for oxygen: 0.3, 0.5, 0.8, and 2.0 mg/L or 20 %, the greater.
    [InlineData(0, 8, "Excellent")]
    [InlineData(0.3, 8, "Excellent")]
    [InlineData(0.31, 8, "Good")]
    [InlineData(0.5, 8, "Good")]
    [InlineData(0.8, 8, "Fair")]
    [InlineData(0.81, 8, "Poor")]
    [InlineData(2.0, 8, "Poor")]
    [InlineData(2.01, 8, "ConsiderDeletion")]
    [InlineData(2.4, 12, "Poor")]
    [InlineData(2.41, 12, "ConsiderDeletion")]
    public void Rating_goes_by_the_sum_of_absolute_corrections(double sum, double value, string expected)
    {
        Assert.Equal(expected, ServiceErrors.Rate(sum, value, new ServiceLimits()).ToString());
    }

    [Fact]
    public void Just_the_limit_is_not_above_it()
    {
        // As doubles, 8.97 less 8.67 is a little above 0.3.
        Assert.True(0.3 < ServiceErrors.Drift(8.97, 8.67));
        Assert.False(ServiceErrors.IsApplied(ServiceErrors.Drift(8.97, 8.67), new ServiceLimits()));
        Assert.True(ServiceErrors.IsApplied(0.31, new ServiceLimits()));
    }

    private static double Share(string time)
    {
        TimeSpan since = TimeSpan.ParseExact(time, "hh\\:mm\\:ss", System.Globalization.CultureInfo.InvariantCulture) - new TimeSpan(12, 10, 49);
        return ServiceErrors.Prorated(since.Ticks, 0, TimeSpan.FromSeconds(461_100).Ticks);
    }
}
