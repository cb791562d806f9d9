using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal equilibrium</c> as others call it.</summary>
public class EquilibriumTests
{
    private static readonly string[] Usual = ["equilibrium", "--gas", "O2", "--temperature", "20", "--salinity", "0", "--pressure", "760mmHg", "--format", "json"];

    [Fact]
    public async Task Json_gives_the_value_in_every_unit()
    {
        JsonNode json = await JsonOfAsync(Usual);

        Assert.Equal("O2", (string?)json["gas"]);
        Assert.Equal("benson-krause-1984", (string?)json["equation"]);
        Assert.Equal(1013.25, (double?)json["pressureHPa"]);
        // 9.09 mg/L: field-manual table (USGS TM 9-A6.2, Table 6.2-2), 20 °C, 760 mmHg, to its printed digits.
        Assert.Equal(9.09, Math.Round((double)json["mgPerL"]!, 2));
        // 31.9988 g/mol and 1.42905 mg/mL (SCOR WG 142): the units follow from the mg/L.
        Assert.Equal((double)json["mgPerL"]! / 0.0319988, (double)json["umolPerL"]!, 1e-9);
        Assert.Equal((double)json["mgPerL"]! / 1.42905, (double)json["mLPerL"]!, 1e-9);
    }

    [Fact]
    public async Task The_numbers_of_version_1_are_the_same_to_the_last_bit()
    {
        JsonNode json = await JsonOfAsync(Usual);
        using JsonDocument released = JsonDocument.Parse(System.IO.File.ReadAllText(System.IO.Path.Combine(House.Repository.Root, "tests/Formats/equilibrium/version-1.json")));
        foreach (string name in new[] { "vapourPressureHPa", "partialPressureHPa", "mgPerL", "umolPerL", "umolPerKg", "mLPerL", "percentOfOneAtmosphere" })
        {
            Assert.Equal(released.RootElement.GetProperty(name).GetDouble(), (double)json[name]!);
        }

        Assert.Equal(released.RootElement.GetProperty("standardUncertainty").GetProperty("mgPerL").GetDouble(), (double)json["standardUncertainty"]!["mgPerL"]!);
    }

    private static readonly string[] _kinds =
    [
        "--pressure 938hPa --pressure-uncertainty 1hPa --salinity 12",
        "--altitude 640m --salinity 12 --equation garcia-gordon-1992",
        "--pressure 938hPa --salinity 0 --mixture O2=5%,N2=90% --humidity 50% --humidity-within 5%",
        "--pressure 938hPa --salinity 0 --partial-pressure 200hPa --partial-pressure-uncertainty 1hPa",
        "--pressure 938hPa --salinity 0 --partial-pressure 200hPa --concentration 8mg/L --concentration-uncertainty 0.1mg/L",
        "--pressure 938hPa --salinity 0 --concentration 250umol/kg --temperature-within 0.2K",
        "--pressure 938hPa --salinity 35 --gas CO2 --concentration 18umol/L",
        "--pressure 3atm --salinity 0 --gas N2",
        "--pressure 938hPa --conductivity 30mS/cm --conductivity-temperature 20 --conductivity-uncertainty 0.1mS/cm",
        "--pressure 938hPa --specific-conductance 500uS/cm",
        "--pressure 938hPa --chlorinity 12 --gas Ar",
        "--pressure 938hPa --ions Na+=0.5mol/L,Cl-=0.5mol/L --concentration 8mg/L",
        "--pressure 1013hPa --altitude 230m --salinity 0",
        "--pressure 938hPa --salinity 0 --gas H2S --mole-fraction 1%",
        "--pressure 938hPa --salinity 0 --temperature-within 0.2K --monte-carlo 2000 --seed 7",
        "--pressure 938hPa --salinity 0 --concentration 8mg/L --monte-carlo 2000",
        "--pressure 938hPa --salinity 0 --mole-fraction 0",
    ];

    public static TheoryData<string> Kinds => [.. _kinds];

    [Theory]
    [MemberData(nameof(Kinds))]
    public async Task Json_of_every_kind_keeps_to_its_schema_and_has_an_uncertainty_for_every_value(string kind)
    {
        JsonNode json = await JsonOfAsync(["equilibrium", "--temperature", "8.4C", "--format", "json", .. kind.Split(' ')]);
        EveryValueHasItsUncertainty(json, ["vapourPressureHPa", "partialPressureHPa", "mgPerL", "umolPerL", "umolPerKg", "mLPerL", "percentOfOneAtmosphere"]);
        if (json["measured"] is JsonNode measured)
        {
            EveryValueHasItsUncertainty(measured, ["mgPerL", "umolPerL", "umolPerKg", "mLPerL", "partialPressureHPa", "percentLocal", "percentOneAtmosphere", "excessMgPerL"]);
        }
    }

