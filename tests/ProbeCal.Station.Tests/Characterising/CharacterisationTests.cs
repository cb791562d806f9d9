using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Characterising;
using ProbeCal.Station.Entry;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Characterising;

/// <summary>Laboratory runs of simulated probes: the truth is found, the intervals hold it as often as they say, and a run that cannot tell is refused in one line.</summary>
public sealed class CharacterisationTests(ITestOutputHelper output) : IDisposable
{
    private static readonly string[] Columns =
        ["signal=I [nA]", "temperature=T [C]", "pressure=Baro [hPa]", "partial-pressure=pO2 [hPa]", "time=t [s]", "stirring=Stirrer", "level=Level"];

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    /// <summary>
    /// The stated 95 % intervals over 300 simulated runs of all parts (3,000 in full). Allowance: four standard errors of the share, 4·√(0.95·0.05/n), 5.0 % at 300 and 1.6 % at 3,000.
    /// </summary>
    [Fact]
    public void Intervals_HoldTheTruthAsOftenAsTheySay()
    {
        (string Name, double Truth)[] truths =
        [
            ("residual-current", SimulatedLab.Zero), ("sensitivity", SimulatedLab.Sensitivity), ("temperature-coefficient", SimulatedLab.Coefficient),
            ("zero-intercept", SimulatedLab.Zero), ("slope", SimulatedLab.Sensitivity), ("curvature", 0.0), ("tau-up", SimulatedLab.TauUp), ("t90-up", SimulatedLab.TauUp * Math.Log(10.0)),
            ("tau-down", SimulatedLab.TauDown), ("t90-down", SimulatedLab.TauDown * Math.Log(10.0)), ("stirring-ratio", SimulatedLab.StirringRatio), ("flow-factor-still", 1.0 / SimulatedLab.StirringRatio),
        ];
        Campaign campaign = new(output, "characterisation", 300, 3_000);
        SimulatedLab lab = new(_folder, new Random(campaign.Seed));
        int[] inside = new int[truths.Length];
        for (int run = 0; run < campaign.Count; run++)
        {
            Characterisation found = All(lab);
            for (int i = 0; i < truths.Length; i++)
            {
                (Estimate estimate, CharacterisedPart part) = Find(found, truths[i].Name);
                // The curvature is judged by the fit that has one parameter more.
                double k = estimate.CoverageFactor ?? part.CoverageFactor;
                inside[i] += Math.Abs(estimate.Value - truths[i].Truth) <= k * estimate.StandardUncertainty ? 1 : 0;
            }
        }

        double allowed = 4.0 * Math.Sqrt(0.95 * 0.05 / campaign.Count);
        for (int i = 0; i < truths.Length; i++)
        {
            double share = (double)inside[i] / campaign.Count;
            output.WriteLine($"{truths[i].Name}: {100.0 * share:F2} %");
            Assert.InRange(share, 0.95 - allowed, 0.95 + allowed);
        }
    }

    [Theory]
    [InlineData("compound", 0.031)]
    [InlineData("linear", 0.02)]
    [InlineData("arrhenius", 22_000.0)]
    public void OtherForms_AreFoundToo(string form, double coefficient)
    {
        TemperatureCoefficientForm kind = Enum.Parse<TemperatureCoefficientForm>(form, ignoreCase: true);
        SimulatedLab lab = new(_folder, new Random(17));
        string temperature = lab.TemperatureRun(celsius =>
        {
            Assert.Equal(Status.Ok, TemperatureCoefficient.Factor(kind, coefficient, 20.0, 0.0, 40.0, celsius, RangeRule.Refuse, out double factor));
            return factor;
        }, 3.0, 10.0, 18.0, 26.0, 34.0);
        Characterisation found = Run(request => request with { Form = form, ReferenceTemperature = "20C", Zero = "0.42 u 0.02", Inputs = ["temperature=" + temperature] });
        (Estimate estimate, CharacterisedPart part) = Find(found, "temperature-coefficient");
        Assert.InRange((estimate.Value - coefficient) / estimate.StandardUncertainty, -3.0, 3.0);
        Assert.InRange(estimate.StandardUncertainty / coefficient, 0.0005, 0.02);
        Assert.Equal((13, 15), (part.DegreesOfFreedom, part.Points));
        Assert.True(0.01 < part.LackOfFitProbability);
        // The text goes back in where calibrate takes it, and says the same.
        ProbeCal.Station.CalibrationLog.RecordedTemperatureCoefficient read = ProbeCal.Station.Calibrating.CoefficientText.Parse("--coefficient", found.CoefficientText!);
        Assert.Equal((form, estimate.Value, estimate.StandardUncertainty, 20.0), (read.Form, read.Value, read.StandardUncertainty, read.ReferenceCelsius));
        Assert.Equal(2.9, read.FittedLowCelsius, 1e-9);
    }

