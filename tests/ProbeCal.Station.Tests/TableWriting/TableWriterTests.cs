using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Text.RegularExpressions;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.TableWriting;
using ProbeCal.Station.Tests.Engine;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.TableWriting;

/// <summary>Tables as they are written, read back by a reader that is written here.</summary>
public class TableWriterTests(ITestOutputHelper output)
{
    private const int Points = 20_000;

    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : 20130613;

    private static TableOptions Fresh => new()
    {
        Format = "csv",
        Program = "probecal test",
        Temperature = "0..40C",
        Pressure = "600..1100hPa",
        Salinity = "0",
        Error = "0.01mg/L",
    };

    private static WrittenTable Make(TableOptions options)
    {
        return TableWriter.Make(options, null, CancellationToken.None);
    }

    [Theory]
    [InlineData("0.1mg/L")]
    [InlineData("0.01mg/L")]
    [InlineData("0.0005mg/L")]
    [InlineData("0.05%")]
    public void The_error_found_holds_at_random_points_and_is_no_idle_bound(string error)
    {
        CsvReading table = CsvReading.Of(Make(Fresh with { Error = error }).Content);
        bool percent = error.EndsWith('%');
        double allowed = double.Parse(error.TrimEnd('%', 'L', '/', 'g', 'm'), CultureInfo.InvariantCulture);
        Random random = new(Seed);
        double worst = 0;
        for (int i = 0; i < Points; i++)
        {
            double celsius = 40 * random.NextDouble();
            double hectopascal = 600 + (500 * random.NextDouble());
            Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(celsius, 0, hectopascal, RangeRule.Refuse, out double truth));
            double wrong = Math.Abs(table.Between(celsius, hectopascal) - truth);
            worst = Math.Max(worst, percent ? 100 * wrong / truth : wrong);
        }