    [Fact]
    public async Task Every_gas_and_equation_keeps_to_the_schema_and_names_its_source()
    {
        int seen = 0;
        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            string fraction = double.IsNaN(DryAir.MoleFraction(entry.Gas)) ? "2ppm" : ProbeCal.Station.Entry.Number.Print(DryAir.MoleFraction(entry.Gas));
            JsonNode json = await JsonOfAsync(["equilibrium", "--gas", Catalogue.Gas(entry.Gas).Name, "--equation", entry.Source.Name, "--mole-fraction", fraction,
                "--temperature", "10", "--temperature-uncertainty", "0.1K", "--salinity", "0", "--pressure", "1000hPa", "--format", "json"]);
            Assert.Equal(entry.Source.Citation, (string?)json["source"]!["citation"]);
            Assert.Equal(entry.Source.Doi, (string?)json["source"]!["doi"]);
            Assert.Equal(entry.IsDefault, (bool)json["source"]!["isDefault"]!);
            Assert.InRange((double)json["mgPerL"]!, 1e-12, 1e3);
            seen++;
        }

        Assert.True(40 <= seen, $"only {seen} pairs of gas and equation");
    }

    [Fact]
    public async Task A_measured_concentration_of_the_equilibrium_is_100_percent()
    {
        foreach (string gas in new[] { "O2", "N2", "CO2", "CH4", "SF6" })
        {
            string[] water = ["equilibrium", "--gas", gas, "--temperature", "12", "--salinity", "20", "--pressure", "950hPa", "--format", "json"];
            JsonNode at = await JsonOfAsync(water);
            string concentration = ProbeCal.Station.Entry.Number.Print((double)at["umolPerKg"]!) + "umol/kg";
            JsonNode back = (await JsonOfAsync([.. water, "--concentration", concentration]))["measured"]!;
            Assert.Equal(100, (double)back["percentLocal"]!, 1e-6);
            Assert.Equal((double)at["percentOfOneAtmosphere"]!, (double)back["percentOneAtmosphere"]!, 1e-6);
            Assert.Equal(0, (double)back["excessMgPerL"]! / (double)at["mgPerL"]!, 1e-9);
        }
    }

    [Fact]
    public async Task A_temperature_just_outside_is_computed_flagged_and_less_sure()
    {
        string[] water = ["equilibrium", "--salinity", "0", "--pressure", "1000hPa", "--format", "json", "--temperature"];
        JsonNode at = await JsonOfAsync([.. water, "0"]);
        JsonNode below = await JsonOfAsync([.. water, "-0.1"]);
        Assert.Empty(at["flags"]!.AsArray());
        JsonNode flag = Assert.Single(below["flags"]!.AsArray())!;
        Assert.Equal("temperature-just-below-range", (string?)flag["code"]);
        Assert.Contains("0.10 K below the range of benson-krause-1984 (0 to 40 °C); uncertainty enlarged by 0.28 %", (string?)flag["text"], StringComparison.Ordinal);
        Assert.True((double)at["standardUncertainty"]!["mgPerL"]! * 2 < (double)below["standardUncertainty"]!["mgPerL"]!);
    }

    [Fact]
    public async Task Limits_are_a_rectangle_and_one_that_decides_is_named()
    {
        JsonNode json = await JsonOfAsync([.. Usual, "--temperature-within", "0.5K"]);
        Assert.Equal(0.5 / Math.Sqrt(3), (double)json["standardUncertainty"]!["temperatureK"]!, 1e-12);
        JsonNode interval = json["interval95"]!["mgPerL"]!;
        // 1.65 = 0.95·√3 for a rectangle alone, 1.96 for a normal distribution: in between, near the former.
        Assert.InRange((double)interval["coverageFactor"]!, 1.645, 1.75);
        Assert.Contains("temperature", (string?)interval["note"], StringComparison.Ordinal);
        Assert.Null((await JsonOfAsync([.. Usual, "--temperature-uncertainty", "0.5K"]))["interval95"]!["mgPerL"]!["note"]);
    }

    [Fact]
    public async Task Monte_Carlo_repeats_itself_by_the_seed_and_agrees_with_the_budget()
    {
        string[] arguments = [.. Usual, "--temperature-within", "0.2K", "--pressure-uncertainty", "2hPa", "--monte-carlo", "50000", "--seed", "11"];
        JsonNode json = await JsonOfAsync(arguments);
        Assert.Equal(json.ToJsonString(), (await JsonOfAsync(arguments)).ToJsonString());
        JsonNode check = json["monteCarlo"]!["values"]![0]!;
        Assert.Equal(11, (int)json["monteCarlo"]!["seed"]!);
        Assert.Equal(50000, (int)check["trials"]!);
        // The standard deviation of 50 000 trials is itself known to 1/√(2·50 000) = 0.3 %; four times that.
        double u = (double)json["standardUncertainty"]!["mgPerL"]!;
        Assert.InRange((double)check["standardDeviation"]! / u, 0.987, 1.013);
        Assert.NotEqual((double)check["mean"]!, (double)(await JsonOfAsync([.. arguments[..^1], "12"]))["monteCarlo"]!["values"]![0]!["mean"]!);
    }

    [Fact]
    public async Task Altitude_stands_in_for_a_barometer_and_says_so()
    {
        JsonNode node = await JsonOfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--altitude", "640m", "--format", "json");
        Assert.Equal("altitude", (string?)node["pressureSource"]);
        Assert.True((double)node["standardUncertainty"]!["pressureHPa"]! >= 10);
        Run text = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--altitude", "640m");
        Assert.Contains("from the altitude alone", text.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_and_json_are_the_same_in_every_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        string[] measured = [.. Usual, "--concentration", "8.1mg/L", "--temperature-within", "0.2K", "--monte-carlo", "1000"];
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
            Run json = await Run.OfAsync(measured);
            Run text = await Run.OfAsync([.. measured.Except(["--format", "json"])]);
            Assert.Equal((0, 0), (json.ExitCode, text.ExitCode));
            foreach (string culture in new[] { "de-DE", "fr-FR", "tr-TR", "ar-SA" })
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                Assert.Equal(json, await Run.OfAsync(measured));
                Assert.Equal(text, await Run.OfAsync([.. measured.Except(["--format", "json"])]));
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("--pressure", "760", "unit")]
    [InlineData("--pressure", "760 furlong", "mmHg")]
    [InlineData("--pressure", "1,013hPa", "comma")]
    [InlineData("--pressure", "300hPa", "506.625")]
    [InlineData("--pressure", "11atm", "10132.5")]
    [InlineData("--pressure", "NaN hPa", "NaN")]
    [InlineData("--temperature", "8,3", "8.3")]
    [InlineData("--temperature", "68", "68F")]
    [InlineData("--temperature", "NaN", "NaN")]
    [InlineData("--temperature", "-3", "benson-krause-1984, which holds for O2 from 0 to 40 °C")]
    [InlineData("--temperature", "-1", "--equation weiss-1970")]
    [InlineData("--temperature", "warm", "warm")]
    [InlineData("--temperature-within", "-0.1K", "zero or above")]
    [InlineData("--temperature-uncertainty", "0.1", "0.05C")]
    [InlineData("--temperature-uncertainty", "1e300K", "uncertainties are too large")]
    [InlineData("--salinity", "-1", "0 to 40")]
    [InlineData("--salinity", "41", "0 to 40")]
    [InlineData("--gas", "O4", "O3")]
    [InlineData("--gas", "nitrogne", "did you mean nitrogen?")]
    [InlineData("--gas", "O3", "--mole-fraction")]
    [InlineData("--gas", "H2S", "--partial-pressure")]
    [InlineData("--equation", "weiss", "benson-krause-1984")]
    [InlineData("--equation", "weiss-1974", "does not cover O2")]
    [InlineData("--mole-fraction", "420pm", "ppm")]
    [InlineData("--mole-fraction", "1.2", "0 to 1")]
    [InlineData("--mole-fraction", "120%", "0 to 1")]
    [InlineData("--mixture", "O2=60%,N2=60%", "mixture O2=60%,N2=60%: the fractions add up to 120 %")]
    [InlineData("--mixture", "N2=60%", "--gas O2 is not in it")]
    [InlineData("--mixture", "O2 60%", "O2=5%")]
    [InlineData("--mixture", "O2=6%,O2=7%", "twice")]
    [InlineData("--mixture", "O2=x", "mixture O2 x")]
    [InlineData("--humidity", "60", "1.5%")]
    [InlineData("--humidity", "101%", "0% to 100%")]
    [InlineData("--partial-pressure", "-1hPa", "zero or above")]
    [InlineData("--partial-pressure-uncertainty", "1hPa", "--partial-pressure, which is not given")]
    [InlineData("--conductivity", "42mS/cm", "give one of them")]
    [InlineData("--conductivity-temperature", "20", "--conductivity, which is not given")]
    [InlineData("--concentration", "8.1", "unit")]
    [InlineData("--concentration", "8.1mg/kg", "mg/L")]
    [InlineData("--concentration", "8,1mg/L", "8.1")]
    [InlineData("--concentration", "lots", "no number")]
    [InlineData("--concentration-uncertainty", "1mg/L", "--concentration, which is not given")]
    [InlineData("--monte-carlo", "10", "1000")]
    [InlineData("--seed", "1", "--monte-carlo")]
    [InlineData("--format", "xml", "json")]
    public async Task Wrong_input_is_one_line_that_names_option_value_and_what_would_be_right(string option, string value, string right)
    {
        string[] arguments = [.. Usual];
        int at = Array.IndexOf(arguments, option);
        if (at < 0)
        {
            arguments = [.. Usual, option, value];
        }
        else
        {
            arguments[at + 1] = value;
        }

        Run run = await Run.OfAsync(arguments);

        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(right, run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains(option is "--gas" || right.StartsWith("uncert", StringComparison.Ordinal) ? "" : option.TrimStart('-'), run.ErrorLine, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--gas CO2 --pressure 1013hPa --salinity 0", "8.4 --temperature-within 0.1K --temperature-uncertainty 0.1K", "give one of them")]
    [InlineData("--gas SF6 --pressure 2atm --salinity 0", "8.4", "506.625 to 1114.575 hPa")]
    [InlineData("--gas N2 --pressure 1atm --salinity 35", "8.4", "hamme-emerson-2004, which holds for N2 from 0 to 34.5; --equation weiss-1970")]
    [InlineData("--pressure 1atm --conductivity 90mS/cm", "8.4", "S 0 to 42")]
    [InlineData("--pressure 1atm --conductivity 40mS/cm", "36", "PSS-78), which holds from -2 to 35 °C")]
    [InlineData("--pressure 1atm --chlorinity 30", "8.4", "0 to 23.25 g/kg")]
    [InlineData("--pressure 1atm --specific-conductance 60mS/cm", "8.4", "59000 uS/cm")]
    [InlineData("--pressure 1atm", "8.4", "--salinity is missing")]
    [InlineData("--pressure 1atm --ions Na=0.5mol/L", "8.4", "did you mean Na+?")]
    [InlineData("--pressure 1atm --ions Na+", "8.4", "Na+=0.5mol/L")]
    [InlineData("--pressure 1atm --ions Na+=0.5", "8.4", "mol/L")]
    [InlineData("--pressure 1atm --ions Na+=6mol/L", "8.4", "0 to 5 mol/L")]
    [InlineData("--pressure 1atm --ions Na+=0.1mol/L,na+=0.1mol/L", "8.4", "twice")]
    [InlineData("--pressure 1atm --ions Na+=0.1mol/L --concentration 250umol/kg", "8.4", "per litre")]
    [InlineData("--pressure 1atm --ions Na+=0.1mol/L --gas SF6", "8.4", "25 °C alone")]
    [InlineData("--pressure 1atm --ions Na+=0.1mol/L --gas CO", "8.4", "no salting-out constants for CO")]
    [InlineData("--pressure 1atm --salinity 0 --partial-pressure 20000hPa", "8.4", "10132.5")]
    [InlineData("--pressure 1atm --salinity 0 --partial-pressure 200hPa --humidity 50%", "8.4", "plays no part")]
    [InlineData("--pressure 1atm --salinity 0 --partial-pressure 200hPa --mole-fraction 5%", "8.4", "give one of them")]
    [InlineData("--pressure 1atm --salinity 0 --concentration 9g/L", "8.4", "--concentration 9g/L")]
    public async Task Wrong_combinations_are_one_line(string arguments, string temperature, string right)
    {
        Run run = await Run.OfAsync(["equilibrium", "--temperature", .. temperature.Split(' '), .. arguments.Split(' ')]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(right, run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_brine_is_not_explained_as_if_it_were_fresh()
    {
        Run run = await Run.OfAsync("explain", "--temperature", "20", "--pressure", "1atm", "--ions", "Na+=1mol/L, Cl-=1mol/L");
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        // log10 of what is left at 20 °C: 0.1143 + 0.0318 + 2·0.000334·5 (Weisenberger and Schumpe 1996, ported) = 0.14944.
        Assert.Contains("0.7088", run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_fits_a_terminal_puts_the_number_first_and_says_what_was_assumed()
    {
        Run exact = await Run.OfAsync("equilibrium", "--temperature", "8.4", "--salinity", "0", "--pressure", "706mmHg");
        JsonNode json = await JsonOfAsync("equilibrium", "--temperature", "8.4", "--salinity", "0", "--pressure", "706mmHg", "--format", "json");
        string number = string.Create(CultureInfo.InvariantCulture, $"{(double)json["mgPerL"]!:F3} ± {(double)json["standardUncertainty"]!["mgPerL"]!:F3}");
        Assert.StartsWith(number + " mg/L O2 (oxygen) in water in equilibrium with air", exact.Output, StringComparison.Ordinal);
        Assert.Contains("(706.0 mmHg)", exact.Output, StringComparison.Ordinal);
        Assert.Contains("20.946 % O2 when dry (the usual), humidity 100 % (assumed)", exact.Output, StringComparison.Ordinal);
        Assert.Contains("temperature, pressure, salinity, mole fraction, humidity taken as exact", OneLine(exact.Output), StringComparison.Ordinal);
        List<string> outputs = [exact.Output];
        foreach (string kind in _kinds)
        {
            Run run = await Run.OfAsync(["equilibrium", "--temperature", "8.4", .. kind.Split(' ')]);
            Assert.Equal(0, run.ExitCode);
            Assert.Matches(@"^-?\d", run.Output);
            outputs.Add(run.Output);
        }

        Assert.All(string.Concat(outputs).Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 100, line));
        Assert.Contains("pressure ± 1 hPa", OneLine(outputs[1]), StringComparison.Ordinal);
        Assert.Contains("the rest, 5 %, is unnamed", OneLine(outputs[3]), StringComparison.Ordinal);
        Assert.Contains("fugacity", OneLine(outputs[8]), StringComparison.Ordinal);
        Assert.Contains("from conductivity 30 mS/cm at 20 °C (PSS-78)", OneLine(outputs[9]), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("CFC-12", "pmol/kg")]
    [InlineData("Xe", "nmol/kg")]
    [InlineData("N2O", "nmol/L")]
    public async Task Trace_gases_come_in_units_without_a_row_of_zeros(string gas, string unit)
    {
        Run run = await Run.OfAsync("equilibrium", "--gas", gas, "--temperature", "8.4", "--salinity", "0", "--pressure", "1atm");
        Assert.Contains(unit, run.Output, StringComparison.Ordinal);
        Assert.DoesNotContain(" 0.0", run.Output.Split("one more")[0].Replace("± 0.0", "", StringComparison.Ordinal), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_pressure_that_is_rare_at_the_altitude_is_computed_with_a_note()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1013hPa", "--altitude", "230m");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("note: --pressure 1013hPa at 230m is 1041 hPa reduced to sea level, which is rare", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_pressure_that_cannot_be_at_the_altitude_is_refused()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1013hPa", "--altitude", "640m");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("640m", run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains("sea-level", run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    [Fact]
    public async Task Without_pressure_or_altitude_it_says_what_is_missing()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("--pressure", run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains("--altitude", run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Unknown_option_is_one_line_with_exit_2()
    {
        Run run = await Run.OfAsync("equilibrium", "--temprature", "20");
        Assert.Equal(2, run.ExitCode);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    private static async Task<JsonNode> JsonOfAsync(params string[] arguments)
    {
        Run run = await Run.OfAsync(arguments);
        Assert.True(run.ExitCode == 0, run.Error);
        using JsonDocument document = JsonDocument.Parse(run.Output);
        Assert.True(Schemas.Of("equilibrium").Evaluate(document.RootElement).IsValid, run.Output);
        return JsonNode.Parse(run.Output)!;
    }

    /// <summary>A value without an uncertainty or an interval is missing something, and so is one the other way about.</summary>
    private static void EveryValueHasItsUncertainty(JsonNode json, string[] values)
    {
        string[] present = [.. values.Where(name => json[name] is not null)];
        Assert.True(4 <= present.Length);
        foreach (string name in values)
        {
            Assert.Equal(json[name] is not null, json["standardUncertainty"]![name] is not null);
            Assert.Equal(json[name] is not null, json["interval95"]![name] is not null);
            if (json[name] is JsonNode value)
            {
                double low = (double)json["interval95"]![name]!["low"]!;
                double high = (double)json["interval95"]![name]!["high"]!;
                Assert.InRange((double)value, low, high);
            }
        }
    }

    private static string OneLine(string text)
    {
        return string.Join(' ', text.Split((char[])[' ', '\n', '\r'], StringSplitOptions.RemoveEmptyEntries));
    }
}