    /// <summary>A polynomial finds the bend that the exponential form shows as lack of fit.</summary>
    [Fact]
    public void APolynomial_FindsWhatTheExponentialMisses()
    {
        SimulatedLab lab = new(_folder, new Random(5));
        string temperature = lab.TemperatureRun(static celsius => Math.Exp((0.029 * (celsius - 25.0)) - (3e-4 * (celsius - 25.0) * (celsius - 25.0))), 3.0, 10.0, 18.0, 26.0, 34.0);
        Characterisation plain = Run(request => request with { Zero = "0.42", Inputs = ["temperature=" + temperature] });
        Assert.InRange(plain.Parts[0].LackOfFitProbability!.Value, 0.0, 1e-4);
        Characterisation bent = Run(request => request with { Zero = "0.42", Form = "polynomial-2", Inputs = ["temperature=" + temperature] });
        (Estimate second, CharacterisedPart part) = Find(bent, "temperature-coefficient-2");
        Assert.InRange((second.Value + 3e-4) / second.StandardUncertainty, -3.0, 3.0);
        Assert.Equal("1/K2", second.Unit);
        Assert.True(0.01 < part.LackOfFitProbability);
        Assert.Null(bent.CoefficientText);
    }

    [Fact]
    public void ABentProbe_IsCalledSo()
    {
        SimulatedLab lab = new(_folder, new Random(8));
        Characterisation found = Run(request => request with { Inputs = ["linearity=" + lab.LinearityRun(-1e-4, 0.0, 50.0, 100.0, 150.0, 200.0)] });
        CharacterisedPart part = Assert.Single(found.Parts);
        Assert.Contains(part.Notes, static note => note.Contains("the probe is bent", StringComparison.Ordinal));
        Assert.InRange(part.LackOfFitProbability!.Value, 0.0, 0.01);
        // A parabola of that bend over that span lies by 1e-4·200²/6 off the least-squares line at the ends at most, of 58 nA: about 1 %.
        Assert.InRange(Math.Abs(Find(found, "linearity-error").Estimate.Value), 0.6, 1.6);
        (Estimate curvature, _) = Find(found, "curvature");
        Assert.InRange((curvature.Value + 1e-4) / curvature.StandardUncertainty, -3.0, 3.0);
    }

    /// <summary>Rows of a level are one point: a plateau of a hundred readings counts once.</summary>
    [Fact]
    public void Levels_AreAveragedFirst()
    {
        StringBuilder text = new("I [nA],T [C],pO2 [hPa],Level\n");
        foreach ((int level, double celsius) in new[] { (1, 5.0), (2, 15.0), (3, 25.0), (4, 35.0) })
        {
            for (int i = 0; i < 100; i++)
            {
                double signal = 0.42 + (0.31 * Math.Exp(0.03 * (celsius - 25.0)) * 200.0) + (i % 2 == 0 ? 0.01 : -0.01);
                text.Append(CultureInfo.InvariantCulture, $"{signal:R},{celsius:R},200,plateau {level}\n");
            }
        }

        SimulatedLab lab = new(_folder, new Random(1));
        Characterisation found = Run(request => request with { Zero = "0.42", Inputs = ["temperature=" + lab.Write("levels.csv", text.ToString())] });
        Assert.Equal((400, 4, 2), (found.Parts[0].Rows, found.Parts[0].Points, found.Parts[0].DegreesOfFreedom));
        Assert.Equal(0.03, found.Parts[0].Parameters[1].Value, 1e-6);
        Assert.Null(found.Parts[0].LackOfFitProbability);
    }

