using System;
using System.Globalization;
using System.Linq;
using System.Text.RegularExpressions;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.TableWriting;
using Xunit;

namespace ProbeCal.Station.Tests.TableWriting;

/// <summary>The printed card.</summary>
public class FieldCardTests
{
    private static TableOptions Pond => new()
    {
        Format = "card",
        Program = "probecal test",
        Temperature = "0..40C",
        Salinity = "0",
        SiteAltitude = "640m",
        Site = "North <pond> & weir",
    };

    private static string Make(TableOptions options)
    {
        return TableWriter.Make(options, null, CancellationToken.None).Content;
    }

    /// <summary>Cells of the card, the row of temperatures and the pressures first.</summary>
    private static string[][] Cells(string card)
    {
        return [.. Regex.Matches(card, "<tr[^>]*>(.*?)</tr>").Select(static row => Regex.Matches(row.Groups[1].Value, "<t[hd][^>]*>(.*?)</t[hd]>").Select(static cell => cell.Groups[1].Value).ToArray())];
    }

    [Fact]
    public void The_columns_lie_about_the_standard_pressure_and_the_expected_one_is_marked()
    {
        string card = Make(Pond);
        string[][] cells = Cells(card);
        // 938.7 hPa at 640 m: US Standard Atmosphere 1976 (the check values of Core.Tests hold the function to its tables).
        Assert.Equal(["910", "940", "970"], [cells[1][1], cells[1][7], cells[1][13]]);
        Assert.Equal("expected", cells[0][7]);
        Assert.Equal("705", cells[2][7]);
        Assert.Contains("938.7 hPa (704.1 mmHg)", card, StringComparison.Ordinal);
        Assert.Equal(41 + 2, Regex.Count(card, "class=\"expected\""));
    }

    [Fact]
    public void Every_cell_is_the_equation_rounded()
    {
        string[][] cells = Cells(Make(Pond));
        int compared = 0;
        foreach (string[] row in cells.Skip(3))
        {
            for (int column = 1; column < row.Length; column++)
            {
                double celsius = double.Parse(row[0], CultureInfo.InvariantCulture);
                double hectopascal = double.Parse(cells[1][column], CultureInfo.InvariantCulture);
                Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(celsius, 0, hectopascal, RangeRule.Refuse, out double value));
                Assert.InRange(Math.Abs(double.Parse(row[column], CultureInfo.InvariantCulture) - value), 0, 0.0050001);
                compared++;
            }
        }

        Assert.Equal(41 * 13, compared);
    }

    [Fact]
    public void The_card_says_what_it_rests_on_and_fetches_nothing()
    {
        string card = Make(Pond);
        foreach (string said in new[]
        {
            "benson-krause-1984", "Limnol. Oceanogr.", "fresh water (salinity 0)", "0.20946", "barometer", "sea level", "made by probecal test",
            "North &lt;pond&gt; &amp; weir", "within 0.0059 mg/L",
        })
        {
            Assert.Contains(said, card, StringComparison.Ordinal);
        }

        Assert.DoesNotMatch("(?i)https?:|src=|<link|<script|url\\(|@import|background: *#(?!fff)|color: *#(?!000)|\\b20[0-9][0-9]-[0-9][0-9]", card);
    }

    [Fact]
    public void Trace_gases_are_in_a_unit_with_figures_before_the_point()
    {
        string card = Make(Pond with { Gas = "CH4", Temperature = "5..30C" });
        Assert.Contains("<h1>Methane in water at equilibrium with air, ng/L</h1>", card, StringComparison.Ordinal);
        Assert.All(Cells(card).Skip(3).SelectMany(static row => row.Skip(1)), static cell => Assert.Matches("^[1-9][0-9]*\\.[0-9]{2}$", cell));
    }

    [Theory]
    [InlineData("hPa", "940", "°C \\ hPa")]
    [InlineData("mmHg", "704", "°C \\ mmHg")]
    [InlineData("kPa", "94.0", "°C \\ kPa")]
    [InlineData("inHg", "27.75", "°C \\ inHg")]
    public void Pressures_are_in_the_unit_of_the_barometer(string unit, string expected, string corner)
    {
        string[][] cells = Cells(Make(Pond with { PressureUnit = unit }));
        Assert.Equal(expected, cells[1][7]);
        Assert.Equal(corner, cells[1][0]);
    }

    [Theory]
    [InlineData("SiteAltitude", "640", "unit")]
    [InlineData("SiteAltitude", "6000m", "leave the range of benson-krause-1984")]
    [InlineData("SiteAltitude", "20km", "the standard atmosphere is used from")]
    [InlineData("Temperature", "0..40C at 0.5K", "do not fit one page")]
    [InlineData("Pressure", "600..1100hPa", "--site-altitude")]
    [InlineData("PressureUnit", "bars", "there are hPa, mmHg, kPa, inHg")]
    [InlineData("Quantity", "vapour-pressure", "a field card tells the concentration")]
    [InlineData("Site", "A site whose name is so very long that no card of one page can hold it", "at most 60 characters")]
    [InlineData("Error", "0.001mg/L", "cannot be reached")]
    public void Wrong_input_is_one_line(string option, string value, string right)
    {
        TableOptions options = option switch
        {
            "SiteAltitude" => Pond with { SiteAltitude = value },
            "Temperature" => Pond with { Temperature = value.Split(' ')[0], TemperatureStep = value.Split(' ')[2] },
            "Pressure" => Pond with { Pressure = value },
            "PressureUnit" => Pond with { PressureUnit = value },
            "Quantity" => Pond with { Quantity = value },
            "Error" => Pond with { Error = value, Temperature = "10..11C" },
            _ => Pond with { Site = value },
        };
        InputException wrong = Assert.Throws<InputException>(() => Make(options));
        Assert.Contains(right, wrong.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
    }
}