        double found = table.LargestFound;
        output.WriteLine(string.Create(CultureInfo.InvariantCulture,
            $"campaign: --error {error}: {table.Rows.Length} x {table.Columns.Length} values, found {found:E3}, worst of {Points} random points {worst:E3}, seed {Seed}"));
        // The header prints three digits, rounded up.
        Assert.InRange(worst, 0.8 * found, found);
        Assert.True(found <= allowed);
    }

    [Fact]
    public void Steps_are_as_coarse_as_the_error_lets_them()
    {
        CsvReading table = CsvReading.Of(Make(Fresh with { PressureStep = "500hPa" }).Content);
        Assert.Equal(21, table.Rows.Length);
        // The next coarser step of few decimals is 2.5 K: with it the same error is refused, and without a limit it is found to be larger.
        InputException refused = Assert.Throws<InputException>(() => Make(Fresh with { PressureStep = "500hPa", TemperatureStep = "2.5K" }));
        Assert.Contains("too coarse for --error 0.01mg/L", refused.Message, StringComparison.Ordinal);
        Assert.InRange(CsvReading.Of(Make(Fresh with { PressureStep = "500hPa", TemperatureStep = "2.5K", Error = null }).Content).LargestFound, 0.01, 0.02);
    }

    /// <summary>The printed table of the US national field manual (public domain, read from the document), within the table's error and the printed rounding.</summary>
    [Fact]
    public void The_table_gives_the_field_manual_within_its_error_and_the_printed_rounding()
    {
        CsvReading table = CsvReading.Of(Make(Fresh).Content);
        double worst = 0;
        int cells = 0;
        foreach (string line in File.ReadLines(Repository.File("tests", "ProbeCal.Core.Tests", "CheckValues", "field-manual-oxygen-solubility.csv")))
        {
            string[] fields = line.Split(',');
            if (line[0] == '#' || fields[0] == "celsius") { continue; }
            double[] row = [.. fields.Take(3).Select(static f => double.Parse(f, CultureInfo.InvariantCulture))];
            worst = Math.Max(worst, Math.Abs(table.Between(row[0], row[1] * 1013.25 / 760) - row[2]));
            cells++;
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{cells} printed cells, worst {worst:F5} mg/L, table error {table.LargestFound}, rounding 0.005"));
        Assert.Equal(1944, cells);
        Assert.InRange(worst, 0, table.LargestFound + 0.005);
    }

    [Fact]
    public void Every_gas_of_air_gets_a_table_by_its_default_equation()
    {
        foreach (GasEntry gas in Catalogue.Gases.Where(static gas => !double.IsNaN(gas.DryAirMoleFraction)))
        {
            TableOptions options = Fresh with { Gas = gas.Symbol, Temperature = "5..30C", Pressure = "900..1050hPa", Salinity = "5", Error = "0.1%" };
            CsvReading table = CsvReading.Of(Make(options).Content);
            GasEquilibrium.MilligramsPerLitre(gas.Gas, gas.DefaultEquation, 17.3, 5, 1003, gas.DryAirMoleFraction, 100, RangeRule.Refuse, out double truth);
            Assert.InRange(Math.Abs((table.Between(17.3, 1003) / truth) - 1), 0, 0.001);
        }
    }

    [Fact]
    public void Salinity_factor_times_fresh_water_is_saline_water()
    {
        TableOptions options = new() { Format = "csv", Program = "probecal test", Quantity = "salinity-factor", Temperature = "0..35C", Salinity = "0..40", Error = "0.0002" };
        CsvReading table = CsvReading.Of(Make(options).Content);
        BensonKrause1984.MilligramsPerLitre(17.3, 0, 1013.25, RangeRule.Refuse, out double fresh);
        BensonKrause1984.MilligramsPerLitre(17.3, 31, 1013.25, RangeRule.Refuse, out double saline);
        Assert.Equal(saline / fresh, table.Between(17.3, 31), 0.0002);
        // USGS TM 9-A6.2, Table 6.2-4: at 0 °C and no conductance the factor is 1.0000.
        Assert.Equal(1, table.Between(0, 0));
    }

    [Fact]
    public void Json_keeps_to_its_schema_and_has_the_values_of_the_csv()
    {
        TableOptions[] all =
        [
            Fresh, Fresh with { Pressure = "1atm", Salinity = "0..40", Error = "0.1%" }, Fresh with { Pressure = "938hPa" },
            new() { Format = "csv", Program = "probecal test", Quantity = "vapour-pressure", Temperature = "0..50C", TemperatureStep = "1K" },
        ];
        foreach (TableOptions options in all)
        {
            using JsonDocument json = JsonDocument.Parse(Make(options with { Format = "json" }).Content);
            Assert.True(Schemas.Of("table").Evaluate(json.RootElement).IsValid);
            CsvReading csv = CsvReading.Of(Make(options).Content);
            double[] values = [.. json.RootElement.GetProperty("values").EnumerateArray().SelectMany(static row => row.EnumerateArray()).Select(static v => v.GetDouble())];
            Assert.Equal(csv.Values, values);
            Assert.Equal(csv.Rows.Length, json.RootElement.GetProperty("rows").GetProperty("count").GetInt32());
        }
    }

    [Fact]
    public void Float_and_double_headers_say_the_error_of_their_own_numbers()
    {
        string single = Make(Fresh with { Format = "c-float", Error = "0.0001mg/L" }).Content;
        string full = Make(Fresh with { Format = "c-double", Error = "0.0001mg/L" }).Content;
        Assert.Contains("read in 32-bit numbers", single, StringComparison.Ordinal);
        Assert.Contains("read in 64-bit numbers", full, StringComparison.Ordinal);
        Assert.All(single + full, static c => Assert.True(c < '\u0080', "not ASCII: " + c));
        InputException unreachable = Assert.Throws<InputException>(() => Make(Fresh with { Format = "c-float", Error = "1e-6mg/L", PressureStep = "100hPa", Temperature = "10..11C" }));
        Assert.Matches(@"cannot be reached with float values: the best found is [0-9.E-]+ mg/L; take double values", unreachable.Message);
    }

    [Fact]
    public void What_is_written_is_the_same_in_every_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            foreach (string format in new[] { "csv", "json", "c-float", "c-double", "csharp", "card" })
            {
                TableOptions options = format == "card"
                    ? Fresh with { Format = format, Pressure = null, Error = null, SiteAltitude = "640m" }
                    : Fresh with { Format = format, Error = "0.1mg/L" };
                CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
                WrittenTable expected = Make(options);
                foreach (string culture in new[] { "de-DE", "tr-TR", "ar-SA" })
                {
                    CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                    Assert.Equal(expected, Make(options));
                }
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("Temperature", "0..60C", "benson-krause-1984 ends at 40 °C")]
    [InlineData("Temperature", "-5..40C", "benson-krause-1984 begins at 0 °C")]
    [InlineData("Temperature", "40..0C", "low to high")]
    [InlineData("Temperature", "0..104F", "the sides of a table are in C")]
    [InlineData("Temperature", "20", "write a range as 0..40C")]
    [InlineData("Temperature", "0..4O", "O is no unit")]
    [InlineData("Temperature", "0..NaN", "NaN")]
    [InlineData("Temperature", "0..39.99999C", "four decimals")]
    [InlineData("Temperature", "0..1e300C", "lie within a million")]
    [InlineData("TemperatureStep", "0.3K", "no whole number of such steps")]
    [InlineData("TemperatureStep", "-1K", "above zero")]
    [InlineData("TemperatureStep", "0.00001K", "no whole number")]
    [InlineData("Pressure", "600..1100", "carries its unit")]
    [InlineData("Pressure", "400..1100hPa", "begins at 506.625 hPa")]
    [InlineData("Pressure", "600..12000hPa", "ends at 10132.5 hPa")]
    [InlineData("Salinity", "0..40", "both ranges")]
    [InlineData("Salinity", "55", "outside the range")]
    [InlineData("Error", "0.01", "unit")]
    [InlineData("Error", "0mg/L", "above zero")]
    [InlineData("Error", "1e-13mg/L", "cannot be reached")]
    [InlineData("Gas", "O4", "there are O2")]
    [InlineData("Gas", "H2S", "--mole-fraction is missing")]
    [InlineData("MoleFraction", "21", "at most 1")]
    [InlineData("Equation", "weiss", "there is no such equation")]
    [InlineData("Format", "xls", "there are csv, json")]
    [InlineData("Quantity", "concentrations", "did you mean concentration?")]
    [InlineData("Name", "Oxygen Table", "small letters")]
    [InlineData("SiteAltitude", "640m", "only a field card")]
    public void Wrong_input_is_one_line_that_says_what_would_be_right(string option, string value, string right)
    {
        TableOptions options = option switch
        {
            "Temperature" => Fresh with { Temperature = value },
            "TemperatureStep" => Fresh with { TemperatureStep = value },
            "Pressure" => Fresh with { Pressure = value },
            "Salinity" => Fresh with { Salinity = value },
            "Error" => Fresh with { Error = value, TemperatureStep = value.StartsWith("1e", StringComparison.Ordinal) ? "1K" : null },
            "Gas" => Fresh with { Gas = value },
            "MoleFraction" => Fresh with { MoleFraction = value },
            "Equation" => Fresh with { Equation = value },
            "Format" => Fresh with { Format = value },
            "Quantity" => Fresh with { Quantity = value },
            "Name" => Fresh with { Name = value },
            _ => Fresh with { SiteAltitude = value },
        };
        InputException wrong = Assert.Throws<InputException>(() => Make(options));
        Assert.Contains(right, wrong.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
    }

    [Fact]
    public void Steps_or_an_error_must_be_said()
    {
        InputException wrong = Assert.Throws<InputException>(() => Make(Fresh with { Error = null }));
        Assert.Contains("--error is missing", wrong.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Work_ends_when_asked_to()
    {
        using CancellationTokenSource stop = new();
        Assert.Throws<OperationCanceledException>(() => TableWriter.Make(Fresh, _ => stop.Cancel(), stop.Token));
    }
}

/// <summary>A CSV table as somebody reads it who knows nothing but its text.</summary>
internal sealed record CsvReading(double[] Rows, double[] Columns, double[] Values, double LargestFound)
{
    internal static CsvReading Of(string text)
    {
        string[] lines = text.TrimEnd('\n').Split('\n');
        string header = string.Join('\n', lines.Where(static line => line[0] == '#'));
        string[][] body = [.. lines.Where(static line => line[0] != '#').Select(static line => line.Split(','))];
        double[] columns = body[0].Length == 2 && !double.TryParse(body[0][1], NumberStyles.Float, CultureInfo.InvariantCulture, out _) ? [0] : [.. body[0].Skip(1).Select(Read)];
        Match found = Regex.Match(header, "# largest error found: ([0-9.E-]+)");
        Assert.True(found.Success, header);
        return new CsvReading(
            [.. body.Skip(1).Select(static row => Read(row[0]))], columns, [.. body.Skip(1).SelectMany(static row => row.Skip(1).Select(Read))], Read(found.Groups[1].Value));
    }

    /// <summary>Linear between the nodes beside the point, by the distances to them.</summary>
    internal double Between(double row, double column)
    {
        int i = Math.Clamp(Array.FindLastIndex(Rows, each => each <= row), 0, Rows.Length - 2);
        int j = Math.Clamp(Array.FindLastIndex(Columns, each => each <= column), 0, Columns.Length - 2);
        double across = (column - Columns[j]) / (Columns[j + 1] - Columns[j]);
        double down = (row - Rows[i]) / (Rows[i + 1] - Rows[i]);
        double At(int r, int c) => Values[(r * Columns.Length) + c];
        return ((1 - down) * (((1 - across) * At(i, j)) + (across * At(i, j + 1)))) + (down * (((1 - across) * At(i + 1, j)) + (across * At(i + 1, j + 1))));
    }

    private static double Read(string text)
    {
        return double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
    }
}