    /// <summary>Slow noise: its neighbours go together, and the interval grows by what that costs.</summary>
    [Fact]
    public void SlowNoise_WidensTheTimeConstant()
    {
        Random random = new(3);
        StringBuilder text = new("I [nA];t [s]\n");
        double slow = 0.0;
        for (int i = 0; i < 200; i++)
        {
            slow = (0.9 * slow) + (0.1 * (random.NextDouble() - 0.5));
            text.Append(CultureInfo.InvariantCulture, $"{5.0 + (60.0 * Math.Exp(-i / 19.5)) + slow:R};{i}\n");
        }

        SimulatedLab lab = new(_folder, random);
        CharacterisedPart part = Run(request => request with { Inputs = ["step-down=" + lab.Write("slow.csv", text.ToString())] }).Parts[0];
        Assert.Contains(part.Notes, static note => note.Contains("lag-1 correlation", StringComparison.Ordinal));
        Assert.InRange(part.DegreesOfFreedom, 5, 60);
        Assert.InRange((part.Parameters[2].Value - 19.5) / part.Parameters[2].StandardUncertainty, -3.0, 3.0);
    }

    [Fact]
    public void BeforeTheStep_RowsAreLeftOutOnRequest()
    {
        StringBuilder text = new("I [nA],t [s]\n");
        for (int i = -30; i < 120; i++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{(i < 0 ? 5.0 : 65.0 - (60.0 * Math.Exp(-i / 14.0)))},{i}\n");
        }

        SimulatedLab lab = new(_folder, new Random(1));
        string file = lab.Write("whole.csv", text.ToString());
        CharacterisedPart part = Run(request => request with { Inputs = ["step-up=" + file], StepAfter = "30s" }).Parts[0];
        Assert.Equal(14.0, part.Parameters[2].Value, 1e-6);
        Assert.Equal((150, 120), (part.Rows, part.Points));
    }

