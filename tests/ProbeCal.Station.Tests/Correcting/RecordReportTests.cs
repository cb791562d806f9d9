using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>
/// A record as a lake station leaves it, made by a seeded generator: a row every ten minutes with gaps, deep water without oxygen where the probe shows its zero
/// offset of -0.070 mg/L, and a % column on 1 atm although the station lies at 954 hPa. The report must find what was put in.
/// </summary>
public sealed class RecordReportTests : IDisposable
{
    private const int Seed = 20180912;
    private const double ZeroOffset = -0.070;
    private const double StationPressure = 954;

    private readonly TemporaryFolder _folder = new();

    public void Dispose()
    {
        _folder.Dispose();
    }

    [Fact]
    public void Gaps_plateau_and_convention_of_the_percent_column_are_found()
    {
        RecordReport report = RecordReport.Of(Request(Write()), CancellationToken.None);
        Assert.Equal(TimeSpan.FromMinutes(10), report.Interval);
        Assert.Equal((2016L - 1 - 7 - 185, 0L, 0L, 0L), (report.Rows, report.WithoutTime, report.Repeats, report.Backward));
        // The clock runs four hours behind UTC.
        Assert.Equal(new DateTimeOffset(2018, 9, 12, 4, 0, 0, TimeSpan.Zero), report.Span.First);
        Assert.Equal([20.0, 80.0, 1860.0], report.Gaps.Select(static gap => (gap.To - gap.From).TotalMinutes));

        Plateau plateau = report.LongestPlateau!;
        // Noise of 0.002 mg/L over 1,400 rows: the mean is known to 0.00005, five times that is allowed.
        Assert.Equal(ZeroOffset, plateau.Mean, 0.0003);
        Assert.Equal(ZeroOffset, plateau.Median, 0.0003);
        Assert.Equal(0.002, plateau.StandardDeviation, 0.0003);
        Assert.True(TimeSpan.FromDays(9) < plateau.To - plateau.From);

        // Printed to 0.01 mg/L and 0.01 %: half a digit of mg/L is 0.06 % at most here, half a digit of % is 0.005.
        Assert.True(Math.Abs(report.AgainstOneAtmosphere!.Largest) < 0.07, $"{report.AgainstOneAtmosphere.Largest}");
        // At 954 hPa full water holds 6 % less than at 1 atm, so 100 % of 1 atm is 106 % here.
        Assert.True(5 < Math.Abs(report.AgainstLocal!.Largest), $"{report.AgainstLocal.Largest}");
    }

    [Fact]
    public void A_column_on_local_pressure_is_told_from_one_on_1_atm()
    {
        RecordReport report = RecordReport.Of(Request(Write(percentPressure: StationPressure)), CancellationToken.None);
        Assert.True(Math.Abs(report.AgainstLocal!.Largest) < 0.07);
        Assert.True(5 < Math.Abs(report.AgainstOneAtmosphere!.Largest));
    }

    [Fact]
    public void A_short_dip_below_zero_is_no_plateau()
    {
        RecordReport report = RecordReport.Of(Request(Write(anoxicRows: 20)), CancellationToken.None);
        Assert.Null(report.LongestPlateau);
        Assert.True(0 < report.BelowZero);
    }

    [Fact]
    public void Times_without_an_offset_are_refused()
    {
        InputException wrong = Assert.Throws<InputException>(() => RecordReport.Of(Request(Write()) with { TimeOffset = null }, CancellationToken.None));
        Assert.Contains("do not say their offset from UTC", wrong.Message, StringComparison.Ordinal);
    }

    private static RecordReportRequest Request(string path)
    {
        return new RecordReportRequest
        {
            Input = path,
            TimeOffset = "-04:00",
            Salinity = "0",
            Pressure = Number.Print(StationPressure) + "hPa",
            Columns = ["time=Time", "concentration=DO [mg/L]", "percent=DO [%]", "temperature=T [C]"],
        };
    }

    private string Write(double percentPressure = PressureUnits.HectopascalPerAtmosphere, int anoxicRows = 1500)
    {
        Random random = new(Seed);
        List<string> lines = ["# seed " + Seed.ToString(CultureInfo.InvariantCulture), "Time,T,DO [mg/L],DO [%]"];
        DateTime begin = new(2018, 9, 12, 0, 0, 0, DateTimeKind.Unspecified);
        for (int i = 0; i < 14 * 144; i++)
        {
            // A row lost, an hour lost, and more than a day.
            if (i == 80 || i is >= 1100 and < 1107 || i is >= 1700 and < 1885)
            {
                continue;
            }

            double temperature = Math.Round(12 + (0.0006 * i) + (0.2 * random.NextDouble()), 3);
            bool anoxic = i < anoxicRows;
            double concentration = anoxic ? ZeroOffset + (0.002 * Normal(random)) : 9 + (1.5 * Math.Sin(i / 23.0));
            Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(temperature, 0, percentPressure, RangeRule.Refuse, out double full));
            lines.Add(string.Create(CultureInfo.InvariantCulture, $"{begin.AddMinutes(10 * i):yyyy-MM-dd HH:mm:ss},{temperature:F3},{(anoxic ? Math.Round(concentration, 6) : Math.Round(concentration, 2)):R},{100 * concentration / full:F2}"));
        }

        string path = _folder.File("lake.csv");
        File.WriteAllLines(path, lines);
        return path;
    }

    private static double Normal(Random random)
    {
        return Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
    }
}
