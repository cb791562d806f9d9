using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>
/// Each method by the program itself with a person at the terminal: live on the simulated probe (0.45 nA/hPa at 25 °C, 0.35 nA at zero), and typed
/// from a meter that shows 4 % too little until it is set.
/// </summary>
public sealed class CalibrateByHandTests : IDisposable
{
    // Saturation at 20 °C and 1013.25 hPa, 9.09 mg/L, and the vapour pressure, 23.4 hPa: TM 9-A6.2, its tables.
    private const double OneAtmosphere = 9.09, Vapour = 23.4, Standard = 1013.25;
    private const double MeterPressure = 750 * 1013.25 / 760;

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-hand-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    public static TheoryData<string> Methods => ["air-saturated-water", "water-saturated-air", "titration", "gas-mixture", "transfer-standard"];

    [Theory]
    [MemberData(nameof(Methods))]
    public async Task Live_WithAPersonWhoAnswers_FindsTheTruthOfTheProbe(string method)
    {
        string water = method == "water-saturated-air" ? "air" : "air-saturated-water";
        double saturation = Saturation(940);
        List<string> arguments =
        [
            "calibrate", "--data", _folder, "--source", $"simulated?seed=5&faster=0&temperature=20C&pressure=940hPa&phase={water}:9min,zero:20min,{water}",
            "--line", "{time},{signal:nA},{temperature},{pressure}", "--probe", "P-1", "--method", method, "--pressure-source", "barometer:B-12", "--altitude", "640m",
            "--salinity", "0", "--stirring", "stirred", "--coefficient", "arrhenius 22kJ/mol at 25C fitted 5..35C u 0.5kJ/mol", "--zero", "adjust", "--format", "json",
        ];
        if (method == "water-saturated-air")
        {
            arguments.AddRange(["--air-to-water-ratio", "1.01", "--air-to-water-uncertainty", "0.3%"]);
        }
        else if (method == "gas-mixture")
        {
            arguments.AddRange(["--mixture", "CYL-21 20.946% u 0.02% humid 100% u 1%"]);
        }

        // Titres and what the standard showed are asked for, beside the water.
        (CalibrationRecord record, Person person) = await RunAsync([.. arguments], new Dictionary<string, string>
        {
            ["Titres and what they rest on"] = Titration(saturation),
            ["What did the standard show"] = FormattableString.Invariant($"STD-3 {saturation:F3}mg/L u 0.03mg/L"),
        });
        Assert.InRange(Math.Abs(record.Result.Slope - 0.45), 0, 2 * record.Result.SlopeStandardUncertainty);
        Assert.InRange(Math.Abs(record.Result.Zero - 0.35), 0, 2 * record.Result.ZeroStandardUncertainty);
        Assert.InRange(record.Result.SlopeStandardUncertainty / record.Result.Slope, 0.001, 0.02);
        Assert.Equal(["span", "zero", "as-left"], record.Points.Select(point => point.Role));
        Assert.Equal(method == "titration", person.Asked.Exists(asked => asked.Contains("Titres and what", StringComparison.Ordinal)));
        Assert.Equal(method == "transfer-standard", person.Asked.Exists(asked => asked.Contains("What did the standard", StringComparison.Ordinal)));
        Assert.Equal(method == "water-saturated-air", person.Asked.Exists(asked => asked.Contains("Droplets", StringComparison.Ordinal)));
        Assert.DoesNotContain(record.Steps, step => step.Note?.StartsWith("unattended", StringComparison.Ordinal) == true);
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public async Task Typed_FromAMeter_WithAPersonWhoAnswers(string method)
    {
        double truth = TruthAtTheMeter(method);
        string shown = FormattableString.Invariant($"{0.96 * truth:F2}");
        string set = FormattableString.Invariant($"{truth:F2}");
        Queue<string> display = new([shown, set]);
        (CalibrationRecord record, Person person) = await RunAsync([.. Meter(method), .. Given(method)], [], display);
        AssertMeter(record, truth);
        Assert.Equal(2, person.Asked.Count(asked => asked.Contains("What does the meter show, in mg/L?", StringComparison.Ordinal)));
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public async Task Typed_FromAMeter_WithEveryReadingGiven(string method)
    {
        double truth = TruthAtTheMeter(method);
        string[] readings = ["--as-found", FormattableString.Invariant($"{0.96 * truth:F2}mg/L"), "--as-left", FormattableString.Invariant($"{truth:F2}mg/L")];
        (CalibrationRecord record, Person person) = await RunAsync([.. Meter(method), .. Given(method), .. readings, "--unattended"], []);
        AssertMeter(record, truth);
        Assert.Empty(person.Asked);
    }

    private static void AssertMeter(CalibrationRecord record, double truth)
    {
        // The table's 9.09 is good to 0.005 mg/L, and so is each display.
        Assert.Equal(-0.04 * truth, record.Points[0].ErrorMilligramsPerLitre!.Value, 0.015);
        Assert.Equal(0, record.Points[1].ErrorMilligramsPerLitre!.Value, 0.015);
        Assert.Equal(truth, record.Points[0].ReferenceMilligramsPerLitre, 0.01);
        Assert.Equal(1, record.Result.Slope, 0.002);
        Assert.True(record.Result.Pass);
    }

    /// <summary>What the water at the meter holds, or what it would show of the gas, mg/L at 20 °C and 750 mmHg.</summary>
    private static double TruthAtTheMeter(string method)
    {
        return method switch
        {
            // Dry gas of 20.95 %, against air's 20.946 % less its vapour.
            "gas-mixture" => OneAtmosphere / (0.20946 * (Standard - Vapour)) * 0.2095 * MeterPressure,
            "titration" or "transfer-standard" => 8.5,
            _ => Saturation(MeterPressure),
        };
    }

    private static string[] Given(string method)
    {
        return method switch
        {
            "gas-mixture" => ["--mixture", "CYL-21 20.95% u 0.02% dry"],
            "titration" => ["--titration", Titration(8.5)],
            "transfer-standard" => ["--transfer", "STD-3 8.50mg/L u 0.03mg/L"],
            "water-saturated-air" => ["--air-to-water-ratio", "1", "--air-to-water-uncertainty", "0.3%"],
            _ => [],
        };
    }

    private string[] Meter(string method)
    {
        return
        [
            "calibrate", "--manual", "--data", _folder, "--probe", "M-3", "--meter-shows", "mg/L", "--method", method, "--salinity", "0", "--stirring", "stirred",
            "--temperature", "20C", "--pressure", "750mmHg", "--pressure-source", "barometer:B-12", "--altitude", "100m", "--confirm", "steady=watched for 5 min", "--format", "json",
        ];
    }

    private static double Saturation(double hectopascal)
    {
        return OneAtmosphere * (hectopascal - Vapour) / (Standard - Vapour);
    }

    /// <summary>1 mL of 0.025 mol/L thiosulfate takes up 0.2 mg of oxygen (definition of the method); 298 mL of sample, and 0.00486 mg that the reagents bring.</summary>
    private static string Titration(double milligramsPerLitre)
    {
        double titre = ((milligramsPerLitre * 0.298) + 0.00486) / 0.2;
        return FormattableString.Invariant($"{titre - 0.01:F3}mL,{titre:F3}mL,{titre + 0.01:F3}mL flask 300mL u 0.1mL titrant 0.025mol/L u 0.00002mol/L drawn 20C blank 0mL u 0.01mL");
    }

    private static async Task<(CalibrationRecord Record, Person Person)> RunAsync(string[] arguments, Dictionary<string, string> answers, Queue<string>? display = null)
    {
        StringWriter output = new();
        StringWriter error = new();
        Person person = new(error, answers, display ?? new Queue<string>());
        int code = await Program.RunAsync(arguments, new Terminal { Input = person, Output = output, Error = error, IsInteractive = true, Time = new StillClock() });
        Assert.True(code == 0, error.ToString());
        return (RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(output.ToString()), "output"), person);
    }

    /// <summary>Reads what was asked last and answers it; presses Enter where nothing else is wanted.</summary>
    private sealed class Person(StringWriter asks, Dictionary<string, string> answers, Queue<string> display) : TextReader
    {
        internal List<string> Asked { get; } = [];

        public override string? ReadLine()
        {
            string all = asks.ToString();
            string question = all[(all.LastIndexOf('\n') + 1)..];
            Asked.Add(question);
            if (question.Contains("What does the meter show", StringComparison.Ordinal))
            {
                return display.TryDequeue(out string? shown) ? shown : null;
            }

            if (question.Contains("(yes or no)", StringComparison.Ordinal))
            {
                return "no";
            }

            foreach ((string asked, string answer) in answers)
            {
                if (question.Contains(asked, StringComparison.Ordinal))
                {
                    return answer;
                }
            }

            // A question that this person knows no answer to would come again for ever.
            return question.Contains("Enter", StringComparison.Ordinal) ? "" : null;
        }
    }

    private sealed class StillClock : TimeProvider
    {
        public override DateTimeOffset GetUtcNow()
        {
            return new DateTimeOffset(2026, 6, 1, 9, 0, 0, TimeSpan.Zero);
        }
    }
}