    [Theory]
    [InlineData("temperature", "I [nA],T [C],pO2 [hPa]\n60,25,200\n61,25.4,200\n45,15,200\n", "needs at least 3 temperatures more than 1 K apart, and there are 2")]
    [InlineData("temperature", "I [nA],T [C]\n60,25\n", "needs a column for partial-pressure or pressure, for example --column \"partial-pressure=pO2 [hPa]\"")]
    [InlineData("temperature", "I [nA],T [C],pO2 [hPa]\n60,25,200\n45,15,200\n0.1,5,200\n", "is not above the zero of 0.42")]
    [InlineData("temperature", "I [nA],T [C],Baro [hPa]\n60,25,1000\n45,15,10000\n30,5,1000\n", "no reference can be computed there (PressureAboveRange)")]
    [InlineData("linearity", "I [nA],pO2 [hPa]\n1,0\n60,200\n61,201\n", "linearity needs at least 3 levels of partial pressure, and there are 2")]
    [InlineData("linearity", "I [nA],pO2 [hPa],T [C]\n1,0,5\n30,100,15\n60,200,25\n", "the temperature runs from 5.0 to 25.0 C, and no temperature coefficient is known")]
    [InlineData("linearity", "I [nA],pO2 [hPa]\n1,0\n30,x\n", "line 3: partial-pressure unreadable, x")]
    [InlineData("linearity", "I [nA],pO2 [hPa]\n5,0\n5,100\n5,200\n", "the signal does not change with the partial pressure")]
    [InlineData("linearity", "I [nA],pO2 [hPa]\n1,0\n30\n", "line 3: 1 cells where the header has 2")]
    [InlineData("linearity", "I [nA],pO2 [hPa]\n", "there are no rows under the header")]
    [InlineData("zero", "I [nA]\n0.4\n0.5\n", "2 readings without the gas; a residual current with its uncertainty needs at least 3")]
    [InlineData("stirring", "I [nA],Stirrer\n50,stirred\n51,stirred\n52,stirred\n40,still\n", "3 stirred and 1 still readings; the ratio needs at least 3 of each")]
    [InlineData("stirring", "I [nA],Stirrer\n50,stired\n", "line 2: stirring stired: write stirred or still (did you mean stirred?)")]
    [InlineData("step-up", "I [nA],t [s]\n1,0\n2,1\n", "2 rows after the step; a time constant needs at least 10")]
    [InlineData("step-up", "I [nA],t [s]\n1,0\n2,1\n3,2\n4,3\n5,3\n6,4\n7,5\n8,6\n9,7\n9,8\n", "the time of row 5 after the step does not go on from the one before (3 s after 3 s)")]
    public void WhatCannotTell_IsRefusedInOneLine(string part, string text, string expected)
    {
        SimulatedLab lab = new(_folder, new Random(1));
        string file = lab.Write("given.csv", text);
        InputException refused = Assert.Throws<InputException>(() => Run(request => request with { Inputs = [part + "=" + file], Zero = part == "zero" ? null : "0.42" }));
        Assert.Contains(expected, refused.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', refused.Message);
    }

    [Fact]
    public void Steps_ThatTellNothingAreRefused()
    {
        SimulatedLab lab = new(_folder, new Random(2));
        Assert.Contains("the signal falls in the step-up part; were the two files exchanged?", Why("step-up=" + lab.StepRun(false)), StringComparison.Ordinal);
        Assert.Contains("the record ends", Why("step-up=" + lab.StepRun(true, seconds: 20.0)), StringComparison.Ordinal);
        Assert.Contains("the step is over before the third row", Why("step-up=" + lab.StepRun(true, seconds: 600.0, interval: 20.0)), StringComparison.Ordinal);
        Assert.Contains("no time constant can be fitted", Why("step-up=" + lab.Write("flat.csv", "I [nA],t [s]\n" + string.Concat(Enumerable.Range(0, 40).Select(static i => $"5,{i}\n")))), StringComparison.Ordinal);
    }

    [Fact]
    public void Requests_ThatContradictThemselvesAreRefused()
    {
        SimulatedLab lab = new(_folder, new Random(2));
        string zero = lab.ZeroRun();
        string temperature = lab.TemperatureRun(SimulatedLab.Exponential, 5.0, 15.0, 25.0, 35.0);
        Assert.Contains("--input is missing", Why(), StringComparison.Ordinal);
        Assert.Contains("there is no part temprature (did you mean temperature?)", Why("temprature=" + temperature), StringComparison.Ordinal);
        Assert.Contains("write which part of the run the file holds", Why(temperature), StringComparison.Ordinal);
        Assert.Contains("the zero part is given twice", Why("zero=" + zero, "zero=" + zero), StringComparison.Ordinal);
        Assert.Contains("there is no such file", Why("zero=" + zero + "x"), StringComparison.Ordinal);
        Assert.Contains("the temperature part needs the signal without the gas; add --input zero=FILE, or --zero VALUE", Why("temperature=" + temperature), StringComparison.Ordinal);
        Assert.Contains("say the same thing", Assert.Throws<InputException>(() => Run(request => request with { Inputs = ["zero=" + zero], Zero = "0.4" })).Message, StringComparison.Ordinal);
        Assert.Contains("did you mean arrhenius?", Assert.Throws<InputException>(() => Run(request => request with { Inputs = ["zero=" + zero], Form = "arhenius" })).Message, StringComparison.Ordinal);
        Assert.Contains("a standard uncertainty is not negative", Assert.Throws<InputException>(() => Run(request => request with { Inputs = ["temperature=" + temperature], Zero = "0.4 u -1" })).Message, StringComparison.Ordinal);
        Assert.Contains("0.4 or \"0.4 u 0.1\"", Assert.Throws<InputException>(() => Run(request => request with { Inputs = ["temperature=" + temperature], Zero = "0.4 0.1" })).Message, StringComparison.Ordinal);
    }

    /// <summary>What a firmware reads is what was fitted, to the last bit.</summary>
    [Fact]
    public void Firmware_HasTheVeryValues()
    {
        Characterisation found = All(new SimulatedLab(_folder, new Random(4)));
        Dictionary<string, string> keys = CharacterisationFiles.KeyValues(found).Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Where(static line => line[0] != '#').Select(static line => line.Split('=', 2)).ToDictionary(static pair => pair[0], static pair => pair[1]);
        Assert.Equal("exponential", keys["temperature-form"]);
        string[] header = CharacterisationFiles.Header(found).Split('\n');
        foreach (Estimate each in found.Parts.SelectMany(static part => part.Parameters.Concat(part.Derived)).Where(static each => each.Name is not ("end" or "jump")))
        {
            Assert.Equal(each.Value, double.Parse(keys[each.Name], NumberStyles.Float, CultureInfo.InvariantCulture));
            Assert.Equal(each.StandardUncertainty, double.Parse(keys["u." + each.Name], NumberStyles.Float, CultureInfo.InvariantCulture));
            string line = Assert.Single(header, line => line.StartsWith("#define PROBECAL_" + each.Name.ToUpperInvariant().Replace('-', '_') + " ", StringComparison.Ordinal));
            Assert.Equal(each.Value, double.Parse(line.Split(' ')[2].Trim('(', ')'), NumberStyles.Float, CultureInfo.InvariantCulture));
        }
    }

    [Fact]
    public void Outputs_AreNeverReplacedUnasked()
    {
        Characterisation found = All(new SimulatedLab(_folder, new Random(4)));
        string path = Path.Combine(_folder, "found.json");
        DateTimeOffset at = new(2026, 6, 1, 12, 0, 0, TimeSpan.Zero);
        CharacterisationFiles.WriteJson(found, path, false, at, "probecal test");
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(path));
        Assert.Equal(("probecal-characterisation", 1, "2026-06-01T12:00:00Z"),
            (json.RootElement.GetProperty("format").GetString(), json.RootElement.GetProperty("version").GetInt32(), json.RootElement.GetProperty("madeUtc").GetString()));
        byte[] before = File.ReadAllBytes(path);
        Assert.Contains("this file exists already", Assert.Throws<InputException>(() => CharacterisationFiles.WriteJson(found, path, false, at, "other")).Message, StringComparison.Ordinal);
        Assert.Equal(before, File.ReadAllBytes(path));
        CharacterisationFiles.WriteJson(found, path, true, at, "other");
        Assert.NotEqual(before, File.ReadAllBytes(path));
        Assert.Throws<InputException>(() => CharacterisationFiles.WriteFirmware(found, _folder, false));
    }

