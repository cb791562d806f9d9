using System;
using System.Globalization;
using System.IO;
using System.Reflection;
using System.Text;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>
/// docs/uncertainty.md cannot rot: its worked example is computed here, and its defaults are those of the code.
/// PROBECAL_UPDATE=1 writes the example anew.
/// </summary>
public class UncertaintyDocumentTests
{
    private const string Begin = "<!-- worked example: written by UncertaintyDocumentTests -->\n";
    private const string End = "<!-- end of worked example -->";

    [Fact]
    public void WorkedExample_IsWhatTheCodeComputes()
    {
        string path = DocumentPath();
        string document = File.ReadAllText(path);
        int start = document.IndexOf(Begin, StringComparison.Ordinal) + Begin.Length;
        int end = document.IndexOf(End, StringComparison.Ordinal);
        Assert.InRange(start, Begin.Length, end);
        string expected = Example();
        if (Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1")
        {
            File.WriteAllText(path, document[..start] + expected + document[end..]);
            document = File.ReadAllText(path);
            end = document.IndexOf(End, StringComparison.Ordinal);
        }

        Assert.Equal(expected, document[start..end]);
    }

    [Fact]
    public void Defaults_AreThoseOfTheCode()
    {
        string document = File.ReadAllText(DocumentPath());
        int found = 0;
        foreach (FieldInfo field in typeof(UncertaintyDefaults).GetFields(BindingFlags.Public | BindingFlags.Static))
        {
            double value = (double)field.GetRawConstantValue()!;
            Assert.Contains(string.Create(CultureInfo.InvariantCulture, $"| `{field.Name}` | {value:G3} |"), document);
            found++;
        }

        Assert.True(found >= 10);
    }

    private static string Example()
    {
        // An invented probe: nA, 3 %/K exponential, calibrated in aerated water at 20 °C and 1000 hPa, read at 15 °C.
        AmperometricProbe probe = Bench.Probe();
        double pointSignal = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, 20.0, 1000.0, Bench.Air(20.0, 1000.0));
        var point = new CalibrationPoint(
            CalibrationMethod.AirSaturatedWater, pointSignal, 0.05, 20.0, UncertaintyDefaults.TemperatureKelvin, 1000.0,
            UncertaintyDefaults.BarometerHectopascal, Stirring.Stirred, 1.0, 1.0, 0.0, UncertaintyDefaults.AirSaturatedWaterRelative);
        ProbeCalibration calibration = Bench.Calibrate(
            probe, point, new ZeroPoint(true, Bench.Zero, 0.05, 20.0, 1000.0), UncertaintyDefaults.ThermometerOffsetKelvin,
            UncertaintyDefaults.TemperatureCoefficientPerKelvin);
        double raw = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, 15.0, 1000.0, 150.0);
        Reading same = Read(calibration, raw, true);
        Reading other = Read(calibration, raw, false);

        var text = new StringBuilder();
        text.Append("| contribution | same thermometer, mg/L | share | another thermometer, mg/L |\n|---|---|---|---|\n");
        double combined = same.StandardUncertainty(ReadingQuantity.MilligramsPerLitre);
        foreach (UncertaintySource source in Enum.GetValues<UncertaintySource>())
        {
            double value = same.Contribution(source, ReadingQuantity.MilligramsPerLitre);
            double share = 100.0 * value * value / (combined * combined);
            Row(text, source.ToString(), value, share, other.Contribution(source, ReadingQuantity.MilligramsPerLitre));
        }

        Row(text, "combined, k = 1", combined, 100.0, other.StandardUncertainty(ReadingQuantity.MilligramsPerLitre));
        text.Append('\n');
        foreach ((ReadingQuantity quantity, string name) in Names)
        {
            text.Append(string.Create(
                CultureInfo.InvariantCulture, $"- {name}: {same.Value(quantity):F3} with U = {2.0 * same.StandardUncertainty(quantity):F3} (k = 2)\n"));
        }

        return text.ToString();
    }

    private static readonly (ReadingQuantity Quantity, string Name)[] Names =
    [
        (ReadingQuantity.PartialPressure, "pO2, hPa"),
        (ReadingQuantity.MilligramsPerLitre, "mg/L"),
        (ReadingQuantity.MicromolesPerLitre, "µmol/L"),
        (ReadingQuantity.MicromolesPerKilogram, "µmol/kg"),
        (ReadingQuantity.PercentLocal, "% of saturation at the local pressure"),
        (ReadingQuantity.PercentOneAtmosphere, "% of saturation at 1 atm"),
    ];

    private static void Row(StringBuilder text, string name, double same, double share, double other)
    {
        // No minus before a zero.
        text.Append(string.Create(
            CultureInfo.InvariantCulture, $"| {name} | {same + 0.0:+0.0000;-0.0000;0} | {share:F1} % | {other + 0.0:+0.0000;-0.0000;0} |\n"));
    }

    private static Reading Read(ProbeCalibration calibration, double raw, bool sameThermometer)
    {
        var conditions = new ReadingConditions(
            SolubilityEquation.BensonKrause1984, 0.05, sameThermometer, UncertaintyDefaults.ThermometerOffsetKelvin,
            UncertaintyDefaults.TemperatureKelvin, UncertaintyDefaults.BarometerHectopascal, UncertaintyDefaults.Salinity,
            Stirring.Stirred, 1.0, UncertaintyDefaults.StirredRelative);
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(calibration, conditions, raw, 15.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading));
        return reading;
    }

    private static string DocumentPath()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "ProbeCal.sln"))) { folder = folder.Parent; }
        Assert.NotNull(folder);
        return Path.Combine(folder.FullName, "docs", "uncertainty.md");
    }
}