    private static Characterisation All(SimulatedLab lab)
    {
        return Run(request => request with
        {
            Inputs =
            [
                "zero=" + lab.ZeroRun(), "temperature=" + lab.TemperatureRun(SimulatedLab.Exponential, 5.0, 12.0, 19.0, 26.0, 33.0), "linearity=" + lab.LinearityRun(0.0, 0.0, 50.0, 100.0, 150.0, 210.0),
                "step-up=" + lab.StepRun(true), "step-down=" + lab.StepRun(false), "stirring=" + lab.StirringRun(),
            ],
        });
    }

    private static Characterisation Run(Func<CharacterisationRequest, CharacterisationRequest> with)
    {
        return LabCharacterisation.Run(with(new CharacterisationRequest { Inputs = [], Columns = Columns, Form = "exponential", ReferenceTemperature = "25C", Probe = "P-17" }));
    }

    private static string Why(params string[] inputs)
    {
        return Assert.Throws<InputException>(() => Run(request => request with { Inputs = inputs })).Message;
    }

    private static (Estimate Estimate, CharacterisedPart Part) Find(Characterisation found, string name)
    {
        CharacterisedPart part = Assert.Single(found.Parts, part => part.Parameters.Concat(part.Derived).Any(each => each.Name == name));
        return (part.Parameters.Concat(part.Derived).Single(each => each.Name == name), part);
    }
}
